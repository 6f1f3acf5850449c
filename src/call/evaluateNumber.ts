import type { NumberDefinition, QuantityInput } from "../functions/definition.js";
import { baseSlope, fromBase, type Unit } from "../units/unit.js";
import { type BlockReader, blockRows, placeReader, quantityReader, type Report, wordReader } from "./blockReader.js";
import type { CallProblem } from "./callProblem.js";
import { CellError } from "./cell.js";
import { cellProblem } from "./cellProblem.js";
import { checkTogether } from "./checkTogether.js";
import { type Block, cellAt } from "./column.js";
import { shorten } from "./explain.js";
import type { CallInputs } from "./inputColumns.js";
import { isWithin, type OpenRange, openRange } from "./range.js";
import { valueText } from "./readCell.js";
import { ResultColumns } from "./resultColumns.js";
import { slopeScratch, slopes } from "./slopes.js";

/** Quantities in, one quantity out: reads, computes, propagates and converts, block by block. */
export function evaluateNumber(definition: NumberDefinition, call: CallInputs, unit: Unit): Block {
  const { rows } = call;
  const size = Math.min(rows, blockRows);
  const readers = call.inputs.map((cells) =>
    cells.input.takes === "word"
      ? wordReader(cells, cells.input, size)
      : cells.input.takes === "count"
        ? placeReader(call.spilled, size)
        : quantityReader(cells, cells.input as QuantityInput, size),
  );
  const inputColumns = readers.map((reader) => reader.base);
  const settled = definition.settle && new Float64Array(size);
  const bases = settled ? [...inputColumns, settled] : inputColumns;
  const results = new ResultColumns(rows, call.filledDown);
  const scratch = new Float64Array(size);
  const isBase = unit.times === 1 && unit.over === 1 && unit.plus === 0 && !unit.logarithm;
  const range = openRange(definition.result.quantity);
  const uncertainty = new BlockUncertainty(definition, readers, bases, size);
  for (let from = 0; from < rows; from += blockRows) {
    const count = Math.min(blockRows, rows - from);
    const report = reportTo(results, definition, from);
    for (const reader of readers) reader.read(from, count, report);
    checkTogether(definition, readers, unit, count, report);
    if (settled) definition.settle!(count, settled, ...inputColumns);
    const out = results.numbers.subarray(from, from + count);
    const values = isBase ? out : scratch;
    definition.compute(count, values, ...bases);
    if (!isBase) convert(values, unit, out);
    if (countOutside(values, range, out) > 0) {
      for (let row = 0; row < count; row++) {
        if (isWithin(range, values[row]!) && Number.isFinite(out[row])) continue;
        results.fail(from + row, cellProblem(definition, noResult(definition, call, from + row)));
      }
    }
    if (readers.some((reader) => reader.uncertain)) uncertainty.propagate(values, count, unit, results, from);
  }
  return results.block();
}

/** Base units to the result's unit, as many as `out` has room for. */
function convert(values: Float64Array, unit: Unit, out: Float64Array): void {
  const { times, over, plus, logarithm } = unit;
  const rows = out.length;
  if (logarithm) for (let row = 0; row < rows; row++) out[row] = fromBase(unit, values[row]!);
  else for (let row = 0; row < rows; row++) out[row] = ((values[row]! - plus) * over) / times;
}

/** How many values are no answer: outside the result's own range, or beyond numbers in its unit. */
function countOutside(values: Float64Array, range: OpenRange, out: Float64Array): number {
  const { lower, upper } = range;
  const rows = out.length;
  let outside = 0;
  for (let row = 0; row < rows; row++) {
    const value = values[row]!;
    if (!(value > lower && value < upper && Math.abs(out[row]!) < Number.POSITIVE_INFINITY)) outside++;
  }
  return outside;
}

function reportTo(results: ResultColumns, definition: NumberDefinition, from: number): Report {
  const error = (problem: CallProblem | CellError) =>
    problem instanceof CellError ? problem : cellProblem(definition, problem);
  return {
    value: (row, problem) => results.fail(from + row, error(problem)),
    sigma: (row, problem) => results.failSigma(from + row, error(problem), 1),
  };
}

function noResult(definition: NumberDefinition, call: CallInputs, row: number): CallProblem {
  const values = () =>
    call.inputs.flatMap(({ input, columns, headers, single }) => {
      const cell = columns.length > 0 ? cellAt(columns[0]!, single ? 0 : row) : null;
      if (cell === null || cell === "") return [];
      const unit = headers[0]?.unit;
      return `${input.name} ${typeof cell === "number" && unit ? valueText(cell, unit) : shorten(String(cell))}`;
    });
  return {
    about: "no result",
    result: definition.result.quantity.name,
    get values() {
      return values().join(", ");
    },
  };
}

/** First-order propagation with independent inputs, each side apart (JCGM 100, 5.1.2). */
class BlockUncertainty {
  private readonly scratch;
  private readonly slope: Float64Array;
  private readonly exact: Float64Array;
  private readonly scale: Float64Array;
  private readonly above: Float64Array;
  private readonly below: Float64Array;
  private readonly sides: Uint8Array;

  constructor(
    private readonly definition: NumberDefinition,
    private readonly readers: readonly BlockReader[],
    private readonly bases: readonly Float64Array[],
    size: number,
  ) {
    this.scratch = slopeScratch(size);
    this.slope = new Float64Array(size);
    this.exact = new Float64Array(definition.beforeRounding ? size : 0);
    this.scale = new Float64Array(size);
    this.above = new Float64Array(size);
    this.below = new Float64Array(size);
    this.sides = new Uint8Array(size);
  }

  propagate(values: Float64Array, rows: number, unit: Unit, results: ResultColumns, from: number): void {
    const { above, below, sides, slope } = this;
    const { beforeRounding, compute } = this.definition;
    const law = beforeRounding ?? compute;
    if (beforeRounding) beforeRounding(rows, this.exact, ...this.bases);
    const exact = beforeRounding ? this.exact : values;
    above.fill(0);
    below.fill(0);
    sides.fill(0);
    this.definition.inputs.forEach((input, index) => {
      const reader = this.readers[index]!;
      if (!reader.uncertain || input.takes !== "quantity") return;
      const scale = this.definition.scales?.[input.name];
      if (scale) scale(rows, this.scale, ...this.bases);
      const given = scale && this.scale;
      slopes(law, input.quantity, index, this.bases, exact, rows, this.scratch, slope, given);
      for (let row = 0; row < rows; row++) {
        if (reader.sides[row] === 0) continue;
        const up = slope[row]! * reader.upper[row]!;
        const down = slope[row]! * reader.lower[row]!;
        above[row]! += slope[row]! >= 0 ? up * up : down * down;
        below[row]! += slope[row]! >= 0 ? down * down : up * up;
        sides[row] = Math.max(sides[row]!, reader.sides[row]!);
      }
    });
    for (let row = 0; row < rows; row++) {
      if (sides[row] === 0) continue;
      if (results.hasFailed(from + row)) {
        results.spoilSigma(from + row, sides[row]!);
        continue;
      }
      const scale = 1 / Math.abs(baseSlope(unit, values[row]!));
      const upper = Math.sqrt(above[row]!) * scale;
      const lower = Math.sqrt(below[row]!) * scale;
      if (!Number.isFinite(upper) || !Number.isFinite(lower)) {
        const result = this.definition.result.quantity.name;
        results.failSigma(from + row, cellProblem(this.definition, { about: "uncertainty beyond numbers", result }), 1);
      }
      results.setSigma(from + row, upper, lower, sides[row]!);
    }
  }
}
