import { FileProblem } from "../fileProblem.js";
import type { FieldColumn } from "../table/fieldColumn.js";
import { type BinaryField, binaryField } from "./binaryField.js";
import { isText, type VotableField } from "./votableField.js";

/** Rows of the BINARY and BINARY2 serialisations, from bytes that arrive in pieces. */
export class BinaryRows {
  rows = 0;
  private rest = new Uint8Array();
  private readonly fields: readonly BinaryField[];
  /** BINARY2 has a bit a field before each row: set where the field has no value. */
  private readonly flagBytes: number;

  constructor(
    private readonly described: readonly VotableField[],
    private readonly columns: readonly FieldColumn[],
    hasFlags: boolean,
  ) {
    this.fields = described.map(binaryField);
    this.flagBytes = hasFlags ? Math.ceil(described.length / 8) : 0;
  }

  push(bytes: Uint8Array): void {
    const all = joined(this.rest, bytes);
    const view = new DataView(all.buffer, all.byteOffset, all.byteLength);
    let at = 0;
    for (let end = this.endOfRow(view, at); end <= view.byteLength; end = this.endOfRow(view, at)) {
      if (end === at)
        throw new FileProblem("not-as-standard", "The VOTable's binary rows hold no bytes; ask for TABLEDATA instead.");
      this.takeRow(view, at);
      at = end;
    }
    this.rest = all.slice(at);
  }

  end(): void {
    if (this.rest.length > 0) {
      throw new FileProblem(
        "not-as-standard",
        `The VOTable's binary data end within row ${(this.rows + 1).toLocaleString("en")}: the file was cut off, or its fields are not as described; copy it again.`,
      );
    }
  }

  private endOfRow(view: DataView, start: number): number {
    let at = start + this.flagBytes;
    for (const field of this.fields) {
      at = field.end(view, at);
      if (!(at <= view.byteLength)) return Number.POSITIVE_INFINITY;
    }
    return at;
  }

  private takeRow(view: DataView, start: number): void {
    let at = start + this.flagBytes;
    for (let index = 0; index < this.fields.length; index++) {
      const field = this.fields[index]!;
      const isNull = this.flagBytes > 0 && (view.getUint8(start + (index >> 3)) & (0x80 >> (index & 7))) !== 0;
      const cell = isNull ? null : field.read(view, at);
      // Without flags an empty text is the only way to write none.
      const isBlank = cell === "" && (this.flagBytes === 0 || !isText(this.described[index]!.datatype));
      this.columns[index]!.pushCell(isBlank ? null : cell);
      at = field.end(view, at);
    }
    this.rows++;
  }
}

function joined(first: Uint8Array, second: Uint8Array): Uint8Array {
  if (first.length === 0) return second;
  const both = new Uint8Array(first.length + second.length);
  both.set(first);
  both.set(second, first.length);
  return both;
}
