const powersOfTen = Array.from({ length: 23 }, (_, exponent) => Number(`1e${exponent}`));
const zero = 48;
const nine = 57;
const point = 46;

/**
 * The double a decimal-point number denotes, correctly rounded, or undefined where the text is anything else or where
 * the number would lose what the text says: an identifier with leading zeros, an integer too long for a double, a
 * magnitude beyond the doubles or below them.
 *
 * Recognised and computed in one pass, for most of a large file is numbers. At most 15 digits times or over a power of ten up to 22 is one rounding of two exact doubles, hence correctly rounded
 * (Clinger 1990, How to read floating point numbers accurately, PLDI '90); the rest is left to the language.
 */
export function readNumber(text: string): number | undefined {
  const length = text.length;
  const first = text.charCodeAt(0);
  const negative = first === 45;
  const start = negative || first === 43 ? 1 : 0;
  let position = start;
  let mantissa = 0;
  let significant = 0;
  let digits = 0;
  let pointAt = -1;
  for (; position < length; position++) {
    const code = text.charCodeAt(position);
    if (code >= zero && code <= nine) {
      digits++;
      if (code !== zero || significant > 0) {
        significant++;
        mantissa = mantissa * 10 + (code - zero);
      }
    } else if (code === point && pointAt < 0) {
      pointAt = position;
    } else {
      break;
    }
  }
  if (digits === 0) {
    return undefined;
  }
  const decimals = pointAt < 0 ? 0 : position - pointAt - 1;
  let exponent = 0;
  if (position < length) {
    const written = readExponent(text, position);
    if (written === undefined) {
      return undefined;
    }
    exponent = written;
  } else if (pointAt < 0 && significant > 15 && !isHeldExactly(text)) {
    return undefined;
  }
  if (pointAt < 0 && digits > 1 && text.charCodeAt(start) === zero) {
    return undefined;
  }
  const scale = exponent - decimals;
  if (significant <= 15 && scale >= -22 && scale <= 22) {
    const magnitude =
      scale < 0 ? mantissa / (powersOfTen[-scale] as number) : mantissa * (powersOfTen[scale] as number);
    return negative ? -magnitude : magnitude;
  }
  const value = Number(text);
  return Number.isFinite(value) && (value !== 0 || significant === 0) ? value : undefined;
}

/** The exponent that begins at the letter e and fills the rest of the text. */
function readExponent(text: string, at: number): number | undefined {
  const letter = text.charCodeAt(at);
  if (letter !== 101 && letter !== 69) {
    return undefined;
  }
  const sign = text.charCodeAt(at + 1);
  const start = at + (sign === 45 || sign === 43 ? 2 : 1);
  if (start === text.length) {
    return undefined;
  }
  let exponent = 0;
  for (let position = start; position < text.length; position++) {
    const code = text.charCodeAt(position);
    if (code < zero || code > nine) {
      return undefined;
    }
    exponent = Math.min(exponent * 10 + (code - zero), 1_000_000);
  }
  return sign === 45 ? -exponent : exponent;
}

/**
 * Whether a long integer is a number rather than an identifier. Beyond 2^53 some catalogue identifiers happen to be
 * doubles and their neighbours do not; so that a column of them stays text throughout, such an integer must also have
 * no more than 15 digits before its trailing zeros.
 */
function isHeldExactly(text: string): boolean {
  const value = Number(text);
  if (Number.isSafeInteger(value)) {
    return true;
  }
  const significant = text.replace(/^[-+]?0*|0+$/g, "").length;
  return significant <= 15 && Number.isFinite(value) && BigInt(text.replace("+", "")) === BigInt(value);
}
