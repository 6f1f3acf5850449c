import { SaxesParser } from "saxes";
import { FileProblem } from "../fileProblem.js";
import { type DescribedColumn, describedColumns } from "../table/describedColumns.js";
import { FieldColumn } from "../table/fieldColumn.js";
import { checkColumnCount } from "../table/mostColumns.js";
import type { TableFile } from "../table/tableFile.js";
import type { TableFinding } from "../table/tableFinding.js";
import type { TableReader } from "../table/tableReader.js";
import { Base64Decoder } from "./base64.js";
import { BinaryRows } from "./binaryRows.js";
import { simpleRow } from "./simpleRow.js";
import { VotableDescription } from "./votableDescription.js";
import { declaredTypeOf, isArray, type VotableField } from "./votableField.js";

/** The rest of a plain row is waited for, up to so many characters. */
const longestAwaited = 1 << 16;

/**
 * Reads a VOTable (IVOA VOTable 1.4 and 1.5, and the earlier ones they extend): the TABLEDATA, BINARY and BINARY2
 * serialisations of one of its tables. The parser is fed tag by tag outside the data; plain rows and the binary stream,
 * which are nearly all of a file, pass it by.
 */
export class VotableReader implements TableReader {
  private readonly parser = new SaxesParser({ position: false });
  private readonly description: VotableDescription;
  private pending = "";
  private columns: DescribedColumn[] = [];
  private fields: readonly VotableField[] = [];
  private row: string[] = [];
  private cell = "";
  private textRows = 0;
  private binary: BinaryRows | undefined;
  private base64 = new Base64Decoder();
  private uneven: { count: number; readonly row: number; readonly fields: number } | undefined;

  /** `asked`: the name, the ID or the number, from 1, of the table to read; the first with data where left out. */
  constructor(asked: string | undefined) {
    this.description = new VotableDescription(asked);
    this.parser.on("doctype", () => {
      throw doctypeRefused();
    });
    this.parser.on("error", ({ message }) => {
      throw notXml(message);
    });
    this.parser.on("opentag", ({ name, attributes }) =>
      this.open(localName(name), attributes as Record<string, string>),
    );
    this.parser.on("closetag", ({ name }) => this.close(localName(name)));
    this.parser.on("text", (text) => this.text(text));
    this.parser.on("cdata", (text) => this.text(text));
  }

  get rows(): number {
    return this.binary?.rows ?? this.textRows;
  }

  push(text: string): void {
    const all = this.pending + text;
    let at = 0;
    while (at < all.length) {
      const next = this.step(all, at);
      if (next === undefined) break;
      at = next;
    }
    this.pending = all.slice(at);
  }

  finish(): TableFile {
    this.parser.write(this.pending).close();
    const chosen = this.description.chosenTable();
    if (this.columns.length === 0) this.begin(chosen.fields);
    const { findings, ...parts } = describedColumns(this.columns);
    return {
      ...parts,
      format: "votable",
      name: chosen.name,
      description: chosen.description,
      unitsRow: undefined,
      rows: this.rows,
      remarks: this.description.remarks,
      findings: [...this.description.findings(this.rows), ...this.ownFindings(), ...findings],
      delimited: undefined,
    };
  }

  /** Takes the next piece of text; the place after it, or undefined where more text is needed. */
  private step(all: string, at: number): number | undefined {
    const { place } = this.description;
    if (place === "TABLEDATA") {
      const row = this.cell === "" && this.row.length === 0 ? simpleRow(all, at) : undefined;
      if (row) {
        if (this.description.isRead) this.takeRow(row.fields);
        return row.end;
      }
    } else if (place === "STREAM") {
      const end = all.indexOf("<", at);
      const stop = end < 0 ? all.length : end;
      if (stop > at) {
        if (this.description.isRead) this.binary?.push(this.base64.push(all.slice(at, stop)));
        return stop;
      }
    }
    const end = all.indexOf(">", at);
    if (end < 0 && place === "TABLEDATA" && all.length - at < longestAwaited) return undefined;
    const next = end < 0 ? all.length : end + 1;
    this.parser.write(all.slice(at, next));
    return next;
  }

  private open(name: string, attributes: Readonly<Record<string, string>>): void {
    this.description.open(name, attributes);
    this.cell = "";
    if (name === "TR") this.row = [];
    if (!this.description.isRead) return;
    if (name === "DATA") this.begin(this.description.chosenTable().fields);
    if (name === "FITS") throw elsewhere("a FITS file");
    if (name === "BINARY" || name === "BINARY2") {
      this.binary = new BinaryRows(
        this.fields,
        this.columns.map(({ cells }) => cells),
        name === "BINARY2",
      );
    }
    if (name === "STREAM") checkStream(attributes);
  }

  private close(name: string): void {
    if (name === "TD") this.row.push(this.cell);
    if (name === "TR") {
      if (this.description.isRead) this.takeRow(this.row);
      this.row = [];
    }
    if (name === "STREAM" && this.description.isRead) this.binary?.end();
    this.description.close(name, this.cell);
    this.cell = "";
  }

  private text(text: string): void {
    const { place } = this.description;
    if (place === "TD" || place === "DESCRIPTION" || place === "INFO") this.cell += text;
  }

  private begin(fields: readonly VotableField[]): void {
    if (fields.length === 0) throw new FileProblem("no-table", "The VOTable's table has no FIELD, so no columns.");
    checkColumnCount(fields.length);
    this.fields = fields;
    this.columns = fields.map((field) => {
      const { nullText, notes } = field;
      const isNull = nullText === undefined ? undefined : (text: string) => text.trim() === nullText;
      return { notes, cells: new FieldColumn(declaredTypeOf(field), isNull) };
    });
  }

  private takeRow(fields: readonly string[]): void {
    const { columns } = this;
    this.textRows++;
    if (fields.length !== columns.length) {
      this.uneven ??= { count: 0, row: this.textRows, fields: fields.length };
      this.uneven.count++;
    }
    for (let index = 0; index < columns.length; index++)
      columns[index]!.cells.push(decimalOfHex(fields[index] ?? "", columns[index]!));
  }

  private ownFindings(): TableFinding[] {
    const arrays = this.fields.filter(isArray).map(
      ({ notes, datatype, arraysize }): TableFinding => ({
        kind: "array-column",
        name: notes.name,
        shape: arraysize === undefined ? datatype : `${datatype}[${arraysize}]`,
      }),
    );
    const uneven: TableFinding[] = this.uneven
      ? [{ kind: "field-count", expected: this.columns.length, ...this.uneven }]
      : [];
    return [...uneven, ...arrays, ...(this.rows === 0 ? [{ kind: "no-rows" } as const] : [])];
  }
}

function localName(name: string): string {
  return name.slice(name.indexOf(":") + 1);
}

/** Integers may be written in base 16: `0xff` (VOTable 1.4, section 6). */
function decimalOfHex(field: string, { cells }: DescribedColumn): string {
  return cells.type === "integer" && /^\s*0x[0-9a-f]+\s*$/i.test(field) ? String(BigInt(field.trim())) : field;
}

function checkStream(attributes: Readonly<Record<string, string>>): void {
  if (attributes.href !== undefined) throw elsewhere("another file");
  const encoding = attributes.encoding ?? "base64";
  if (encoding !== "base64") {
    throw new FileProblem(
      "other-kind",
      `The VOTable's binary data are encoded as "${encoding.slice(0, 40)}"; only base64 is read. Ask for TABLEDATA instead.`,
    );
  }
}

function elsewhere(where: string): FileProblem {
  return new FileProblem(
    "other-kind",
    `The VOTable holds its data in ${where}, which is not read; ask for the serialisation TABLEDATA or BINARY2.`,
  );
}

export function doctypeRefused(): FileProblem {
  return new FileProblem(
    "other-kind",
    "The file has a document type declaration (<!DOCTYPE ...>), which can define entities without end and is never read; a VOTable needs none: delete it.",
  );
}

function notXml(message: string): FileProblem {
  const said = message
    .replace(/^[\d:undefi]*:\s*/, "")
    .replace(/\.$/, "")
    .slice(0, 120);
  return new FileProblem(
    "not-as-standard",
    `The file begins as VOTable, but its XML is broken or was cut off (${said}); copy it again from where it came.`,
  );
}
