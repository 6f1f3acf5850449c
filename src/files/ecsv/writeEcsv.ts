import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { cellAt } from "../../call/column.js";
import { fieldOfCell } from "../cell/fieldOfCell.js";
import { lineOfFields } from "../delimited/lineOfFields.js";
import type { DescribedTable } from "../table/describedTable.js";
import { type WrittenColumn, type WrittenTable, type WrittenType, writtenTable } from "../table/writtenColumn.js";
import { yamlText } from "./yamlText.js";

const pieceLength = 1 << 16;

const datatypes: Readonly<Record<WrittenType, string>> = {
  double: "float64",
  integer: "int64",
  logical: "bool",
  text: "string",
};

/** The text of a table as ECSV 1.0, fields separated by commas. */
export function* writeEcsv(table: DescribedTable, written: WrittenTable = writtenTable(table)): Generator<string> {
  const { columns } = written;
  let text = `${headLines(table, columns).join("\n")}\n`;
  text += `${lineOfFields(
    columns.map(({ name }) => name),
    ",",
  )}\n`;
  const rows = columns[0]?.column.length ?? 0;
  for (let row = 0; row < rows; row++) {
    text += `${lineOfFields(
      columns.map(({ column, type }) => fieldOf(cellAt(column, row), type)),
      ",",
    )}\n`;
    if (text.length >= pieceLength) {
      yield text;
      text = "";
    }
  }
  yield text;
}

function headLines({ name, description, remarks = [] }: DescribedTable, columns: readonly WrittenColumn[]): string[] {
  const meta = pairs([
    ["name", name],
    ["description", description],
  ]);
  if (remarks.length > 0) meta.push(`comments: [${remarks.map(yamlText).join(", ")}]`);
  return [
    "%ECSV 1.0",
    "---",
    "datatype:",
    ...columns.map((column) => `- {${columnParts(column).join(", ")}}`),
    "delimiter: ','",
    ...(meta.length > 0 ? [`meta: {${meta.join(", ")}}`] : []),
  ].map((line) => `# ${line}`);
}

function columnParts({ name, unit, unknownUnit, description, ucd, type }: WrittenColumn): string[] {
  // The readers of this format write a logarithm of a unit so, and take the bare word for a unit that VOUnits does not list.
  const unitText = unit?.text.replace(/^log\(/, "dex(") ?? unknownUnit;
  return [
    ...pairs([
      ["name", name],
      ["unit", unitText],
    ]),
    `datatype: ${datatypes[type]}`,
    ...pairs([["description", description]]),
    ...(ucd === undefined ? [] : [`meta: {ucd: ${yamlText(ucd)}}`]),
  ];
}

function pairs(values: readonly (readonly [string, string | undefined])[]): string[] {
  return values.flatMap(([key, value]) => (value === undefined || value === "" ? [] : [`${key}: ${yamlText(value)}`]));
}

function fieldOf(cell: Cell, type: WrittenType): string {
  if (cell === null || cell instanceof CellError) return "";
  if (type === "logical") return cell ? "True" : "False";
  // A zero byte is the one character that no text file holds.
  return typeof cell === "string" ? cell.replaceAll("\0", "\ufffd") : fieldOfCell(cell);
}
