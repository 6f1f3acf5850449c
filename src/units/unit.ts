import type { Kind } from "./kind.js";

/**
 * A unit as it was understood. A value `x` in this unit is `x * times / over + plus` in the base unit of its kind:
 * SI, except that a mass is carried as G times the mass [m3 s-2] and an instant as days from J2000.0 in its own scale.
 * Two factors instead of one keep conversions such as nm -> m correctly rounded.
 */
export interface Unit {
  /** VOUnits spelling. */
  readonly text: string;
  readonly meaning: string;
  readonly kind: Kind;
  readonly times: number;
  readonly over: number;
  readonly plus: number;
  /** The value is a logarithm of the quantity: log10 ("dex") or natural. */
  readonly logarithm?: "log10" | "ln";
  /** For an instant its time scale and reference position, "JD_UTC" or "BJD_TDB"; instants of two frames do not mix. */
  readonly frame?: string;
}

export const one: Unit = { text: "1", meaning: "plain number", kind: "ratio", times: 1, over: 1, plus: 0 };

export function toBase(unit: Unit, value: number): number {
  if (unit.logarithm === "log10") return (10 ** value * unit.times) / unit.over;
  if (unit.logarithm === "ln") return (Math.exp(value) * unit.times) / unit.over;
  return (value * unit.times) / unit.over + unit.plus;
}

const longDate = /^\d{1,8}\.\d+$/;

/**
 * `toBase` of a number as it was written. A Julian date in one double is good to 40 microseconds; the days and their part
 * read one by one give the days from J2000.0 to a tenth of a microsecond.
 */
export function toBaseOf(unit: Unit, value: number, digits: string | undefined): number {
  if (digits === undefined || unit.kind !== "instant" || !longDate.test(digits)) return toBase(unit, value);
  const point = digits.indexOf(".");
  return Number(digits.slice(0, point)) + unit.plus + Number(digits.slice(point));
}

export function fromBase(unit: Unit, value: number): number {
  const linear = ((value - unit.plus) * unit.over) / unit.times;
  if (unit.logarithm === "log10") return Math.log10(linear);
  if (unit.logarithm === "ln") return Math.log(linear);
  return linear;
}

/** How much the base value changes for a change of one in this unit, at a base value. */
export function baseSlope(unit: Unit, base: number): number {
  if (unit.logarithm === "log10") return Math.LN10 * base;
  if (unit.logarithm === "ln") return base;
  return unit.times / unit.over;
}

/** Whether values can be converted between two units: one kind, and for instants one frame. */
export function convertible(from: Unit, to: Unit): boolean {
  return from.kind === to.kind && from.frame === to.frame;
}
