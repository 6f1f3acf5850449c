import { mean, sumOf } from "./sum.js";

/** A linear fit y = intercept + sum of slopes times x, and how well it is known. */
export interface Fit {
  readonly slopes: readonly number[];
  readonly intercept: number;
  readonly slopeErrors: readonly number[];
  readonly interceptError: number;
  readonly residualSquares: number;
  readonly explainedSquares: number;
  readonly freedom: number;
}

/**
 * Least squares by Householder reflections on columns less their means (Golub & Van Loan, 4th ed., section 5.3.2).
 * A column that depends on those before it gets slope 0, as worksheets have it.
 */
export function leastSquares(y: Float64Array, xs: readonly Float64Array[], withIntercept: boolean): Fit {
  const count = y.length;
  const yMean = withIntercept ? mean(y) : 0;
  const xMeans = xs.map((x) => (withIntercept ? mean(x) : 0));
  const right = y.map((each) => each - yMean);
  const columns = xs.map((x, index) => x.map((each) => each - (xMeans[index] as number)));
  const { triangle, independent } = reflect(columns, right);
  const slopes = backSubstitute(triangle, independent, right);
  const intercept = yMean - slopes.reduce((total, slope, index) => total + slope * (xMeans[index] as number), 0);
  const fitted = (row: number) =>
    intercept + slopes.reduce((total, slope, index) => total + slope * ((xs[index] as Float64Array)[row] as number), 0);
  const residualSquares = sumOf(count, (row) => ((y[row] as number) - fitted(row)) ** 2);
  const explainedSquares = sumOf(count, (row) => (fitted(row) - yMean) ** 2);
  const used = independent.filter(Boolean).length;
  const freedom = count - used - (withIntercept ? 1 : 0);
  const variance = residualSquares / freedom;
  const inverses = inverseColumns(triangle, independent);
  const slopeErrors = slopes.map((_, index) =>
    Math.sqrt(variance * inverses.reduce((total, row) => total + (row[index] as number) ** 2, 0)),
  );
  const leverage = inverses.reduce(
    (total, row) => total + row.reduce((sum, each, index) => sum + each * (xMeans[index] as number), 0) ** 2,
    0,
  );
  return {
    slopes,
    intercept,
    slopeErrors,
    interceptError: Math.sqrt(variance * (1 / count + leverage)),
    residualSquares,
    explainedSquares,
    freedom,
  };
}

/** The upper triangle of the columns; the right side is carried along in place. */
function reflect(
  columns: readonly Float64Array[],
  right: Float64Array,
): { triangle: number[][]; independent: boolean[] } {
  const width = columns.length;
  const triangle = Array.from({ length: width }, () => new Array<number>(width).fill(0));
  const independent: boolean[] = [];
  let top = 0;
  for (let step = 0; step < width; step++) {
    const column = columns[step] as Float64Array;
    const size = norm(column, top);
    const isIndependent = size > 1e-13 * norm(column, 0) && top < column.length;
    independent.push(isIndependent);
    if (!isIndependent) {
      continue;
    }
    const head = column[top] as number;
    const alpha = head > 0 ? -size : size;
    const mirror = column.slice();
    mirror.fill(0, 0, top);
    mirror[top] = head - alpha;
    const length = norm(mirror, top) ** 2;
    for (const each of [...columns.slice(step), right]) {
      const factor = (2 * dot(mirror, each, top)) / length;
      for (let row = top; row < each.length; row++) {
        each[row] = (each[row] as number) - factor * (mirror[row] as number);
      }
    }
    for (let other = step; other < width; other++) {
      (triangle[step] as number[])[other] = (columns[other] as Float64Array)[top] as number;
    }
    top += 1;
  }
  return { triangle, independent };
}

function norm(column: Float64Array, from: number): number {
  return Math.sqrt(sumOf(column.length - from, (index) => (column[from + index] as number) ** 2));
}

function dot(left: Float64Array, right: Float64Array, from: number): number {
  return sumOf(left.length - from, (index) => (left[from + index] as number) * (right[from + index] as number));
}

function backSubstitute(
  triangle: readonly number[][],
  independent: readonly boolean[],
  right: ArrayLike<number>,
): number[] {
  const slopes = new Array<number>(triangle.length).fill(0);
  let row = independent.filter(Boolean).length;
  for (let step = triangle.length - 1; step >= 0; step--) {
    if (independent[step]) {
      row -= 1;
      const line = triangle[step] as number[];
      const known = line.reduce(
        (total, each, other) => (other > step ? total + each * (slopes[other] as number) : total),
        0,
      );
      slopes[step] = ((right[row] as number) - known) / (line[step] as number);
    }
  }
  return slopes;
}

/** Rows of the transposed inverse triangle: squares summed down give the variances of the slopes. */
function inverseColumns(triangle: readonly number[][], independent: readonly boolean[]): number[][] {
  const used = independent.flatMap((each, step) => (each ? [step] : []));
  return used.map((_, place) => {
    const unit = used.map((__, other) => (other === place ? 1 : 0));
    return backSubstitute(triangle, independent, unit);
  });
}
