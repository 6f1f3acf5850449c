import { toBase, type Unit } from "../units/unit.js";
import type { CallProblem } from "./callProblem.js";
import { type Cell, CellError } from "./cell.js";
import type { HeaderUnit } from "./headerUnit.js";
import { type CellReading, readCell } from "./readCell.js";
import { knownUnit } from "./resultUnit.js";

const day = knownUnit("d");

/**
 * The uncertainty that stands beside a value in `unit`, in a unit of the value's kind: that of its own header or else that
 * of the value. An uncertain instant is uncertain by a time that passes, in days where nothing else is said.
 */
export function readSigma(
  input: string,
  cell: Cell,
  header: HeaderUnit,
  unit: Unit,
): CellReading | CallProblem | CellError {
  const name = `uncertainty of ${input}`;
  if (unit.kind !== "instant")
    return readCell(name, cell, { ...header, unit: header.unit ?? unit }, { kind: unit.kind });
  const own = header.unit && header.unit.kind !== "instant" ? header.unit : day;
  const reading = readCell(name, cell, { ...header, unit: own }, { kind: "duration" });
  if (reading instanceof CellError || "about" in reading) return reading;
  const days = toBase(reading.unit, reading.value) / toBase(day, 1);
  return { value: days, upper: undefined, lower: undefined, unit };
}

/** Whether a unit of a header may be that of an uncertainty of such a kind. */
export function fitsSigma(unit: Unit, kind: string | undefined): boolean {
  return kind === "instant" && unit.kind === "duration";
}
