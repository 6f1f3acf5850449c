import { FileProblem } from "../fileProblem.js";
import { fixedLayout } from "../fixedWidth/layout.js";
import { barsOf, betweenBars } from "../ipac/bars.js";
import { ipacType } from "../ipac/ipacReader.js";
import type { TableFormat } from "./tableFile.js";

/** Kinds of files that hold no text, by their first bytes, and what to do with them. */
const signatures: readonly { readonly bytes: string; readonly what: string; readonly advice: string }[] = [
  {
    bytes: "\u00d0\u00cf\u0011\u00e0",
    what: "a workbook in the old binary form",
    advice: "save it as .xlsx or as CSV",
  },
  { bytes: "\u001f\u008b", what: "packed with gzip", advice: "unpack it first" },
  { bytes: "BZh", what: "packed with bzip2", advice: "unpack it first" },
  { bytes: "\u00fd7zXZ", what: "packed with xz", advice: "unpack it first" },
  { bytes: "\u0028\u00b5\u002f\u00fd", what: "packed with Zstandard", advice: "unpack it first" },
  { bytes: "7z\u00bc\u00af", what: "a 7z archive", advice: "unpack it first" },
  { bytes: "%PDF", what: "a PDF", advice: "ask for the table as text: CSV, ECSV, VOTable or a machine-readable table" },
  { bytes: "SIMPLE  =", what: "a FITS file", advice: "save its table as VOTable or ECSV" },
  { bytes: "\u0089HDF", what: "an HDF5 file", advice: "save its table as VOTable, ECSV or CSV" },
  { bytes: "PAR1", what: "a Parquet file", advice: "save its table as VOTable, ECSV or CSV" },
  { bytes: "SQLite format 3", what: "a database", advice: "export the table as CSV" },
  { bytes: "\u0089PNG", what: "a picture", advice: "ask for the table itself" },
  { bytes: "\u00ff\u00d8\u00ff", what: "a picture", advice: "ask for the table itself" },
  { bytes: "GIF8", what: "a picture", advice: "ask for the table itself" },
];

/** How many bytes decide whether a file is text at all. */
export const signatureLength = 16;

/** "workbook" for a packed file; undefined for what may be text. Throws for kinds of files that are known and not read. */
export function detectSignature(bytes: Uint8Array): "workbook" | undefined {
  const start = String.fromCharCode(...bytes.subarray(0, signatureLength));
  if (start.startsWith("PK\u0003\u0004") || start.startsWith("PK\u0005\u0006")) return "workbook";
  const known = signatures.find((signature) => start.startsWith(signature.bytes));
  if (known) throw new FileProblem("other-kind", `The file is ${known.what}, which is not read; ${known.advice}.`);
  return undefined;
}

/** How much text decides what kind of table a file is. */
export const openingLength = 1 << 16;

/** The kind of a text file, by what it begins with and never by its name. */
export function detectFormat(opening: string): Exclude<TableFormat, "workbook"> {
  const whole = opening.replace(/^\uFEFF/, "");
  const text = whole.trimStart();
  if (/^#\s*%ECSV\s/.test(text)) return "ecsv";
  if (/^<(?:\?xml|!|[A-Za-z][\w.-]*[\s:>/])/.test(text)) return xmlFormat(text);
  if (/^\s*Byte-(?:by|per)-byte Description of file:/im.test(text)) return "machine-readable";
  const lines = whole.split(/\r\n?|\n/, 400);
  if (isIpac(lines)) return "ipac";
  const head = lines.filter((line) => line.trim() !== "" && !line.startsWith("#")).slice(0, 4);
  return fixedLayout(head) ? "fixed-width" : "delimited";
}

function xmlFormat(text: string): "votable" | "delimited" {
  const body = text.replace(/<\?[\s\S]*?\?>|<!--[\s\S]*?-->/g, "").trim();
  if (/^<(?:[\w.-]+:)?VOTABLE[\s>]/.test(body)) return "votable";
  if (/^<(?:!doctype\s+html|html)[\s>]/i.test(body)) {
    throw new FileProblem(
      "other-kind",
      "The file is a web page, not a table; download the table itself, as CSV, ECSV or VOTable.",
    );
  }
  // Its reader refuses a document type, and XML of other kinds, with its own sentence.
  return /^<(?:\?xml|!)/.test(text) ? "votable" : "delimited";
}

/** Names between bars under backslashed lines, or over a line of the names of types. */
function isIpac(lines: readonly string[]): boolean {
  const first = lines.findIndex((line) => line.startsWith("|"));
  if (first < 0 || !lines.slice(0, first).every((line) => line.startsWith("\\") || line.trim() === "")) return false;
  const [names, types] = [lines[first]!, lines[first + 1] ?? ""];
  const bars = barsOf(names);
  if (bars.length < 2 || names.slice(bars[bars.length - 1]! + 1).trim() !== "") return false;
  if (!types.startsWith("|")) return first > 0;
  return betweenBars(types, bars).every((type) => ipacType(type) !== undefined);
}
