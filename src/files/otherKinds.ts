import { FileProblem } from "./fileProblem.js";

interface OtherKind {
  /** How such a file begins, a character a byte. */
  readonly start: string;
  readonly what: string;
  readonly advice: string;
  /** A table may begin so too, with a column of that name; then all that follows is text. */
  readonly couldBeText?: true;
}

const askForTable = "ask for the table itself, as a workbook (.xlsx), CSV or VOTable";
const saveAsTable = "save its table as VOTable, ECSV or CSV and open that file";
const saveAsWorkbook = "save it as a workbook (.xlsx) where it was made and open that file";
const unpack = "unpack it first";

/** Kinds of files that hold no table that is read, by their first bytes, whatever they are called. */
const otherKinds: readonly OtherKind[] = [
  { start: "MZ", what: "a program", advice: "do not open it, and ask for the table itself", couldBeText: true },
  { start: "\x7FELF", what: "a program", advice: "do not open it, and ask for the table itself" },
  { start: "\xCF\xFA\xED\xFE", what: "a program", advice: "do not open it, and ask for the table itself" },
  { start: "\x09\x08", what: "a worksheet in a form from before 1997 (.xls)", advice: saveAsWorkbook },
  { start: "%PDF", what: "a PDF", advice: askForTable },
  { start: "\x89PNG", what: "a picture", advice: askForTable },
  { start: "\xFF\xD8\xFF", what: "a picture", advice: askForTable },
  { start: "GIF8", what: "a picture", advice: askForTable, couldBeText: true },
  { start: "\x1F\x8B", what: "packed with gzip", advice: unpack },
  { start: "BZh", what: "packed with bzip2", advice: unpack, couldBeText: true },
  { start: "\xFD7zXZ", what: "packed with xz", advice: unpack },
  { start: "\x28\xB5\x2F\xFD", what: "packed with Zstandard", advice: unpack },
  { start: "7z\xBC\xAF", what: "a 7z archive", advice: unpack },
  { start: "Rar!", what: "a RAR archive", advice: unpack, couldBeText: true },
  { start: "SIMPLE  =", what: "a FITS file", advice: saveAsTable },
  { start: "\x89HDF", what: "an HDF5 file", advice: saveAsTable },
  { start: "PAR1", what: "a Parquet file", advice: saveAsTable, couldBeText: true },
  { start: "SQLite format 3", what: "a database", advice: "export the table as CSV" },
];

/** Workbooks under a password and documents of the forms before 2007 begin alike. */
const compound = "\xD0\xCF\x11\xE0";

/** How many bytes tell one kind from another. */
export const signatureLength = 16;

/**
 * Refuses, with a sentence, a file that is known by its first bytes to hold no table that is read. What a workbook of the
 * forms before 2007 is exactly, its names tell where more of it is given.
 */
export function refuseOtherKinds(bytes: Uint8Array): void {
  const start = String.fromCharCode(...bytes.subarray(0, signatureLength));
  if (start.startsWith(compound)) throw compoundProblem(bytes);
  const isText = /^[\t\n\r\x20-\x7E]*$/.test(start);
  const known = otherKinds.find((kind) => start.startsWith(kind.start) && !(isText && kind.couldBeText));
  if (known) throw new FileProblem("other-kind", `The file is ${known.what}, which is not read; ${known.advice}.`);
}

function compoundProblem(bytes: Uint8Array): FileProblem {
  const names = new TextDecoder("utf-16le").decode(bytes.subarray(0, bytes.length & ~1));
  if (names.includes("EncryptedPackage")) {
    return new FileProblem(
      "encrypted",
      "The workbook is protected by a password; open it where it was made, take the password off and save it again.",
    );
  }
  const what = /Workbook|Book/.test(names)
    ? "a workbook in the form from before 2007 (.xls)"
    : "a document in the form from before 2007, or under a password";
  return new FileProblem("other-kind", `The file is ${what}, which is not read; ${saveAsWorkbook}.`);
}

/** What a file that may be a table is told by its first bytes: a packed one can only be a workbook. */
export function isPacked(bytes: Uint8Array): boolean {
  const start = String.fromCharCode(...bytes.subarray(0, 4));
  return start === "PK\x03\x04" || start === "PK\x05\x06";
}
