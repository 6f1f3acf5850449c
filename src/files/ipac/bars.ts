/** Where the bars of a line stand. */
export function barsOf(line: string): readonly number[] {
  const bars: number[] = [];
  for (let at = line.indexOf("|"); at >= 0; at = line.indexOf("|", at + 1)) bars.push(at);
  return bars;
}

/** What stands between each bar and the next, without blanks around it. */
export function betweenBars(line: string, bars: readonly number[]): string[] {
  return bars.slice(0, -1).map((bar, index) => line.slice(bar + 1, bars[index + 1]).trim());
}
