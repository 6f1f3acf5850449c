import { readHeader } from "../units/readHeader.js";
import { hourOfAngle } from "../units/readSexagesimal.js";
import type { Unit } from "../units/unit.js";
import type { CallProblem, HeaderCell } from "./callProblem.js";

/** What the header of a column says about its unit. */
export interface HeaderUnit {
  readonly header: HeaderCell | undefined;
  readonly unit: Unit | undefined;
  readonly problem: CallProblem | undefined;
}

/** An hour of right ascension where an hour of time was read. */
export function angleOf<U extends Unit | undefined>(unit: U): U | Unit {
  return unit?.text === "h" ? hourOfAngle : unit;
}

export const noHeader: HeaderUnit = { header: undefined, unit: undefined, problem: undefined };

/** `hours`: an angle that is counted in hours, for which `h` is no hour of time. */
export function headerUnit(input: string, header: HeaderCell | undefined, hours = false): HeaderUnit {
  if (!header) return noHeader;
  if (header.isNumber) return { header, unit: undefined, problem: undefined };
  const reading = readHeader(header.text);
  const problem: CallProblem | undefined = reading.problem && {
    about: "unit",
    input,
    at: { place: "header", header },
    unit: reading.problem,
  };
  if (!hours) return { header, unit: reading.unit, problem };
  // "RA" alone heads a column of right ascensions rather than one of ronnaamperes.
  const unit = header.text.trim() === "RA" ? undefined : angleOf(reading.unit);
  return { header, unit, problem };
}
