import { readFileSync } from "node:fs";
import type { Cell, ErrorCode } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";

/** One case of the corpus. */
export interface FormulaCase {
  /** Section of ISO/IEC 26300-3 (OpenDocument 1.3 part 4); "-" for a function that the standard does not know. */
  readonly section: string;
  readonly formula: string;
  readonly cells: ReadonlyMap<string, Cell | { readonly formula: string }>;
  /** One row of one cell, or a rectangle. */
  readonly expected: readonly (readonly Cell[])[];
  /** Relative deviation that is allowed; 0 where the result is exact. */
  readonly tolerance: number;
  /** Where the expected value comes from. */
  readonly source: string;
}

/** Cases of a text file: section | formula | cells | expected | source. */
export function readCases(file: string): FormulaCase[] {
  const lines = readFileSync(new URL(file, import.meta.url), "utf8").split("\n");
  return lines.filter((line) => line.trim() !== "" && !line.startsWith("#:")).map(readCase);
}

function readCase(line: string): FormulaCase {
  const fields = line.split(" | ").map((field) => field.trim());
  const [section, formula, cells, expected, source] = fields;
  if (fields.length !== 5 || !section || !formula || cells === undefined || !expected || !source) {
    throw new Error(`a case needs five fields: ${line}`);
  }
  const approximate = expected.startsWith("~");
  return {
    section,
    formula,
    cells: new Map(splitOutsideQuotes(cells, ";").map(readCell)),
    expected: readRectangle(approximate ? expected.slice(1) : expected),
    tolerance: approximate ? 2e-14 : 0,
    source,
  };
}

function readCell(text: string): [string, Cell | { formula: string }] {
  const at = text.indexOf("=");
  const content = text.slice(at + 1).trim();
  return [text.slice(0, at).trim(), content.startsWith("=") ? { formula: content } : readValue(content)];
}

function readRectangle(text: string): Cell[][] {
  return text.startsWith("{")
    ? splitOutsideQuotes(text.slice(1, -1), ";").map((row) => splitOutsideQuotes(row, ",").map(readValue))
    : [[readValue(text)]];
}

function readValue(text: string): Cell {
  const trimmed = text.trim();
  if (trimmed === "blank") {
    return null;
  }
  if (trimmed === "TRUE" || trimmed === "FALSE") {
    return trimmed === "TRUE";
  }
  if (trimmed.startsWith('"')) {
    return trimmed.slice(1, -1).replaceAll('""', '"');
  }
  if (trimmed.startsWith("#")) {
    return new CellError(trimmed as ErrorCode, "expected", "expected");
  }
  const value = Number(trimmed);
  if (trimmed === "" || Number.isNaN(value)) {
    throw new Error(`neither a number nor a text in quotes: ${text}`);
  }
  return value;
}

function splitOutsideQuotes(text: string, separator: string): string[] {
  const pieces = [""];
  let quoted = false;
  for (const character of text) {
    quoted = character === '"' ? !quoted : quoted;
    if (character === separator && !quoted) {
      pieces.push("");
    } else {
      pieces[pieces.length - 1] += character;
    }
  }
  return pieces.map((piece) => piece.trim()).filter((piece) => piece !== "");
}
