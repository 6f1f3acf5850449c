import type { Decimal } from "../../../values/decimal.js";
import { decimalOf, fixedText, roundedDecimal } from "../../../values/decimal.js";
import { textFromNumber } from "../../../values/textFromNumber.js";
import type { Token } from "./tokens.js";

/** A number of 0 or more in one section of a format code, without its sign. */
export function formatNumber(tokens: readonly Token[], value: number): string {
  const percents = tokens.filter((token) => token.kind === "percent").length;
  const body = withoutGroups(tokens);
  const exponentAt = body.tokens.findIndex((token) => token.kind === "exponent");
  const scaled = decimalOf(value);
  const shifted: Decimal =
    scaled.digits === "" ? scaled : { ...scaled, exponent: scaled.exponent + 2 * percents - 3 * body.thousands };
  return exponentAt < 0
    ? mantissaText(body.tokens, shifted, body.isGrouped)
    : scientificText(body.tokens.slice(0, exponentAt), body.tokens.slice(exponentAt), shifted);
}

/** The tokens without commas: between digits they group by thousands, after the last digit each divides by 1000. */
function withoutGroups(tokens: readonly Token[]): { tokens: Token[]; isGrouped: boolean; thousands: number } {
  const pointAt = tokens.findIndex((token) => token.kind === "point");
  const digitsAt = tokens.flatMap((token, index) => (token.kind === "digit" ? [index] : []));
  const integerDigits = digitsAt.filter((index) => pointAt < 0 || index < pointAt);
  const lastInteger = integerDigits.at(-1) ?? -1;
  const isGrouped = tokens.some(
    (token, index) => token.kind === "group" && index > (integerDigits[0] ?? Infinity) && index < lastInteger,
  );
  let thousands = 0;
  for (let index = lastInteger + 1; lastInteger >= 0 && tokens[index]?.kind === "group"; index++) {
    thousands += 1;
  }
  return { tokens: tokens.filter((token) => token.kind !== "group"), isGrouped, thousands };
}

const isDigit = (token: Token) => token.kind === "digit";

function mantissaText(tokens: readonly Token[], value: Decimal, isGrouped: boolean): string {
  const pointAt = tokens.findIndex((token) => token.kind === "point");
  const before = pointAt < 0 ? tokens : tokens.slice(0, pointAt);
  const after = pointAt < 0 ? [] : tokens.slice(pointAt + 1);
  const places = after.filter(isDigit).length;
  const rounded = roundedDecimal(value, places);
  const [integer = "", fraction = ""] = fixedText(rounded, places).split(".");
  const integerDigits = integer === "0" ? "" : integer;
  return integerText(before, integerDigits, isGrouped) + (pointAt < 0 ? "" : `.${fractionText(after, fraction)}`);
}

/** Digits laid on the placeholders from the right; what is left over stands at the first of them. */
function integerText(tokens: readonly Token[], digits: string, isGrouped: boolean): string {
  let left = digits;
  let written = 0;
  let result = "";
  let placeholders = tokens.filter(isDigit).length;
  const put = (digit: string) => {
    result = digit + (isGrouped && written > 0 && written % 3 === 0 ? "," : "") + result;
    written += 1;
  };
  for (const token of tokens.toReversed()) {
    if (token.kind !== "digit") {
      result = literalText(token) + result;
      continue;
    }
    placeholders -= 1;
    if (left !== "") {
      put(left.slice(-1));
      left = left.slice(0, -1);
    } else if (token.sign !== "#") {
      put(token.sign === "0" ? "0" : " ");
    }
    while (placeholders === 0 && left !== "") {
      put(left.slice(-1));
      left = left.slice(0, -1);
    }
  }
  return result;
}

function fractionText(tokens: readonly Token[], digits: string): string {
  const significant = digits.replace(/0+$/, "").length;
  let index = 0;
  let result = "";
  for (const token of tokens) {
    if (token.kind !== "digit") {
      result += literalText(token);
      continue;
    }
    const digit = digits[index] ?? "0";
    result += index < significant || token.sign === "0" ? digit : token.sign === "?" ? " " : "";
    index += 1;
  }
  return result;
}

function scientificText(mantissa: readonly Token[], exponent: readonly Token[], value: Decimal): string {
  const pointAt = mantissa.findIndex((token) => token.kind === "point");
  const before = (pointAt < 0 ? mantissa : mantissa.slice(0, pointAt)).filter(isDigit).length;
  const places = pointAt < 0 ? 0 : mantissa.slice(pointAt).filter(isDigit).length;
  const step = Math.max(before, 1);
  // The exponent is a multiple of the integer placeholders: ##0.0E+0 counts in thousands.
  const power = (digits: Decimal) => (digits.digits === "" ? 0 : Math.floor((digits.exponent - 1) / step) * step);
  const first = power(value);
  const rounded = roundedDecimal({ ...value, exponent: value.exponent - first }, places);
  const final = rounded.digits !== "" && rounded.exponent > step ? first + step : first;
  const shown = { ...value, exponent: value.exponent - final };
  const [, ...rest] = exponent;
  const sign = final < 0 ? "-" : (exponent[0] as { plus: boolean }).plus ? "+" : "";
  return `${mantissaText(mantissa, shown, false)}E${sign}${integerText(rest, String(Math.abs(final)), false)}`;
}

function literalText(token: Token): string {
  return token.kind === "literal" ? token.text : token.kind === "percent" ? "%" : "";
}

/** A number in the general form: the shortest text. */
export function generalText(value: number): string {
  return textFromNumber(value);
}
