import { type Column, columnOf } from "../../../../call/column.js";
import { joinColumns } from "../../../../sheet/book/cells.js";

/** A table as it was read; formats say more of theirs. */
interface ReadTable {
  readonly header: readonly string[];
  readonly unitsRow: readonly string[] | undefined;
  readonly columns: readonly Column[];
}

/** The columns of a sheet: header in row 1, units in row 2 where the file has such a row, then the data. */
export function tableColumns({ header, unitsRow, columns }: ReadTable): Column[] {
  return columns.map((column, index) => {
    const above = unitsRow ? [header[index], unitsRow[index]] : [header[index]];
    return joinColumns([columnOf(above.map((text) => text || null)), column]);
  });
}
