const mostDecimals = 9;
/** Sums of whole numbers below this are exact in a double. */
const exactBelow = 2 ** 53;

/**
 * Values as whole numbers whose sums are exact, so that the same set is found in every order and what is equal is equal:
 * by the decimals they are written with where these are few, else in steps of 2^-50 of their sum.
 */
export function wholeValues(values: readonly number[]): number[] {
  const total = values.reduce((sum, value) => sum + Math.abs(value), 0);
  if (total === 0) return values.map(() => 0);
  for (let decimals = 0; decimals <= mostDecimals && total * 10 ** decimals < exactBelow; decimals++) {
    const scaled = values.map((value) => Number(value.toFixed(decimals)));
    if (scaled.every((value, index) => value === values[index])) {
      return values.map((value) => Math.round(value * 10 ** decimals));
    }
  }
  return values.map((value) => Math.round((value / total) * 2 ** 50));
}
