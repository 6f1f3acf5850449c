import { HyperFormula } from "hyperformula";
import { cellAt } from "../../src/call/column.js";
import { derived, drawTable, firstDerived } from "./sheetTable.js";

/** Times in milliseconds, memory in bytes, as far as they came to be measured. */
export type Measured = Partial<Record<"fill" | "edit" | "revise" | "sort" | "delete" | "undo" | "memory", number>>;

/**
 * The same table and formulas in a general recalculation engine with a node a cell: a process of its own, told the
 * rows, the derived columns and the operation, that sends what it measures as soon as it has it.
 */
function main([rowText, columnText, operation]: string[]): void {
  const rows = Number(rowText);
  const columns = Number(columnText);
  const send = (measured: Measured): void => {
    process.send?.(measured);
  };
  const table = drawTable(rows);
  const cells = Array.from({ length: rows + 1 }, (_, row) => [
    ...table.map((column) => cellAt(column, row) as number | string),
    ...derived
      .slice(0, columns)
      .map((text) => (row === 0 ? "derived" : text.replaceAll(/([A-Z])2(?![\d.])/g, `$1${row + 1}`))),
  ]);
  globalThis.gc?.();
  const before = process.memoryUsage().heapUsed;
  const fill = performance.now();
  const engine = HyperFormula.buildFromArray(cells, {
    licenseKey: "gpl-v3",
    maxRows: 2_000_000,
    useArrayArithmetic: false,
  });
  const filled = performance.now() - fill;
  globalThis.gc?.();
  const memory = process.memoryUsage().heapUsed - before;

  const clock = (work: () => void): number => {
    const from = performance.now();
    work();
    return performance.now() - from;
  };
  if (operation === "fill") {
    send({ fill: filled, memory });
    const edits = Array.from({ length: 21 }, (_, turn) =>
      clock(() => void engine.setCellContents({ sheet: 0, row: 1 + turn * 97, col: 1 }, [[0.5 + turn / 40]])),
    );
    send({ edit: edits.toSorted((a, b) => a - b)[10] as number });
    const revised = Array.from({ length: rows }, (_, row) => [1 + (row % 97) / 97]);
    send({ revise: clock(() => void engine.setCellContents({ sheet: 0, row: 1, col: 1 }, revised)) });
  }
  if (operation === "sort") {
    const keys = Array.from(
      { length: rows },
      (_, row) => engine.getCellValue({ sheet: 0, row: row + 1, col: firstDerived + 1 }) as number,
    );
    const order = keys.map((_, row) => row).sort((a, b) => (keys[a] as number) - (keys[b] as number));
    const target = new Array<number>(rows + 1).fill(0);
    for (const [to, from] of order.entries()) {
      target[from + 1] = to + 1;
    }
    send({ sort: clock(() => void engine.setRowOrder(0, target)) });
  }
  if (operation === "delete") {
    send({ delete: clock(() => void engine.removeRows(0, [rows >> 1, 1])) });
    send({ undo: clock(() => void engine.undo()) });
  }
}

main(process.argv.slice(2));
process.disconnect?.();
