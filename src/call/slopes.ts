import type { Compute } from "../functions/definition.js";
import type { Quantity } from "../functions/quantity.js";

/**
 * Derivatives of a computation by one input, by differences of fourth order:
 *
 *     f'(x) = (f(x - 2h) - 8 f(x - h) + 8 f(x + h) - f(x + 2h)) / (12 h)
 *
 * and its one-sided form next to a bound that belongs to the range (e = 0). The step is a small part of the way to
 * the nearest bound where the law is singular (M = 0, e = 1), so accuracy does not depend on the unit or the size of
 * the value; it is made larger where the result hardly moves, since rounding would decide there.
 * Accuracy: relative error <= 1e-7, in practice 1e-9; test/call/propagation.test.ts against the exact derivatives.
 */
export interface SlopeScratch {
  readonly shifted: Float64Array;
  readonly steps: Float64Array;
  readonly stencils: Uint8Array;
  readonly results: readonly [Float64Array, Float64Array, Float64Array, Float64Array];
}

export function slopeScratch(size: number): SlopeScratch {
  const array = () => new Float64Array(size);
  const results = [array(), array(), array(), array()] as const;
  return { shifted: array(), steps: array(), stencils: new Uint8Array(size), results };
}

/** Where the four values are taken, in steps, and with which weights they enter 12 h f'; `centre` weighs f(x). */
interface Stencil {
  readonly offsets: readonly [number, number, number, number];
  readonly weights: readonly [number, number, number, number];
  readonly centre: number;
}

const central = 0;
const forward = 1;
const backward = 2;
const stencils: readonly [Stencil, Stencil, Stencil] = [
  { offsets: [-2, -1, 1, 2], weights: [1, -8, 8, -1], centre: 0 },
  { offsets: [1, 2, 3, 4], weights: [48, -36, 16, -3], centre: -25 },
  { offsets: [-1, -2, -3, -4], weights: [-48, 36, -16, 3], centre: 25 },
];

const relativeStep = 2e-3;
/** Below this relative change of the result the step is too small to tell a slope from rounding. */
const leastChange = 1e-6;
/** A difference of this many roundings of the result is no difference. */
const roundings = 64 * Number.EPSILON;

/**
 * Fills `out` with the derivatives by input `index` in the first `rows` rows; `values` are the results there. `scale` says
 * how far the input may move before the result bends, where that is known better than from its size.
 */
export function slopes(
  compute: Compute,
  quantity: Quantity,
  index: number,
  columns: readonly Float64Array[],
  values: Float64Array,
  rows: number,
  scratch: SlopeScratch,
  out: Float64Array,
  scale?: Float64Array,
): void {
  const column = columns[index]!;
  const { shifted, steps, results } = scratch;
  for (let row = 0; row < rows; row++) {
    const x = column[row]!;
    steps[row] = relativeStep * (scale ? scale[row]! : scaleOf(quantity, x));
    scratch.stencils[row] = stencilAt(quantity, x, steps[row]!);
  }
  const shiftedColumns = columns.with(index, shifted);
  for (let part = 0; part < 4; part++) {
    const offsets = stencils.map((stencil) => stencil.offsets[part]!);
    for (let row = 0; row < rows; row++) shifted[row] = column[row]! + offsets[scratch.stencils[row]!]! * steps[row]!;
    compute(rows, results[part]!, ...shiftedColumns);
  }
  const [a, b, c, d] = results;
  for (let row = 0; row < rows; row++) {
    const least = scale ? 0 : leastChange;
    const form = scratch.stencils[row]!;
    const slope = slopeFrom(form, a[row]!, b[row]!, c[row]!, d[row]!, values[row]!, steps[row]!, least);
    out[row] =
      Number.isNaN(slope) && !scale
        ? refinedSlope(compute, quantity, index, columns, values[row]!, row, steps[row]!)
        : slope;
  }
}

/** NaN where the differences are too small to mean anything, or leave the range. */
function slopeFrom(
  form: number,
  a: number,
  b: number,
  c: number,
  d: number,
  value: number,
  h: number,
  least = leastChange,
): number {
  const size = Math.abs(value);
  const change = Math.max(Math.abs(a - value), Math.abs(b - value), Math.abs(c - value), Math.abs(d - value));
  if (!(change >= least * size)) return Number.NaN;
  const { weights, centre } = stencils[form]!;
  const sum = weights[0] * a + weights[1] * b + weights[2] * c + weights[3] * d + centre * value;
  if (Math.abs(sum) <= roundings * size) return 0;
  return Number.isFinite(sum) ? sum / (12 * h) : Number.NaN;
}

/** One row again with larger steps, then smaller ones; 0 where no step moves the result. */
function refinedSlope(
  compute: Compute,
  quantity: Quantity,
  index: number,
  columns: readonly Float64Array[],
  value: number,
  row: number,
  start: number,
): number {
  if (Number.isNaN(value)) return Number.NaN;
  const one = columns.map((column) => Float64Array.of(column[row]!));
  const x = columns[index]![row]!;
  const out = new Float64Array(1);
  const at = (offset: number) => {
    one[index]![0] = x + offset;
    compute(1, out, ...one);
    return out[0]!;
  };
  for (const factor of [10, 100, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 0.1, 0.01, 1e-3]) {
    const h = start * factor;
    const form = stencilAt(quantity, x, h);
    const [a, b, c, d] = stencils[form]!.offsets;
    const slope = slopeFrom(form, at(a * h), at(b * h), at(c * h), at(d * h), value, h);
    if (!Number.isNaN(slope)) return slope;
  }
  return 0;
}

/** The way to the nearest bound outside the range; without one, the size of the value itself. */
function scaleOf(quantity: Quantity, x: number): number {
  const { lower, upper } = quantity;
  const below = lower?.open ? x - lower.at : Number.POSITIVE_INFINITY;
  const above = upper?.open ? upper.at - x : Number.POSITIVE_INFINITY;
  const way = Math.min(below, above);
  return Number.isFinite(way) ? way : Math.abs(x) || quantity.step;
}

function stencilAt(quantity: Quantity, x: number, h: number): number {
  const { lower, upper } = quantity;
  if (lower && x - 2 * h < lower.at) return forward;
  if (upper && x + 2 * h > upper.at) return backward;
  return central;
}
