/** |actual / expected - 1|, and 0 for two zeros; NaN stays NaN, so that no comparison with a bound passes. */
export function relativeError(actual: number, expected: number): number {
  return actual === expected ? 0 : Math.abs((actual - expected) / expected);
}
