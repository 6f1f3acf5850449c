import { unitSentence } from "../../../../call/explain.js";
import { fits } from "../../../../call/readCell.js";
import type { Book, Sheet, SheetColumn } from "../../../../sheet/book/book.js";
import { readCell } from "../../../../sheet/book/cells.js";
import { general } from "../../../../sheet/display/numberFormat.js";
import { plainSheet, type SheetPresentation } from "../../../../sheet/presentation/presentation.js";
import { sentenceOfColumnFinding } from "../../../../table/columnFinding.js";
import { type RecognisedColumn, recogniseColumn } from "../../../../table/recogniseColumn.js";
import { headerUnitSpan } from "../../../../units/headerUnitSpan.js";
import type { ColumnState } from "../../protocol/bookState.js";
import { lengthInUse, sheetSize } from "./sheetSize.js";

/** What the cells of a column say by themselves. */
interface ColumnFacts {
  readonly header: string;
  readonly recognised: RecognisedColumn;
  readonly spelling: string;
  readonly derived: boolean;
  /** The column whose formulas fill most of this one beside their own cells. */
  readonly filledBy: number | undefined;
  readonly startsWithNumber: boolean;
}

const factsOfColumns = new WeakMap<SheetColumn, ColumnFacts>();
const headers = new Map<string, Pick<ColumnFacts, "recognised" | "spelling">>();
const mostHeaders = 4096;

/** The states of the columns in use of a sheet, as if nothing were set for them. */
export function columnStatesOf(book: Book, sheet: number): readonly ColumnState[] {
  const found = book.sheets[sheet];
  return found === undefined ? [] : columnStates(found, plainSheet);
}

const statesOfSheets = new WeakMap<
  Sheet,
  { readonly of: SheetPresentation; readonly states: readonly ColumnState[] }
>();

export function columnStates(sheet: Sheet, presentation: SheetPresentation): readonly ColumnState[] {
  const known = statesOfSheets.get(sheet);
  if (known?.of === presentation) return known.states;
  const facts = sheet.columns.slice(0, sheetSize(sheet).columns).map(factsOf);
  const sigmaOf = facts.map((_, column) => valueColumnOf(facts, column));
  const states = facts.map((each, column): ColumnState => {
    const seen = presentation.columns[column] ?? {};
    const last = sigmaOf.lastIndexOf(column);
    return {
      name: each.recognised.name,
      unit: each.spelling,
      reading: readingOf(each),
      sigmaOf: sigmaOf[column],
      sigmasTo: last < 0 ? undefined : last,
      width: seen.width,
      hidden: seen.hidden === true,
      format: seen.format ?? general,
      derived: each.derived,
    };
  });
  statesOfSheets.set(sheet, { of: presentation, states });
  return states;
}

function factsOf(column: SheetColumn): ColumnFacts {
  let facts = factsOfColumns.get(column);
  if (facts === undefined) {
    const { cells, runs, claims } = column;
    const cell = readCell(cells, 0);
    const header = typeof cell === "string" || typeof cell === "number" ? String(cell) : "";
    const rows = lengthInUse(cells) - 1;
    const inRows = (spans: readonly { from: number; to: number }[]) =>
      spans.reduce((sum, { from, to }) => sum + to - Math.max(1, Math.min(from, to)), 0);
    const beside = claims.filter(({ row }) => row === undefined);
    facts = {
      header,
      ...headerFacts(header),
      derived: rows > 0 && 2 * (inRows(runs) + inRows(claims)) > rows,
      filledBy: rows > 0 && 2 * inRows(beside) > rows ? beside[0]?.column : undefined,
      startsWithNumber: typeof readCell(cells, 1) === "number",
    };
    factsOfColumns.set(column, facts);
  }
  return facts;
}

function headerFacts(header: string): Pick<ColumnFacts, "recognised" | "spelling"> {
  let facts = headers.get(header);
  if (facts === undefined) {
    const recognised = recogniseColumn(header);
    const span = recognised.unit || recognised.problem ? headerUnitSpan(header) : undefined;
    facts = { recognised, spelling: span ? header.slice(span.from, span.to).trim() : "" };
    if (headers.size >= mostHeaders) headers.clear();
    headers.set(header, facts);
  }
  return facts;
}

/** The column left of this one whose uncertainty it is: a value may have two of them, an upper and a lower one. */
function valueColumnOf(facts: readonly ColumnFacts[], column: number): number | undefined {
  const own = facts[column] as ColumnFacts;
  if (own.filledBy !== undefined && own.filledBy < column && own.filledBy >= column - 2) return own.filledBy;
  if (!own.recognised.isUncertainty) return undefined;
  for (let left = column - 1; left >= Math.max(0, column - 2); left--) {
    const { recognised, startsWithNumber } = facts[left] as ColumnFacts;
    if (!recognised.isUncertainty) {
      return recognised.quantity || recognised.unit || startsWithNumber ? left : undefined;
    }
  }
  return undefined;
}

function readingOf({ header, recognised }: ColumnFacts): ColumnState["reading"] {
  const { unit, problem, quantity, isUncertainty } = recognised;
  if (problem) return { is: "problem", message: `${unitSentence(problem)}.`.replace("?.", "?") };
  if (!unit) return { is: "none", quantity: quantity?.name };
  if (quantity && !isUncertainty && !fits(unit, quantity.kind)) {
    const finding = { about: "kind", quantity, unit } as const;
    return { is: "problem", message: sentenceOfColumnFinding(finding, header, String) };
  }
  return { is: "unit", unit: unit.text, kind: unit.kind, quantity: quantity?.name };
}
