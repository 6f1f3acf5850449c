import type { Book, ColumnSpan } from "../../sheet/book/book.js";
import { calculate } from "../../sheet/calculate/calculate.js";
import type { Watch } from "../../sheet/change.js";
import type { SheetPresentation, Workbook } from "../../sheet/display/workbook.js";
import { plainSheet } from "../../sheet/display/workbook.js";
import type { Functions } from "../../sheet/formula/functions.js";
import { openZip } from "../zip/openZip.js";
import { damaged } from "../zip/zipProblem.js";
import { ownFunctions } from "./ownFunctions.js";
import { mostCells } from "./read/cellsBuilder.js";
import { explainer } from "./read/explainCell.js";
import { notesOf } from "./read/notesOf.js";
import { findWorkbookPart, openParts } from "./read/parts.js";
import { readNames } from "./read/readNames.js";
import { readSharedStrings } from "./read/readSharedStrings.js";
import type { SheetReading } from "./read/readSheet.js";
import { readSheet } from "./read/readSheet.js";
import { readStyles } from "./read/readStyles.js";
import { readTables } from "./read/readTables.js";
import { readWorkbookPart } from "./read/readWorkbookPart.js";
import { refuseOtherKinds } from "./read/refuseOtherKinds.js";
import type { Steps } from "./steps.js";
import { inSlices } from "./steps.js";

/**
 * Reads a workbook (ECMA-376, .xlsx). Cells hold what the file says their formulas gave; formulas without a value, and
 * all of them where the file asks for it, are calculated. Throws a FileProblem, with a sentence, for anything that is
 * no whole workbook; resolves to undefined where it was cancelled.
 */
export function readWorkbook(bytes: Uint8Array): Promise<Workbook>;
export function readWorkbook(bytes: Uint8Array, watch: Watch): Promise<Workbook | undefined>;
export function readWorkbook(bytes: Uint8Array, watch?: Watch): Promise<Workbook | undefined> {
  return inSlices(readSteps(bytes, ownFunctions, "as needed"), watch);
}

/** The same with every formula's value as the file has it, whatever the file asks for. */
export function readWorkbookAsStored(bytes: Uint8Array): Promise<Workbook> {
  return inSlices(readSteps(bytes, ownFunctions, "never")) as Promise<Workbook>;
}

type Calculating = "as needed" | "never";

function* readSteps(bytes: Uint8Array, functions: Functions, calculating: Calculating): Steps<Workbook> {
  refuseOtherKinds(bytes);
  const directory = openZip(bytes);
  const parts = openParts(directory);
  const workbookEntry = findWorkbookPart(parts, directory);
  const {
    sheets,
    names: nameEntries,
    since1904,
    recalculates,
    refersElsewhere,
  } = readWorkbookPart(parts, workbookEntry);
  const relationships = parts.relationshipsOf(workbookEntry.name);
  const partOf = (test: (each: (typeof relationships)[number]) => boolean) => {
    const target = relationships.find(test)?.target;
    return target === undefined ? undefined : parts.find(target);
  };
  const stringsEntry = partOf(({ type }) => type === "sharedStrings");
  const stylesEntry = partOf(({ type }) => type === "styles");
  const entries = sheets.map(({ id, name }) => {
    const entry = partOf((each) => each.id === id);
    if (entry === undefined) {
      throw damaged(`the sheet "${name.slice(0, 31)}" is missing`);
    }
    const type = relationships.find((each) => each.id === id)?.type;
    return { entry, name, isChart: type !== "worksheet" };
  });

  const total = entries.reduce((sum, { entry }) => sum + entry.size, stringsEntry?.size ?? 0);
  const told = function* <T>(steps: Generator<number, T>): Steps<T> {
    for (let step = steps.next(); ; step = steps.next()) {
      if (step.done) {
        return step.value;
      }
      yield { done: Math.min(parts.unpacked.bytes, total), total };
    }
  };
  const notes: string[] = [];
  const tables = new Map(
    entries.flatMap(({ entry, name }) => readTables(parts, entry, name).map((each) => [each.name.toUpperCase(), each])),
  );
  const names = readNames(nameEntries, functions, tables, notes);
  const strings = stringsEntry === undefined ? [] : yield* told(readSharedStrings(stringsEntry, parts.unpacked));
  const styles = stylesEntry === undefined ? [] : readStyles(parts, stylesEntry);
  const reading = { functions, names, tables, strings, styles, since1904, budget: { left: mostCells } };
  let book: Book = { names, sheets: [] };
  const why = explainer(() => book);
  const readings: (SheetReading | undefined)[] = [];
  for (const [sheet, { entry, name, isChart }] of entries.entries()) {
    const explain = (row: number, column: number) => why({ sheet, row, column });
    readings.push(
      isChart ? undefined : yield* told(readSheet(entry, parts.unpacked, { ...reading, sheet: name }, explain)),
    );
  }
  book = { names, sheets: sheets.map(({ name }, sheet) => ({ name, columns: readings[sheet]?.columns ?? [] })) };
  if (refersElsewhere) {
    notes.push("Formulas refer to other files, which are not read; they keep the values that they had.");
  }
  notes.push(...notesOf(sheets, readings));
  const presentations = sheets.map(
    ({ hidden }, sheet): SheetPresentation => ({ ...plainSheet, ...readings[sheet]?.presentation, hidden }),
  );
  if (calculating === "as needed") {
    book = yield* calculate(book, { changed: [], stale: recalculates ? allFormulas(book) : withoutValue(readings) });
  }
  return { book, sheets: presentations, notes };
}

function withoutValue(readings: readonly (SheetReading | undefined)[]): ColumnSpan[] {
  return readings.flatMap((reading, sheet) =>
    [...(reading?.stale ?? [])].flatMap(([column, spans]) => spans.map((span) => ({ ...span, sheet, column }))),
  );
}

/** Formulas that cannot be calculated here keep the values of the program that could. */
function allFormulas(book: Book): ColumnSpan[] {
  return book.sheets.flatMap(({ columns }, sheet) =>
    columns.flatMap(({ runs }, column) =>
      runs.filter(({ formula }) => formula.problem === undefined).map(({ from, to }) => ({ sheet, column, from, to })),
    ),
  );
}
