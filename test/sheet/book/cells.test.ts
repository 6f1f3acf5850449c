import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { cellAt, columnOf } from "../../../src/call/column.js";
import type { Cells } from "../../../src/sheet/book/cells.js";
import { cellsOfChunks, chunksOf, readCell, sliceCells, spliceCells } from "../../../src/sheet/book/cells.js";
import { workOn } from "../../../src/sheet/book/workingCells.js";

const cell = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.constantFrom(null, "x", true));
const pieces = fc.array(fc.array(cell, { minLength: 1, maxLength: 7 }), { maxLength: 5 });

function ropeOf(parts: readonly (readonly Cell[])[]): Cells {
  return cellsOfChunks(parts.map(columnOf));
}

function all(cells: Cells): Cell[] {
  return Array.from({ length: cells.length }, (_, row) => readCell(cells, row));
}

describe("cells in chunks against an array", () => {
  test("slices, and splices that leave the original alone", () => {
    fc.assert(
      fc.property(pieces, pieces, fc.nat(30), fc.nat(30), (parts, others, a, b) => {
        const cells = ropeOf(parts);
        const flat = parts.flat();
        const [from, to] = [Math.min(a, b), Math.max(a, b)];
        const slice = sliceCells(cells, from, to);
        expect(Array.from({ length: slice.length }, (_, row) => cellAt(slice, row))).toEqual(
          Array.from({ length: to - from }, (_, row) => flat[from + row] ?? null),
        );
        const start = Math.min(from, flat.length);
        const end = Math.min(to, flat.length);
        const spliced = spliceCells(cells, start, end, others.map(columnOf));
        expect(all(spliced)).toEqual([...flat.slice(0, start), ...others.flat(), ...flat.slice(end)]);
        expect(all(cells)).toEqual(flat);
      }),
    );
  });

  test("written cells are seen by whoever reads later and by nobody before", () => {
    const write = fc.tuple(fc.nat(40), fc.array(cell, { minLength: 1, maxLength: 80 }), fc.boolean());
    fc.assert(
      fc.property(pieces, fc.array(write, { maxLength: 12 }), (parts, writes) => {
        const original = ropeOf(parts);
        const before = all(original);
        const working = workOn(original);
        const model: Cell[] = parts.flat();
        for (const [at, values, single] of writes) {
          const seen = working.slice(0, 70);
          const shown = Array.from({ length: 70 }, (_, row) => cellAt(seen, row));
          const written = single ? values.slice(0, 1) : values;
          if (single) {
            working.write(at, written[0] as Cell);
          } else {
            working.writeColumn(at, columnOf(written));
          }
          for (const [index, value] of written.entries()) {
            while (model.length < at + index) {
              model.push(null);
            }
            model[at + index] = value;
          }
          expect(Array.from({ length: 70 }, (_, row) => cellAt(seen, row))).toEqual(shown);
        }
        expect(all(working.finish()).slice(0, model.length)).toEqual(model);
        expect(all(original)).toEqual(before);
      }),
    );
  });

  test("a long column is cut into chunks and reads the same", () => {
    const long = columnOf(Array.from({ length: 20_000 }, (_, row) => (row === 0 ? "header" : row)));
    const cells = cellsOfChunks(chunksOf(long));
    expect(cells.chunks.length).toBe(3);
    expect(cells.chunks.slice(1).every(({ others }) => others === undefined)).toBe(true);
    expect([0, 8191, 8192, 19_999, 20_000].map((row) => readCell(cells, row))).toEqual([
      "header",
      8191,
      8192,
      19_999,
      null,
    ]);
  });
});
