import type { Column } from "../../src/call/column.js";
import type { ColumnSpan } from "../../src/sheet/book/book.js";

/** A table of planets that nobody has found: period, star mass, planet mass, eccentricity, drawn before anything is timed. */
export function drawTable(rows: number): Column[] {
  let seed = 20_231;
  const draw = (): number => {
    seed = (seed * 48_271) % 2_147_483_647;
    return seed / 2_147_483_647;
  };
  const column = (header: string, value: () => number): Column => {
    const numbers = Float64Array.from({ length: rows + 1 }, value);
    numbers[0] = Number.NaN;
    const others = new Array<string | undefined>(rows + 1).fill(undefined);
    others[0] = header;
    return { length: rows + 1, numbers, others };
  };
  return [
    column("Period [d]", () => 1 + 1000 * draw()),
    column("Star mass [solMass]", () => 0.2 + 1.5 * draw()),
    column("Planet mass [earthMass]", () => 1 + 300 * draw()),
    column("Eccentricity", () => 0.6 * draw()),
  ];
}

/** Derived columns in closed form, as typed in row 2: orbit, K, shift, shift of a line, pixels and what one makes of them. */
export const derived: readonly string[] = [
  "=((A2/365.25)^2*B2)^(1/3)",
  "=0.0894917*C2/SQRT(1-D2^2)*B2^(-2/3)*(A2/365.25)^(-1/3)",
  "=F2/299792458",
  "=G2*550",
  "=G2*100000*3",
  "=IF(F2>1,F2,0)",
  "=E2*(1-D2)",
  "=E2*(1+D2)",
  "=F2/SQRT(100)",
  "=LOG10(A2)",
];

export const firstDerived = 4;

export function spanOf(column: number, rows: number): ColumnSpan {
  return { sheet: 0, column, from: 1, to: rows + 1 };
}
