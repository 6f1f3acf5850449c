import { FileProblem } from "../../../../files/fileProblem.js";
import { refuseOtherKinds } from "../../../../files/otherKinds.js";
import { mostRows } from "../../../../sheet/limits.js";
import { openBookFile } from "./openBookFile.js";
import type { Opener, OpenWatch, ReadFile } from "./opener.js";
import { openTable } from "./openTable.js";
import { openWorkbook } from "./openWorkbook.js";

/** The kinds of files that can be opened; the first that recognises a file reads it, the last reads any text. */
const openers: readonly Opener[] = [openBookFile, openWorkbook, openTable];

const startLength = 4096;

/** Reads a file of any kind that is known. Throws a FileProblem whose message names the file. */
export async function openFile(name: string, content: Blob, watch: OpenWatch): Promise<ReadFile> {
  const start = new Uint8Array(await content.slice(0, startLength).arrayBuffer());
  const file = { name, size: content.size, start, content };
  const opener = openers.find((each) => each.isFor(file)) ?? openTable;
  try {
    refuseOtherKinds(start);
    if (file.size > opener.longest) throw tooLong(file.size, opener.longest);
    return await opener.read(file, watch);
  } catch (error) {
    if (error instanceof FileProblem) throw new FileProblem(error.kind, `${quoted(name)}: ${error.message}`);
    throw error;
  }
}

function tooLong(size: number, longest: number): FileProblem {
  return new FileProblem(
    "too-large",
    `It has ${megabytes(size)} MB; ${megabytes(longest)} MB are read at most, and a sheet holds ${(mostRows - 1).toLocaleString("en")} rows. Cut it into parts, or leave out columns that are not needed.`,
  );
}

function megabytes(size: number): string {
  return Math.ceil(size / 1_000_000).toLocaleString("en");
}

function quoted(name: string): string {
  return name.length > 40 ? `${name.slice(0, 24)}…${name.slice(-15)}` : name;
}
