import { recogniseColumn } from "../../table/recogniseColumn.js";
import { isErrorUcd } from "../../table/ucds.js";
import { isProblem } from "../../units/problem.js";
import { readHeader } from "../../units/readHeader.js";
import { readUnit } from "../../units/readUnit.js";
import { one } from "../../units/unit.js";
import type { ColumnNotes } from "./tableFile.js";

/**
 * The header text of a column that a file describes in parts: `Period [d]`. A unit that is not known stands there as it
 * was written, so that it is seen and can be mended. Where only the UCD says that the column holds uncertainties, the
 * name is followed by the word that says so.
 */
export function headerOfField({ name, unit = "", ucd = "" }: ColumnNotes): string {
  const titled = `${name}${sigmaWord(name, ucd)}`;
  const reading = readUnit(unit);
  const text = isProblem(reading) ? unit.trim() : reading.text;
  return text === "" || text === one.text ? titled : `${titled} [${text}]`;
}

/** Whether the unit of a header that was made of parts can be read from it again, or is told as not known. */
export function headerKeepsUnit(header: string, { unit = "" }: ColumnNotes): boolean {
  const expected = readUnit(unit);
  const read = readHeader(header);
  if (isProblem(expected)) return read.problem !== undefined;
  return expected.text === one.text || read.unit?.text === expected.text;
}

function sigmaWord(name: string, ucd: string): string {
  if (!isErrorUcd(ucd) || recogniseColumn(name).isUncertainty) return "";
  const side = /stat\.error\.(min|max)\b/i.exec(ucd)?.[1]?.toLowerCase();
  return side === undefined ? " sigma" : side === "max" ? " sigma+" : " sigma-";
}
