import type { QuantityInput, WordInput } from "../functions/definition.js";
import { convertInstant, isClock } from "../units/convertInstant.js";
import { isPlainNumberKind } from "../units/kind.js";
import { nearest } from "../units/nearest.js";
import { baseSlope, one, toBaseOf, type Unit } from "../units/unit.js";
import type { CallProblem } from "./callProblem.js";
import { type Cell, CellError } from "./cell.js";
import { cellAt } from "./column.js";
import { quote } from "./explain.js";
import type { InputColumns } from "./inputColumns.js";
import { isWithin, type OpenRange, openRange, rangeProblem } from "./range.js";
import { type CellReading, fits, readCell, valueText } from "./readCell.js";
import { readSigma } from "./readSigma.js";
import { zeroOfDate } from "./zeroOfDate.js";

/** Rows are read in blocks of this many, so that what one block needs stays in the processor's cache. */
export const blockRows = 1024;

/** One input of a block of rows, in base units. */
export interface BlockReader {
  readonly base: Float64Array;
  readonly upper: Float64Array;
  readonly lower: Float64Array;
  /** How many uncertainties each row states: 0, 1 (both sides alike) or 2. */
  readonly sides: Uint8Array;
  /** For an instant that is not brought into one frame, the frame of each row; undefined where it could not be read. */
  readonly frames?: (string | undefined)[];
  /** For an input that others may need, 1 where the fallback stands in. */
  readonly assumed?: Uint8Array;
  /** Whether any row of the block states one. */
  uncertain: boolean;
  /** Reads rows from `from` on; where one cannot be read, its base value is NaN and it is reported. */
  read(from: number, rows: number, report: Report): void;
}

export interface Report {
  /** The row, counted within the block, has no answer. */
  value(row: number, problem: CallProblem | CellError): void;
  /** The row has an answer whose uncertainty is not known. */
  sigma(row: number, problem: CallProblem | CellError): void;
}

export function quantityReader(cells: InputColumns, input: QuantityInput, size: number): BlockReader {
  const { quantity } = input;
  const range = openRange(quantity);
  const [column, ...sigmaColumns] = cells.columns;
  const [header = { header: undefined, unit: undefined, problem: undefined }, ...sigmaHeaders] = cells.headers;
  const base = new Float64Array(size);
  const uncertainSize = column && (sigmaColumns.length > 0 || column.others) ? size : 0;
  const upper = new Float64Array(uncertainSize);
  const lower = new Float64Array(uncertainSize);
  const sides = new Uint8Array(uncertainSize);
  const plain = isPlainNumberKind(quantity.kind);
  const stated = header.problem ? undefined : (header.unit ?? (plain ? one : undefined));
  const isFast = stated && !stated.logarithm && fits(stated, quantity.kind);
  const fastUnit = isFast && (!quantity.frame || stated.frame === quantity.frame) ? stated : undefined;
  const frames: (string | undefined)[] | undefined =
    quantity.kind === "instant" && !quantity.frame ? new Array(size).fill(undefined) : undefined;
  const assumed = input.needed && new Uint8Array(size);

  function assume(row: number): void {
    base[row] = input.fallback!;
    assumed![row] = 1;
  }

  function readOther(row: number, cell: Cell, at: number, report: Report): void {
    if (cell === null && input.fallback === 0) {
      base[row] = 0;
      return;
    }
    if (assumed && (cell === null || cell === "" || cell === 0)) {
      assume(row);
      return;
    }
    if (frames) frames[row] = undefined;
    if (quantity.zeroIsBlank && cell === 0 && header.unit) {
      base[row] = Number.NaN;
      report.value(row, { about: "zero for blank", input: input.name, unit: header.unit });
      if (sigmaColumns.length > 0) setSigma(row, 0, 0, sigmaColumns.length);
      return;
    }
    const reading = readCell(input.name, cell, header, quantity);
    if (reading instanceof CellError || "about" in reading) {
      base[row] = Number.NaN;
      report.value(row, reading);
      if (sigmaColumns.length > 0) setSigma(row, 0, 0, sigmaColumns.length);
      return;
    }
    const value = baseOf(reading, row, report);
    base[row] = value;
    if (frames) frames[row] = reading.unit.frame;
    if (!isWithin(range, value)) {
      base[row] = Number.NaN;
      // The number behind a date counts from J2000.0, which nobody typed.
      const isDate = reading.unit.kind === "instant" && reading.unit.plus === 0;
      const text = isDate ? quote(String(cell)) : valueText(reading.value, reading.unit);
      const problem = zeroOfDate(input.name, quantity, reading, header.header);
      report.value(row, problem ?? rangeProblem(input.name, quantity, value, text));
    }
    if (reading.upper !== undefined && reading.lower !== undefined) {
      const slope = baseSlope(reading.unit, value);
      setSigma(row, reading.upper * slope, reading.lower * slope, reading.upper === reading.lower ? 1 : 2);
    } else if (sigmaColumns.length > 0) {
      readSigmas(row, reading.unit, value, at, report);
    }
  }

  /** In base units, an instant in the frame that is wanted. */
  function baseOf({ value, unit, digits }: CellReading, row: number, report: Report): number {
    const days = toBaseOf(unit, value, digits);
    if (!quantity.frame || unit.frame === quantity.frame) return days;
    if (!isClock(unit.frame)) {
      report.value(row, { about: "no clock", input: input.name, frame: unit.frame ?? "", wanted: quantity.frame });
      return days;
    }
    // Beyond the table of leap seconds the range, which ends there, refuses the instant as it came.
    const converted = convertInstant(days, unit.frame!, quantity.frame);
    return Number.isNaN(converted) ? days : converted;
  }

  function setSigma(row: number, above: number, below: number, count: number): void {
    upper[row] = above;
    lower[row] = below;
    sides[row] = count;
    reader.uncertain = true;
  }

  /** Reads what stands beside a value, in its own header's unit or else in that of the value. */
  function readSigmas(row: number, unit: Unit, value: number, at: number, report: Report): void {
    const first = sigmaAt(0, row, unit, value, at, report);
    const last = sigmaColumns.length > 1 ? sigmaAt(1, row, unit, value, at, report) : first;
    setSigma(row, first, last, sigmaColumns.length);
  }

  function sigmaAt(index: number, row: number, unit: Unit, value: number, at: number, report: Report): number {
    const header = sigmaHeaders[index]!;
    const cell = cellAt(sigmaColumns[index]!, at);
    const own = header.unit ?? unit;
    if (typeof cell === "number" && !header.problem && fits(own, quantity.kind)) {
      return Math.abs(cell) * baseSlope(own, value);
    }
    const reading = readSigma(input.name, cell, header, unit);
    if (reading instanceof CellError || "about" in reading) {
      report.sigma(row, reading);
      return 0;
    }
    return Math.abs(reading.value) * baseSlope(reading.unit, value);
  }

  /** The common case, a column of numbers under one unit. */
  function readNumbers(unit: Unit, numbers: Float64Array, from: number, rows: number, report: Report): void {
    frames?.fill(unit.frame, 0, rows);
    if (readLinear(unit, numbers.subarray(from, from + rows), range, base) > 0) {
      for (let row = 0; row < rows; row++) {
        if (!isWithin(range, base[row]!)) readOther(row, cellAt(column!, from + row), from + row, report);
      }
    }
    if (!assumed && !quantity.zeroIsBlank) return;
    for (let row = 0; row < rows; row++) if (numbers[from + row] === 0) readOther(row, 0, from + row, report);
  }

  function read(from: number, rows: number, report: Report): void {
    reader.uncertain = false;
    sides.fill(0);
    assumed?.fill(column ? 0 : 1);
    if (!column) {
      base.fill(input.fallback!, 0, rows);
    } else if (fastUnit && !column.others) {
      readNumbers(fastUnit, column.numbers, from, rows, report);
      for (let row = 0; row < rows && sigmaColumns.length > 0; row++) {
        if (!Number.isNaN(base[row])) readSigmas(row, fastUnit, base[row]!, from + row, report);
      }
    } else {
      for (let row = 0; row < rows; row++) readOther(row, cellAt(column, from + row), from + row, report);
    }
  }

  const reader: BlockReader = { base, upper, lower, sides, frames, assumed, uncertain: false, read };
  return cells.single ? singleReader(reader) : reader;
}

/**
 * Numbers into base units, in loops that allocate nothing and divide only if they must; the count of those outside
 * the range comes back.
 */
function readLinear(unit: Unit, numbers: Float64Array, range: OpenRange, base: Float64Array): number {
  const { times, over, plus } = unit;
  const { lower, upper } = range;
  const rows = numbers.length;
  let outside = 0;
  if (over === 1 && plus === 0) {
    for (let row = 0; row < rows; row++) {
      const value = numbers[row]! * times;
      base[row] = value;
      if (!(value > lower && value < upper)) outside++;
    }
  } else {
    for (let row = 0; row < rows; row++) {
      const value = (numbers[row]! * times) / over + plus;
      base[row] = value;
      if (!(value > lower && value < upper)) outside++;
    }
  }
  return outside;
}

/** Reads its one cell once and serves it to every row. */
function singleReader(reader: BlockReader): BlockReader {
  let valueProblem: CallProblem | CellError | undefined;
  let sigmaProblem: CallProblem | CellError | undefined;
  reader.read(0, 1, {
    value: (_, problem) => {
      valueProblem ??= problem;
    },
    sigma: (_, problem) => {
      sigmaProblem ??= problem;
    },
  });
  for (const array of [reader.base, reader.upper, reader.lower, reader.sides]) array.fill(array[0]!);
  reader.frames?.fill(reader.frames[0]);
  reader.assumed?.fill(reader.assumed[0]!);
  return {
    ...reader,
    read: (_, rows, report) => {
      for (let row = 0; row < rows && (valueProblem || sigmaProblem); row++) {
        if (valueProblem) report.value(row, valueProblem);
        if (sigmaProblem) report.sigma(row, sigmaProblem);
      }
    },
  };
}

/** Words become their place in the definition's list; a blank is the first. */
export function wordReader(cells: InputColumns, input: WordInput, size: number): BlockReader {
  const [column] = cells.columns;
  const base = new Float64Array(size);
  const none = new Float64Array(0);
  const codes = new Map(input.words.map(({ word }, code) => [word.toLowerCase(), code]));
  const words = input.words.map(({ word }) => word);
  const read = (from: number, rows: number, report: Report) => {
    for (let row = 0; row < rows && column; row++) readWord(row, cellAt(column, from + row), report);
  };
  const readWord = (row: number, cell: Cell, report: Report) => {
    if (input.required && (cell === null || cell === "")) {
      base[row] = Number.NaN;
      report.value(row, { about: "blank", input: input.name });
      return;
    }
    const code = cell === null || cell === "" ? 0 : codes.get(String(cell).trim().toLowerCase());
    base[row] = code ?? Number.NaN;
    if (cell instanceof CellError) report.value(row, cell);
    else if (code === undefined) {
      const text = typeof cell === "string" ? cell : String(cell);
      report.value(row, { about: "word", input: input.name, text, words, nearest: nearest(text, words) });
    }
  };
  const reader: BlockReader = { base, upper: none, lower: none, sides: new Uint8Array(0), uncertain: false, read };
  return cells.single && column ? singleReader(reader) : reader;
}

/** The place of each result among those that were asked for; a column has one in each row. */
export function placeReader(spilled: boolean, size: number): BlockReader {
  const base = new Float64Array(size).fill(1);
  const none = new Float64Array(0);
  const read = (from: number, rows: number) => {
    for (let row = 0; spilled && row < rows; row++) base[row] = from + row + 1;
  };
  return { base, upper: none, lower: none, sides: new Uint8Array(0), uncertain: false, read };
}
