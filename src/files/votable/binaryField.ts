import type { Cell } from "../../call/cell.js";
import { bytesOfType, type Datatype, isArray, isText, type VotableField } from "./votableField.js";

/** How the cells of one field lie in the bytes of a row (VOTable 1.4, sections 5.2 and 6; big-endian). */
export interface BinaryField {
  /** Where the cell that begins at `at` ends; beyond the bytes, or not a number, where they do not reach. */
  end(bytes: DataView, at: number): number;
  read(bytes: DataView, at: number): Cell;
}

const lengthBytes = 4;

export function binaryField(field: VotableField): BinaryField {
  const { datatype, count } = field;
  const sizeOf = (values: number) => Math.ceil(bytesOfType[datatype] * values);
  const start = count === undefined ? lengthBytes : 0;
  const countAt = (bytes: DataView, at: number) => {
    if (count !== undefined) return count;
    return at + lengthBytes <= bytes.byteLength ? bytes.getUint32(at) : Number.NaN;
  };
  return {
    end: (bytes, at) => at + start + sizeOf(countAt(bytes, at)),
    read: (bytes, at) => readCell(field, bytes, at + start, countAt(bytes, at)),
  };
}

function readCell(field: VotableField, bytes: DataView, at: number, count: number): Cell {
  const { datatype, nullText } = field;
  if (isText(datatype)) return readText(datatype, bytes, at, count);
  if (!isArray(field)) {
    const cell = readValue(datatype, bytes, at, 0);
    return nullText !== undefined && String(cell) === nullText ? null : cell;
  }
  const values = datatype.endsWith("Complex") ? 2 * count : count;
  return Array.from({ length: values }, (_, index) => wordOf(readValue(datatype, bytes, at, index))).join(" ");
}

/** One value of a cell; nan is blank, an infinity the word for it, a long integer its digits. */
function readValue(datatype: Datatype, bytes: DataView, at: number, index: number): Cell {
  switch (datatype) {
    case "double":
    case "doubleComplex":
      return finite(bytes.getFloat64(at + 8 * index));
    case "float":
    case "floatComplex":
      return finite(bytes.getFloat32(at + 4 * index));
    case "long":
      return longOf(bytes, at + 8 * index);
    case "int":
      return bytes.getInt32(at + 4 * index);
    case "short":
      return bytes.getInt16(at + 2 * index);
    case "bit":
      return (bytes.getUint8(at + (index >> 3)) >> (7 - (index & 7))) & 1;
    case "boolean":
      return logicalOf(bytes.getUint8(at + index));
    default:
      return bytes.getUint8(at + index);
  }
}

function finite(value: number): Cell {
  if (Number.isFinite(value)) return value;
  return Number.isNaN(value) ? null : value > 0 ? "+Inf" : "-Inf";
}

function longOf(bytes: DataView, at: number): Cell {
  const value = bytes.getInt32(at) * 2 ** 32 + bytes.getUint32(at + 4);
  return Number.isSafeInteger(value) ? value : String(bytes.getBigInt64(at));
}

function logicalOf(code: number): Cell {
  const letter = String.fromCharCode(code);
  if (letter === "T" || letter === "t" || letter === "1") return true;
  return letter === "F" || letter === "f" || letter === "0" ? false : null;
}

function wordOf(cell: Cell): string {
  return cell === null ? "NaN" : String(cell);
}

const utf8 = new TextDecoder("utf-8");
const utf16 = new TextDecoder("utf-16be");

/** A text ends before its first zero, or with its bytes. */
function readText(datatype: Datatype, bytes: DataView, at: number, count: number): string {
  if (datatype === "unicodeChar") {
    let length = 0;
    while (length < count && bytes.getUint16(at + 2 * length) !== 0) length++;
    return utf16.decode(new Uint8Array(bytes.buffer, bytes.byteOffset + at, 2 * length));
  }
  let text = "";
  for (let index = 0; index < count; index++) {
    const code = bytes.getUint8(at + index);
    if (code === 0) return text;
    if (code >= 0x80)
      return utf8.decode(new Uint8Array(bytes.buffer, bytes.byteOffset + at, count)).replace(/\0.*/s, "");
    text += String.fromCharCode(code);
  }
  return text;
}
