/**
 * The shortest text that reads back as the same double, with a capital E where there is an exponent.
 * Negative zero is "0": a worksheet shows no sign on zero.
 */
export function textFromNumber(value: number): string {
  return value === 0 ? "0" : String(value).replace("e", "E");
}
