import type { Column } from "../../../../call/column.js";
import type { KeptMark } from "../../../../files/bookFile/bookDocument.js";
import { type PackedCells, packCells, unpackCells } from "../../../../files/bookFile/packedCells.js";
import { cellsOfChunks, joinColumns, noCells, piecesOf } from "../../../../sheet/book/cells.js";
import type { PackedMark } from "./database.js";

/** A mark as plain data, and back. */
export function packMark({ table, ...mark }: KeptMark): PackedMark {
  return {
    ...mark,
    keys: table.keys,
    columns: table.columns.map(({ header, column, sigma }) => ({
      header,
      rows: column.length,
      cells: packCells(column, 0, column.length),
      sigma: sigma && packCells(sigma, 0, sigma.length),
      hasSigma: sigma !== undefined,
    })),
  };
}

export function unpackMark({ keys, columns, ...mark }: PackedMark): KeptMark {
  const unpacked = columns.map(({ header, rows, cells, sigma, hasSigma }) => ({
    header,
    column: wholeColumn(cells, rows),
    ...(hasSigma && { sigma: wholeColumn(sigma, rows) }),
  }));
  return { ...mark, table: { keys, columns: unpacked } };
}

/** With the blanks at both ends again. */
function wholeColumn(packed: PackedCells | undefined, rows: number): Column {
  if (packed === undefined) return joinColumns(piecesOf(noCells, 0, rows));
  const pieces = [...piecesOf(noCells, 0, packed.row), unpackCells(packed)];
  return joinColumns(piecesOf(cellsOfChunks(pieces), 0, rows));
}
