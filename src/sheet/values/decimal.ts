/** A number as decimal digits: its value is 0.DIGITS times 10 to `exponent`. Zero has no digits. */
export interface Decimal {
  readonly negative: boolean;
  readonly digits: string;
  readonly exponent: number;
}

/** The shortest decimal that reads back as the same double: the number as it was typed. */
export function decimalOf(value: number): Decimal {
  if (value === 0) {
    return { negative: false, digits: "", exponent: 0 };
  }
  const [mantissa, power] = Math.abs(value).toExponential().split("e") as [string, string];
  return { negative: value < 0, digits: mantissa.replace(".", ""), exponent: Number(power) + 1 };
}

/**
 * The decimal rounded to `places` digits behind the decimal point (before it where negative), halves away from zero
 * (ISO/IEC 26300-3 section 6.3.6, ROUND). What is rounded is the number as it was typed: 2.675 to 2 places is 2.68,
 * though its double lies a little below.
 */
export function roundedDecimal(decimal: Decimal, places: number): Decimal {
  return cutDecimal(decimal, places, (next) => next >= "5");
}

/** The decimal cut to `places` digits behind the point, one more in the last place where `up` says so. */
export function cutDecimal(
  decimal: Decimal,
  places: number,
  up: (next: string, following: string) => boolean,
): Decimal {
  const { negative, digits, exponent } = decimal;
  const kept = exponent + places;
  if (kept >= digits.length) {
    return decimal;
  }
  if (kept < 0) {
    return up("0", digits) && digits !== "" ? { negative, digits: "1", exponent: 1 - places } : zeroLike(decimal);
  }
  if (!up(digits[kept] as string, digits.slice(kept + 1))) {
    const cut = digits.slice(0, kept).replace(/0+$/, "");
    return cut === "" ? zeroLike(decimal) : { negative, digits: cut, exponent };
  }
  const increased = incremented(digits.slice(0, kept));
  const carried = increased.length > kept ? 1 : 0;
  return { negative, digits: increased.replace(/0+$/, ""), exponent: exponent + carried };
}

function zeroLike(decimal: Decimal): Decimal {
  return { negative: decimal.negative, digits: "", exponent: 0 };
}

function incremented(digits: string): string {
  const nines = /9*$/.exec(digits)?.[0].length ?? 0;
  const head = digits.slice(0, digits.length - nines);
  const zeros = "0".repeat(nines);
  return head === "" ? `1${zeros}` : `${head.slice(0, -1)}${Number(head.at(-1)) + 1}${zeros}`;
}

export function numberOfDecimal(decimal: Decimal): number {
  const size = decimal.digits === "" ? 0 : Number(`0.${decimal.digits}e${decimal.exponent}`);
  return decimal.negative ? -size : size;
}

/** The digits in fixed notation with exactly `places` digits behind the point, without a sign. */
export function fixedText(decimal: Decimal, places: number): string {
  const { digits, exponent } = decimal;
  const integer = digits.slice(0, Math.max(exponent, 0)).padEnd(Math.max(exponent, 0), "0") || "0";
  if (places <= 0) {
    return integer;
  }
  const fraction = "0".repeat(Math.max(-exponent, 0)) + digits.slice(Math.max(exponent, 0));
  return `${integer}.${(digits === "" ? "" : fraction).slice(0, places).padEnd(places, "0")}`;
}
