import type { Quantity } from "../functions/quantity.js";
import { isPlainNumberKind, type Kind } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readQuantity } from "../units/readQuantity.js";
import { hourOfAngle, readSexagesimal } from "../units/readSexagesimal.js";
import { convertible, one, type Unit } from "../units/unit.js";
import type { CallProblem, UnitPlace } from "./callProblem.js";
import { type Cell, CellError } from "./cell.js";
import { quote } from "./explain.js";
import { angleOf, type HeaderUnit } from "./headerUnit.js";

/** A cell read as a quantity; numbers in `unit`. */
export interface CellReading {
  readonly value: number;
  readonly upper: number | undefined;
  readonly lower: number | undefined;
  readonly unit: Unit;
  /** The value as it was written, where that has more digits than one double holds. */
  readonly digits?: string;
}

/** What a cell is to hold: its kind, and whether an angle may be written in sixtieths. */
export type Wanted = Pick<Quantity, "kind" | "sexagesimal">;

/** `wanted` is undefined where a quantity of any kind will do. */
export function readCell(
  input: string,
  cell: Cell,
  header: HeaderUnit,
  wanted: Wanted | undefined,
): CellReading | CallProblem | CellError {
  if (cell instanceof CellError) return cell;
  if (cell === null) return { about: "blank", input };
  if (typeof cell === "boolean") {
    return { about: "not a number", input, value: `${cell ? "TRUE" : "FALSE"}, a logical value`, hint: undefined };
  }
  if (typeof cell === "number") {
    return withHeaderUnit(input, { value: cell, upper: undefined, lower: undefined }, header, wanted?.kind);
  }
  const angle = wanted?.sexagesimal && readSexagesimal(cell, wanted.sexagesimal);
  const quantity = angle ? { ...angle, upper: undefined, lower: undefined } : readQuantity(cell);
  if (isProblem(quantity)) {
    if (quantity.problem === "not a number") {
      const value = cell.trim() === "" ? "an empty text" : quote(cell);
      return { about: "not a number", input, value, hint: quantity.hint };
    }
    return { about: "unit", input, at: { place: "text", text: cell }, unit: quantity };
  }
  const unit = wanted?.sexagesimal === "hours" ? angleOf(quantity.unit) : quantity.unit;
  if (!unit) return withHeaderUnit(input, quantity, header, wanted?.kind);
  const at: UnitPlace = { place: "text", text: cell };
  if (!fits(unit, wanted?.kind)) {
    return { about: "wrong kind", input, value: quote(cell), unit, wanted: wanted!.kind, at };
  }
  if (angle && !angle.stated && header.header && header.unit?.kind === "angle") {
    const asHours = header.unit.text === hourOfAngle.text;
    if (asHours !== (unit === hourOfAngle)) {
      return { about: "hours or degrees", input, text: cell, header: header.header, headerUnit: header.unit };
    }
  }
  if (header.header && header.unit && !convertible(unit, header.unit) && !isPlainNumberKind(unit.kind)) {
    return { about: "disagreement", input, text: cell, unit, header: header.header, headerUnit: header.unit };
  }
  return { ...quantity, unit };
}

function withHeaderUnit(
  input: string,
  quantity: Omit<CellReading, "unit">,
  header: HeaderUnit,
  wanted: Kind | undefined,
): CellReading | CallProblem {
  if (header.problem) return header.problem;
  const unit = header.unit ?? (wanted !== undefined && isPlainNumberKind(wanted) ? one : undefined);
  if (!unit) return { about: "no unit", input, value: String(quantity.value), header: header.header };
  if (fits(unit, wanted)) return { ...quantity, unit };
  const at: UnitPlace = header.header ? { place: "header", header: header.header } : { place: "text", text: "" };
  return { about: "wrong kind", input, value: valueText(quantity.value, unit), unit, wanted: wanted!, at };
}

/** Whether a unit is of the kind that is needed; a plain number may stand for a count. */
export function fits(unit: Unit, wanted: Kind | undefined): boolean {
  if (wanted === undefined || unit.kind === wanted) return true;
  return unit.text === one.text && isPlainNumberKind(wanted);
}

export function valueText(value: number, unit: Unit): string {
  return unit.text === one.text ? String(value) : `${value} ${unit.text}`;
}
