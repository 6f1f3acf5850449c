import { CellError } from "../call/cell.js";
import { type Column, cellAt } from "../call/column.js";
import { isWithin, openRange } from "../call/range.js";
import type { Quantity } from "../functions/quantity.js";
import { isPlainNumberKind } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readQuantity } from "../units/readQuantity.js";
import { readUnit } from "../units/readUnit.js";
import { one, toBase, type Unit } from "../units/unit.js";
import type { ColumnFinding } from "./columnFinding.js";
import { isSymbol, type RecognisedColumn, recogniseColumn } from "./recogniseColumn.js";

/** What was understood of a column, how its cells are made up, and what to look at. */
export interface ColumnCheck {
  readonly header: string;
  readonly recognised: RecognisedColumn;
  readonly numbers: number;
  readonly texts: number;
  readonly blanks: number;
  readonly findings: readonly ColumnFinding[];
}

export function checkColumn(header: string, unitCell: string | undefined, column: Column, ucd?: string): ColumnCheck {
  const recognised = recogniseColumn(header, unitCell, ucd);
  const { counts, findings } = contentsOf(column, recognised);
  // A column without numbers needs no unit: names, remarks, or quantities that carry their own.
  const ofHeader = counts.numbers > 0 ? headerFindings(recognised) : [];
  return { header, recognised, ...counts, findings: [...ofHeader, ...findings] };
}

function headerFindings({ problem, quantity, unit, isUncertainty }: RecognisedColumn): ColumnFinding[] {
  if (problem) return [{ about: "unit problem", unit: problem }];
  if (!quantity) return [];
  if (!unit) return isPlainNumberKind(quantity.kind) || isUncertainty ? [] : [{ about: "no unit", quantity }];
  const fits = unit.kind === quantity.kind || (unit.text === one.text && isPlainNumberKind(quantity.kind));
  return fits ? [] : [{ about: "kind", quantity, unit }];
}

function contentsOf(column: Column, recognised: RecognisedColumn) {
  const counts = { numbers: 0, texts: 0, blanks: 0 };
  const values: number[] = [];
  const strange: { text: string; row: number }[] = [];
  const errors: { code: string; row: number }[] = [];
  for (let row = 0; row < column.length; row++) {
    const cell = cellAt(column, row);
    if (cell === null || cell === "") counts.blanks++;
    else if (cell instanceof CellError) errors.push({ code: cell.code, row });
    else if (typeof cell === "number") {
      counts.numbers++;
      values.push(cell);
    } else {
      counts.texts++;
      if (typeof cell === "boolean" || isProblem(readQuantity(cell))) strange.push({ text: String(cell), row });
    }
  }
  const findings: ColumnFinding[] = [];
  if (errors[0]) findings.push({ about: "error cell", ...errors[0], count: errors.length });
  // A column of names is no column of numbers with faults; one with more numbers than texts is.
  if (strange[0] && counts.numbers > strange.length) {
    findings.push({ about: "mixed", ...strange[0], count: strange.length, numbers: counts.numbers });
  }
  return { counts, findings: [...findings, ...valueFindings(column, values, recognised)] };
}

function valueFindings(column: Column, values: readonly number[], recognised: RecognisedColumn): ColumnFinding[] {
  const { quantity, isUncertainty } = recognised;
  const unit = recognised.unit ?? (quantity && isPlainNumberKind(quantity.kind) ? one : undefined);
  if (!quantity || !unit || isUncertainty || unit.kind !== quantity.kind || values.length === 0) return [];
  const range = openRange(quantity);
  const outside = [...column.numbers.keys()].filter((row) => {
    const value = column.numbers[row]!;
    return !Number.isNaN(value) && !isWithin(range, toBase(unit, value));
  });
  const [first] = outside;
  const findings: ColumnFinding[] = [];
  if (first !== undefined) {
    const text = `${column.numbers[first]}${unit.text === one.text ? "" : ` ${unit.text}`}`;
    findings.push({
      about: "out of range",
      problem: `${text} is ${rangeText(quantity)}.`,
      row: first,
      count: outside.length,
    });
  }
  // A symbol alone is too little to doubt a column for: "R" is a radius as often as a resolving power.
  if (isSymbol(recognised.name) && recognised.unit === undefined) return findings;
  const median = [...values].sort((a, b) => a - b)[values.length >> 1]!;
  if (!isPlausible(quantity, toBase(unit, median))) {
    findings.push({ about: "implausible", quantity, unit, median, better: betterUnit(quantity, median, unit) });
  }
  return findings;
}

export function isPlausible({ plausible }: Quantity, base: number): boolean {
  return plausible === undefined || (base >= plausible.least && base <= plausible.most);
}

/** Units that columns of target tables are given in (common practice). */
const usualUnits = "d h yr s min solMass jupiterMass earthMass kg deg rad m/s km/s AU solRad nm Angstrom um".split(" ");

/** A unit in which columns of this quantity are common and in which the value would be usual. */
function betterUnit(quantity: Quantity, value: number, unit: Unit): string | undefined {
  return otherUnits(quantity, unit).find((other) => isPlausible(quantity, toBase(other, value)))?.text;
}

/** The units besides its own in which columns of a quantity are common. */
export function otherUnits(quantity: Quantity, unit: Unit): readonly Unit[] {
  return [quantity.unit, ...usualUnits]
    .map(readUnit)
    .filter((other): other is Unit => !isProblem(other) && other.kind === quantity.kind && other.text !== unit.text);
}

function rangeText({ lower, upper }: Quantity): string {
  const ends = [
    lower && `${lower.open ? "above" : "at least"} ${lower.text}`,
    upper && `${upper.open ? "below" : "at most"} ${upper.text}`,
  ];
  return `not ${ends.filter(Boolean).join(" and ")}`;
}
