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
  private sigmas: { upper: Float64Array; lower: Float64Array; cells: (OtherCell | undefined)[] } | undefined;
  private asymmetric = false;

  constructor(private readonly rows: number) {
    this.numbers = new Float64Array(rows);
  }

  /** The first problem of a row is the one it shows. */
  fail(row: number, error: OtherCell): void {
    this.others ??= new Array<OtherCell | undefined>(this.rows).fill(undefined);
    this.others[row] ??= error;
    this.numbers[row] = Number.NaN;
  }

  failSigma(row: number, error: CellError): void {
    const { cells } = this.sigmaColumns();
    if (cells[row] === null || cells[row] === undefined) cells[row] = error;
  }

  setSigma(row: number, upper: number, lower: number, sides: number): void {
    if (sides > 1) this.asymmetric = true;
    const sigmas = this.sigmaColumns();
    if (sigmas.cells[row] !== null) return;
    sigmas.upper[row] = upper;
    sigmas.lower[row] = lower;
    sigmas.cells[row] = undefined;
  }

  block(): Block {
    const { rows, numbers, others, sigmas } = this;
    const value: Column = { length: rows, numbers, others };
    if (others) for (let row = 0; row < rows; row++) if (others[row] !== undefined) numbers[row] = Number.NaN;
    if (!sigmas) return { rows, columns: [value] };
    // A row without a value has no uncertainty either: its error stands once, in the value's cell.
    const cells = sigmas.cells.map((cell, row) => (others?.[row] === undefined ? cell : null));
    const side = (source: Float64Array): Column => {
      cells.forEach((cell, row) => {
        if (cell !== undefined) source[row] = Number.NaN;
      });
      return { length: rows, numbers: source, others: cells.some((cell) => cell !== undefined) ? cells : undefined };
    };
    const columns = this.asymmetric ? [value, side(sigmas.upper), side(sigmas.lower)] : [value, side(sigmas.upper)];
    return { rows, columns };
  }

  private sigmaColumns() {
    this.sigmas ??= {
      upper: new Float64Array(this.rows),
      lower: new Float64Array(this.rows),
      cells: new Array<OtherCell | undefined>(this.rows).fill(null),
    };
    return this.sigmas;
  }
}
