import { FileProblem } from "../fileProblem.js";
import { fixedLayout } from "../fixedWidth/layout.js";
import { barsOf, betweenBars } from "../ipac/bars.js";
import { ipacType } from "../ipac/ipacReader.js";
import type { TableFormat } from "./tableFile.js";

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
