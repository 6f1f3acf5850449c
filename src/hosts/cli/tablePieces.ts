import { delimitedOfTable, type UnitsPlace } from "../../files/delimited/delimitedOfTable.js";
import { writeDelimited } from "../../files/delimited/writeDelimited.js";
import { writeEcsv } from "../../files/ecsv/writeEcsv.js";
import type { DescribedTable } from "../../files/table/describedTable.js";
import { workbookOfTable } from "../../files/table/workbookOfTable.js";
import { writtenTable } from "../../files/table/writtenColumn.js";
import { writeVotable } from "../../files/votable/writeVotable.js";
import { writeWorkbook } from "../../files/xlsx/writeWorkbook.js";
import type { TableForm } from "./tableForm.js";

/** A table as the pieces of a file, and in a sentence each what such a file cannot hold. */
export interface TablePieces {
  readonly pieces: Iterable<string | Uint8Array>;
  readonly losses: readonly string[];
}

export async function tablePieces(table: DescribedTable, form: TableForm, units?: UnitsPlace): Promise<TablePieces> {
  if (form === "csv" || form === "tsv") {
    const { table: delimited, losses } = delimitedOfTable(table, units);
    const options = { delimiter: form === "csv" ? "," : "\t" } as const;
    return { pieces: writeDelimited(delimited, options), losses };
  }
  if (form === "xlsx") return { pieces: [await writeWorkbook(workbookOfTable(table))], losses: workbookLosses(table) };
  const written = writtenTable(table);
  if (form === "ecsv") return { pieces: writeEcsv(table, written), losses: written.losses };
  return { pieces: writeVotable(table, form === "votable" ? "TABLEDATA" : "BINARY2", written), losses: written.losses };
}

function workbookLosses({ notes = [], remarks = [] }: DescribedTable): string[] {
  const isSaid = remarks.length > 0 || notes.some((own) => own?.description !== undefined || own?.ucd !== undefined);
  return isSaid ? ["A sheet has no place for descriptions, UCDs and remarks; ECSV and VOTable keep them."] : [];
}
