import { open, stat } from "node:fs/promises";
import { signatureLength } from "../../files/otherKinds.js";
import { ioProblem } from "./ioProblem.js";
import type { Terminal } from "./terminal.js";

/**
 * The first bytes of a file, none of a pipe's, or of standard input ("-"), and standard input with all of its bytes
 * still to come.
 */
export async function inputBytes(
  path: string,
  { input }: Terminal,
): Promise<{ readonly opening: Uint8Array; readonly input: AsyncIterable<Uint8Array> }> {
  if (path !== "-") return { opening: await openingOf(path), input };
  const pieces = input[Symbol.asyncIterator]();
  const seen: Uint8Array[] = [];
  let length = 0;
  while (length < signatureLength) {
    const { done, value } = await pieces.next();
    if (done) break;
    seen.push(value);
    length += value.length;
  }
  return { opening: Buffer.concat(seen), input: continued(seen, pieces) };
}

async function* continued(seen: readonly Uint8Array[], pieces: AsyncIterator<Uint8Array>) {
  yield* seen;
  for (let piece = await pieces.next(); !piece.done; piece = await pieces.next()) yield piece.value;
}

async function openingOf(path: string): Promise<Uint8Array> {
  try {
    // What is read from a pipe is gone.
    if (!(await stat(path)).isFile()) return new Uint8Array();
    const file = await open(path);
    try {
      const { buffer, bytesRead } = await file.read(Buffer.alloc(signatureLength), 0, signatureLength, 0);
      return buffer.subarray(0, bytesRead);
    } finally {
      await file.close();
    }
  } catch (error) {
    throw ioProblem("read", path, error);
  }
}
