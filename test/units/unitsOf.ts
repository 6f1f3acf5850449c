import { isProblem, type QuantityProblem, type UnitProblem } from "../../src/units/problem.js";
import type { QuantityReading } from "../../src/units/quantityReading.js";
import { readQuantity } from "../../src/units/readQuantity.js";
import { readUnit } from "../../src/units/readUnit.js";
import { fromBase, toBase, type Unit } from "../../src/units/unit.js";

/** The unit that a text is; a test fails in the problem's own words. */
export function unitOf(text: string): Unit {
  const unit = readUnit(text);
  if (isProblem(unit)) throw new Error(`"${text}": ${JSON.stringify(unit)}`);
  return unit;
}

export function problemOf(text: string): UnitProblem {
  const unit = readUnit(text);
  if (!isProblem(unit)) throw new Error(`"${text}" reads as ${unit.text}`);
  return unit;
}

export function quantityOf(text: string): QuantityReading {
  const quantity = readQuantity(text);
  if (isProblem(quantity)) throw new Error(`"${text}": ${JSON.stringify(quantity)}`);
  return quantity;
}

export function quantityProblemOf(text: string): QuantityProblem {
  const quantity = readQuantity(text);
  if (!isProblem(quantity)) throw new Error(`"${text}" reads as ${quantity.value} ${quantity.unit?.text}`);
  return quantity;
}

export function convert(value: number, from: string, to: string): number {
  const [own, asked] = [unitOf(from), unitOf(to)];
  if (own.kind !== asked.kind || own.frame !== asked.frame) throw new Error(`${from} is not of the kind of ${to}`);
  return fromBase(asked, toBase(own, value));
}
