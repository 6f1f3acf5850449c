import type { Area, Place } from "../../../sheet/book/book.js";
import type {
  BookEntry,
  ColumnReport,
  ComparisonReport,
  CompletedText,
  CurveAnswer,
  Distribution,
  ExportedFile,
  FormulaCheck,
  FunctionEntry,
  KeptDraft,
  MarkState,
  Opened,
  PlotColumn,
  Summary,
  TableReport,
  WhyCell,
} from "./answers.js";
import type { BookState } from "./bookState.js";
import type { PlanAnswer, PlanHours, PlanNight, PlanStart, PlanVisibility, PlanWords } from "./plan.js";
import type { Action, FilterCondition, FindOptions, Outcome } from "./request.js";
import type {
  LedgerForm,
  LedgerSummary,
  LedgerView,
  ReviseAnswer,
  Revised,
  ReviseWords,
  RevisionMoves,
  RevisionTexts,
  WrittenLedger,
} from "./revise.js";
import type { ShownWindow } from "./shown.js";

/**
 * All that the page asks of the worker, which holds the books. Every method is answered by a promise on the page's
 * side; arguments and answers are plain data.
 */
export interface Bench {
  /** Opens the last book, or the demo where there is none; the state is also sent as an event. */
  start(): BookState;
  books(): readonly BookEntry[];
  openBook(id: string): Opened;
  /** An empty table with these headers: `Period [d]`. */
  newBook(title: string, headers: readonly string[]): Opened;
  openDemo(): Opened;
  renameBook(title: string): void;
  /** Removed books can be taken back until the page is closed. */
  removeBook(id: string): void;
  takeBack(id: string): void;
  openFile(file: File): Opened;
  openText(name: string, text: string): Opened;
  /** The file as bytes, whole; `sheet` counts for formats of one table. */
  exportAs(format: ExportFormat, sheet: number): ExportedFile;

  windowOf(sheet: number, from: number, to: number, left: number, right: number): ShownWindow;
  /** The rows of a sheet that its filter lets through, ascending, the header row first; undefined while no filter is on. */
  visibleRows(sheet: number): Int32Array | undefined;
  /** What a cell holds, as one would type it. */
  entryOf(place: Place): string;
  act(action: Action, label?: string): Outcome;
  undo(): Outcome;
  redo(): Outcome;
  goTo(version: number): Outcome;
  cancel(): void;

  /** What the numbers of an area add up to; for the line under the grid. */
  summarise(area: Area): Summary;
  copy(area: Area): { readonly text: string; readonly html: string; readonly own: string };
  /** Rows for which every condition holds, and that are among `rows` where these are given. */
  filter(sheet: number, conditions: readonly FilterCondition[], rows?: Int32Array): Outcome;
  find(options: FindOptions, after: Place, backwards: boolean): Place | undefined;
  /** The edge of the filled cells from a place in a direction: where a jump by keyboard lands. */
  edge(place: Place, toward: "down" | "up" | "left" | "right"): Place;
  /** A place typed by name or address: `H12`, `Assumptions!B2`, a defined name, a target's name in the first column. */
  placeOf(text: string, sheet: number): Area | undefined;
  nextProblem(after: Place): Place | undefined;

  functions(): readonly FunctionEntry[];
  /** Functions whose question or words answer these; the best first. */
  searchFunctions(words: string): readonly string[];
  checkFormula(text: string, place: Place): FormulaCheck;
  completeHeaders(text: string, caret: number, place: Place): CompletedText;
  keepDraft(draft: KeptDraft | undefined): void;
  keptDraft(): KeptDraft | undefined;

  why(place: Place): WhyCell;
  draw(place: Place, seed: number): Distribution | undefined;
  checkTable(sheet: number): TableReport;
  checkUnit(text: string, place: Place): ColumnReport;
  marks(): readonly MarkState[];
  mark(sheet: number): MarkState;
  forget(mark: string): void;
  compare(mark: string): ComparisonReport;
  writeComparison(mark: string): Outcome;

  plotColumn(sheet: number, column: number): PlotColumn;
  /** Which columns hold these quantities, as far as the headers tell. */
  columnsOf(sheet: number): Readonly<Record<string, number>>;
  /** Radial velocity over one orbit of a row's planet. */
  curve(sheet: number, row: number): CurveAnswer;

  /** What a sheet offers to a plan: its columns, a site. */
  planStart(sheet: number): PlanStart;
  /** What a plan calls the targets of these rows. */
  targetNames(sheet: number, rows: readonly number[]): readonly string[];
  /** Chooses targets and lays their visits; `cancel` ends it. */
  plan(sheet: number, words: PlanWords): PlanAnswer;
  /** The visits of the last plan in a sheet of their own, and what was asked and found in another. */
  writePlan(): Outcome;
  planHours(sheet: number, words: PlanWords): PlanHours;
  planVisibility(sheet: number, rows: readonly number[], words: PlanWords): PlanVisibility;
  /** `date` is that of the evening; empty for the first night of the plan. */
  planNight(sheet: number, rows: readonly number[], words: PlanWords, date: string): PlanNight;

  revisionTexts(): RevisionTexts;
  /** Kept with the book. */
  keepRevisionTexts(texts: RevisionTexts): void;
  /** What the values of a file would change in the table of a sheet; `cancel` ends it. */
  reviseFrom(file: File, sheet: number, words: ReviseWords): ReviseAnswer;
  /** Does what was shown last, as one step. */
  applyRevision(): Revised;
  /** Of the book as it is: revisions that are undone have none. The latest first. */
  ledgers(): readonly LedgerSummary[];
  ledger(id: string, most: number): LedgerView | undefined;
  writeLedger(id: string, form: LedgerForm): WrittenLedger;
  /** Columns by their headers; the latest ledger where none has that id. */
  revisionMoves(id: string, x: string, y: string): RevisionMoves;
}

export type ExportFormat = "csv" | "tsv" | "ecsv" | "votable" | "xlsx" | "book";

/** What the worker tells by itself. */
export type BenchEvent =
  | { readonly is: "state"; readonly state: BookState }
  | { readonly is: "progress"; readonly what: string; readonly done: number; readonly total: number }
  | { readonly is: "idle" }
  /** A fault of ours in the worker: it is started anew from the last whole sheet. */
  | { readonly is: "fault"; readonly message: string };
