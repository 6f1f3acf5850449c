import type { Steps } from "./watch.js";
import { wholeValues } from "./wholeValues.js";

interface Item {
  /** Whole, at least 1. */
  readonly minutes: number;
  /** At least 0. */
  readonly value: number;
}

/**
 * Places of the items that are worth most within so many minutes, by dynamic programming over every number of minutes:
 * exact. Ties go to fewer minutes, then to items that come earlier.
 */
export function* fillBudget(items: readonly Item[], room: number): Steps<number[]> {
  const fitting = items.flatMap(({ minutes }, index) => (minutes <= room ? [index] : []));
  if (fitting.length === 0) return [];
  const step = fitting.reduce((divisor, index) => greatestCommonDivisor(divisor, items[index]!.minutes), 0);
  const sizes = fitting.map((index) => items[index]!.minutes / step);
  const values = wholeValues(fitting.map((index) => items[index]!.value));
  // More room than all of them need is never looked at.
  const capacity = Math.min(
    Math.floor(room / step),
    sizes.reduce((sum, size) => sum + size, 0),
  );
  const best = new Float64Array(capacity + 1);
  const taken = fitting.map(() => new Uint8Array((capacity >> 3) + 1));
  for (let place = fitting.length - 1; place >= 0; place--) {
    addItem(best, taken[place]!, sizes[place]!, values[place]!, capacity);
    yield { done: fitting.length - place, total: fitting.length };
  }
  let left = best.indexOf(best[capacity]!);
  return fitting.filter((_, place) => {
    const isTaken = ((taken[place]![left >> 3]! >> (left & 7)) & 1) === 1;
    if (isTaken) left -= sizes[place]!;
    return isTaken;
  });
}

/** `best` holds, for each room, the most that the items looked at so far are worth in it. */
function addItem(best: Float64Array, taken: Uint8Array, size: number, value: number, capacity: number): void {
  for (let room = capacity; room >= size; room--) {
    const withIt = best[room - size]! + value;
    if (withIt < best[room]!) continue;
    best[room] = withIt;
    taken[room >> 3]! |= 1 << (room & 7);
  }
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
