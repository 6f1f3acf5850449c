import { tokenize } from "@borgar/fx";
import { CellError } from "../../../../call/cell.js";
import { type Block, cellAt } from "../../../../call/column.js";
import type { Input } from "../../../../functions/definition.js";
import { addressText } from "../../../../sheet/book/address.js";
import type { Book, Place } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { displayCell } from "../../../../sheet/display/displayCell.js";
import { measuredText, withUnitText } from "../../../../sheet/display/measuredText.js";
import { general } from "../../../../sheet/display/numberFormat.js";
import { blockOfOperand, evaluateCell } from "../../../../sheet/evaluate/evaluateCell.js";
import type { Formula } from "../../../../sheet/formula/formula.js";
import { readFormula } from "../../../../sheet/formula/readFormula.js";
import { readReference } from "../../../../sheet/formula/reference.js";
import { callsIn, type TextSpan } from "../../../../sheet/tell/callsIn.js";
import { argumentsOf, definitionOf } from "../../../../sheet/tell/ownCall.js";
import { areaAt, cellsRead, sceneAt } from "../../../../sheet/tell/sceneAt.js";
import type { Diagnostic, FormulaCheck } from "../../protocol/answers.js";
import { counted } from "../actions/words.js";
import { functions } from "../functions.js";

/** A formula that reads more cells is checked without being worked out while it is typed. */
const mostCells = 300_000;

/** What is wrong with a formula in its place, where in its text, and what it would give. */
export function checkFormulaAt(book: Book, text: string, place: Place): FormulaCheck {
  const nothing: FormulaCheck = { diagnostics: [], preview: undefined };
  if (!text.startsWith("=") || text.trim() === "=") return nothing;
  const formula = readFormula(text, place.row, place.column, functions);
  if (formula.problem) {
    const { position, message } = formula.problem;
    return { diagnostics: [{ ...spanAt(text, position), severity: "error", message }], preview: undefined };
  }
  const spans = referenceSpans(text, place);
  const own = formula.references.findIndex((reference) => {
    const area = areaAt(book, reference, place);
    return area !== undefined && isInside(area, place);
  });
  if (own >= 0) {
    const address = addressText(place.row, place.column);
    const message = `formula: ${address} would read itself; a reference that leaves ${address} out is needed`;
    return { diagnostics: [{ ...(spans[own] ?? wholeOf(text)), severity: "error", message }], preview: undefined };
  }
  if (cellsRead(book, formula, place) > mostCells) return nothing;
  return evaluated(book, text, formula, place, spans);
}

function isInside(
  area: { sheet: number; top: number; bottom: number; left: number; right: number },
  place: Place,
): boolean {
  const { sheet, row, column } = place;
  return area.sheet === sheet && area.top <= row && row <= area.bottom && area.left <= column && column <= area.right;
}

function evaluated(book: Book, text: string, formula: Formula, place: Place, spans: readonly TextSpan[]): FormulaCheck {
  const scene = sceneAt(book, formula, place);
  const block = blockOfOperand(evaluateCell(formula.tree, scene, place.row));
  const first = cellAt(block.columns[0]!, 0);
  if (first instanceof CellError) {
    const span = spanOfError(book, text, formula, place, spans, first);
    const severity = first.code === "#N/A" ? "hint" : "error";
    return { diagnostics: [{ ...span, severity, message: first.message }], preview: undefined };
  }
  const { tree } = formula;
  const unit = tree.kind === "own" ? tree.called.unitOf?.(argumentsOf(tree, scene, place.row)) : undefined;
  return { diagnostics: rowProblems(text, block), preview: previewOf(block, unit) };
}

/** Rows of a column result that have no answer although the first one has. */
function rowProblems(text: string, { rows, columns }: Block): Diagnostic[] {
  let [count, first] = [0, undefined as CellError | undefined];
  for (let row = 1; row < rows && columns[0]!.others; row++) {
    const cell = cellAt(columns[0]!, row);
    if (cell instanceof CellError) {
      count++;
      first ??= cell;
    }
  }
  if (!first) return [];
  const message = `${counted(count, "row")} of ${rows.toLocaleString("en")} would have no answer; the first: ${first.message}`;
  return [
    { ...wholeOf(text), severity: "hint", message: message.length > 250 ? `${message.slice(0, 249)}…` : message },
  ];
}

function previewOf({ rows, columns }: Block, unit: string | undefined): string {
  const [value, upper, lower] = columns.map((column) => cellAt(column, 0));
  const single =
    typeof value === "number" ? measuredOf(value, unit, [upper, lower]) : displayCell(value ?? null, general);
  const more = unit === undefined && columns.length > 1 ? `${rows} x ${columns.length} cells` : undefined;
  if (more) return `${single} … ${more}`;
  return rows > 1 ? `${single} and ${counted(rows - 1, "more row")}` : single;
}

/** The digits of a plain worksheet number are its own; those of ours follow its uncertainty. */
function measuredOf(
  value: number,
  unit: string | undefined,
  [upper, lower]: readonly (ReturnType<typeof cellAt> | undefined)[],
): string {
  if (unit === undefined) return displayCell(value, general);
  return withUnitText(measuredText(value, upper ?? null, lower ?? null), unit);
}

function wholeOf(text: string): TextSpan {
  return { from: 1, to: Math.max(1, text.length) };
}

/** The token at a position, or the last character where the text ends before it. */
function spanAt(text: string, position: number): TextSpan {
  const token = tokenize(text, { withLocation: true }).find(
    ({ loc }) => loc && loc[0]! <= position && position < loc[1]!,
  );
  if (token?.loc) return { from: token.loc[0]!, to: token.loc[1]! };
  return { from: Math.max(0, Math.min(position, text.length) - 1), to: text.length };
}

/** Where the references of a formula stand, in their order. */
function referenceSpans(text: string, { row, column }: Place): readonly TextSpan[] {
  return tokenize(text, { withLocation: true }).flatMap(({ type, value, loc }) => {
    const isRange = type === "range" || type === "range_beam";
    return isRange && loc && readReference(value, row, column) ? [{ from: loc[0]!, to: loc[1]! }] : [];
  });
}

/** The part of the text that an error is about: a cell that holds it, an argument, a name, a function, or all of it. */
function spanOfError(
  book: Book,
  text: string,
  formula: Formula,
  place: Place,
  spans: readonly TextSpan[],
  error: CellError,
): TextSpan {
  for (const [index, reference] of formula.references.entries()) {
    const area = areaAt(book, reference, place);
    if (area && cellOf(book, { sheet: area.sheet, row: area.top, column: area.left }) === error) {
      return spans[index] ?? wholeOf(text);
    }
  }
  const [first = "", about = "", input = ""] = error.topic.split(": ");
  const call = callsIn(text).find(({ name }) => name === first || name.endsWith(`.${first}`));
  if (call) {
    const definition = definitionOf(call.name);
    const at = definition ? argumentIndex(definition.inputs, about, input) : undefined;
    const part = at === undefined ? undefined : call.parts[at];
    return part && part.to > part.from ? trimmed(text, part) : { from: call.from, to: call.to };
  }
  const name = /^(.+) is not a known name$/.exec(error.topic)?.[1];
  const token = tokenize(text, { withLocation: true }).find(({ value }) => name !== undefined && value === name);
  return token?.loc ? { from: token.loc[0]!, to: token.loc[1]! } : wholeOf(text);
}

/** The argument that a problem of a call is about, by the input it names; headers and result stand behind the inputs. */
function argumentIndex(inputs: readonly Input[], about: string, input: string): number | undefined {
  if (about === "header count") return inputs.length;
  if (about.startsWith("result")) return inputs.length + 1;
  const index = inputs.findIndex(({ name }) => name === input.replace(/^uncertainty of /, ""));
  return index < 0 ? undefined : index;
}

function trimmed(text: string, { from, to }: TextSpan): TextSpan {
  const part = text.slice(from, to);
  return { from: from + part.length - part.trimStart().length, to: from + part.trimEnd().length };
}
