import { isProblem, type QuantityProblem } from "./problem.js";
import type { QuantityReading } from "./quantityReading.js";
import { readInstant } from "./readInstant.js";
import { readUnit } from "./readUnit.js";

const digits = "(?:\\d+\\.?\\d*|\\.\\d+)";
const number = `[+-]?${digits}(?:[eE][+-]?\\d+|\\s?[x\u00d7]\\s?10(?:\\^|\\*\\*)[+-]?\\d+)?`;
const plusMinus = "(?:\u00b1|\\+\\s?/?\\s?-)";
const form = new RegExp(
  `^(\\()?\\s*(${number})` +
    `(?:\\((${digits})\\)((?:[eE][+-]?\\d+)?)` +
    `|\\s*${plusMinus}\\s*(${number})` +
    `|\\s*\\(?\\s*\\+\\s?(${number})\\s*[/,;]?\\s*-\\s?(${number})\\s*\\)?)?` +
    `\\s*(\\))?\\s*(?![\\d.])(.*)$`,
  "s",
);

// Brackets around the unit are those of a header, not the logarithm that they are inside one.
const squared = /^\[([^[\]]*)\]$/;
const uncertaintyAfterUnit = new RegExp(`^([^\u00b1]*?)\\s*${plusMinus}\\s*(${number})[^\u00b1]*$`, "s");

/** Any decimal of fifteen digits comes back from a double. */
const mostDigits = 15;

/**
 * Reads a quantity text: `4.23 d`, `0.47 \u00b1 0.02 jupiterMass`, `4.2308(2) d` (the digits in brackets are the
 * uncertainty of the last digits), `0.47 +- 0.02`, `0.47 +0.03 -0.02 jupiterMass`, an ISO 8601 instant.
 */
export function readQuantity(text: string): QuantityReading | QuantityProblem {
  const instant = readInstant(text.trim());
  if (instant) return instant;
  const match = form.exec(text.replace(/[\u2212\u2013]/g, "-").trim());
  if (!match) return { problem: "not a number", text, hint: undefined };
  const [, open, value, bracket, exponent, both, upper, lower, close, rest = ""] = match;
  if (Boolean(open) !== Boolean(close)) return { problem: "not a number", text, hint: undefined };
  const comma = /^,(\d+)(.*)$/s.exec(rest);
  if (comma) return { problem: "not a number", text, hint: withoutComma(value!, comma[1]!, comma[2]!) };
  const late = uncertaintyAfterUnit.exec(rest);
  if (late && !bracket && !both && !upper) {
    return { problem: "not a number", text, hint: `${value} \u00b1 ${late[2]} ${late[1]!.trim()}` };
  }
  if (/^\s*[-+.\d]/.test(rest)) return { problem: "not a number", text, hint: undefined };
  const unit = rest.trim() === "" ? undefined : readUnit(squared.exec(rest.trim())?.[1] ?? rest);
  if (unit && isProblem(unit)) return unit;
  const read = numberOf(value! + (exponent ?? ""));
  const sigmas =
    bracket === undefined
      ? [upper ?? both, lower ?? both].map((side) => (side === undefined ? undefined : numberOf(side)))
      : [bracketUncertainty(value!, bracket, exponent!), bracketUncertainty(value!, bracket, exponent!)];
  if (![read, ...sigmas].every((part) => part === undefined || Number.isFinite(part))) {
    return { problem: "not a number", text, hint: undefined };
  }
  const reading = { value: read, upper: absolute(sigmas[0]), lower: absolute(sigmas[1]), unit };
  return value!.length > mostDigits && !exponent ? { ...reading, digits: value! } : reading;
}

/** 4,23 is a decimal comma; 1,234 may also be a thousand and more. */
function withoutComma(value: string, digits: string, rest: string): string {
  const decimal = `${value}.${digits}${rest}`;
  return digits.length === 3 ? `${decimal} or ${value}${digits}${rest}` : decimal;
}

function absolute(sigma: number | undefined): number | undefined {
  return sigma === undefined ? undefined : Math.abs(sigma);
}

function numberOf(text: string): number {
  return Number(text.replace(/\s?[x\u00d7]\s?10(?:\^|\*\*)/, "e"));
}

/** 4.2308(2) -> 0.0002; a decimal point inside the brackets, 12.3(1.5), states the uncertainty outright. */
function bracketUncertainty(value: string, bracket: string, exponent: string): number {
  if (bracket.includes(".")) return Number(bracket + exponent);
  const own = /[eE]([+-]?\d+)$/.exec(value)?.[1];
  const decimals = /\.(\d*)/.exec(value)?.[1]?.length ?? 0;
  return Number(`${bracket}e${Number(own ?? 0) + Number(exponent.slice(1) || 0) - decimals}`);
}
