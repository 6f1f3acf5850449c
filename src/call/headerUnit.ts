import { readHeader } from "../units/readHeader.js";
import type { Unit } from "../units/unit.js";
import type { CallProblem, HeaderCell } from "./callProblem.js";

/** What the header of a column says about its unit. */
export interface HeaderUnit {
  readonly header: HeaderCell | undefined;
  readonly unit: Unit | undefined;
  readonly problem: CallProblem | undefined;
}

export const noHeader: HeaderUnit = { header: undefined, unit: undefined, problem: undefined };

export function headerUnit(input: string, header: HeaderCell | undefined): HeaderUnit {
  if (!header) return noHeader;
  if (header.isNumber) return { header, unit: undefined, problem: undefined };
  const reading = readHeader(header.text);
  const problem: CallProblem | undefined = reading.problem && {
    about: "unit",
    input,
    at: { place: "header", header },
    unit: reading.problem,
  };
  return { header, unit: reading.unit, problem };
}
