import type { Decimal } from "../values/decimal.js";
import { decimalOf, fixedText, roundedDecimal } from "../values/decimal.js";
import { textFromNumber } from "../values/textFromNumber.js";
import { timeOfSerial } from "../values/timeOfSerial.js";
import type { NumberFormat } from "./numberFormat.js";

/**
 * A finite number as text. Halves are rounded away from zero (ISO 80000-1 annex B, rule B), on the number as it was
 * typed; a number that rounds to zero has no sign. A serial outside the calendar is shown in general form.
 */
export function displayNumber(value: number, format: NumberFormat): string {
  switch (format.kind) {
    case "fixed": {
      const text = fixed(decimalOf(value), format.decimals);
      return format.grouped ? grouped(text) : text;
    }
    case "percent":
      return `${fixed(shifted(decimalOf(value), 2), format.decimals)}%`;
    case "significant":
      return significant(value, format.digits);
    case "scientific":
      return scientific(decimalOf(value), format.digits);
    case "date":
    case "time":
    case "date-time":
      return serialText(value, format.kind, format.kind === "date" ? 0 : format.decimals);
    default:
      return textFromNumber(value);
  }
}

/** The decimal with exactly so many digits behind the point, sign included. */
export function fixed(decimal: Decimal, places: number): string {
  const rounded = roundedDecimal(decimal, places);
  return `${rounded.negative && rounded.digits !== "" ? "-" : ""}${fixedText(rounded, Math.max(places, 0))}`;
}

/** The decimal times a power of ten. */
export function shifted(decimal: Decimal, power: number): Decimal {
  return decimal.digits === "" ? decimal : { ...decimal, exponent: decimal.exponent + power };
}

function grouped(text: string): string {
  const [integer = "", fraction] = text.split(".");
  return integer.replace(/\B(?=(\d{3})+$)/g, ",") + (fraction === undefined ? "" : `.${fraction}`);
}

/** Powers of ten between which digits are written out. */
const smallestWritten = -5;
const largestWritten = 15;

function significant(value: number, digits: number): string {
  const decimal = decimalOf(value);
  if (decimal.digits === "") {
    return fixed(decimal, digits - 1);
  }
  const rounded = roundedDecimal(decimal, digits - decimal.exponent);
  const isWritten = rounded.exponent > smallestWritten && rounded.exponent <= largestWritten;
  return isWritten ? fixed(rounded, digits - rounded.exponent) : scientific(decimal, digits);
}

function scientific(decimal: Decimal, digits: number): string {
  const rounded = roundedDecimal(decimal, digits - decimal.exponent);
  const power = rounded.digits === "" ? 0 : rounded.exponent - 1;
  return `${fixed(shifted(rounded, -power), digits - 1)}${exponentText(power)}`;
}

export function exponentText(power: number): string {
  return `E${power < 0 ? "-" : "+"}${Math.abs(power)}`;
}

const two = (part: number) => String(part).padStart(2, "0");

function serialText(serial: number, kind: "date" | "time" | "date-time", decimals: number): string {
  const at = timeOfSerial(kind === "date" ? Math.floor(serial) : serial, decimals);
  if (!at) {
    return textFromNumber(serial);
  }
  const date = `${String(at.year).padStart(4, "0")}-${two(at.month)}-${two(at.day)}`;
  const seconds = at.second.toFixed(decimals).padStart(decimals > 0 ? decimals + 3 : 2, "0");
  const time = `${two(at.hour)}:${two(at.minute)}:${seconds}`;
  return kind === "date" ? date : kind === "time" ? time : `${date} ${time}`;
}
