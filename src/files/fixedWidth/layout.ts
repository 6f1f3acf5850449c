import { barsOf } from "../ipac/bars.js";

/** Where the columns of a fixed-width table stand, and which lines of its head say so. */
export interface FixedLayout {
  /** Where each column begins, characters of a line from 0; it ends where the next begins. */
  readonly starts: readonly number[];
  /** Columns end with a bar. */
  readonly hasBars: boolean;
  /** Lines above the data, without comments and blank lines: names, perhaps units, perhaps a rule. */
  readonly headLines: number;
  /** Where among them the names stand: below the upper border of a framed table. */
  readonly namesLine: number;
  readonly hasRule: boolean;
}

/** Dashes, with blanks, bars or crosses between; a tab would be a delimiter. */
const rule = /^[ |+:]*[-=]{2,}[-=: |+]*$/;

/**
 * The layout that the first lines of a text state: a rule whose runs of dashes lie under the names, or bars around names
 * that stand in the next line too. Undefined where the head says nothing of widths.
 */
export function fixedLayout(lines: readonly string[]): FixedLayout | undefined {
  if (lines[0] !== undefined && rule.test(lines[0])) {
    const inner = fixedLayout(lines.slice(1));
    return inner && { ...inner, headLines: inner.headLines + 1, namesLine: inner.namesLine + 1 };
  }
  const at = lines.slice(0, 4).findIndex((line) => rule.test(line));
  if (at === 1 || at === 2) {
    const runs = runsOf(lines[at]!);
    if (runs.length < 2 || !namesFit(lines[0]!, runs)) return undefined;
    const hasBars = `${lines[at]}${lines[0]}`.includes("|");
    return { starts: runs.map(({ from }) => from), hasBars, headLines: at + 1, namesLine: 0, hasRule: true };
  }
  const [names, row] = lines;
  if (!names || !row || !isBarred(names) || !isBarred(row)) return undefined;
  const bars = barsOf(names);
  if (bars.length < 2 || bars.some((bar) => row[bar] !== "|")) return undefined;
  return { starts: bars.slice(0, -1).map((bar) => bar + 1), hasBars: true, headLines: 1, namesLine: 0, hasRule: false };
}

function isBarred(line: string): boolean {
  return /^\|.*\|\s*$/.test(line);
}

function runsOf(line: string): { from: number; to: number }[] {
  return [...line.matchAll(/[-=:]+/g)].map((run) => ({ from: run.index, to: run.index + run[0].length }));
}

/** Every name lies over one run and every run lies under one. */
function namesFit(names: string, runs: readonly { readonly from: number; readonly to: number }[]): boolean {
  let outside = names;
  for (const { from, to } of runs) {
    if (names.slice(from, to).trim() === "") return false;
    outside = `${outside.slice(0, from)}${" ".repeat(Math.max(0, Math.min(to, names.length) - from))}${outside.slice(to)}`;
  }
  return /^[\s|+]*$/.test(outside);
}
