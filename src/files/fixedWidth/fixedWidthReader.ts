import { ColumnBuilder } from "../cell/columnBuilder.js";
import { isUnitsRow } from "../delimited/isUnitsRow.js";
import { FileProblem } from "../fileProblem.js";
import { checkColumnCount } from "../table/mostColumns.js";
import { sameNames } from "../table/sameNames.js";
import type { TableFile } from "../table/tableFile.js";
import type { TableFinding } from "../table/tableFinding.js";
import type { TableReader } from "../table/tableReader.js";
import { Lines } from "../text/lines.js";
import { type FixedLayout, fixedLayout } from "./layout.js";

const headLines = 4;
const border = /^[\s|+:=-]*$/;
const mostRemarks = 10_000;

/** Reads a table of columns of fixed width whose head shows where they stand: a rule under the names, or bars. */
export class FixedWidthReader implements TableReader {
  rows = 0;
  private readonly lines = new Lines();
  private readonly remarks: string[] = [];
  private head: string[] | undefined = [];
  private layout: FixedLayout | undefined;
  private names: readonly string[] = [];
  private unitsRow: readonly string[] | undefined;
  private columns: ColumnBuilder[] = [];
  private line = 0;
  private across: { count: number; readonly line: number; readonly text: string } | undefined;

  constructor(private readonly isUnit: (text: string) => boolean) {}

  push(text: string): void {
    this.lines.push(text, (line) => this.take(line));
  }

  finish(): TableFile {
    this.lines.end((line) => this.take(line));
    if (this.head) this.begin(this.head);
    const columns = this.columns.map((column) => column.finish());
    const across: TableFinding[] = this.across ? [{ kind: "across-columns", ...this.across }] : [];
    const none: TableFinding[] = this.rows === 0 ? [{ kind: "no-rows" }] : [];
    return {
      format: "fixed-width",
      name: undefined,
      description: undefined,
      header: this.names,
      unitsRow: this.unitsRow,
      columns,
      rows: this.rows,
      notes: this.names.map((name) => ({ name, unit: undefined, description: undefined, ucd: undefined })),
      remarks: this.remarks,
      findings: [...sameNames(this.names), ...across, ...none],
      delimited: undefined,
    };
  }

  private take(text: string): void {
    this.line++;
    if (text.startsWith("#")) {
      if (this.remarks.length < mostRemarks) this.remarks.push(text.replace(/^#\s*/, ""));
    } else if (text.trim() === "") return;
    else if (!this.head) this.takeRow(text, this.line);
    else {
      this.head.push(text);
      if (this.head.length === headLines) this.begin(this.head);
    }
  }

  private begin(head: readonly string[]): void {
    const layout = fixedLayout(head);
    if (!layout)
      throw new FileProblem(
        "no-header",
        "The file's first lines do not show where its columns stand; put a rule of dashes under each name.",
      );
    checkColumnCount(layout.starts.length);
    this.head = undefined;
    this.layout = layout;
    this.columns = layout.starts.map(() => new ColumnBuilder(0));
    this.names = this.fieldsOf(head[layout.namesLine]!);
    const units =
      layout.headLines - layout.namesLine - (layout.hasRule ? 1 : 0) === 2
        ? this.fieldsOf(head[layout.namesLine + 1]!)
        : undefined;
    let first = layout.headLines;
    if (units) this.unitsRow = units;
    else if (head[first] !== undefined && isUnitsRow(this.fieldsOf(head[first]!), this.isUnit)) {
      this.unitsRow = this.fieldsOf(head[first]!);
      first++;
    }
    for (const [index, line] of head.slice(first).entries())
      this.takeRow(line, this.line - head.length + first + index + 1);
  }

  private takeRow(text: string, line: number): void {
    // The lower border of a framed table.
    if (border.test(text) && /[-=]{3}/.test(text)) return;
    this.rows++;
    const fields = this.fieldsOf(text);
    for (let index = 0; index < fields.length; index++) this.columns[index]!.push(fields[index]!);
    const cut = this.cutAt(text);
    if (cut !== undefined) {
      this.across ??= { count: 0, line, text: text.slice(Math.max(0, cut - 10), cut + 10).trim() };
      this.across.count++;
    }
  }

  private fieldsOf(text: string): string[] {
    const { starts, hasBars } = this.layout!;
    return starts.map((from, index) => {
      const field = text.slice(index === 0 ? 0 : from, starts[index + 1] ?? text.length);
      return (hasBars ? field.replace(/^\s*\|/, "").replace(/\|\s*$/, "") : field).trim();
    });
  }

  /** Where a word runs on from one column into the next. */
  private cutAt(text: string): number | undefined {
    const { starts } = this.layout!;
    return starts.slice(1).find((from) => from < text.length && !isGap(text[from - 1]!) && text[from] !== " ");
  }
}

function isGap(letter: string): boolean {
  return letter === " " || letter === "|" || letter === "+";
}
