import { Inflate } from "fflate";
import { crc32 } from "./crc32.js";
import type { ZipEntry } from "./openZip.js";
import type { ZipLimits } from "./zipLimits.js";
import { damaged, megabytes, tooLarge } from "./zipProblem.js";

/** Packed bytes taken at a time: at the most that deflate can do they unpack to 64 MB. */
const slice = 1 << 16;

/** How many bytes the parts of one file have unpacked to so far. */
export interface Unpacked {
  bytes: number;
}

/**
 * The bytes of a part, piece by piece. What it really unpacks to is held against the limits and against what the file
 * says of it, size and checksum, so that nothing passes that is cut off or changed.
 */
export function* unpack(entry: ZipEntry, limits: ZipLimits, unpacked: Unpacked): Generator<Uint8Array, void> {
  let size = 0;
  let sum = 0;
  for (const piece of entry.method === 0 ? stored(entry) : inflated(entry)) {
    size += piece.length;
    unpacked.bytes += piece.length;
    sum = crc32(piece, sum);
    refuse(entry, size, limits, unpacked);
    yield piece;
  }
  if (size !== entry.size || sum !== entry.crc) {
    throw damaged(`its part ${entry.name.slice(0, 40)} is not what was packed`);
  }
}

function* stored({ packed }: ZipEntry): Generator<Uint8Array> {
  for (let at = 0; at < packed.length; at += slice) {
    yield packed.subarray(at, at + slice);
  }
}

function* inflated({ name, packed }: ZipEntry): Generator<Uint8Array> {
  const pieces: Uint8Array[] = [];
  const inflate = new Inflate((piece) => {
    if (piece.length > 0) {
      pieces.push(piece);
    }
  });
  for (let at = 0; at < packed.length || at === 0; at += slice) {
    try {
      inflate.push(packed.subarray(at, at + slice), at + slice >= packed.length);
    } catch {
      throw damaged(`its part ${name.slice(0, 40)} cannot be unpacked`);
    }
    yield* pieces.splice(0);
  }
}

function refuse({ name, size: declared, packedSize }: ZipEntry, size: number, limits: ZipLimits, all: Unpacked): void {
  if (size > declared) {
    throw damaged(`its part ${name.slice(0, 40)} is larger than it says`);
  }
  if (all.bytes > limits.mostBytes) {
    throw tooLarge(`more than ${megabytes(limits.mostBytes)}`);
  }
  if (size > limits.smallBytes && size > packedSize * limits.mostRatio) {
    throw tooLarge(`${name.slice(0, 40)} to more than ${limits.mostRatio} times its size`);
  }
}
