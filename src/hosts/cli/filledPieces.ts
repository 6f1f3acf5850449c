import type { Column } from "../../call/column.js";
import { guardFormula } from "../../files/cell/guardFormula.js";
import { appendColumns, type ReplacedColumn } from "../../files/delimited/appendColumns.js";
import type { TableFile } from "../../files/table/tableFile.js";
import type { FilledColumn } from "./fillTable.js";
import { formOfPath, type TableForm } from "./tableForm.js";
import { type TablePieces, tablePieces } from "./tablePieces.js";

/**
 * A table with its added and replaced columns. Delimited text keeps its own text unless another form is asked for by the end of the
 * output's name; other tables are written in their own form where that can be.
 */
export async function filledPieces(
  table: TableFile,
  added: readonly FilledColumn[],
  out: string | undefined,
  replaced: readonly ReplacedColumn[] = [],
): Promise<TablePieces> {
  const asked = out === undefined ? undefined : formOfPath(out);
  if (table.delimited && (asked === undefined || asked === "csv" || asked === "tsv")) {
    return { pieces: appendColumns(table.delimited, added, { guardText: guardFormula, replaced }), losses: [] };
  }
  const whole = {
    ...table,
    header: [...table.header, ...added.map(({ header }) => header)],
    unitsRow: table.unitsRow && [...table.unitsRow, ...added.map(({ unit }) => unit ?? "")],
    columns: [
      ...table.columns.map((column, index) => replacedIn(replaced, index) ?? column),
      ...added.map(({ column }) => column),
    ],
    notes: [...table.notes, ...added.map(() => undefined)],
  };
  return tablePieces(whole, asked ?? ownForm(table));
}

function replacedIn(replaced: readonly ReplacedColumn[], index: number): Column | undefined {
  return replaced.find((own) => own.index === index)?.column;
}

function ownForm({ format }: TableFile): TableForm {
  return format === "ecsv" || format === "votable" ? format : "csv";
}
