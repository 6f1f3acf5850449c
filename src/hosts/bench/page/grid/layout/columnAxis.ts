/** Where columns stand, in pixels from the start of the first; frozen ones come first and do not scroll. */
export interface ColumnAxis {
  readonly count: number;
  readonly frozen: number;
  readonly frozenWidth: number;
  readonly width: number;
  startOf(column: number): number;
  /** 0 where it is hidden. */
  widthOf(column: number): number;
  /** The column at a distance from the start; the first or last seen one beyond the ends. */
  at(distance: number): number;
  /** The seen column so many steps on; the last one that there is. */
  step(column: number, steps: number): number;
}

export function columnAxis(widths: ArrayLike<number>, frozen: number): ColumnAxis {
  const count = widths.length;
  const starts = new Float64Array(count + 1);
  for (let column = 0; column < count; column++) {
    starts[column + 1] = (starts[column] as number) + (widths[column] as number);
  }
  const startOf = (column: number) => starts[Math.min(Math.max(column, 0), count)] as number;
  const widthOf = (column: number) => startOf(column + 1) - startOf(column);

  function at(distance: number): number {
    let [from, to] = [0, count - 1];
    while (from < to) {
      const middle = (from + to) >> 1;
      if ((starts[middle + 1] as number) > distance) to = middle;
      else from = middle + 1;
    }
    return widthOf(from) > 0 ? from : step(from, -1);
  }

  function step(column: number, steps: number): number {
    const direction = Math.sign(steps);
    let seen = column;
    for (
      let left = Math.abs(steps), next = column + direction;
      left > 0 && next >= 0 && next < count;
      next += direction
    ) {
      if (widthOf(next) === 0) continue;
      seen = next;
      left -= 1;
    }
    return seen;
  }

  return { count, frozen, frozenWidth: startOf(frozen), width: startOf(count), startOf, widthOf, at, step };
}
