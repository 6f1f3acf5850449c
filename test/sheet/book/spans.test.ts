import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Span } from "../../../src/sheet/book/spans.js";
import { addRows, cutSpans, putSpan, replaceSpans, rowsOutside, spanAt } from "../../../src/sheet/book/spans.js";

interface Marked extends Span {
  readonly mark: number;
}

const size = 24;
const same = (a: Marked, b: Marked): boolean => a.mark === b.mark;
const span = fc
  .tuple(fc.nat(size - 1), fc.integer({ min: 1, max: 8 }), fc.nat(2))
  .map(([from, length, mark]): Marked => ({ from, to: Math.min(size, from + length), mark }));

/** The mark of every row; undefined for none. */
function marks(spans: readonly Marked[]): (number | undefined)[] {
  return Array.from({ length: size }, (_, row) => spanAt(spans, row)?.mark);
}

function expectTidy(spans: readonly Marked[]): void {
  for (let index = 1; index < spans.length; index++) {
    const [before, after] = [spans[index - 1], spans[index]] as [Marked, Marked];
    expect(before.to).toBeLessThanOrEqual(after.from);
    expect(before.to === after.from && same(before, after)).toBe(false);
  }
}

const list = fc
  .array(span, { maxLength: 8 })
  .map((spans) => spans.reduce<readonly Marked[]>((all, each) => putSpan(all, each, same), []));

describe("lists of spans against an array of rows", () => {
  test("putting, cutting and replacing", () => {
    fc.assert(
      fc.property(list, span, span, (spans, put, other) => {
        const before = marks(spans);
        const inside = (row: number, { from, to }: Span): boolean => row >= from && row < to;
        const after = putSpan(spans, put, same);
        expect(marks(after)).toEqual(before.map((mark, row) => (inside(row, put) ? put.mark : mark)));
        expectTidy(after);
        expect(marks(cutSpans(spans, put.from, put.to))).toEqual(
          before.map((mark, row) => (inside(row, put) ? undefined : mark)),
        );
        const inner = cutSpans([other], 0, put.from).flatMap((each) => cutSpans([each], put.to, size));
        const replaced = replaceSpans(spans, put.from, put.to, inner, same);
        expect(marks(replaced)).toEqual(
          before.map((mark, row) => (inside(row, put) ? (inside(row, other) ? other.mark : undefined) : mark)),
        );
        expectTidy(replaced);
        expect(marks(spans)).toEqual(before);
      }),
    );
  });

  test("sets of rows", () => {
    fc.assert(
      fc.property(fc.array(span, { maxLength: 10 }), span, (spans, asked) => {
        const rows = spans.reduce<readonly Span[]>((all, { from, to }) => addRows(all, from, to), []);
        const inSet = (row: number): boolean => spans.some(({ from, to }) => row >= from && row < to);
        expect(Array.from({ length: size }, (_, row) => spanAt(rows, row) !== undefined)).toEqual(
          Array.from({ length: size }, (_, row) => inSet(row)),
        );
        const outside = rowsOutside(rows, asked.from, asked.to);
        for (let row = asked.from; row < asked.to; row++) {
          expect(spanAt(outside, row) === undefined).toBe(inSet(row));
        }
      }),
    );
  });
});
