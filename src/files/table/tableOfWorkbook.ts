import type { Book } from "../../sheet/book/book.js";
import { readColumn } from "../../sheet/book/readColumn.js";
import { usedRows } from "../../sheet/book/usedRows.js";
import type { Workbook } from "../../sheet/display/workbook.js";
import { findTable, nearCells } from "../../sheet/view/findTable.js";
import type { TablePlan } from "../../table/tableOf.js";
import { readHeader } from "../../units/readHeader.js";
import { FileProblem } from "../fileProblem.js";
import { sameNames } from "./sameNames.js";
import type { TableFile } from "./tableFile.js";
import type { TableFinding } from "./tableFinding.js";

/** The table of one sheet of a workbook: the one asked for by name or number, else the first that holds a table. */
export function tableOfWorkbook({ book, notes }: Workbook, asked: string | undefined): TableFile {
  const { sheet, plan } = chosenSheet(book, asked);
  const rows = Math.max(0, usedRows(book, sheet) - plan.firstRow);
  const columns = plan.columns.map(({ index }) =>
    readColumn(book, { sheet, column: index, from: plan.firstRow, to: plan.firstRow + rows }),
  );
  const header = plan.columns.map((column) => column.header);
  const others = book.sheets.filter((_, index) => index !== sheet && usedRows(book, index) > 0).map(({ name }) => name);
  const several: TableFinding[] =
    others.length > 0 ? [{ kind: "several-tables", read: book.sheets[sheet]!.name, others }] : [];
  return {
    format: "workbook",
    name: book.sheets[sheet]!.name,
    description: undefined,
    header,
    unitsRow: plan.unitRow === undefined ? undefined : plan.columns.map(({ unitCell }) => unitCell ?? ""),
    columns,
    rows,
    notes: header.map((text) => ({
      name: readHeader(text).name || text,
      unit: undefined,
      description: undefined,
      ucd: undefined,
    })),
    remarks: [...above(book, sheet, plan.headerRow), ...notes],
    findings: [...several, ...sameNames(header), ...(rows === 0 ? [{ kind: "no-rows" } as const] : [])],
    delimited: undefined,
  };
}

/** The sheet asked for by name or number, else the first that holds a table, and where the table lies in it. */
export function chosenSheet(
  book: Book,
  asked: string | undefined,
): { readonly sheet: number; readonly plan: TablePlan } {
  const names = book.sheets.map(({ name }) => name);
  const wanted = names.map((name, index) => asked === undefined || asked === name || asked === String(index + 1));
  for (const [sheet, isWanted] of wanted.entries()) {
    const plan = isWanted ? findTable(book, sheet) : undefined;
    if (plan) return { sheet, plan };
  }
  const shown = names
    .slice(0, 4)
    .map((name) => `"${name}"`)
    .join(", ");
  throw new FileProblem(
    "no-table",
    wanted.includes(true)
      ? "The workbook's sheet has no row of column names; put one above the data."
      : `The workbook has no sheet "${asked?.slice(0, 40)}"; it has ${shown}${names.length > 4 ? " and more" : ""}.`,
  );
}

/** The rows above the header row, as remarks. */
function above(book: Book, sheet: number, headerRow: number): string[] {
  return nearCells(book, sheet)
    .slice(0, headerRow)
    .map((row) =>
      row
        .filter((cell) => typeof cell === "string" || typeof cell === "number")
        .join(" ")
        .trim(),
    )
    .filter((text) => text !== "");
}
