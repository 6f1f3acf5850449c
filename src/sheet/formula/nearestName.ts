/** The name with the fewest letters to change, where that is few enough to be a slip. */
export function nearestName(name: string, names: Iterable<string>): string | undefined {
  let best: string | undefined;
  let least = Math.max(1, Math.floor(name.length / 3)) + 1;
  for (const each of names) {
    if (Math.abs(each.length - name.length) < least) {
      const distance = editDistance(name, each);
      if (distance < least) {
        least = distance;
        best = each;
      }
    }
  }
  return best;
}

function editDistance(a: string, b: string): number {
  let previous = Array.from({ length: b.length + 1 }, (_, index) => index);
  for (let i = 1; i <= a.length; i++) {
    const current = [i];
    for (let j = 1; j <= b.length; j++) {
      const change = (previous[j - 1] as number) + (a[i - 1] === b[j - 1] ? 0 : 1);
      current.push(Math.min(change, (previous[j] as number) + 1, (current[j - 1] as number) + 1));
    }
    previous = current;
  }
  return previous[b.length] as number;
}
