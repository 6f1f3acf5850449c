import type { Column } from "../../call/column.js";
import type { SheetColumn } from "../../sheet/book/book.js";
import { cellsOfChunks } from "../../sheet/book/cells.js";
import { formulaText } from "../../sheet/formula/formula.js";
import { type ColumnPresentation, sheetPresentation } from "../../sheet/presentation/presentation.js";
import type { BookDocument, KeptMark, KeptRevisions } from "./bookDocument.js";
import { type PackedCells, type PackedOther, packCells } from "./packedCells.js";
import { literalPieces, packPiece, packRuns } from "./packedColumn.js";

export const bookFormat = "barycell book";
export const bookFormatVersion = 1;

/**
 * A book as JSON text, in pieces: what was typed, the formulas, and how it is seen; readBookFile reads it back to the bit.
 *
 *     { "format": "barycell book", "version": 1, "title": text,
 *       "sheets": [{ "name": text, "frozenColumns": count, "columns": [{
 *         "width": pixels, "hidden": true, "format": { "kind": ... },
 *         "values": [{ "row": 1, "cells": [cell, ...] }, ...],
 *         "formulas": [{ "from": 2, "to": 61, "formula": "=B2*2" }, ...] }] }],
 *       "names": [{ "name": text, "refersTo": "=Assumptions!$B$2" }],
 *       "marks": [{ "id", "name", "sheet": text, "at": milliseconds since 1970, "keys": [text, ...],
 *         "columns": [{ "header": text, "cells": [cell, ...], "sigma": [cell, ...] }] }],
 *       "revisions": { "aliases": text, "conditions": text, "ledgers": [{ "kind": "barycell-ledger", "version": 1, ... }] },
 *       "history": [text, ...] }
 *
 * Rows count from 1, as in addresses, `to` included; a formula is that of its first row and moves along below. A cell is
 * a number, a text, true, false, null where it is blank, { "number": "-0" }, or
 * { "error": "#N/A", "topic": text, "message": text }. What formulas give is not kept: it is calculated anew.
 */
export function* writeBookFile({
  title,
  book,
  presentation,
  marks,
  revisions,
  history,
}: BookDocument): Generator<string, void> {
  yield `{"format":${JSON.stringify(bookFormat)},"version":${bookFormatVersion},"title":${JSON.stringify(title)},\n"sheets":[`;
  for (const [index, { name, columns }] of book.sheets.entries()) {
    const seen = sheetPresentation(presentation, index);
    yield `${index > 0 ? "," : ""}\n{"name":${JSON.stringify(name)},"frozenColumns":${seen.frozenColumns},"columns":[`;
    const width = Math.max(columns.length, seen.columns.length);
    for (let column = 0; column < width; column++) {
      yield `${column > 0 ? "," : ""}\n`;
      yield* columnText(columns[column], column, seen.columns[column]);
    }
    yield "]}";
  }
  const names = book.names.map((each) => ({ name: each.name, refersTo: formulaText(each.formula, 0, 0) }));
  yield `],\n"names":${JSON.stringify(names)},\n"marks":[`;
  for (const [index, mark] of marks.entries()) yield `${index > 0 ? "," : ""}\n${markText(mark)}`;
  yield "],\n";
  if (revisions) yield* revisionsText(revisions);
  yield `"history":${JSON.stringify(history)}}\n`;
}

function* columnText(
  column: SheetColumn | undefined,
  index: number,
  { width, hidden, format }: ColumnPresentation = {},
): Generator<string> {
  const presented = JSON.stringify({ width, hidden, format }).slice(0, -1);
  yield `${presented}${presented === "{" ? "" : ","}"values":[`;
  let separator = "";
  for (const piece of column ? literalPieces(column) : []) {
    for (const packed of packPiece(piece)) {
      yield `${separator}{"row":${piece.start + packed.row + 1},"cells":${cellsText(packed)}}`;
      separator = ",\n";
    }
  }
  const runs = packRuns(column?.runs ?? [], index);
  yield `],"formulas":${JSON.stringify(runs.map(({ from, to, formula }) => ({ from: from + 1, to, formula })))}}`;
}

function markText({ id, name, at, sheet, table }: KeptMark): string {
  const columns = table.columns.map(
    ({ header, column, sigma }) =>
      `{"header":${JSON.stringify(header)},"cells":${wholeText(column)}${sigma ? `,"sigma":${wholeText(sigma)}` : ""}}`,
  );
  const head = JSON.stringify({ id, name, at, sheet, keys: table.keys }).slice(0, -1);
  return `${head},"columns":[${columns.join(",\n")}]}`;
}

function* revisionsText({ aliases, conditions, ledgers }: KeptRevisions): Generator<string> {
  yield `"revisions":{"aliases":${JSON.stringify(aliases)},"conditions":${JSON.stringify(conditions)},"ledgers":[`;
  for (const [index, ledger] of ledgers.entries()) yield `${index > 0 ? "," : ""}\n${JSON.stringify(ledger)}`;
  yield "]},\n";
}

function wholeText(column: Column): string {
  const { length, chunks } = cellsOfChunks([column]);
  const packed = packCells(chunks[0] as Column, 0, length);
  const before = new Array(packed?.row ?? 0).fill("null");
  const within = packed ? cellTexts(packed) : [];
  const after = new Array(length - before.length - within.length).fill("null");
  return `[${[...before, ...within, ...after].join(",")}]`;
}

function cellsText(packed: PackedCells): string {
  return `[${cellTexts(packed).join(",")}]`;
}

function cellTexts({ numbers, others }: PackedCells): string[] {
  return Array.from(numbers, (number, row) => {
    const other: PackedOther | undefined = others?.[row];
    if (other !== undefined) return JSON.stringify(other);
    return Object.is(number, -0) ? '{"number":"-0"}' : String(number);
  });
}
