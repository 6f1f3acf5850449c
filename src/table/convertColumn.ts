import type { Column } from "../call/column.js";
import { baseSlope, fromBase, toBase, type Unit } from "../units/unit.js";

/** The numbers of a column in another unit; what is no number stays, what has no value there is blank. */
export function convertColumn(column: Column, from: Unit, to: Unit): Column {
  return mapNumbers(column, (value) => fromBase(to, toBase(from, value)));
}

/** The uncertainties of a column of values in another unit; `values` and `from` are those before the conversion. */
export function convertSigmas(sigmas: Column, values: Column, from: Unit, to: Unit): Column {
  return mapNumbers(sigmas, (sigma, row) => {
    if (values.others?.[row] !== undefined) return sigma;
    const base = toBase(from, values.numbers[row]!);
    return (sigma * baseSlope(from, base)) / baseSlope(to, base);
  });
}

function mapNumbers(column: Column, change: (value: number, row: number) => number): Column {
  const numbers = new Float64Array(column.length).fill(Number.NaN);
  let lost: number[] | undefined;
  for (let row = 0; row < column.length; row++) {
    if (column.others?.[row] !== undefined) continue;
    numbers[row] = change(column.numbers[row]!, row);
    if (!Number.isFinite(numbers[row])) {
      lost ??= [];
      lost.push(row);
    }
  }
  if (!lost) return { length: column.length, numbers, others: column.others };
  const others = column.others ? [...column.others] : new Array(column.length).fill(undefined);
  for (const row of lost) {
    numbers[row] = Number.NaN;
    others[row] = null;
  }
  return { length: column.length, numbers, others };
}
