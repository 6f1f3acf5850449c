import type { Cell } from "../call/cell.js";
import { columnKey } from "../table/columnKey.js";
import { recogniseColumn } from "../table/recogniseColumn.js";
import { isPlainNumberKind, kindPhrase } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readQuantity } from "../units/readQuantity.js";
import { convertible, fromBase, one, toBase, type Unit } from "../units/unit.js";
import type { BookColumn } from "./bookTable.js";
import { RevisionRefused } from "./revisionRefused.js";
import { listed, quoted } from "./words.js";

/** A threshold that the analyst watches: `K >= 1 m/s`. */
export interface Condition {
  readonly text: string;
  /** The header of the column, and its place among the columns it was read for. */
  readonly header: string;
  readonly index: number;
  /** Whether a cell of that column meets it, its numbers in `unit`; what is no number does not. */
  isMet(cell: Cell, unit: Unit | undefined): boolean;
}

type Comparison = "<=" | ">=" | "<" | ">" | "=" | "<>";

const signs: Readonly<Record<string, Comparison>> = {
  "\u2264": "<=",
  "\u2265": ">=",
  "==": "=",
  "!=": "<>",
  "\u2260": "<>",
};
const form = /^(.+?)\s*(<=|>=|<>|!=|==|\u2264|\u2265|\u2260|<|>|=)\s*(.+)$/s;

/** Reads a condition on a column, named by its header or its quantity. Throws RevisionRefused with what to write. */
export function readCondition(text: string, columns: readonly BookColumn[]): Condition {
  const match = form.exec(text.trim());
  if (!match) {
    throw new RevisionRefused(`the condition ${quoted(text)} cannot be read; write for example "K >= 1 m/s".`);
  }
  const [, name, sign, limit] = match as unknown as [string, string, string, string];
  const index = columnNamed(name, columns, text);
  const { header, recognised } = columns[index]!;
  const reading = readQuantity(limit);
  if (isProblem(reading)) {
    throw new RevisionRefused(
      `the condition ${quoted(text)} compares with ${quoted(limit)}, which is no number with a unit that is known; write for example "K >= 1 m/s".`,
    );
  }
  const unit = reading.unit ?? one;
  checkKind(text, header, recognised.unit, unit, `${name} ${sign} ${reading.value}`);
  const base = toBase(unit, reading.value);
  const holds = comparisons[signs[sign] ?? (sign as Comparison)];
  return {
    text: text.trim(),
    header,
    index,
    isMet(cell, own) {
      if (typeof cell !== "number") return false;
      // In the column's own unit the limit is what was typed, to the last bit.
      const limitHere = (own ?? one).text === unit.text ? reading.value : fromBase(own ?? one, base);
      return holds(cell, limitHere);
    },
  };
}

const comparisons: Readonly<Record<Comparison, (value: number, limit: number) => boolean>> = {
  "<=": (value, limit) => value <= limit,
  ">=": (value, limit) => value >= limit,
  "<": (value, limit) => value < limit,
  ">": (value, limit) => value > limit,
  "=": (value, limit) => value === limit,
  "<>": (value, limit) => value !== limit,
};

function columnNamed(name: string, columns: readonly BookColumn[], text: string): number {
  const whole = columns.findIndex(({ header }) => header === name);
  if (whole >= 0) return whole;
  const named = columns.filter(({ header, recognised }) =>
    [header, recognised.name].some((own) => columnKey(own) === columnKey(name)),
  );
  const { quantity } = recogniseColumn(name);
  const meant =
    named.length > 0 || !quantity
      ? named
      : columns.filter(
          ({ sigmaOf, recognised }) => sigmaOf === undefined && recognised.quantity?.name === quantity.name,
        );
  if (meant.length === 1) return columns.indexOf(meant[0]!);
  const names = (meant.length > 0 ? meant : columns).map(({ header }) => header);
  throw new RevisionRefused(
    meant.length > 1
      ? `the condition ${quoted(text)} could mean ${listed(names)}; name the column by its whole header.`
      : `the condition ${quoted(text)} names ${quoted(name)}, which is no column; the table has ${listed(names)}.`,
  );
}

function checkKind(text: string, header: string, own: Unit | undefined, unit: Unit, bare: string): void {
  const isPlain = (own === undefined || isPlainNumberKind(own.kind)) && isPlainNumberKind(unit.kind);
  if (isPlain || convertible(own ?? one, unit)) return;
  if (own && unit.text === one.text) {
    throw new RevisionRefused(
      `the condition ${quoted(text)} states no unit, and ${quoted(header)} is in ${own.text}; write ${quoted(`${bare} ${own.text}`)}.`,
    );
  }
  throw new RevisionRefused(
    `the condition ${quoted(text)} compares with ${kindPhrase(unit.kind)}, and ${quoted(header)} ${own ? `holds ${kindPhrase(own.kind)}` : "states no unit"}; make the two agree.`,
  );
}
