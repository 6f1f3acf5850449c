import type { QuantityReading } from "./quantityReading.js";

/** A quantity as text that reads back to the same doubles: `4.2308 \u00b1 0.0002 d`, `0.47 +0.03 -0.02 jupiterMass`. */
export function quantityText(quantity: QuantityReading): string {
  const { value, upper, lower, unit } = quantity;
  const both = upper === lower;
  const sigma = upper === undefined ? "" : both ? ` \u00b1 ${upper}` : ` +${upper} -${lower}`;
  // A unit that begins with a number would be read on as part of the value.
  const symbol = unit && /^\d/.test(unit.text) ? `[${unit.text}]` : unit?.text;
  const suffix = !unit || unit.text === "1" ? "" : ` ${symbol}`;
  return `${value}${sigma}${suffix}`;
}
