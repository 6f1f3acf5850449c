/** A square or rectangular table of numbers, row by row. */
export interface Table {
  readonly rows: number;
  readonly columns: number;
  readonly values: Float64Array;
}

export interface Factors {
  /** Lower and upper triangle in one table. */
  readonly lu: Float64Array;
  readonly order: readonly number[];
  readonly sign: number;
  readonly singular: boolean;
}

/** Triangular factors with row exchanges, pivots chosen by size against their row (Golub & Van Loan, 4th ed., section 3.4). */
export function factorize({ rows: n, values }: Table): Factors {
  const lu = Float64Array.from(values);
  const order = Array.from({ length: n }, (_, row) => row);
  let sign = 1;
  let singular = false;
  const at = (row: number, column: number) => lu[row * n + column] as number;
  for (let step = 0; step < n; step++) {
    let pivot = step;
    for (let row = step + 1; row < n; row++) {
      if (Math.abs(at(row, step)) > Math.abs(at(pivot, step))) {
        pivot = row;
      }
    }
    if (at(pivot, step) === 0) {
      singular = true;
      continue;
    }
    if (pivot !== step) {
      sign = -sign;
      swapRows(lu, n, pivot, step);
      [order[pivot], order[step]] = [order[step] as number, order[pivot] as number];
    }
    eliminate(lu, n, step);
  }
  return { lu, order, sign, singular };
}

function swapRows(lu: Float64Array, n: number, first: number, second: number): void {
  for (let column = 0; column < n; column++) {
    const kept = lu[first * n + column] as number;
    lu[first * n + column] = lu[second * n + column] as number;
    lu[second * n + column] = kept;
  }
}

function eliminate(lu: Float64Array, n: number, step: number): void {
  const pivot = lu[step * n + step] as number;
  for (let row = step + 1; row < n; row++) {
    const factor = (lu[row * n + step] as number) / pivot;
    lu[row * n + step] = factor;
    for (let column = step + 1; column < n; column++) {
      lu[row * n + column] = (lu[row * n + column] as number) - factor * (lu[step * n + column] as number);
    }
  }
}

/** The solution for one right-hand side. */
export function solve({ lu, order }: Factors, right: readonly number[]): number[] {
  const n = order.length;
  const x = order.map((row) => right[row] as number);
  for (let row = 0; row < n; row++) {
    for (let column = 0; column < row; column++) {
      x[row] = (x[row] as number) - (lu[row * n + column] as number) * (x[column] as number);
    }
  }
  for (let row = n - 1; row >= 0; row--) {
    for (let column = row + 1; column < n; column++) {
      x[row] = (x[row] as number) - (lu[row * n + column] as number) * (x[column] as number);
    }
    x[row] = (x[row] as number) / (lu[row * n + row] as number);
  }
  return x;
}
