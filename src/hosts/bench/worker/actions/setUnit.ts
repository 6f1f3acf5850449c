import type { Cell } from "../../../../call/cell.js";
import { type Column, cellAt, columnOf } from "../../../../call/column.js";
import { unitSentence } from "../../../../call/explain.js";
import type { Area, Book, Place } from "../../../../sheet/book/book.js";
import { columnAt } from "../../../../sheet/book/book.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import { rowsOutside } from "../../../../sheet/book/spans.js";
import { usedRows } from "../../../../sheet/book/usedRows.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { setCells } from "../../../../sheet/edit/setCells.js";
import { setColumn } from "../../../../sheet/edit/setColumn.js";
import type { Reference } from "../../../../sheet/formula/reference.js";
import { resolve } from "../../../../sheet/formula/reference.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import { headerWithUnit } from "../../../../units/headerWithUnit.js";
import { kindPhrase } from "../../../../units/kind.js";
import { isProblem } from "../../../../units/problem.js";
import { quantityText } from "../../../../units/quantityText.js";
import { readQuantity } from "../../../../units/readQuantity.js";
import { readUnit } from "../../../../units/readUnit.js";
import { baseSlope, convertible, fromBase, toBase, type Unit } from "../../../../units/unit.js";
import type { Action } from "../../protocol/request.js";
import { bookOfSession, type Session } from "../session.js";
import { columnStatesOf } from "../state/columnStates.js";
import type { Plan } from "./plan.js";
import { columnName, counted, headerText } from "./words.js";

/**
 * Another unit in a header, and in the headers of its uncertainties that state the same one. With `convert` the numbers
 * typed in these columns are changed so that they mean what they meant; formulas that read the header follow by
 * themselves.
 */
export function setUnit(session: Session, { place, unit: text, convert }: Extract<Action, { do: "set unit" }>): Plan {
  const book = bookOfSession(session);
  const { sheet, column } = place;
  const header = headerText(book, sheet, column);
  const name = columnName(book, sheet, column);
  const before = recogniseColumn(header);
  const to = text === "" ? undefined : unitOf(text);
  if (convert) refuseConversion(name, before.unit, to);
  const sigmas = sigmaColumns(book, sheet, column);
  const following = sigmas.filter(({ unit }) => unit === undefined || unit.text === before.unit?.text);
  const headers = [column, ...following.filter(({ unit }) => unit !== undefined).map(({ at }) => at)];
  const edits: Edit[] = headers.map((at) => {
    const own = headerText(book, sheet, at);
    const written = headerWithUnit(own, text, recogniseColumn(own).unit === undefined && before.problem === undefined);
    return setCells({ sheet, row: 0, column: at }, [[written]]);
  });
  const converted: number[] = [];
  if (convert && before.unit && to) {
    converted.push(column, ...following.map(({ at }) => at));
    edits.push(...valueEdits(book, place, before.unit, to));
    for (const { at } of following) edits.push(...sigmaEdits(book, { ...place, column: at }, column, before.unit, to));
  }
  const edited = [...new Set([...headers, ...converted])].map((at): Area => {
    const bottom = converted.includes(at) ? Math.max(0, usedRows(book, sheet) - 1) : 0;
    return { sheet, top: 0, bottom, left: at, right: at };
  });
  const how = convert ? ", values converted" : before.unit ? ", numbers kept" : "";
  const done = text === "" ? `took the unit from ${name}` : `set unit of ${name} to ${text}${how}`;
  const strangers = convert ? formulasWithoutHeader(book, sheet, column) : 0;
  const said =
    strangers > 0
      ? `${counted(strangers, "formula cell")} of ${name} ${strangers === 1 ? "does" : "do"} not read the header and still ${strangers === 1 ? "gives" : "give"} ${before.unit?.text}; change ${strangers === 1 ? "that formula" : "those formulas"} too.`
      : undefined;
  return { name: done, edits, edited, ...(said === undefined ? {} : { said }) };
}

function unitOf(text: string): Unit {
  const unit = readUnit(text);
  if (isProblem(unit)) throw new EditRefused(`unit: ${unitSentence(unit)}`);
  return unit;
}

function refuseConversion(name: string, from: Unit | undefined, to: Unit | undefined): void {
  if (!from) {
    throw new EditRefused(
      `unit: ${name} states no unit yet, so its numbers cannot be converted; set the unit and keep them`,
    );
  }
  if (!to || convertible(from, to)) return;
  const kinds =
    from.kind === to.kind
      ? `instants in ${from.frame} and ${to.frame}`
      : `${kindPhrase(from.kind)} and ${kindPhrase(to.kind)}`;
  throw new EditRefused(
    `unit: ${name} is in ${from.text}, which cannot be converted to ${to.text}: they are ${kinds}; choose a unit of ${kindPhrase(from.kind)}, or keep the numbers as they stand`,
  );
}

function sigmaColumns(book: Book, sheet: number, column: number) {
  const states = columnStatesOf(book, sheet);
  const last = states[column]?.sigmasTo ?? column;
  return Array.from({ length: last - column }, (_, index) => {
    const at = column + 1 + index;
    return { at, unit: recogniseColumn(headerText(book, sheet, at)).unit };
  });
}

/** The typed cells of a column below its header, span by span, changed. */
function literalEdits(book: Book, { sheet, column }: Place, change: (cells: Column, from: number) => Column): Edit[] {
  const { cells, runs, claims } = columnAt(book, sheet, column);
  const typed = rowsOutside(runs, 1, cells.length).flatMap(({ from, to }) => rowsOutside(claims, from, to));
  return typed.flatMap(({ from, to }) => {
    const before = readColumn(book, { sheet, column, from, to });
    const after = change(before, from);
    return after === before ? [] : [setColumn({ sheet, row: from, column }, after)];
  });
}

function valueEdits(book: Book, place: Place, from: Unit, to: Unit): Edit[] {
  return literalEdits(book, place, (cells) =>
    columnOf(Array.from({ length: cells.length }, (_, row) => convertedCell(cellAt(cells, row), from, to))),
  );
}

/** A text that states no unit of its own, `0.47 ± 0.02`, is in that of the header. */
function convertedCell(cell: Cell, from: Unit, to: Unit): Cell {
  if (typeof cell === "number") return numberIn(cell, from, to);
  const read = typeof cell === "string" ? readQuantity(cell) : undefined;
  if (!read || isProblem(read) || read.unit !== undefined || read.upper === undefined || read.lower === undefined) {
    return cell;
  }
  const base = toBase(from, read.value);
  const slope = baseSlope(from, base) / baseSlope(to, base);
  const value = numberIn(read.value, from, to);
  return quantityText({ value, upper: read.upper * slope, lower: read.lower * slope, unit: undefined });
}

function numberIn(value: number, from: Unit, to: Unit): number {
  const converted = fromBase(to, toBase(from, value));
  if (Number.isFinite(converted)) return converted;
  throw new EditRefused(
    `unit: ${value} ${from.text} cannot be written in ${to.text}; correct that cell, or keep the numbers as they stand`,
  );
}

/** An uncertainty is converted by the slope of the conversion at its value. */
function sigmaEdits(book: Book, place: Place, valueColumn: number, from: Unit, to: Unit): Edit[] {
  return literalEdits(book, place, (cells, start) => {
    const values = readColumn(book, { sheet: place.sheet, column: valueColumn, from: start, to: start + cells.length });
    return columnOf(
      Array.from({ length: cells.length }, (_, row): Cell => {
        const [sigma, value] = [cellAt(cells, row), cellAt(values, row)];
        if (typeof sigma !== "number" || (from.logarithm && typeof value !== "number")) return sigma;
        const base = typeof value === "number" ? toBase(from, value) : 1;
        return sigma * (baseSlope(from, base) / baseSlope(to, base));
      }),
    );
  });
}

/** How many formula cells of a column do not look at its header: their numbers cannot follow. */
function formulasWithoutHeader(book: Book, sheet: number, column: number): number {
  const reads = (reference: Reference | undefined, row: number): boolean => {
    if (reference === undefined || reference.sheet !== undefined) return false;
    const { top, left, right } = resolve(reference, row, column);
    return top === 0 && left <= column && column <= right;
  };
  return columnAt(book, sheet, column)
    .runs.filter(({ from, to }) => to > 1 && from > 0)
    .filter(({ formula, from }) => !formula.references.some((reference) => reads(reference, from)))
    .reduce((sum, { from, to }) => sum + to - from, 0);
}
