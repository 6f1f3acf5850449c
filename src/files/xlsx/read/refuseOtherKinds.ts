import { FileProblem } from "../../fileProblem.js";

type Sign = readonly [bytes: readonly number[], sentence: string];

const saveAs = "save it as a workbook (.xlsx) where it was made and open that file";

/** The first bytes of files that are handed over as workbooks and are something else. */
const signs: readonly Sign[] = [
  [[0x09, 0x08], `The file is a worksheet in a form from before 1997 (.xls); ${saveAs}.`],
  [[0x4d, 0x5a], "The file is a program, whatever its name says; do not open it, and ask for the table itself."],
  [[0x7f, 0x45, 0x4c, 0x46], "The file is a program, whatever its name says; ask for the table itself."],
  [[0x25, 0x50, 0x44, 0x46], "The file is a PDF document; ask for the table itself, as a workbook (.xlsx) or as CSV."],
  [[0x1f, 0x8b], "The file is packed with gzip; unpack it and open what is in it."],
  [
    [0x53, 0x49, 0x4d, 0x50, 0x4c, 0x45],
    "The file is a FITS file; save its table as CSV or VOTable and open that file.",
  ],
  [[0x89, 0x50, 0x4e, 0x47], "The file is a picture; ask for the table itself, as a workbook (.xlsx) or as CSV."],
  [[0xff, 0xd8, 0xff], "The file is a picture; ask for the table itself, as a workbook (.xlsx) or as CSV."],
  [[0x37, 0x7a, 0xbc, 0xaf], "The file is an archive (7z); unpack it and open the workbook in it."],
  [[0x52, 0x61, 0x72, 0x21], "The file is an archive (RAR); unpack it and open the workbook in it."],
];
const zip = [0x50, 0x4b];
const compound = [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1];

/** Throws where the first bytes are not those of a workbook, with a sentence on what the file is. */
export function refuseOtherKinds(bytes: Uint8Array): void {
  if (bytes.length === 0) {
    throw new FileProblem("empty", "The file is empty; copy it again from where it came.");
  }
  if (startsWith(bytes, zip)) {
    return;
  }
  if (startsWith(bytes, compound)) {
    throw compoundProblem(bytes);
  }
  const sign = signs.find(([first]) => startsWith(bytes, first));
  if (sign !== undefined) {
    throw new FileProblem("other-kind", sign[1]);
  }
  throw new FileProblem("other-kind", sentenceOfText(bytes));
}

function startsWith(bytes: Uint8Array, first: readonly number[]): boolean {
  return first.every((byte, index) => bytes[index] === byte);
}

/** Workbooks under a password and workbooks of the older form are both compound files; their parts have names. */
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
    : "an office document in the form from before 2007";
  return new FileProblem("other-kind", `The file is ${what}; ${saveAs}.`);
}

function sentenceOfText(bytes: Uint8Array): string {
  const start = new TextDecoder().decode(bytes.subarray(0, 1024)).trimStart().toLowerCase();
  if (/^(<\?xml|<!doctype|<html|<table|<votable)/.test(start)) {
    return /<html|<table|<!doctype html/.test(start)
      ? "The file is a web page, whatever its name says; copy the table from the page and paste it, or save it as CSV."
      : `The file is a single XML text and not a workbook; ${saveAs}, or open it as a VOTable if it is one.`;
  }
  const isText = !start.includes("\uFFFD") && !start.includes("\0");
  return isText
    ? "The file is plain text and not a workbook; open it as a table of text (CSV, TSV), whatever its name says."
    : "The file is no workbook (.xlsx) and of no kind that is known; check that it is the file that was meant.";
}
