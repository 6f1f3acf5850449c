import type { Column } from "../../call/column.js";
import type { Run, SheetColumn } from "../../sheet/book/book.js";
import { type Cells, cellsOfChunks, chunkRows, joinColumns, noCells, piecesOf } from "../../sheet/book/cells.js";
import { addRows, rowsOutside, type Span, spansIn } from "../../sheet/book/spans.js";
import { placeFormula } from "../../sheet/edit/placeFormula.js";
import { formulaText } from "../../sheet/formula/formula.js";
import type { Functions } from "../../sheet/formula/functions.js";
import { readFormula } from "../../sheet/formula/readFormula.js";
import { type PackedCells, packCells, unpackCells } from "./packedCells.js";

/** A formula as typed in row `from`, filled down to before row `to`. */
export interface PackedRun extends Span {
  readonly formula: string;
}

/** What was typed into one chunk of a column: the rows of it that no formula fills. */
export interface LiteralPiece {
  readonly chunk: Column;
  /** The row of the sheet at which the chunk begins. */
  readonly start: number;
  /** Rows of the chunk, counted in the chunk. */
  readonly spans: readonly Span[];
}

/** The parts of a column that have to be kept; what formulas give is calculated anew. */
export function literalPieces({ cells, runs, claims }: SheetColumn): LiteralPiece[] {
  let filled: readonly Span[] = runs.map(({ from, to }) => ({ from, to }));
  for (const { from, to } of claims) filled = addRows(filled, from, to);
  const literal = rowsOutside(filled, 0, cells.length);
  return cells.chunks.flatMap((chunk, index) => {
    const start = cells.starts[index] as number;
    const end = start + chunk.length;
    const spans = spansIn(literal, start, end).map(({ from, to }) => ({
      from: Math.max(from, start) - start,
      to: Math.min(to, end) - start,
    }));
    return spans.length === 0 ? [] : [{ chunk, start, spans }];
  });
}

/** Stretches of cells that are not blank, by their row in the chunk. */
export function packPiece({ chunk, spans }: LiteralPiece): PackedCells[] {
  return spans.flatMap(({ from, to }) => packCells(chunk, from, to) ?? []);
}

export function packRuns(runs: readonly Run[], column: number): PackedRun[] {
  return runs.map(({ formula, from, to }) => ({ from, to, formula: formulaText(formula, from, column) }));
}

/** A column in which the formulas stand and wait to be calculated. Stretches are in the order of their rows. */
export function unpackColumn(
  stretches: readonly PackedCells[],
  runs: readonly PackedRun[],
  column: number,
  functions: Functions,
): SheetColumn {
  const length = Math.max(...stretches.map(({ row, numbers }) => row + numbers.length), ...runs.map(({ to }) => to), 0);
  return {
    cells: unpackStretches(stretches, length),
    runs: runs.flatMap(({ from, to, formula }) =>
      placeFormula(readFormula(formula, from, column, functions), column, from, to),
    ),
    spills: [],
    claims: [],
  };
}

/** Whole chunks of the usual size, so that columns of one sheet end theirs at the same rows. */
function unpackStretches(stretches: readonly PackedCells[], length: number): Cells {
  const pieces: Column[] = [];
  let row = 0;
  for (const stretch of stretches) {
    pieces.push(...blanks(stretch.row - row), unpackCells(stretch));
    row = stretch.row + stretch.numbers.length;
  }
  const loose = cellsOfChunks([...pieces, ...blanks(length - row)]);
  const chunks: Column[] = [];
  for (let from = 0; from < length; from += chunkRows) {
    chunks.push(joinColumns(piecesOf(loose, from, Math.min(length, from + chunkRows))));
  }
  return cellsOfChunks(chunks);
}

function blanks(rows: number): Column[] {
  return rows <= 0 ? [] : piecesOf(noCells, 0, rows);
}
