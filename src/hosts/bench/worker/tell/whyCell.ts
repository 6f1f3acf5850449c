import { type Cell, CellError } from "../../../../call/cell.js";
import { canDraw } from "../../../../call/drawCall.js";
import type { CellReading } from "../../../../call/readCell.js";
import { type CallStory, isUnread, tellCall } from "../../../../call/tellCall.js";
import { formulaMath } from "../../../../catalog/formulaMath.js";
import { lastMovedBy } from "../../../../revision/lastMovedBy.js";
import { cellOfKept } from "../../../../revision/ledgerEntry.js";
import { addressText } from "../../../../sheet/book/address.js";
import type { Book, Place } from "../../../../sheet/book/book.js";
import { columnAt } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { spanAt } from "../../../../sheet/book/spans.js";
import { displayCell } from "../../../../sheet/display/displayCell.js";
import { displayNumber } from "../../../../sheet/display/displayNumber.js";
import { measuredText, withUnitText } from "../../../../sheet/display/measuredText.js";
import { general } from "../../../../sheet/display/numberFormat.js";
import { type Formula, formulaText } from "../../../../sheet/formula/formula.js";
import { sameCell } from "../../../../sheet/history/changes.js";
import { argumentsOf, definitionOf, type OwnNode, ownCallIn } from "../../../../sheet/tell/ownCall.js";
import { areaAt, sceneAt } from "../../../../sheet/tell/sceneAt.js";
import type { WhyCall, WhyCell, WhyInput } from "../../protocol/answers.js";
import { ledgersOf } from "../revise/keptRevisions.js";
import { bookOfSession, type Session } from "../session.js";
import { columnStatesOf } from "../state/columnStates.js";
import { windowOf } from "../view/windowOf.js";
import { readsOf } from "./readsOf.js";

/** Where the value of a cell comes from: all that the panel says of it. */
export function whyCell(session: Session, place: Place): WhyCell {
  const book = bookOfSession(session);
  const cell = cellOf(book, place);
  const home = formulaHome(book, place);
  const told = home && tellAt(book, home, place);
  const unit = told?.story.unit ?? (typeof cell === "number" ? unitOfColumn(book, place) : "");
  return {
    place,
    address: addressText(place.row, place.column),
    value: shownValue(session, place, cell),
    exact: cell instanceof CellError ? cell.code : displayCell(cell, general),
    unit: unit === "1" ? "" : unit,
    error: cell instanceof CellError ? cell.message : undefined,
    formula: home && formulaText(home.formula, home.place.row, home.place.column),
    filledFrom: home && !samePlace(home.place, place) ? addressed(home.place) : undefined,
    call: told && whyCall(book, told, home.place),
    reads: home ? readsOf(book, home.formula, home.place) : [],
    changedBy: lastChange(session, place),
  };
}

/** The formula that a cell holds, or that filled it from elsewhere. */
export interface FormulaHome {
  readonly formula: Formula;
  readonly place: Place;
}

export function formulaHome(book: Book, place: Place): FormulaHome | undefined {
  const { runs, claims } = columnAt(book, place.sheet, place.column);
  const run = spanAt(runs, place.row);
  if (run) return { formula: run.formula, place };
  const claim = spanAt(claims, place.row);
  if (!claim) return undefined;
  const source = { sheet: place.sheet, row: claim.row ?? place.row, column: claim.column };
  const formula = spanAt(columnAt(book, source.sheet, source.column).runs, source.row)?.formula;
  return formula && { formula, place: source };
}

/** The call of one of our functions in a formula, told for the row of a cell. */
export interface ToldCall {
  readonly story: CallStory;
  readonly node: OwnNode;
  readonly formula: Formula;
}

export function tellAt(book: Book, { formula, place: home }: FormulaHome, place: Place): ToldCall | undefined {
  const node = ownCallIn(formula.tree);
  const definition = node && definitionOf(node.called.name);
  if (!node || !definition) return undefined;
  const scene = sceneAt(book, formula, home);
  const story = tellCall(definition, argumentsOf(node, scene, home.row), place.row - home.row);
  return { story, node, formula };
}

function shownValue(session: Session, { sheet, row, column }: Place, cell: Cell): string {
  // One row around the cell, as if nothing were filtered: the text that the grid shows.
  const shown = windowOf({ ...session, filters: [] }, sheet, row, row + 1, column, column + 1).cells[0]?.[0];
  return shown?.text ?? displayCell(cell, general);
}

function unitOfColumn(book: Book, { sheet, row, column }: Place): string {
  if (row === 0) return "";
  const states = columnStatesOf(book, sheet);
  const own = states[column];
  const stated = own?.unit === "" && own.sigmaOf !== undefined ? states[own.sigmaOf] : own;
  return stated?.reading.is === "unit" ? stated.reading.unit : "";
}

function samePlace(a: Place, b: Place): boolean {
  return a.sheet === b.sheet && a.row === b.row && a.column === b.column;
}

function addressed(place: Place) {
  return { address: addressText(place.row, place.column), place };
}

function whyCall(book: Book, { story, node, formula }: ToldCall, home: Place): WhyCall {
  const { definition, result, upper, lower, unit } = story;
  const sides = typeof upper === "number" && typeof lower === "number" ? ([upper, lower] as const) : undefined;
  return {
    name: node.called.name,
    question: definition.question,
    part: formula.tree !== node,
    result: typeof result === "number" ? measuredText(result, upper, lower) : textOf(result),
    unit: unit === undefined || unit === "1" ? "" : unit,
    inputs: story.inputs.map((_, index) => whyInput(book, story, index, node, formula, home)),
    formula: definition.formula,
    formulaMath: formulaMath(definition.formula),
    source: definition.source,
    note: definition.note,
    sigma: sides,
    canDraw: canDraw(story),
  };
}

function whyInput(book: Book, story: CallStory, index: number, node: OwnNode, formula: Formula, home: Place): WhyInput {
  const { name, cell, header, assumed, reading, base, share } = story.inputs[index]!;
  const given = node.parameters[index];
  const area = given?.kind === "reference" ? areaAt(book, formula.references[given.index], home) : undefined;
  const place = area && { sheet: area.sheet, row: area.top, column: area.left };
  const own = place && place.sheet === home.sheet ? undefined : book.sheets[place?.sheet ?? -1]?.name;
  return {
    name,
    cell: textOf(cell),
    address: place && addressText(place.row, place.column, own),
    place,
    read: reading && withUnitText(readText(reading), reading.unit.text),
    base:
      base && reading?.unit.text !== "1"
        ? withUnitText(displayNumber(base.value, { kind: "significant", digits: 9 }), base.unit)
        : undefined,
    header: header?.text ? (header.address ? `${header.address}: ${header.text}` : header.text) : undefined,
    assumed,
    share,
    problem: isUnread(story, index),
  };
}

/** A number without uncertainty is shown with the digits that it has. */
function readText({ value, upper, lower }: CellReading): string {
  return upper === undefined ? displayNumber(value, general) : measuredText(value, upper, lower ?? null);
}

function textOf(cell: Cell): string {
  if (cell instanceof CellError) return `${cell.code} ${cell.message}`;
  return cell === null ? "" : displayCell(cell, general);
}

/** What gave the cell its value: a step of this visit, or a revision whose ledger came with the book. */
function lastChange(session: Session, place: Place): string | undefined {
  const step = changedBy(session, place);
  const book = bookOfSession(session);
  const asked = { sheet: book.sheets[place.sheet]?.name ?? "", cell: addressText(place.row, place.column) };
  const entry = lastMovedBy(ledgersOf(session), asked);
  // What was typed since has another value.
  if (!entry || !sameCell(cellOfKept(entry.after), cellOf(book, place))) return step;
  const { file, date } = entry.source;
  return `the revision ${file} of ${date.slice(0, 16).replace("T", " ")} UTC`;
}

/** The latest version that gave the cell the value it has; undefined where cells were moved about since. */
function changedBy({ history }: Session, place: Place): string | undefined {
  const { versions, present } = history;
  const value = cellOf(versions[present]!.book, place);
  for (let index = present; index > 0; index--) {
    if (!sameCell(cellOf(versions[index - 1]!.book, place), value)) return versions[index]!.name;
    if (versions[index]!.moved) return undefined;
  }
  return versions[0]!.name;
}
