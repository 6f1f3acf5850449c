import { type Cell, CellError } from "../../call/cell.js";
import { cellAt } from "../../call/column.js";
import { vounitText } from "../../units/vounitText.js";
import { fieldOfCell } from "../cell/fieldOfCell.js";
import type { DescribedTable } from "../table/describedTable.js";
import { type WrittenColumn, type WrittenTable, writtenTable } from "../table/writtenColumn.js";
import { base64Of } from "./base64.js";
import { BinaryRowWriter } from "./binaryRowWriter.js";
import { type TimeSystem, timeSystemOf } from "./timeSystem.js";
import type { Datatype } from "./votableField.js";
import { xmlAttribute, xmlText } from "./xmlText.js";

export type Serialisation = "TABLEDATA" | "BINARY2";

const pieceLength = 1 << 16;

interface WrittenField {
  readonly column: WrittenColumn;
  readonly datatype: Datatype;
  readonly timeSystem: TimeSystem | undefined;
}

/** The text of a table as VOTable 1.4 (IVOA Recommendation 2019-10-21). */
export function* writeVotable(
  table: DescribedTable,
  serialisation: Serialisation = "TABLEDATA",
  written: WrittenTable = writtenTable(table),
): Generator<string> {
  const fields = written.columns.map(fieldOf);
  const rows = written.columns[0]?.column.length ?? 0;
  yield headText(table, fields, rows);
  if (serialisation === "BINARY2") {
    yield '<BINARY2><STREAM encoding="base64">\n';
    yield* binaryText(fields, rows);
    yield "</STREAM></BINARY2>\n";
  } else {
    yield "<TABLEDATA>\n";
    yield* rowsText(fields, rows);
    yield "</TABLEDATA>\n";
  }
  yield "</DATA>\n</TABLE>\n</RESOURCE>\n</VOTABLE>\n";
}

function fieldOf(column: WrittenColumn): WrittenField {
  const timeSystem = column.unit && timeSystemOf(column.unit);
  return { column, datatype: datatypeOf(column), timeSystem };
}

function datatypeOf({ type, column }: WrittenColumn): Datatype {
  if (type === "double") return "double";
  if (type === "integer") return "long";
  if (type === "logical") return "boolean";
  const areAscii = column.others?.every((cell) => typeof cell !== "string" || isAscii(cell)) ?? true;
  return areAscii ? "char" : "unicodeChar";
}

function isAscii(text: string): boolean {
  return !/[\0\u0080-\uffff]/.test(text);
}

function headText({ name, description, remarks = [] }: DescribedTable, fields: readonly WrittenField[], rows: number) {
  const lines = [
    '<?xml version="1.0" encoding="UTF-8"?>',
    '<VOTABLE version="1.4" xmlns="http://www.ivoa.net/xml/VOTable/v1.3">',
  ];
  lines.push("<RESOURCE>", ...remarks.map((remark) => `<INFO${attributes({ name: "comment", value: remark })}/>`));
  fields.forEach(({ timeSystem }, index) => {
    if (timeSystem) lines.push(`<TIMESYS${attributes({ ID: timeSystemId(index), ...timeSystem })}/>`);
  });
  lines.push(`<TABLE${attributes({ name, nrows: String(rows) })}>`);
  if (description) lines.push(`<DESCRIPTION>${xmlText(description)}</DESCRIPTION>`);
  lines.push(...fields.map(fieldText));
  return `${lines.join("\n")}\n<DATA>\n`;
}

function fieldText({ column, datatype, timeSystem }: WrittenField, index: number): string {
  const { name, unit, unknownUnit, ucd, type, description } = column;
  const start = `<FIELD${attributes({
    name,
    datatype,
    arraysize: type === "text" ? "*" : undefined,
    unit: timeSystem ? "d" : ((unit && vounitText(unit)) ?? unknownUnit),
    ucd: ucd ?? (timeSystem && "time.epoch"),
    ref: timeSystem && timeSystemId(index),
  })}`;
  return description ? `${start}><DESCRIPTION>${xmlText(description)}</DESCRIPTION></FIELD>` : `${start}/>`;
}

function timeSystemId(index: number): string {
  return `time_system_${index + 1}`;
}

function attributes(values: Readonly<Record<string, string | undefined>>): string {
  return Object.entries(values)
    .map(([name, value]) => (value === undefined || value === "" ? "" : ` ${name}="${xmlAttribute(value)}"`))
    .join("");
}

function* rowsText(fields: readonly WrittenField[], rows: number): Generator<string> {
  let text = "";
  for (let row = 0; row < rows; row++) {
    text += "<TR>";
    for (const { column } of fields) {
      const cell = cellAt(column.column, row);
      text += typeof cell === "number" ? `<TD>${fieldOfCell(cell)}</TD>` : elementOf(cell);
    }
    text += "</TR>\n";
    if (text.length >= pieceLength) {
      yield text;
      text = "";
    }
  }
  yield text;
}

function elementOf(cell: Exclude<Cell, number>): string {
  if (cell === null || cell === "" || cell instanceof CellError) return "<TD/>";
  return `<TD>${typeof cell === "boolean" ? String(cell) : xmlText(cell)}</TD>`;
}

function* binaryText(fields: readonly WrittenField[], rows: number): Generator<string> {
  const writer = new BinaryRowWriter(fields.map(({ column, datatype }) => ({ column: column.column, datatype })));
  for (let row = 0; row < rows; row++) {
    writer.addRow(row);
    if (writer.length >= pieceLength) yield `${base64Of(writer.take(3))}\n`;
  }
  yield `${base64Of(writer.take(1))}\n`;
}
