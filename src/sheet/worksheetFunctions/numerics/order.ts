import type { Numbers } from "./sum.js";

/** The numbers in ascending order, copied. */
export function sorted(values: Numbers): Float64Array {
  return Float64Array.from(values).sort();
}

/** The value at a place between the first (0) and the last (1) of sorted numbers, linear between neighbours. */
export function interpolated(ascending: Numbers, place: number): number {
  const position = place * (ascending.length - 1);
  return atPosition(ascending, position);
}

/** The value at a position counted from 0, linear between neighbours. */
export function atPosition(ascending: Numbers, position: number): number {
  const below = Math.min(Math.max(Math.floor(position), 0), ascending.length - 1);
  const fraction = position - below;
  const lower = ascending[below] as number;
  const upper = ascending[Math.min(below + 1, ascending.length - 1)] as number;
  return fraction === 0 ? lower : lower + (upper - lower) * fraction;
}

export function median(values: Numbers): number {
  const ascending = sorted(values);
  const middle = ascending.length >> 1;
  const upper = ascending[middle] as number;
  return ascending.length % 2 === 1 ? upper : halfway(ascending[middle - 1] as number, upper);
}

function halfway(lower: number, upper: number): number {
  const total = lower + upper;
  return Number.isFinite(total) ? total / 2 : lower / 2 + upper / 2;
}
