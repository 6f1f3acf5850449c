import { FileProblem } from "../fileProblem.js";
import type { DeclaredType } from "../table/declaredCell.js";
import { type DescribedColumn, describedColumns } from "../table/describedColumns.js";
import { FieldColumn } from "../table/fieldColumn.js";
import { checkColumnCount } from "../table/mostColumns.js";
import type { TableFile } from "../table/tableFile.js";
import type { TableFinding } from "../table/tableFinding.js";
import type { TableReader } from "../table/tableReader.js";
import { Lines } from "../text/lines.js";
import { barsOf, betweenBars } from "./bars.js";

const types: Readonly<Record<string, DeclaredType>> = {
  int: "integer",
  integer: "integer",
  long: "integer",
  float: "number",
  double: "number",
  real: "number",
  char: "text",
  date: "text",
};

const mostRemarks = 10_000;

/** What the name of a type, often shortened to its first letters, declares; undefined where it is none. */
export function ipacType(text: string): DeclaredType | undefined {
  const asked = text.trim().toLowerCase();
  const name = asked === "" ? undefined : Object.keys(types).find((type) => type.startsWith(asked));
  return name === undefined ? undefined : types[name];
}

/**
 * Reads an IPAC table (IPAC Table Format Definition): keywords and comments after backslashes, a head of up to four
 * lines between bars (names, types, units, what stands for no value), and rows of fixed width under it.
 */
export class IpacReader implements TableReader {
  rows = 0;
  private readonly lines = new Lines();
  private readonly remarks: string[] = [];
  private readonly head: string[][] = [];
  private bars: readonly number[] = [];
  private columns: DescribedColumn[] | undefined;
  private line = 0;
  private across: { count: number; readonly line: number; readonly text: string } | undefined;

  push(text: string): void {
    this.lines.push(text, (line) => this.take(line));
  }

  finish(): TableFile {
    this.lines.end((line) => this.take(line));
    if (this.head.length === 0) throw problem("it has no line of column names between bars");
    const described = this.columns ?? this.describe();
    const { findings, ...parts } = describedColumns(described);
    const across: TableFinding[] = this.across ? [{ kind: "across-columns", ...this.across }] : [];
    const none: TableFinding[] = this.rows === 0 ? [{ kind: "no-rows" }] : [];
    return {
      ...parts,
      format: "ipac",
      name: undefined,
      description: undefined,
      unitsRow: undefined,
      rows: this.rows,
      remarks: this.remarks,
      findings: [...across, ...none, ...findings],
      delimited: undefined,
    };
  }

  private take(text: string): void {
    this.line++;
    if (text.startsWith("\\")) {
      if (this.remarks.length < mostRemarks) this.remarks.push(text.slice(1).trim());
    } else if (text.startsWith("|") && this.rows === 0 && this.head.length < 4) this.takeHead(text);
    else if (text.trim() !== "") this.takeRow(text);
  }

  private takeHead(text: string): void {
    const bars = barsOf(text);
    if (this.head.length === 0) this.bars = bars;
    const fits = bars.length === this.bars.length && bars.every((bar, index) => bar === this.bars[index]);
    if (bars.length < 2 || !fits)
      throw problem(`the bars of line ${this.line.toLocaleString("en")} do not stand under those of the first`);
    this.head.push(betweenBars(text, bars));
  }

  private describe(): DescribedColumn[] {
    const [names, typeNames, units, nulls] = this.head;
    if (!names) throw problem("it has no line of column names between bars");
    checkColumnCount(names.length);
    return names.map((name, index) => {
      const nullText = nulls?.[index] || "null";
      const unit = /^(?:-*|null)$/.test(units?.[index] ?? "") ? undefined : units![index];
      return {
        notes: { name, unit, description: undefined, ucd: undefined },
        cells: new FieldColumn(ipacType(typeNames?.[index] ?? "char") ?? "text", (field) => field === nullText),
      };
    });
  }

  /** Values stand between the bars; one that reaches beyond the last bar is not cut off. */
  private takeRow(text: string): void {
    this.columns ??= this.describe();
    this.rows++;
    const { bars, columns } = this;
    for (let index = 0; index < columns.length; index++) {
      const bar = bars[index]!;
      const end = index === columns.length - 1 ? text.length : bars[index + 1]!;
      columns[index]!.cells.push(text.slice(isClear(text, bar) ? bar + 1 : bar, end).trim());
    }
    const under = bars.slice(0, -1).find((bar) => !isClear(text, bar));
    if (under !== undefined) {
      this.across ??= { count: 0, line: this.line, text: text.slice(Math.max(0, under - 10), under + 10).trim() };
      this.across.count++;
    }
  }
}

/** Nothing of a value stands under the bar. */
function isClear(text: string, bar: number): boolean {
  return bar >= text.length || text[bar] === " " || text[bar] === "|" || text[bar] === "\t";
}

function problem(what: string): FileProblem {
  return new FileProblem(
    "not-as-standard",
    `The file looks like an IPAC table, but ${what}; copy it again from where it came.`,
  );
}
