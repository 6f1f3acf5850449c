import type { Candidate } from "./choose.js";

/** One step of the curve of hours against targets. */
export interface HoursStep {
  /** Place among the candidates. */
  readonly index: number;
  readonly name: string;
  readonly value: number;
  readonly hours: number;
  /** Of this target and all before it. */
  readonly total: number;
}

/** Hours that the most valuable target, the two most valuable and so on need together; equal ones in the table's order. */
export function cumulativeHours(candidates: readonly Candidate[]): HoursStep[] {
  let total = 0;
  return candidates
    .map((candidate, index) => ({ ...candidate, index }))
    .sort((a, b) => b.value - a.value || a.index - b.index)
    .map(({ index, name, value, hours }) => {
      total += hours;
      return { index, name, value, hours, total };
    });
}
