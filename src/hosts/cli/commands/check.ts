import type { TableFile } from "../../../files/table/tableFile.js";
import { sentenceOfTableFinding } from "../../../files/table/tableFinding.js";
import { columnLetters } from "../../../sheet/book/address.js";
import type { ColumnCheck } from "../../../table/checkColumn.js";
import { checkTable } from "../../../table/checkTable.js";
import { sentenceOfColumnFinding } from "../../../table/columnFinding.js";
import type { RecognisedColumn } from "../../../table/recogniseColumn.js";
import { one } from "../../../units/unit.js";
import type { Command } from "../command.js";
import { exitCode } from "../exitCode.js";
import { progressOn } from "../progress.js";
import { readTable, tableLayout } from "../readTable.js";
import { UsageProblem } from "../usageProblem.js";

const help = `barycell check FILE [--json]

Tells what each column of a table was understood as, and what to look at: units that are missing, unknown or
unlikely, values out of range, texts among numbers, and what is odd about the file. FILE is any that barycell convert
reads, or - for standard input. Exits 1 if there is anything to look at.

  --json                 {"format", "name", "rows", "columns", "findings"}; a finding is {"column", "about", "message"}
  --table NAME           which table of a file of several, by name or number
  --delimiter NAME       where it is delimited text: comma, semicolon, tab or bar
  --units-row yes|no     whether a row of units stands under the header
`;

interface Told {
  /** The column's letters; undefined for the file as a whole. */
  readonly column: string | undefined;
  readonly about: string;
  readonly message: string;
}

export const check: Command = {
  name: "check",
  summary: "tell what a table was understood as and what to look at",
  help,
  options: { "--json": 0, "--table": 1, "--delimiter": 1, "--units-row": 1 },
  async run(line, terminal) {
    const [path, ...more] = line.operands;
    if (path === undefined || more.length > 0) {
      throw new UsageProblem("give one table, for example targets.csv, or - for standard input.");
    }
    const progress = progressOn(terminal);
    const table = await readTable(path, tableLayout(line), terminal, progress).finally(() => progress.end());
    const checks = checkTable(
      table.columns.map((column, index) => ({
        header: table.header[index]!,
        ucd: table.notes[index]?.ucd,
        ...(table.unitsRow ? { unitCell: table.unitsRow[index]! } : {}),
        column,
      })),
    );
    const findings = [...fileFindings(table), ...columnFindings(table, checks)];
    const text = line.options.has("--json")
      ? `${JSON.stringify(jsonAnswer(table, checks, findings))}\n`
      : textAnswer(table, checks, findings);
    await terminal.out(text);
    return findings.length > 0 ? exitCode.cellError : exitCode.done;
  },
};

function fileFindings(table: TableFile): Told[] {
  return table.findings.map((finding) => ({
    column: undefined,
    about: finding.kind,
    message: sentenceOfTableFinding(finding),
  }));
}

function columnFindings({ header }: TableFile, checks: readonly ColumnCheck[]): Told[] {
  return checks.flatMap(({ findings }, index) =>
    findings.map((finding) => ({
      column: columnLetters(index),
      about: finding.about,
      message: sentenceOfColumnFinding(finding, header[index]!, (row) => `row ${(row + 1).toLocaleString("en")}`),
    })),
  );
}

const formatNames: Readonly<Record<TableFile["format"], string>> = {
  delimited: "delimited text",
  ecsv: "ECSV",
  votable: "VOTable",
  "machine-readable": "machine-readable table",
  ipac: "IPAC table",
  "fixed-width": "fixed-width table",
  workbook: "workbook",
};

function textAnswer(table: TableFile, checks: readonly ColumnCheck[], findings: readonly Told[]): string {
  const { format, name, rows } = table;
  const title = `${formatNames[format]}${name ? ` "${name}"` : ""}: ${counted(rows, "row")}, ${counted(checks.length, "column")}`;
  const names = checks.map(({ header }) => header);
  const width = Math.min(40, Math.max(...names.map((header) => header.length)));
  const columns = checks.map(
    (check, index) => `  ${columnLetters(index).padEnd(3)}${names[index]!.padEnd(width)}  ${understoodText(check)}`,
  );
  const look = findings.map(({ message }) => `  ${message}`);
  const end = findings.length === 0 ? "Nothing to look at." : `To look at: ${counted(findings.length, "thing")}`;
  return `${[title, ...columns, end, ...look].join("\n")}\n`;
}

function understoodText({ recognised, numbers, texts, blanks }: ColumnCheck): string {
  const contents = [
    numbers && counted(numbers, "number"),
    texts && counted(texts, "text"),
    blanks && `${blanks.toLocaleString("en")} blank`,
  ]
    .filter(Boolean)
    .join(", ");
  return `${meaningOf(recognised)}: ${contents || "no cells"}`;
}

function meaningOf({ quantity, isUncertainty, unit }: RecognisedColumn): string {
  const unitText = unit && unit.text !== one.text ? ` in ${unit.text}` : "";
  if (quantity) return `${isUncertainty ? "uncertainty of " : ""}${quantity.name}${unitText}`;
  if (isUncertainty) return `an uncertainty${unitText}`;
  return unitText ? `${unit!.kind}${unitText}` : "not a known quantity";
}

function jsonAnswer(table: TableFile, checks: readonly ColumnCheck[], findings: readonly Told[]): object {
  const columns = checks.map(({ header, recognised, numbers, texts, blanks }, index) => ({
    column: columnLetters(index),
    header,
    name: recognised.name,
    quantity: recognised.quantity?.name ?? null,
    uncertainty: recognised.isUncertainty,
    unit: recognised.unit?.text ?? null,
    ucd: table.notes[index]?.ucd ?? null,
    description: table.notes[index]?.description ?? null,
    numbers,
    texts,
    blanks,
  }));
  const told = findings.map(({ column = null, ...finding }) => ({ column, ...finding }));
  return { format: table.format, name: table.name ?? null, rows: table.rows, columns, findings: told };
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}
