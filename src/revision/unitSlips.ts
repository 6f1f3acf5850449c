import type { Column } from "../call/column.js";
import { usualUnits } from "../catalog/usualUnits.js";
import { isProblem } from "../units/problem.js";
import { readUnit } from "../units/readUnit.js";
import type { Unit } from "../units/unit.js";

/** Cells that moved by the ratio of two units, as they do where a value stands in a column of another unit. */
export interface UnitSlip {
  readonly other: Unit;
  /** How much larger the values became: the ratio of the two units. */
  readonly factor: number;
  /** As if a value in the column's unit had been converted from the other once too often; else it is in the other. */
  readonly isReversed: boolean;
  /** Nearly all cells that changed did so. */
  readonly isWhole: boolean;
  readonly rows: readonly number[];
}

interface Candidate {
  readonly other: Unit;
  readonly isReversed: boolean;
  readonly logarithm: number;
}

/** Ratios below this are changes that catalogues do make. */
const leastFactor = Math.log(2.5);
/** Within this of a ratio in any case, and never farther than that: revisions themselves scatter [natural logarithm]. */
const nearest = 0.05;
const farthest = 0.5;
/** So many changed cells tell how much a revision scatters. */
const fewestForScatter = 8;

/** Units in which columns of these kinds come besides the usual ones: a proper motion times a distance is in AU/yr. */
const besides: Readonly<Record<string, readonly string[]>> = { speed: ["km/s", "AU/yr"], angle: ["mas"] };

/**
 * Finds changes by about the ratio of two units of the column's kind, up or down. A cell counts where its ratio lies
 * near one of them and far outside the scatter of all other changes, so that a large honest revision does not.
 */
export function unitSlips(unit: Unit, before: Column, after: Column): readonly UnitSlip[] {
  const candidates = candidatesFor(unit);
  const logarithms = new Float64Array(before.length);
  const rows: number[] = [];
  for (let row = 0; row < before.length; row++) {
    const ratio = after.numbers[row]! / before.numbers[row]!;
    if (!(ratio > 0) || ratio === 1 || ratio === Number.POSITIVE_INFINITY) continue;
    logarithms[row] = Math.log(ratio);
    rows.push(row);
  }
  if (rows.length === 0 || candidates.length === 0) return [];
  const changes = Float64Array.from(rows, (row) => logarithms[row]!);
  const centre = medianOf(changes);
  const scatter = 1.4826 * medianOf(changes.map((change) => Math.abs(change - centre)));
  const reach = rows.length < fewestForScatter ? 0.2 : Math.min(farthest, Math.max(nearest, 5 * scatter));
  const whole = Math.abs(centre) > leastFactor ? nearestOf(candidates, centre, reach) : undefined;
  // Where the column as a whole is right, what lies within its scatter is no slip.
  const least = Math.max(leastFactor, whole || rows.length < fewestForScatter ? 0 : Math.abs(centre) + 5 * scatter);
  const found = new Map<Candidate, number[]>();
  for (const row of rows) {
    const logarithm = logarithms[row]!;
    // The ratio of the column as a whole explains its cells, even where another lies nearer to one of them.
    const isOfWhole = whole && Math.abs(whole.logarithm - logarithm) <= reach;
    const single = Math.abs(logarithm) < least ? undefined : nearestOf(candidates, logarithm, reach);
    const candidate = isOfWhole ? whole : single;
    if (!candidate) continue;
    const known = found.get(candidate);
    if (known) known.push(row);
    else found.set(candidate, [row]);
  }
  return [...found].map(([candidate, all]) => ({
    other: candidate.other,
    factor: Math.exp(candidate.logarithm),
    isReversed: candidate.isReversed,
    isWhole: candidate === whole,
    rows: all,
  }));
}

const candidatesByUnit = new Map<string, readonly Candidate[]>();

/** A value in the other unit is larger by unit / other; one that was converted once too often by other / unit. */
function candidatesFor(unit: Unit): readonly Candidate[] {
  const known = candidatesByUnit.get(unit.text);
  if (known) return known;
  const texts = [...usualUnits(unit.kind).map(({ text }) => text), ...(besides[unit.kind] ?? [])];
  const units = texts.map(readUnit).filter((other): other is Unit => !isProblem(other) && other.kind === unit.kind);
  const linear = unit.logarithm || unit.plus !== 0 ? [] : units.filter((other) => !other.logarithm && other.plus === 0);
  const found = linear.flatMap((other): Candidate[] => {
    const logarithm = Math.log(((unit.times / unit.over) * other.over) / other.times);
    if (Math.abs(logarithm) < leastFactor) return [];
    return [
      { other, isReversed: false, logarithm },
      { other, isReversed: true, logarithm: -logarithm },
    ];
  });
  candidatesByUnit.set(unit.text, found);
  return found;
}

/** Of equals the first: that a value is in another unit is likelier than that it was converted twice. */
function nearestOf(candidates: readonly Candidate[], logarithm: number, reach: number): Candidate | undefined {
  let best: Candidate | undefined;
  let distance = reach;
  for (const candidate of candidates) {
    const own = Math.abs(candidate.logarithm - logarithm);
    const isPreferred = own < distance - 1e-9 || (best?.isReversed && !candidate.isReversed && own <= distance + 1e-9);
    if (!isPreferred) continue;
    best = candidate;
    distance = own;
  }
  return best;
}

function medianOf(values: Float64Array): number {
  return values.slice().sort()[values.length >> 1]!;
}
