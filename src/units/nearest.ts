/**
 * The candidate that takes the fewest slips of the keyboard (insert, leave out, replace, swap neighbours) to become
 * `word`, if that is near enough to be meant; a difference in capitals counts half a slip.
 */
export function nearest(word: string, candidates: Iterable<string>): string | undefined {
  const allowed = word.length <= 4 ? 1 : word.length <= 7 ? 2 : 3;
  let best: string | undefined;
  let fewest = allowed + 0.25;
  for (const candidate of candidates) {
    if (Math.abs(candidate.length - word.length) > allowed) continue;
    const slips = distance(word, candidate);
    if (slips < fewest && slips < word.length) {
      fewest = slips;
      best = candidate;
    }
  }
  return best;
}

function distance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1] ? 0 : a[i - 1]?.toLowerCase() === b[j - 1]?.toLowerCase() ? 0.5 : 1;
      let slips = Math.min(last[j]! + 1, row[j - 1]! + 1, last[j - 1]! + same);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1] && same) {
        slips = Math.min(slips, beforeLast[j - 2]! + 1);
      }
      row.push(slips);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length]!;
}
