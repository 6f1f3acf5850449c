import { serialFromText } from "./serialFromText.js";

const plain = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;
const grouped = /^[+-]?\d{1,3}(?:,\d{3})+(?:\.\d*)?$/;
const couldBeNumber = /^\s*[+\-.\d]/;

/**
 * The number that a text is, or undefined: decimal and exponent forms, comma groups of three, a percent sign at the
 * end, and the dates and times of `serialFromText`. Too large for a double is undefined too.
 * ISO/IEC 26300-3 section 6.3.5 leaves the accepted forms to the evaluator.
 */
export function numberFromText(text: string): number | undefined {
  if (!couldBeNumber.test(text)) {
    return undefined;
  }
  const trimmed = text.trim();
  if (trimmed.endsWith("%")) {
    const value = decimalFromText(trimmed.slice(0, -1).trimEnd());
    return value === undefined ? undefined : value / 100;
  }
  return decimalFromText(trimmed) ?? serialFromText(trimmed);
}

function decimalFromText(text: string): number | undefined {
  let digits = text;
  if (!plain.test(digits)) {
    if (!grouped.test(digits)) {
      return undefined;
    }
    digits = digits.replaceAll(",", "");
  }
  const value = Number(digits);
  return Number.isFinite(value) ? value : undefined;
}
