import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { buildMatrix, isMatrix } from "../../values/operand.js";
import { toText } from "../../values/toText.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { anything, logical, matrix, omittable, rest, text, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { fitting } from "./texts.js";

/** Every cell of the arguments as text, row by row; the first error instead. */
function allTexts(given: readonly { operand: Operand }[]): string[] | CellError {
  const found: string[] = [];
  for (const { operand } of given) {
    for (const cell of isMatrix(operand) ? cellsOf(operand) : [operand]) {
      const piece = toText(cell);
      if (piece instanceof CellError) {
        return piece;
      }
      found.push(piece);
    }
  }
  return found;
}

function* cellsOf(range: Matrix): Generator<Cell> {
  for (let row = 0; row < range.rows; row++) {
    for (let column = 0; column < range.columns; column++) {
      yield range.at(row, column);
    }
  }
}

const concat = define("CONCAT", [rest(anything("text"))] as const, (given) => {
  const pieces = allTexts(given);
  return pieces instanceof CellError ? pieces : fitting("CONCAT", pieces.join(""));
});

/** Several delimiters take turns between the texts. */
const textJoin = define(
  "TEXTJOIN",
  [matrix("delimiter"), omittable(logical("skip empty"), true), rest(anything("text"))] as const,
  (delimiter, skipEmpty, given) => {
    const delimiters = allTexts([{ operand: delimiter }]);
    const pieces = allTexts(given);
    if (delimiters instanceof CellError || pieces instanceof CellError) {
      return delimiters instanceof CellError ? delimiters : (pieces as CellError);
    }
    const kept = skipEmpty ? pieces.filter((piece) => piece !== "") : pieces;
    const joined = kept.map((piece, index) =>
      index === 0 ? piece : (delimiters[(index - 1) % delimiters.length] as string) + piece,
    );
    return fitting("TEXTJOIN", joined.join(""));
  },
);

interface Cut {
  readonly from: number;
  readonly to: number;
}

/** Where the delimiters stand in a text, in order; at one place the first of the list that fits counts. */
function cuts(within: string, delimiters: readonly string[], matchCase: boolean): Cut[] {
  const haystack = matchCase ? within : within.toLowerCase();
  const needles = delimiters.filter((each) => each !== "").map((each) => (matchCase ? each : each.toLowerCase()));
  const found: Cut[] = [];
  for (let offset = 0; offset < haystack.length; ) {
    const needle = needles.find((each) => haystack.startsWith(each, offset));
    if (needle !== undefined) {
      found.push({ from: offset, to: offset + needle.length });
    }
    offset += needle?.length ?? 1;
  }
  return found;
}

function besideDelimiter(name: string, side: "before" | "after"): WorksheetFunction {
  const parameters = [
    text("text"),
    matrix("delimiter"),
    omittable(whole("occurrence"), 1),
    omittable(whole("match mode"), 0),
    omittable(whole("match end"), 0),
    omittable<{ operand: Operand } | undefined>(anything("value if not found"), undefined),
  ] as const;
  return define(name, parameters, (within, delimiter, occurrence, matchMode, matchEnd, otherwise) => {
    const delimiters = allTexts([{ operand: delimiter }]);
    if (delimiters instanceof CellError) {
      return delimiters;
    }
    if (occurrence === 0) {
      return outside(`${name}: occurrence`, 0, "zero", "1 for the first, -1 for the last is needed", "#VALUE!");
    }
    const found = cuts(within, delimiters, matchMode === 0);
    const all = matchEnd === 0 ? found : withEnds(within, found, occurrence);
    const cut = occurrence > 0 ? all[occurrence - 1] : all.at(occurrence);
    if (!cut) {
      return otherwise
        ? otherwise.operand
        : outside(`${name}: text`, within, "without that delimiter", "a text that holds it so often is needed", "#N/A");
    }
    return side === "before" ? within.slice(0, cut.from) : within.slice(cut.to);
  });
}

/** The end of the text in the direction of the search as one more delimiter. */
function withEnds(within: string, found: Cut[], occurrence: number): Cut[] {
  return occurrence > 0 ? [...found, { from: within.length, to: within.length }] : [{ from: 0, to: 0 }, ...found];
}

function split(within: string, delimiters: readonly string[], skipEmpty: boolean, matchCase: boolean): string[] {
  const pieces: string[] = [];
  let start = 0;
  for (const { from, to } of cuts(within, delimiters, matchCase)) {
    pieces.push(within.slice(start, from));
    start = to;
  }
  pieces.push(within.slice(start));
  return skipEmpty ? pieces.filter((piece) => piece !== "") : pieces;
}

const textSplit = define(
  "TEXTSPLIT",
  [
    text("text"),
    omittable<Matrix | undefined>(matrix("column delimiter"), undefined),
    omittable<Matrix | undefined>(matrix("row delimiter"), undefined),
    omittable(logical("skip empty"), false),
    omittable(whole("match mode"), 0),
    omittable<{ operand: Operand } | undefined>(anything("fill"), undefined),
  ] as const,
  (within, columnDelimiter, rowDelimiter, skipEmpty, matchMode, fill) => {
    const across = columnDelimiter ? allTexts([{ operand: columnDelimiter }]) : [];
    const down = rowDelimiter ? allTexts([{ operand: rowDelimiter }]) : [];
    if (across instanceof CellError || down instanceof CellError) {
      return across instanceof CellError ? across : (down as CellError);
    }
    const rows = split(within, down, skipEmpty, matchMode === 0).map((row) =>
      split(row, across, skipEmpty, matchMode === 0),
    );
    const width = Math.max(...rows.map((row) => row.length), 1);
    const filler: Cell = fill ? (isMatrix(fill.operand) ? fill.operand.at(0, 0) : fill.operand) : missing();
    return rows.length === 0 ? "" : buildMatrix(rows.length, width, (row, column) => rows[row]?.[column] ?? filler);
  },
);

const missing = () =>
  new CellError(
    "#N/A",
    "TEXTSPLIT: rows of unequal length",
    "TEXTSPLIT: this row has fewer pieces than another; a fill value as the last argument is needed",
  );

export const joins: readonly WorksheetFunction[] = [
  concat,
  textJoin,
  besideDelimiter("TEXTBEFORE", "before"),
  besideDelimiter("TEXTAFTER", "after"),
  textSplit,
];
