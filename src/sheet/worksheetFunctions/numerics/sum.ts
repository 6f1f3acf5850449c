/** Numbers that a kernel reads, never writes. */
export type Numbers = ArrayLike<number>;

/**
 * Sum with the rounding error of every step carried along (Neumaier 1974, Zeitschrift fuer Angewandte Mathematik und
 * Mechanik 54, 39). Accuracy: about 2 ulp of the result plus n^2 eps^2 times the sum of magnitudes.
 */
export function sum(values: Numbers): number {
  return sumOf(values.length, (index) => values[index] as number);
}

/** The same sum over terms that are worked out one by one. */
export function sumOf(count: number, term: (index: number) => number): number {
  let total = 0;
  let carry = 0;
  for (let index = 0; index < count; index++) {
    const next = term(index);
    const longer = total + next;
    carry += Math.abs(total) >= Math.abs(next) ? total - longer + next : next - longer + total;
    total = longer;
  }
  // Beyond the largest double the carry is not a number: the total says what happened.
  return Number.isFinite(total) ? total + carry : total;
}

/** Arithmetic mean; NaN of nothing. The sum may be beyond a double where the mean is not. */
export function mean(values: Numbers): number {
  const count = values.length;
  const total = sum(values);
  return Number.isFinite(total) ? total / count : sumOf(count, (index) => (values[index] as number) / count);
}

/**
 * Sum of squared deviations from the mean, in two passes with the correction of Chan, Golub and LeVeque 1983
 * (The American Statistician 37, 242, eq. 1.7), so that a large mean takes no digits away.
 */
export function squaredDeviations(values: Numbers, centre: number = mean(values)): number {
  const count = values.length;
  const squares = sumOf(count, (index) => ((values[index] as number) - centre) ** 2);
  const residual = sumOf(count, (index) => (values[index] as number) - centre);
  return Number.isFinite(squares) ? Math.max(0, squares - (residual * residual) / count) : Number.POSITIVE_INFINITY;
}

/** Sum of products of deviations of pairs, corrected alike. */
export function productDeviations(left: Numbers, right: Numbers): number {
  const count = left.length;
  const leftMean = mean(left);
  const rightMean = mean(right);
  const products = sumOf(
    count,
    (index) => ((left[index] as number) - leftMean) * ((right[index] as number) - rightMean),
  );
  const leftResidual = sumOf(count, (index) => (left[index] as number) - leftMean);
  const rightResidual = sumOf(count, (index) => (right[index] as number) - rightMean);
  return products - (leftResidual * rightResidual) / count;
}

/** Sum of the k-th powers of the deviations from the mean. */
export function powerDeviations(values: Numbers, power: number): number {
  const centre = mean(values);
  return sumOf(values.length, (index) => ((values[index] as number) - centre) ** power);
}
