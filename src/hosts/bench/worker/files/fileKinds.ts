import { FileProblem } from "../../../../files/fileProblem.js";

/** How files begin that are no tables, whatever they are called. */
const kinds: readonly (readonly [begin: string, what: string])[] = [
  ["MZ", "a program"],
  ["\x7FELF", "a program"],
  ["\xCF\xFA\xED\xFE", "a program"],
  ["%PDF", "a PDF document"],
  ["\x89PNG", "a picture"],
  ["\xFF\xD8\xFF", "a picture"],
  ["GIF8", "a picture"],
  ["\x1F\x8B", "a gzip archive; unpack it and open what is in it"],
  ["PK\x03\x04", "a zip package of a kind that is not read"],
  ["7z\xBC\xAF", "an archive; unpack it and open what is in it"],
  ["SQLite format 3", "a database"],
  ["SIMPLE  =", "a FITS file"],
  ["\x89HDF", "an HDF5 file"],
  ["\xD0\xCF\x11\xE0", "a document in a binary form of before 2007"],
];

/** Refuses by its first bytes a file that is known to be no table. */
export function refuseOtherKinds(start: Uint8Array): void {
  const text = String.fromCharCode(...start.subarray(0, 16));
  const known = kinds.find(([begin]) => text.startsWith(begin));
  if (known === undefined) return;
  throw new FileProblem(
    "other-kind",
    `By its first bytes it is ${known[1]}, whatever its name says; save the table as CSV and open that.`,
  );
}
