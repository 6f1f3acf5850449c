import type { AstExpression, Token } from "@borgar/fx";
import { parse, tokenize } from "@borgar/fx";
import { CellError } from "../../call/cell.js";
import { buildTree } from "./buildTree.js";
import { explainSyntax, syntaxProblem } from "./explainSyntax.js";
import type { Formula, FormulaProblem } from "./formula.js";
import { formulaKey } from "./formula.js";
import type { Functions } from "./functions.js";
import type { Reference } from "./reference.js";
import { readReference } from "./reference.js";

/** The longest text of a formula; worksheet files hold no longer one. */
const longestFormula = 8192;

/**
 * A formula from its text as typed in one cell. Never throws: a text that cannot be read is kept as it is and becomes
 * an error that says where and why.
 */
export function readFormula(text: string, row: number, column: number, functions: Functions): Formula {
  if (text.length > longestFormula) {
    const what = `it has ${text.length} characters; ${longestFormula} are the most`;
    return unreadable(text, syntaxProblem(text, longestFormula, what));
  }
  const tokens = tokenize(text, { withLocation: true });
  const { texts, references, positions } = splitAtReferences(text, tokens, row, column);
  try {
    const root = parse(tokens) as AstExpression;
    const reading = buildTree(root, references, (position) => positions.get(position), functions);
    return { key: formulaKey(texts, references), texts, references, ...reading };
  } catch (thrown) {
    return unreadable(text, problemOf(text, tokens, thrown));
  }
}

/** What is wrong with the text of a formula, if anything is: for an editor, before the text goes into a cell. */
export function checkFormula(text: string, functions: Functions): FormulaProblem | undefined {
  return readFormula(text, 0, 0, functions).problem;
}

function splitAtReferences(text: string, tokens: readonly Token[], row: number, column: number) {
  const texts: string[] = [];
  const references: Reference[] = [];
  const positions = new Map<number, number>();
  let last = 0;
  for (const token of tokens) {
    if (token.type !== "range" && token.type !== "range_beam") {
      continue;
    }
    const reference = readReference(token.value, row, column);
    const [from, to] = token.loc as [number, number];
    if (reference !== undefined) {
      texts.push(text.slice(last, from));
      positions.set(from, references.length);
      references.push(reference);
      last = to;
    }
  }
  texts.push(text.slice(last));
  return { texts, references, positions };
}

function problemOf(text: string, tokens: readonly Token[], thrown: unknown): FormulaProblem {
  if (thrown instanceof RangeError) {
    return syntaxProblem(text, 0, "it is nested too deeply; split it over several columns");
  }
  const offset = (thrown as { sourceOffset?: number }).sourceOffset ?? text.length;
  return explainSyntax(text, tokens, offset);
}

function unreadable(text: string, problem: FormulaProblem): Formula {
  const value = new CellError(problem.code, problem.topic, problem.message);
  const tree = { kind: "value", fixed: true, value } as const;
  return { key: text, texts: [text], references: [], names: [], tree, positional: false, problem };
}
