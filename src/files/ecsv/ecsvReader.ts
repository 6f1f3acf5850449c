import { eachRecord } from "../delimited/eachRecord.js";
import { FileProblem } from "../fileProblem.js";
import { type DescribedColumn, describedColumns } from "../table/describedColumns.js";
import { FieldColumn } from "../table/fieldColumn.js";
import type { TableFile } from "../table/tableFile.js";
import type { TableFinding } from "../table/tableFinding.js";
import type { TableReader } from "../table/tableReader.js";
import { eachSpacedRecord } from "./eachSpacedRecord.js";
import { type EcsvHeader, readEcsvHeader } from "./ecsvHeader.js";

/** Text is parsed so much at a time. */
const blockLength = 1 << 18;

/** Reads an ECSV 1.0 file (Astropy Proposal for Enhancement 6): delimited text under a commented YAML header. */
export class EcsvReader implements TableReader {
  rows = 0;
  private pending = "";
  private enough = 0;
  private readonly yaml: string[] = [];
  private header: EcsvHeader | undefined;
  private columns: DescribedColumn[] = [];
  private isNamed = false;
  private uneven: { count: number; readonly row: number; readonly fields: number } | undefined;

  push(text: string): void {
    this.pending += text;
    if (this.pending.length >= this.enough) this.parse(false);
  }

  finish(): TableFile {
    this.parse(true);
    if (!this.header) this.header = readEcsvHeader(this.yaml.join("\n"));
    if (!this.isNamed) throw problem("its header is not followed by a line of column names");
    const { findings, ...parts } = describedColumns(this.columns);
    const { name, description, comments } = this.header;
    return {
      ...parts,
      format: "ecsv",
      name,
      description,
      unitsRow: undefined,
      rows: this.rows,
      remarks: comments,
      findings: [...this.ownFindings(), ...findings],
      delimited: undefined,
    };
  }

  private parse(last: boolean): void {
    if (!this.header) this.takeHeader(last);
    if (!this.header) return;
    const text = this.pending;
    const used =
      this.header.delimiter === ","
        ? eachRecord(text, ",", "\n", last, (fields, start, end) => {
            if (fields.length > 1 || text.slice(start, end).trim() !== "") this.take(fields);
          })
        : eachSpacedRecord(text, last, (fields) => this.take(fields));
    this.pending = text.slice(used);
    this.enough = Math.max(blockLength, 2 * this.pending.length);
  }

  /** Takes the comment lines at the head; the header is whole when another line follows. */
  private takeHeader(last: boolean): void {
    let at = 0;
    const text = this.pending;
    while (at < text.length) {
      const feed = text.indexOf("\n", at);
      if (feed < 0 && !last) break;
      const line = text.slice(at, feed < 0 ? text.length : feed).replace(/\r$/, "");
      if (!line.startsWith("#") && line.trim() !== "") {
        this.header = readEcsvHeader(this.yaml.join("\n"));
        this.columns = this.header.columns.map(({ notes, type }) => ({ notes, cells: new FieldColumn(type) }));
        break;
      }
      if (line.startsWith("#") && !/^#\s*%ECSV/.test(line)) this.yaml.push(line.replace(/^# ?/, ""));
      at = feed < 0 ? text.length : feed + 1;
    }
    this.pending = text.slice(at);
  }

  private take(fields: readonly string[]): void {
    const { columns } = this;
    if (!this.isNamed) {
      this.checkNames(fields);
      this.isNamed = true;
      return;
    }
    this.rows++;
    if (fields.length !== columns.length) {
      this.uneven ??= { count: 0, row: this.rows, fields: fields.length };
      this.uneven.count++;
    }
    for (let index = 0; index < columns.length; index++) columns[index]!.cells.push(fields[index] ?? "");
  }

  private checkNames(fields: readonly string[]): void {
    const names = this.columns.map(({ notes }) => notes.name);
    const differs = names.findIndex((name, index) => fields[index]?.trim() !== name.trim());
    if (fields.length !== names.length || differs >= 0) {
      const index = Math.max(differs, 0);
      throw problem(
        `its header describes column ${index + 1} as ${short(names[index])} and its line of names has ${short(fields[index])} there`,
      );
    }
  }

  private ownFindings(): TableFinding[] {
    const arrays = this.header!.columns.flatMap(({ notes, subtype }): TableFinding[] =>
      subtype === undefined ? [] : [{ kind: "array-column", name: notes.name, shape: subtype }],
    );
    const uneven: TableFinding[] = this.uneven
      ? [{ kind: "field-count", expected: this.columns.length, ...this.uneven }]
      : [];
    return [...uneven, ...arrays, ...(this.rows === 0 ? [{ kind: "no-rows" } as const] : [])];
  }
}

function short(name: string | undefined): string {
  return name === undefined ? "nothing" : `"${name.length > 30 ? `${name.slice(0, 29)}…` : name}"`;
}

function problem(what: string): FileProblem {
  return new FileProblem("not-as-standard", `The file begins as ECSV, but ${what}; mend the header.`);
}
