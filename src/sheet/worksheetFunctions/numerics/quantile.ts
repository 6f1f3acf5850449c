/** Chances below and above a value: the smaller is accurate. */
export interface Tails {
  readonly below: number;
  readonly above: number;
}

/**
 * The value below which a continuous distribution has chance `below`, found by halving an interval of doubles and
 * interpolating in it; the tail that is smaller decides, so neither end loses digits.
 */
export function quantile(tails: (x: number) => Tails, wanted: Tails, least: number, most: number): number {
  // Negative left of the quantile, positive right of it.
  const miss = (x: number): number => {
    const at = tails(x);
    return wanted.below <= wanted.above ? at.below - wanted.below : wanted.above - at.above;
  };
  let [low, high] = bracket(miss, least, most);
  let lowMiss = miss(low);
  let highMiss = miss(high);
  for (let step = 0; step < 400; step++) {
    const middle = step % 3 === 2 ? between(low, high) : secant(low, high, lowMiss, highMiss);
    if (middle <= low || middle >= high) {
      break;
    }
    const at = miss(middle);
    if (at === 0 || Number.isNaN(at)) {
      return at === 0 ? middle : Number.NaN;
    }
    if (at < 0) {
      low = middle;
      lowMiss = at;
    } else {
      high = middle;
      highMiss = at;
    }
  }
  return Math.abs(lowMiss) < Math.abs(highMiss) ? low : high;
}

function bracket(miss: (x: number) => number, least: number, most: number): [number, number] {
  if (Number.isFinite(most)) {
    return [least, most];
  }
  let high = 1;
  while (miss(high) < 0 && high < 1e300) {
    high *= 4;
  }
  return [least, high];
}

/** The middle in the order of doubles where the ends are far apart, else the arithmetic middle. */
function between(low: number, high: number): number {
  if (low <= 0) {
    return high > 1e-300 ? (low === 0 ? high * 1e-3 : (low + high) / 2) : high / 2;
  }
  return high / low > 4 ? Math.sqrt(low) * Math.sqrt(high) : low + (high - low) / 2;
}

function secant(low: number, high: number, lowMiss: number, highMiss: number): number {
  const at = low - (lowMiss * (high - low)) / (highMiss - lowMiss);
  return at > low && at < high ? at : low + (high - low) / 2;
}
