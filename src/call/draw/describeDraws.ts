export interface DrawSummary {
  readonly mean: number;
  readonly deviation: number;
  /** 2.3, 15.9, 50, 84.1 and 97.7 per cent: where a normal distribution has -2, -1, 0, 1 and 2 deviations. */
  readonly percentiles: readonly [number, number, number, number, number];
  readonly histogram: { readonly from: number; readonly to: number; readonly counts: readonly number[] };
}

/** The normal distribution function at -2, -1, 0, 1, 2 (from memory; tested against mpmath). */
const levels = [0.022750131948179209, 0.15865525393145705, 0.5, 0.8413447460685429, 0.97724986805182079] as const;

const bins = 48;
/** The histogram shows this part of the draws; the few beyond would make all others narrow. */
const shownTail = 0.002;

/** Moments and quantiles of drawn values. The values are sorted in place. */
export function describeDraws(values: Float64Array): DrawSummary {
  const count = values.length;
  const mean = values.reduce((sum, value) => sum + value, 0) / count;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  values.sort();
  const [from, to] = [quantile(values, shownTail), quantile(values, 1 - shownTail)];
  const counts = new Array<number>(bins).fill(0);
  for (const value of values) {
    if (value >= from && value <= to) {
      const bin = to > from ? Math.min(bins - 1, Math.floor(((value - from) / (to - from)) * bins)) : 0;
      counts[bin]!++;
    }
  }
  return {
    mean,
    deviation: Math.sqrt(squares / Math.max(1, count - 1)),
    percentiles: levels.map((level) => quantile(values, level)) as unknown as DrawSummary["percentiles"],
    histogram: { from, to, counts },
  };
}

/** Between the two values nearest to a level (Hyndman & Fan 1996, The American Statistician 50, 361: definition 7). */
function quantile(sorted: Float64Array, level: number): number {
  const at = level * (sorted.length - 1);
  const low = sorted[Math.floor(at)]!;
  return low + (at - Math.floor(at)) * (sorted[Math.ceil(at)]! - low);
}
