import { ambiguousUnits } from "./ambiguousUnits.js";
import { nearest } from "./nearest.js";
import { prefixes } from "./prefixes.js";
import type { UnitProblem } from "./problem.js";
import { type UnitRow, unitTable } from "./unitTable.js";

/** A row of the unit table with the power of ten of its prefix. */
export interface UnitSymbol {
  readonly row: UnitRow;
  readonly prefix: string;
  readonly exponent: number;
}

const bySpelling = new Map<string, UnitRow>();
const byWord = new Map<string, UnitRow>();
for (const row of unitTable) {
  for (const spelling of [row.symbol, ...row.spellings]) bySpelling.set(spelling, row);
  for (const word of row.words) byWord.set(word.toLowerCase(), row);
}

const prefixNames = Object.keys(prefixes);

/**
 * The unit of the table that one symbol means: as written, then with an SI prefix (a known unit wins over a prefix:
 * `Pa` is pascal, `min` is minute), then as a word with capitals ignored, then with capitals ignored altogether
 * where only one unit of three letters or more fits.
 */
export function findUnitSymbol(text: string): UnitSymbol | UnitProblem {
  const choices = ambiguousUnits[text];
  if (choices && Object.hasOwn(ambiguousUnits, text)) return { problem: "ambiguous unit", text, choices };
  const plain = bySpelling.get(text) ?? byWord.get(text.toLowerCase());
  if (plain) return { row: plain, prefix: "", exponent: 0 };
  return withPrefix(text) ?? ignoringCapitals(text) ?? { problem: "unknown unit", text, nearest: nearestSymbol(text) };
}

function withPrefix(text: string): UnitSymbol | undefined {
  for (const prefix of prefixNames) {
    if (!text.startsWith(prefix)) continue;
    const row = bySpelling.get(text.slice(prefix.length)) ?? byWord.get(text.slice(prefix.length));
    if (row?.prefixes)
      return { row, prefix: prefix === "\u00b5" || prefix === "\u03bc" ? "u" : prefix, exponent: prefixes[prefix]! };
  }
  return undefined;
}

function ignoringCapitals(text: string): UnitSymbol | undefined {
  if (text.length < 3) return undefined;
  const lower = text.toLowerCase();
  const rows = new Set([...bySpelling].filter(([spelling]) => spelling.toLowerCase() === lower).map(([, row]) => row));
  const [row] = rows;
  return rows.size === 1 && row ? { row, prefix: "", exponent: 0 } : undefined;
}

function nearestSymbol(text: string) {
  const spelling = nearest(text, [...bySpelling.keys(), ...byWord.keys()]);
  const row = spelling === undefined ? undefined : (bySpelling.get(spelling) ?? byWord.get(spelling));
  return spelling === undefined || !row ? undefined : { spelling, symbol: row.symbol };
}
