import type { CellError } from "./cell.js";
import type { Block, Column, OtherCell } from "./column.js";

/**
 * The results of one call while they are made: numbers, the errors of rows that have none, and the uncertainties of
 * rows that state them. Columns beside the first come into being when the first row needs them; the cells of rows
 * that need none stay blank.
 */
export class ResultColumns {
  readonly numbers: Float64Array;
  private others: (OtherCell | undefined)[] | undefined;
  private sigmas:
    | { upper: Float64Array; lower: Float64Array; cells: (OtherCell | undefined)[]; sides: Uint8Array }
    | undefined;

  /** `filledDown`: each row is a call of its own, so its width does not depend on the other rows. */
  constructor(
    private readonly rows: number,
    private readonly filledDown: boolean,
  ) {
    this.numbers = new Float64Array(rows);
  }

  /** The first problem of a row is the one it shows. */
  fail(row: number, error: OtherCell): void {
    this.others ??= new Array<OtherCell | undefined>(this.rows).fill(undefined);
    this.others[row] ??= error;
    this.numbers[row] = Number.NaN;
  }

  hasFailed(row: number): boolean {
    return this.others?.[row] !== undefined;
  }

  failSigma(row: number, error: CellError, count: number): void {
    const { cells, sides } = this.sigmaColumns();
    if (cells[row] === null || cells[row] === undefined) cells[row] = error;
    sides[row] = Math.max(sides[row]!, count);
  }

  setSigma(row: number, upper: number, lower: number, count: number): void {
    const sigmas = this.sigmaColumns();
    sigmas.sides[row] = Math.max(sigmas.sides[row]!, count);
    if (sigmas.cells[row] !== null) return;
    sigmas.upper[row] = upper;
    sigmas.lower[row] = lower;
    sigmas.cells[row] = undefined;
  }

  /** A row that states uncertainties and has no value: its error stands in every cell of the row. */
  spoilSigma(row: number, count: number): void {
    const { sides } = this.sigmaColumns();
    sides[row] = Math.max(sides[row]!, count);
  }

  block(): Block {
    const { rows, numbers, others, sigmas } = this;
    const value: Column = { length: rows, numbers, others };
    if (others) for (let row = 0; row < rows; row++) if (others[row] !== undefined) numbers[row] = Number.NaN;
    if (!sigmas) return { rows, columns: [value] };
    const cellsOf = (least: number) =>
      sigmas.cells.map((cell, row) => {
        if (sigmas.sides[row]! < (this.filledDown ? least : 1)) return null;
        return others?.[row] ?? cell;
      });
    const side = (source: Float64Array, cells: readonly (OtherCell | undefined)[]): Column => {
      cells.forEach((cell, row) => {
        if (cell !== undefined) source[row] = Number.NaN;
      });
      return { length: rows, numbers: source, others: cells.some((cell) => cell !== undefined) ? cells : undefined };
    };
    const first = side(sigmas.upper, cellsOf(1));
    const asymmetric = sigmas.sides.some((count) => count > 1);
    return { rows, columns: asymmetric ? [value, first, side(sigmas.lower, cellsOf(2))] : [value, first] };
  }

  private sigmaColumns() {
    this.sigmas ??= {
      upper: new Float64Array(this.rows),
      lower: new Float64Array(this.rows),
      cells: new Array<OtherCell | undefined>(this.rows).fill(null),
      sides: new Uint8Array(this.rows),
    };
    return this.sigmas;
  }
}
