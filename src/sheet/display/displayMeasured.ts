import type { Decimal } from "../values/decimal.js";
import { decimalOf, roundedDecimal } from "../values/decimal.js";
import { displayNumber, exponentText, fixed, shifted } from "./displayNumber.js";
import type { MeasuredFormat, UncertaintyDigits } from "./numberFormat.js";
import { general } from "./numberFormat.js";

/** More digits behind the point, or zeros before it, are written with a power of ten. */
const mostPlaces = 9;
const mostZeros = 4;

/**
 * A value with its standard uncertainty, or with an upper and a lower one (signs are ignored). The uncertainty gets two
 * significant digits unless asked otherwise, the value as many places (JCGM 100:2008 sections 7.2.2 and 7.2.6); of two
 * uncertainties the smaller one decides. An uncertainty of zero leaves the value as it is.
 */
export function displayMeasured(
  value: number,
  upper: number,
  lower: number | undefined,
  format: MeasuredFormat,
): string {
  const sizes = [upper, lower ?? upper].map(Math.abs) as [number, number];
  const smallest = Math.min(...sizes.filter((size) => size > 0));
  if (!Number.isFinite(smallest)) {
    return exact(value, lower !== undefined, format);
  }
  const places = placesOf(smallest, format.digits);
  const largest = Math.max(Math.abs(value), ...sizes);
  const isWritten = places <= mostPlaces && places >= -mostZeros;
  const power = isWritten ? 0 : decimalOf(largest).exponent - 1;
  const shown = (each: number) => fixed(shifted(decimalOf(each), -power), places + power);
  const parts = { value: shown(value), upper: shown(sizes[0]), lower: shown(sizes[1]) };
  const symmetric = lower === undefined || parts.upper === parts.lower;
  return format.kind === "plus-minus" ? plusMinus(parts, symmetric, power) : brackets(parts, symmetric, power);
}

function exact(value: number, asymmetric: boolean, format: MeasuredFormat): string {
  const text = displayNumber(value, general);
  return format.kind === "brackets" ? `${text}(0)` : `${text} ${asymmetric ? "+0 -0" : "± 0"}`;
}

interface Parts {
  readonly value: string;
  readonly upper: string;
  readonly lower: string;
}

function plusMinus({ value, upper, lower }: Parts, symmetric: boolean, power: number): string {
  const text = symmetric ? `${value} ± ${upper}` : `${value} +${upper} -${lower}`;
  return power === 0 ? text : `(${text})${exponentText(power)}`;
}

/** The uncertainty counts in the last digits of the value; where it reaches before the point it is written in full. */
function brackets({ value, upper, lower }: Parts, symmetric: boolean, power: number): string {
  const [above, below] = [lastDigits(upper), lastDigits(lower)];
  const text = symmetric ? `${value}(${above})` : `${value}(+${above} -${below})`;
  return power === 0 ? text : `${text}${exponentText(power)}`;
}

function lastDigits(text: string): string {
  return text.includes(".") && /^0\./.test(text) ? text.slice(2).replace(/^0+(?=\d)/, "") : text;
}

/** Places behind the point at which an uncertainty shows the digits asked for, after its rounding. */
function placesOf(size: number, digits: UncertaintyDigits): number {
  const decimal = decimalOf(size);
  if (digits === "PDG") {
    return placesOfParticleDataGroup(decimal);
  }
  // A carry, as in 0.0996, adds a digit: 0.10 has two.
  return digits - roundedDecimal(decimal, digits - decimal.exponent).exponent;
}

/**
 * The Particle Data Group's rule (Review of Particle Physics, Introduction, section 5.3): three leading digits of 100 to
 * 354 keep two digits, 355 to 949 one, 950 to 999 become 1000 and keep two.
 */
function placesOfParticleDataGroup(decimal: Decimal): number {
  const three = roundedDecimal(decimal, 3 - decimal.exponent);
  const leading = Number(three.digits.padEnd(3, "0").slice(0, 3));
  return (leading >= 355 ? 1 : 2) - three.exponent;
}
