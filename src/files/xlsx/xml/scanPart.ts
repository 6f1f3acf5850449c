import type { ZipEntry } from "../../zip/openZip.js";
import type { Unpacked } from "../../zip/unpack.js";
import { unpack } from "../../zip/unpack.js";
import { zipLimits } from "../../zip/zipLimits.js";
import { damaged } from "../../zip/zipProblem.js";
import type { XmlHandler } from "./xmlScanner.js";
import { xmlScanner } from "./xmlScanner.js";

/** Unpacks a part and hands its XML to a handler, piece by piece; yields the bytes unpacked in each. */
export function* scanPart(entry: ZipEntry, unpacked: Unpacked, handler: XmlHandler): Generator<number, void> {
  const scanner = xmlScanner(entry.name.slice(0, 40), handler);
  let decoder: TextDecoder | undefined;
  for (const piece of unpack(entry, zipLimits, unpacked)) {
    decoder ??= decoderOf(piece);
    scanner.push(decode(entry, decoder, piece));
    yield piece.length;
  }
  if (decoder !== undefined) {
    scanner.push(decode(entry, decoder));
  }
  scanner.end();
}

/** XML is UTF-8, or UTF-16 with a byte order mark (XML 1.0, section 4.3.3; other encodings are not for workbooks). */
function decoderOf(piece: Uint8Array): TextDecoder {
  const encoding =
    piece[0] === 0xff && piece[1] === 0xfe ? "utf-16le" : piece[0] === 0xfe && piece[1] === 0xff ? "utf-16be" : "utf-8";
  return new TextDecoder(encoding, { fatal: true });
}

function decode(entry: ZipEntry, decoder: TextDecoder, piece?: Uint8Array): string {
  try {
    return decoder.decode(piece, { stream: piece !== undefined });
  } catch {
    throw damaged(`its part ${entry.name.slice(0, 40)} is not UTF-8 text`);
  }
}
