import type { QuantityReading } from "./quantityReading.js";
import { julianDateOfEpoch } from "./readInstantUnit.js";
import type { Unit } from "./unit.js";

/** A quantity as text that reads back to the same doubles: `4.2308 \u00b1 0.0002 d`, `0.47 +0.03 -0.02 jupiterMass`. */
export function quantityText(quantity: QuantityReading): string {
  const { value, upper, lower, unit } = quantity;
  const both = upper === lower;
  const sigma = upper === undefined ? "" : both ? ` \u00b1 ${upper}` : ` +${upper} -${lower}`;
  const symbol = unit && symbolOf(unit);
  const suffix = !unit || unit.text === "1" ? "" : ` ${symbol}`;
  return `${value}${sigma}${suffix}`;
}

/** A unit as it reads back behind a number. */
export function symbolOf(unit: Unit): string {
  // The number that a date is read as counts from J2000.0.
  if (unit.kind === "instant" && unit.plus === 0) return `${unit.frame}-${julianDateOfEpoch}`;
  // A unit that begins with a number would be read on as part of the value.
  return /^\d/.test(unit.text) ? `[${unit.text}]` : unit.text;
}
