/** The shortest of several runs [ms]; the first runs warm the engine up and do not count. */
export function shortest(run: () => unknown, runs = 9, warming = 3): number {
  let best = Number.POSITIVE_INFINITY;
  for (let count = 0; count < runs + warming; count++) {
    const start = performance.now();
    consume(run());
    const time = performance.now() - start;
    if (count >= warming) best = Math.min(best, time);
  }
  return best;
}

let kept: unknown;

/** Keeps a result, so that making it cannot be left out as useless. */
export function consume(result: unknown): void {
  kept = result;
}

export function lastResult(): unknown {
  return kept;
}

export function report(what: string, ours: string, against: string, ratio: number, aim: string): void {
  const line = [what.padEnd(46), ours.padStart(12), against.padStart(22), `x ${ratio.toFixed(3)}`.padStart(12), aim];
  process.stdout.write(`${line.join("  ")}\n`);
}

/** The same random numbers in every run: a linear congruence (Numerical Recipes, 3rd ed., ranqd1). */
export function randomNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state + 0.5) / 4294967296;
  };
}
