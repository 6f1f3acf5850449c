import { type Cell, CellError } from "../../call/cell.js";
import { type Column, cellAt } from "../../call/column.js";
import { fieldOfCell } from "../cell/fieldOfCell.js";
import { infinityOf } from "../table/writtenColumn.js";
import type { Datatype } from "./votableField.js";

export interface BinaryColumn {
  readonly column: Column;
  readonly datatype: Datatype;
}

const utf8 = new TextEncoder();
/** Room for the flags and the numbers of a row; texts ask for their own. */
const bytesPerField = 16;

/** Rows of BINARY2 (VOTable 1.4, section 5.4): a bit a field, set where it has no value, then the fields, big-endian. */
export class BinaryRowWriter {
  length = 0;
  private bytes = new Uint8Array(1 << 17);
  private view = new DataView(this.bytes.buffer);

  constructor(private readonly columns: readonly BinaryColumn[]) {}

  addRow(row: number): void {
    const { columns } = this;
    this.reserve((columns.length + 1) * bytesPerField);
    const flags = this.length;
    this.bytes.fill(0, flags, flags + Math.ceil(columns.length / 8));
    this.length += Math.ceil(columns.length / 8);
    for (let index = 0; index < columns.length; index++) {
      const { column, datatype } = columns[index]!;
      const cell = cellAt(column, row);
      const isNull = cell === null || cell instanceof CellError;
      if (isNull) this.bytes[flags + (index >> 3)]! |= 0x80 >> (index & 7);
      this.add(isNull ? null : cell, datatype, columns.length - index);
    }
  }

  /** The bytes so far, as many as are a multiple of `unit`; the others stay. */
  take(unit: number): Uint8Array {
    const length = this.length - (this.length % unit);
    const taken = this.bytes.slice(0, length);
    this.bytes.copyWithin(0, length, this.length);
    this.length -= length;
    return taken;
  }

  private add(cell: Exclude<Cell, CellError>, datatype: Datatype, fieldsLeft: number): void {
    if (datatype === "double") this.addDouble(numberOf(cell));
    else if (datatype === "long") this.addLong(typeof cell === "number" ? cell : 0);
    else if (datatype === "boolean") this.bytes[this.length++] = (cell === null ? "?" : cell ? "T" : "F").charCodeAt(0);
    else this.addText(cell === null ? "" : fieldOfCell(cell), datatype, fieldsLeft);
  }

  private addDouble(value: number): void {
    this.view.setFloat64(this.length, value);
    this.length += 8;
  }

  private addLong(value: number): void {
    this.view.setInt32(this.length, Math.floor(value / 2 ** 32));
    this.view.setUint32(this.length + 4, value >>> 0);
    this.length += 8;
  }

  /** A zero would end the text for the reader. */
  private addText(text: string, datatype: Datatype, fieldsLeft: number): void {
    const kept = text.replaceAll("\0", "\ufffd");
    this.reserve(4 + 3 * kept.length + fieldsLeft * bytesPerField);
    const start = this.length + 4;
    if (datatype === "unicodeChar") {
      for (let at = 0; at < kept.length; at++) this.view.setUint16(start + 2 * at, kept.charCodeAt(at));
      this.view.setUint32(this.length, kept.length);
      this.length = start + 2 * kept.length;
    } else {
      const { written } = utf8.encodeInto(kept, this.bytes.subarray(start));
      this.view.setUint32(this.length, written);
      this.length = start + written;
    }
  }

  private reserve(bytes: number): void {
    if (this.length + bytes <= this.bytes.length) return;
    const grown = new Uint8Array(2 * (this.length + bytes));
    grown.set(this.bytes.subarray(0, this.length));
    this.bytes = grown;
    this.view = new DataView(grown.buffer);
  }
}

function numberOf(cell: Exclude<Cell, CellError>): number {
  if (typeof cell === "number") return cell;
  return typeof cell === "string" ? (infinityOf(cell) ?? Number.NaN) : Number.NaN;
}
