import type { ErrorCode } from "../../call/cell.js";
import type { Node } from "./node.js";
import type { Reference } from "./reference.js";
import { isOnSheet, referenceText, relativeText, resolve } from "./reference.js";

/** Why a formula cannot be read as it stands. */
export interface FormulaProblem {
  /** Characters before the place in question, the leading "=" counted. */
  readonly position: number;
  readonly code: ErrorCode;
  readonly topic: string;
  readonly message: string;
}

/** A formula as seen from its cell: the same value for every cell of a column it is filled down. */
export interface Formula {
  /** The text with relative references in R1C1 form: equal for equal formulas. */
  readonly key: string;
  /** What stands around the references: one text more than there are references. */
  readonly texts: readonly string[];
  /** In the order of the text; undefined where the cells are gone (#REF!). */
  readonly references: readonly (Reference | undefined)[];
  /** The defined names in it. */
  readonly names: readonly string[];
  readonly tree: Node;
  /** Whether the value depends on where the cell stands, as with ROW(). */
  readonly positional: boolean;
  /** The first problem, where there is one; the formula is worth an error then. */
  readonly problem: FormulaProblem | undefined;
}

/** The text of a formula in one cell, as the analyst sees and types it. */
export function formulaText(formula: Formula, row: number, column: number): string {
  return weave(formula.texts, formula.references, (reference) => {
    const area = resolve(reference, row, column);
    return isOnSheet(area) ? referenceText(reference, row, column) : "#REF!";
  });
}

export function formulaKey(texts: readonly string[], references: readonly (Reference | undefined)[]): string {
  return weave(texts, references, relativeText);
}

/** The same formula with other references, one for one. */
export function withReferences(formula: Formula, references: readonly (Reference | undefined)[]): Formula {
  return { ...formula, references, key: formulaKey(formula.texts, references) };
}

export function sameFormula(a: Formula, b: Formula): boolean {
  return a === b || a.key === b.key;
}

function weave(
  texts: readonly string[],
  references: readonly (Reference | undefined)[],
  show: (reference: Reference) => string,
): string {
  let text = texts[0] as string;
  for (const [index, reference] of references.entries()) {
    text += (reference === undefined ? "#REF!" : show(reference)) + texts[index + 1];
  }
  return text;
}
