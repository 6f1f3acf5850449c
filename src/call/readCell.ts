import { isPlainNumberKind, type Kind } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readQuantity } from "../units/readQuantity.js";
import { convertible, one, type Unit } from "../units/unit.js";
import type { CallProblem, UnitPlace } from "./callProblem.js";
import { type Cell, CellError } from "./cell.js";
import { quote } from "./explain.js";
import type { HeaderUnit } from "./headerUnit.js";

/** A cell read as a quantity; numbers in `unit`. */
export interface CellReading {
  readonly value: number;
  readonly upper: number | undefined;
  readonly lower: number | undefined;
  readonly unit: Unit;
}

/** `wanted` is the kind that is needed, undefined where any will do. */
export function readCell(
  input: string,
  cell: Cell,
  header: HeaderUnit,
  wanted: Kind | undefined,
): CellReading | CallProblem | CellError {
  if (cell instanceof CellError) return cell;
  if (cell === null) return { about: "blank", input };
  if (typeof cell === "boolean") {
    return { about: "not a number", input, value: `${cell ? "TRUE" : "FALSE"}, a logical value`, hint: undefined };
  }
  if (typeof cell === "number") {
    return withHeaderUnit(input, { value: cell, upper: undefined, lower: undefined }, header, wanted);
  }
  const quantity = readQuantity(cell);
  if (isProblem(quantity)) {
    if (quantity.problem === "not a number") {
      const value = cell.trim() === "" ? "an empty text" : quote(cell);
      return { about: "not a number", input, value, hint: quantity.hint };
    }
    return { about: "unit", input, at: { place: "text", text: cell }, unit: quantity };
  }
  const { unit } = quantity;
  if (!unit) return withHeaderUnit(input, quantity, header, wanted);
  const at: UnitPlace = { place: "text", text: cell };
  if (!fits(unit, wanted)) return { about: "wrong kind", input, value: quote(cell), unit, wanted: wanted!, at };
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
