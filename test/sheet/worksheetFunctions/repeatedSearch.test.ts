import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
import type { Matrix } from "../../../src/sheet/values/operand.js";
import { matrixOfBlock } from "../../../src/sheet/values/operand.js";
import { findWorksheetFunction } from "../../../src/sheet/worksheetFunctions/findWorksheetFunction.js";
import type { WorksheetFunction } from "../../../src/sheet/worksheetFunctions/worksheetFunction.js";

const value = fc.constantFrom<Cell>(0, -0, 1, 2.5, "a", "A", "b*", "1", "", true, false, null);
const cells = fc.array(value, { minLength: 64, maxLength: 90 });

function columnMatrix(given: readonly Cell[]): Matrix {
  return matrixOfBlock({ rows: given.length, columns: [columnOf(given)] }, true);
}

/** ISO/IEC 26300-3, 4.11.8: numbers and logicals equal themselves, texts without regard to case, * stands for characters. */
function equals(cell: Cell, criterion: Cell): boolean {
  if (typeof criterion !== "string") return cell === criterion;
  if (criterion === "1") return cell === 1;
  if (criterion === "b*") return typeof cell === "string" && cell.toLowerCase().startsWith("b");
  return typeof cell === "string" && cell.toLowerCase() === criterion.toLowerCase();
}

const called = (name: string) => findWorksheetFunction(name) as WorksheetFunction;

describe("a column that is searched again and again answers as at the first time", () => {
  test.each<Cell>([0, 1, 2.5, 7, "a", "A", "b*", "1", "z", true, false])("COUNTIF and SUMIF of %j", (criterion) => {
    fc.assert(
      fc.property(cells, (given) => {
        const range = columnMatrix(given);
        const rows = [...given.keys()].filter((row) => equals(given[row] as Cell, criterion));
        const values = columnMatrix(given.map((_, row) => row));
        for (let time = 0; time < 3; time++) {
          expect(called("COUNTIF").call([range, criterion])).toBe(rows.length);
          expect(called("SUMIF").call([range, criterion, values])).toBe(rows.reduce((sum, row) => sum + row, 0));
        }
      }),
      { numRuns: 40 },
    );
  });

  test("further conditions narrow what the first found", () => {
    fc.assert(
      fc.property(cells, cells, (given, others) => {
        const count = Math.min(given.length, others.length);
        const [first, second] = [given.slice(0, count), others.slice(0, count)];
        const wanted = first.filter((cell, row) => cell === 1 && second[row] === true).length;
        const ranges = [columnMatrix(first), columnMatrix(second)] as const;
        for (let time = 0; time < 3; time++) {
          expect(called("COUNTIFS").call([ranges[0], 1, ranges[1], true])).toBe(wanted);
        }
      }),
      { numRuns: 40 },
    );
  });
});
