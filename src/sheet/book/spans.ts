/** Rows `from` up to but not including `to`. Lists of spans are sorted and do not overlap. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** The index of the first span that ends after `row`. */
export function firstSpanAfter(spans: readonly Span[], row: number): number {
  let low = 0;
  let high = spans.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((spans[middle] as Span).to > row) {
      high = middle;
    } else {
      low = middle + 1;
    }
  }
  return low;
}

export function spanAt<S extends Span>(spans: readonly S[], row: number): S | undefined {
  const span = spans[firstSpanAfter(spans, row)];
  return span !== undefined && span.from <= row ? span : undefined;
}

/** The spans that reach into rows `from` up to `to`, whole. */
export function spansIn<S extends Span>(spans: readonly S[], from: number, to: number): S[] {
  const found: S[] = [];
  for (let index = firstSpanAfter(spans, from); index < spans.length; index++) {
    const span = spans[index] as S;
    if (span.from >= to) {
      break;
    }
    found.push(span);
  }
  return found;
}

/** The same list without rows `from` up to `to`. */
export function cutSpans<S extends Span>(spans: readonly S[], from: number, to: number): readonly S[] {
  const first = firstSpanAfter(spans, from);
  let end = first;
  const kept: S[] = [];
  for (; end < spans.length && (spans[end] as S).from < to; end++) {
    const span = spans[end] as S;
    if (span.from < from) {
      kept.push({ ...span, to: from });
    }
    if (span.to > to) {
      kept.push({ ...span, from: to });
    }
  }
  return end === first ? spans : [...spans.slice(0, first), ...kept, ...spans.slice(end)];
}

/** The same list with `span` in place of whatever was there; neighbours that are the same become one. */
export function putSpan<S extends Span>(spans: readonly S[], span: S, same: (a: S, b: S) => boolean): readonly S[] {
  if (span.from >= span.to) {
    return spans;
  }
  const last = spans.at(-1);
  if (last === undefined || last.to < span.from || (last.to === span.from && !same(last, span))) {
    return [...spans, span];
  }
  const free = cutSpans(spans, span.from, span.to);
  const index = firstSpanAfter(free, span.from);
  let { from, to } = span;
  let start = index;
  let end = index;
  const before = free[index - 1];
  const after = free[index];
  if (before !== undefined && before.to === from && same(before, span)) {
    from = before.from;
    start--;
  }
  if (after !== undefined && after.from === to && same(after, span)) {
    to = after.to;
    end++;
  }
  return [...free.slice(0, start), { ...span, from, to }, ...free.slice(end)];
}

/** Neighbours that are the same made one, in a list that is sorted already. */
export function mergeSpans<S extends Span>(spans: readonly S[], same: (a: S, b: S) => boolean): readonly S[] {
  const merged: S[] = [];
  for (const span of spans) {
    const last = merged.at(-1);
    if (last !== undefined && last.to === span.from && same(last, span)) {
      merged[merged.length - 1] = { ...last, to: span.to };
    } else if (span.from < span.to) {
      merged.push(span);
    }
  }
  return merged;
}

const always = (): boolean => true;

export function addRows(spans: readonly Span[], from: number, to: number): readonly Span[] {
  if (from >= to) {
    return spans;
  }
  const touching = spans.slice(firstSpanAfter(spans, from - 1)).filter((span) => span.from <= to);
  const low = Math.min(from, touching[0]?.from ?? from);
  const high = Math.max(to, touching.at(-1)?.to ?? to);
  return putSpan(spans, { from: low, to: high }, always);
}

/** The rows of `from` up to `to` that are in none of the spans. */
export function rowsOutside(spans: readonly Span[], from: number, to: number): Span[] {
  const outside: Span[] = [];
  let row = from;
  for (const span of spansIn(spans, from, to)) {
    if (span.from > row) {
      outside.push({ from: row, to: span.from });
    }
    row = Math.max(row, span.to);
  }
  if (row < to) {
    outside.push({ from: row, to });
  }
  return outside;
}

/** The parts of spans that lie in rows `from` up to `to`. */
export function clipSpans<S extends Span>(spans: readonly S[], from: number, to: number): S[] {
  return spansIn(spans, from, to).map((span) => ({
    ...span,
    from: Math.max(from, span.from),
    to: Math.min(to, span.to),
  }));
}

/** The same list with `inner` as all that is in rows `from` up to `to`. */
export function replaceSpans<S extends Span>(
  spans: readonly S[],
  from: number,
  to: number,
  inner: readonly S[],
  same: (a: S, b: S) => boolean,
): readonly S[] {
  if (inner.length === 0 && spansIn(spans, from, to).length === 0) {
    return spans;
  }
  const copy = spans.slice();
  replaceInPlace(copy, from, to, inner, same);
  return copy;
}

/** The same in the list itself. */
export function replaceInPlace<S extends Span>(
  spans: S[],
  from: number,
  to: number,
  inner: readonly S[],
  same: (a: S, b: S) => boolean,
): void {
  // The spans that reach in, and one neighbour on each side, which may be the same as what comes beside it.
  const first = Math.max(0, firstSpanAfter(spans, from) - 1);
  let end = first;
  const before: S[] = [];
  const after: S[] = [];
  for (; end < spans.length; end++) {
    const span = spans[end] as S;
    if (span.from < from) {
      before.push({ ...span, to: Math.min(span.to, from) });
    }
    if (span.to > to) {
      after.push({ ...span, from: Math.max(span.from, to) });
      end++;
      break;
    }
  }
  const middle = mergeSpans([...before, ...inner, ...after], same);
  spans.splice(first, end - first, ...middle);
}
