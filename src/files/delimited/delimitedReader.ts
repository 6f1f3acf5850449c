import { ColumnBuilder } from "../cell/columnBuilder.js";
import { unguardFormula } from "../cell/guardFormula.js";
import { FileProblem } from "../fileProblem.js";
import type { TextEncoding } from "../text/textSource.js";
import { asidesOf } from "./asidesOf.js";
import type { DelimitedTable } from "./delimitedTable.js";
import { detectDialect } from "./detectDialect.js";
import type { Delimiter, Newline } from "./dialect.js";
import { eachRecord, type QuoteTrouble } from "./eachRecord.js";
import { FindingCollector } from "./findingCollector.js";
import { isUnitsRow } from "./isUnitsRow.js";
import type { SourceText } from "./sourceText.js";
import { SourceTextBuilder } from "./sourceTextBuilder.js";

export interface DelimitedOptions {
  /** Left out: found from the text. */
  readonly delimiter?: Delimiter;
  /** Left out: found from the text. Carriage returns alone, or line feeds with or without one before them. */
  readonly newline?: Newline;
  /** Whether a text is a unit; decides whether the row under the header is a row of units. */
  readonly isUnit: (text: string) => boolean;
  /** Left out: decided by isUnit. */
  readonly unitsRow?: boolean;
  /** A line with more columns than this is refused: it is no table. */
  readonly mostColumns?: number;
}

const byteOrderMark = "\uFEFF";

/** Reads one delimited text that arrives in pieces. */
export class DelimitedReader {
  rows = 0;
  private readonly mostColumns: number;
  private pending: string[] = [];
  private pendingLength = 0;
  private enough: number;
  private hasMark = false;
  private dialect: { readonly delimiter: Delimiter; readonly newline: Newline } | undefined;
  private header: string[] | undefined;
  private unitsRow: string[] | undefined;
  private readonly columns: ColumnBuilder[] = [];
  private readonly source = new SourceTextBuilder();
  private readonly findings = new FindingCollector();

  /** `blockLength`: how much text is parsed at a time. */
  constructor(
    private readonly options: DelimitedOptions,
    private readonly blockLength = 1 << 18,
  ) {
    this.enough = blockLength;
    this.mostColumns = Math.min(options.mostColumns ?? 16_384, 65_535);
  }

  push(text: string): void {
    this.pending.push(text);
    this.pendingLength += text.length;
    if (this.pendingLength >= this.enough) {
      this.parse(false);
    }
  }

  finish(encoding: TextEncoding = "utf-8"): DelimitedTable {
    this.parse(true);
    const header = this.header;
    if (header === undefined || this.dialect === undefined) {
      throw this.source.isEmpty
        ? new FileProblem("empty", "The file is empty; a table needs a first row of column names.")
        : new FileProblem(
            "no-header",
            "The file holds only blank lines and comments; a table needs a row of column names.",
          );
    }
    const source = this.source.finish();
    const dialect = { ...this.dialect, byteOrderMark: this.hasMark, encoding };
    const padded = (texts: string[]) => this.columns.map((_, column) => texts[column] ?? "");
    return {
      header: padded(header),
      unitsRow: this.unitsRow && padded(this.unitsRow),
      columns: this.columns.map((column) => column.finish()),
      rows: this.rows,
      preamble: preambleOf(source, dialect.newline),
      dialect,
      findings: this.findings.finish(header, this.unitsRow !== undefined, this.columns.length, source, dialect),
      source,
    };
  }

  /** What a record may be missing waits for twice as much text, so that a record as long as the file is cheap too. */
  private parse(last: boolean): void {
    let text = this.pending.join("");
    if (this.dialect === undefined) {
      this.hasMark = text.startsWith(byteOrderMark);
      text = this.hasMark ? text.slice(1) : text;
      this.dialect = detectDialect(text, this.options, last);
    }
    const { delimiter, newline } = this.dialect;
    const used = eachRecord(text, delimiter, newline, last, (fields, start, end, trouble) =>
      this.take(fields, text, start, end, trouble),
    );
    if (used > 0) {
      this.source.addBlock(text.slice(0, used));
    }
    this.pending = used < text.length ? [text.slice(used)] : [];
    this.pendingLength = text.length - used;
    this.enough = Math.max(this.blockLength, 2 * this.pendingLength);
  }

  private take(fields: string[], text: string, start: number, end: number, trouble: QuoteTrouble): void {
    if (fields.length === 1 && text.slice(start, end).trim() === "") {
      return;
    }
    if (fields.length > this.mostColumns) {
      throw tooManyColumns(fields.length, this.mostColumns, this.source.records);
    }
    if (trouble !== undefined) {
      this.findings.quote(trouble, this.source.records);
    }
    this.source.addRecord(start, end, fields.length, trouble === "unclosed");
    if (this.header === undefined) {
      this.header = fields.map((field) => unguardFormula(field.trim()));
      this.widen(fields.length);
    } else if (this.source.records === 2 && this.holdsUnits(fields)) {
      this.unitsRow = fields.map((field) => unguardFormula(field.trim()));
      this.checkWidth(fields.length, this.header.length);
    } else {
      this.addRow(fields, this.header.length);
    }
  }

  private holdsUnits(fields: readonly string[]): boolean {
    return this.options.unitsRow ?? isUnitsRow(fields, this.options.isUnit);
  }

  private addRow(fields: readonly string[], expected: number): void {
    this.checkWidth(fields.length, expected);
    const columns = this.columns;
    for (let column = 0; column < columns.length; column++) {
      const builder = columns[column] as ColumnBuilder;
      if (column < fields.length) {
        builder.push(fields[column] as string);
      } else {
        builder.pushBlank();
      }
    }
    this.rows++;
  }

  private checkWidth(width: number, expected: number): void {
    if (width !== expected) {
      this.findings.width(width, expected, this.source.records - 1);
      this.widen(width);
    }
  }

  private widen(width: number): void {
    while (this.columns.length < width) {
      this.columns.push(new ColumnBuilder(this.rows));
    }
  }
}

function preambleOf(source: SourceText, newline: Newline): string[] {
  const preamble: string[] = [];
  for (const aside of asidesOf(source, newline)) {
    if (aside.beforeRecord > 0) {
      break;
    }
    if (aside.kind === "comment") {
      preamble.push(aside.text);
    }
  }
  return preamble;
}

function tooManyColumns(columns: number, most: number, recordsBefore: number): FileProblem {
  const [counted, limit] = [columns.toLocaleString("en"), most.toLocaleString("en")];
  const which = recordsBefore === 0 ? "The first row" : `The row after the first ${recordsBefore.toLocaleString("en")}`;
  return new FileProblem(
    "too-many-columns",
    `${which} has ${counted} columns, more than the ${limit} a table may have; check that the rows end with line breaks and that the delimiter is the file's own.`,
  );
}
