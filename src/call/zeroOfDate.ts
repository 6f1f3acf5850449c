import type { Quantity } from "../functions/quantity.js";
import { isProblem } from "../units/problem.js";
import { readUnit } from "../units/readUnit.js";
import { toBase } from "../units/unit.js";
import type { CallProblem, HeaderCell } from "./callProblem.js";
import type { CellReading } from "./readCell.js";
import { valueText } from "./readCell.js";

/** How tables count their days: all of them, from 1858, or from a zero of their own. Common practice, no source. */
const zeros: readonly ((place: string, scale: string) => string)[] = [
  (place, scale) => `${place}JD_${scale}`,
  (place, scale) => `${place}MJD_${scale}`,
  (place, scale) => `${place}JD_${scale}-2450000`,
  (place, scale) => `${place}JD_${scale}-2400000`,
];

/** A date far off that would be one of our time if its unit counted from another zero: JD for MJD and the reverse. */
export function zeroOfDate(
  input: string,
  quantity: Quantity,
  { value, unit }: CellReading,
  header: HeaderCell | undefined,
): CallProblem | undefined {
  const { plausible } = quantity;
  const [place, scale] = unit.frame?.split("JD_") ?? [];
  if (unit.plus === 0 || !plausible || place === undefined || scale === undefined) return undefined;
  for (const zero of zeros) {
    const meant = readUnit(zero(place, scale));
    if (isProblem(meant)) continue;
    const days = toBase(meant, value);
    if (days > plausible.least && days < plausible.most) {
      return { about: "zero of date", input, value: valueText(value, unit), header, unit, meant: meant.text };
    }
  }
  return undefined;
}
