import type { ZipLimits } from "./zipLimits.js";
import { zipLimits } from "./zipLimits.js";
import { damaged, megabytes, tooLarge } from "./zipProblem.js";

/** A part of a zip file, as its directory tells of it. */
export interface ZipEntry {
  readonly name: string;
  readonly method: number;
  readonly crc: number;
  readonly packedSize: number;
  readonly size: number;
  /** The packed bytes. */
  readonly packed: Uint8Array;
}

/** The parts of a zip file by name. Names with a path out of the file are left out: nothing here has such a name. */
export type ZipDirectory = ReadonlyMap<string, ZipEntry>;

const endSignature = 0x06054b50;
const centralSignature = 0x02014b50;
const localSignature = 0x04034b50;
const endLength = 22;
const longestComment = 0xffff;
const inExtraField = 0xffffffff;

/** Reads the directory of a zip file (APPNOTE.TXT 6.3.10, sections 4.3.7, 4.3.12 and 4.3.16); unpacks nothing. */
export function openZip(bytes: Uint8Array, limits: ZipLimits = zipLimits): ZipDirectory {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const end = findEnd(view);
  const count = view.getUint16(end + 10, true);
  const directorySize = view.getUint32(end + 12, true);
  const directoryStart = view.getUint32(end + 16, true);
  if (directoryStart + directorySize > end) {
    throw damaged("its list of parts does not lie within it");
  }
  if (count > limits.mostEntries) {
    throw tooLarge(`it has ${count.toLocaleString("en")} parts`);
  }
  const entries = new Map<string, ZipEntry>();
  let at = directoryStart;
  let packed = 0;
  for (let index = 0; index < count; index++) {
    const { entry, next } = readEntry(bytes, view, at, directoryStart);
    at = next;
    packed += entry.packedSize;
    // Parts that share their bytes are how a small file unpacks to a huge one.
    if (packed > directoryStart || entries.has(entry.name)) {
      throw damaged("two of its parts are in one place or have one name");
    }
    refuseLarge(entry, limits);
    if (isPlainPath(entry.name)) {
      entries.set(entry.name, entry);
    }
  }
  return entries;
}

function findEnd(view: DataView): number {
  const last = view.byteLength - endLength;
  for (let at = last; at >= Math.max(0, last - longestComment); at--) {
    if (
      view.getUint32(at, true) === endSignature &&
      at + endLength + view.getUint16(at + 20, true) <= view.byteLength
    ) {
      return at;
    }
  }
  throw damaged("the list of its parts, which stands at the end, is missing");
}

function readEntry(bytes: Uint8Array, view: DataView, at: number, end: number) {
  if (at + 46 > view.byteLength || view.getUint32(at, true) !== centralSignature) {
    throw damaged("the list of its parts breaks off");
  }
  const flags = view.getUint16(at + 8, true);
  const [nameLength, extraLength, commentLength] = [28, 30, 32].map((offset) => view.getUint16(at + offset, true)) as [
    number,
    number,
    number,
  ];
  const next = at + 46 + nameLength + extraLength + commentLength;
  if (next > view.byteLength) {
    throw damaged("the list of its parts breaks off");
  }
  const name = new TextDecoder().decode(bytes.subarray(at + 46, at + 46 + nameLength));
  if (flags & 1) {
    throw damaged(`its part ${shown(name)} is encrypted in a way that workbooks are not`);
  }
  const extra = at + 46 + nameLength;
  const sizes = readSizes(view, at, extra, extra + extraLength);
  const packed = locate(bytes, view, sizes.start, sizes.packedSize, end, name);
  const method = view.getUint16(at + 10, true);
  if (method !== 0 && method !== 8) {
    throw damaged(`its part ${shown(name)} is packed in an unknown way (method ${method})`);
  }
  const crc = view.getUint32(at + 16, true);
  return { entry: { name, method, crc, packedSize: sizes.packedSize, size: sizes.size, packed }, next };
}

/** Sizes and place of a part; where they are too large for their fields they stand in an extra field (section 4.5.3). */
function readSizes(view: DataView, at: number, extra: number, extraEnd: number) {
  const sizes = [24, 20, 42].map((offset) => view.getUint32(at + offset, true)) as [number, number, number];
  for (let field = extra; field + 4 <= extraEnd; field += 4 + view.getUint16(field + 2, true)) {
    if (view.getUint16(field, true) === 1) {
      let value = field + 4;
      for (const [index, size] of sizes.entries()) {
        if (size === inExtraField && value + 8 <= extraEnd) {
          sizes[index] = Number(view.getBigUint64(value, true));
          value += 8;
        }
      }
    }
  }
  return { size: sizes[0], packedSize: sizes[1], start: sizes[2] };
}

function locate(
  bytes: Uint8Array,
  view: DataView,
  start: number,
  packedSize: number,
  end: number,
  name: string,
): Uint8Array {
  if (start + 30 > end || view.getUint32(start, true) !== localSignature) {
    throw damaged(`its part ${shown(name)} is not where its list says`);
  }
  const from = start + 30 + view.getUint16(start + 26, true) + view.getUint16(start + 28, true);
  if (from + packedSize > end) {
    throw damaged(`its part ${shown(name)} reaches beyond its end`);
  }
  return bytes.subarray(from, from + packedSize);
}

function refuseLarge({ name, size, packedSize }: ZipEntry, limits: ZipLimits): void {
  if (size > limits.mostBytes) {
    throw tooLarge(`${shown(name)} alone to ${megabytes(size)}`);
  }
  if (size > limits.smallBytes && size > packedSize * limits.mostRatio) {
    throw tooLarge(`${shown(name)} to ${megabytes(size)}, ${Math.round(size / packedSize)} times its size`);
  }
}

function isPlainPath(name: string): boolean {
  return !/^[/\\]|\\|^[a-z]:|(^|\/)\.\.?(\/|$)/i.test(name);
}

/** A name short enough for a sentence. */
function shown(name: string): string {
  return name.length > 40 ? `${name.slice(0, 37)}...` : name;
}
