import { fork } from "node:child_process";
import { fileURLToPath } from "node:url";
import type { Book } from "../../src/sheet/book/book.js";
import { bookOf } from "../../src/sheet/book/bookOf.js";
import { change } from "../../src/sheet/change.js";
import { deleteRows } from "../../src/sheet/edit/deleteRows.js";
import { fillFormula } from "../../src/sheet/edit/fillFormula.js";
import { insertRows } from "../../src/sheet/edit/insertRows.js";
import { setCells } from "../../src/sheet/edit/setCells.js";
import { setColumn } from "../../src/sheet/edit/setColumn.js";
import { sortRows } from "../../src/sheet/edit/sortRows.js";
import { noFunctions } from "../../src/sheet/formula/functions.js";
import { presentBook, record, startHistory, undo } from "../../src/sheet/history/history.js";
import type { Measured } from "./sheetGeneral.js";
import { derived, drawTable, firstDerived, spanOf } from "./sheetTable.js";

const operations = ["fill", "edit", "revise", "sort", "insert", "delete", "undo", "memory"] as const;
type Operation = (typeof operations)[number];
type Row = Partial<Record<Operation, number>>;

function timed<T>(work: () => T): { readonly took: number; readonly result: T } {
  const from = performance.now();
  const result = work();
  return { took: performance.now() - from, result };
}

function median(times: readonly number[]): number {
  return times.toSorted((a, b) => a - b)[times.length >> 1] as number;
}

function memory(): number {
  // The memory of arrays is given back some time after they are collected.
  for (let turn = 0; turn < 3; turn++) {
    globalThis.gc?.();
  }
  const { heapUsed, arrayBuffers } = process.memoryUsage();
  return heapUsed + arrayBuffers;
}

/** Every operation on a table of so many rows with so many derived columns, in milliseconds; memory in bytes. */
function measureOurs(rows: number, columns: number): Row {
  const table = drawTable(rows);
  const revised = {
    length: rows,
    numbers: Float64Array.from({ length: rows }, (_, row) => 1 + (row % 97) / 97),
    others: undefined,
  };
  const before = memory();
  const fills = derived.slice(0, columns).map((text, index) => fillFormula(spanOf(firstDerived + index, rows), text));
  const start = bookOf([{ name: "Targets", columns: table }]);
  const { took: fill, result: book } = timed(() => change(start, fills, noFunctions));
  const used = memory() - before;

  const edits: number[] = [];
  let current: Book = book;
  for (let turn = 0; turn < 200; turn++) {
    const place = { sheet: 0, row: 1 + ((turn * 7919) % rows), column: 1 };
    const { took, result } = timed(() => change(current, [setCells(place, [[0.5 + turn / 400]])], noFunctions));
    edits.push(took);
    current = result;
  }
  const all = { sheet: 0, top: 1, bottom: rows, left: 0, right: firstDerived + columns - 1 };
  const middle = rows >> 1;
  const revise = timed(() => change(book, [setColumn({ sheet: 0, row: 1, column: 1 }, revised)], noFunctions));
  const sort = timed(() => change(book, [sortRows(all, [{ column: firstDerived + 1 }])], noFunctions));
  const insert = timed(() => change(book, [insertRows(0, middle, 1000)], noFunctions));
  const remove = timed(() => change(book, [deleteRows(0, middle, 1)], noFunctions));
  const history = record(startHistory(book), "deleted row", remove.result);
  const back = timed(() => presentBook(undo(history)));
  if (back.result !== book || insert.result === book || sort.result === book || revise.result === book) {
    throw new Error("a result was not consumed as expected");
  }
  return {
    fill,
    edit: median(edits),
    revise: revise.took,
    sort: sort.took,
    insert: insert.took,
    delete: remove.took,
    undo: back.took,
    memory: used,
  };
}

/** The same in a general engine, each operation in a process of its own that is given up on after a while. */
async function measureGeneral(rows: number, columns: number, patience: number): Promise<Row> {
  const found: Row = {};
  for (const operation of ["fill", "sort", "delete"] as const) {
    Object.assign(found, await inChild(rows, columns, operation, patience));
  }
  return found;
}

function inChild(rows: number, columns: number, operation: string, patience: number): Promise<Measured> {
  return new Promise((resolve) => {
    const script = fileURLToPath(new URL("sheetGeneral.ts", import.meta.url));
    const child = fork(script, [String(rows), String(columns), operation], {
      execArgv: ["--expose-gc", "--import", "tsx"],
    });
    const measured: Measured = {};
    const giveUp = setTimeout(() => {
      Object.assign(measured, { [operation]: Number.POSITIVE_INFINITY, ...measured });
      child.kill();
    }, patience);
    child.on("message", (message) => Object.assign(measured, message));
    child.on("exit", () => {
      clearTimeout(giveUp);
      resolve(measured);
    });
  });
}

function show(operation: Operation, value: number | undefined): string {
  if (value === undefined) {
    return "-";
  }
  if (value === Number.POSITIVE_INFINITY) {
    return "gave up";
  }
  return operation === "memory" ? `${(value / 1e6).toFixed(0)} MB` : `${value.toFixed(value < 10 ? 3 : 0)} ms`;
}

/** Prints the sheet engine at three sizes, and beside a general engine at one. */
export async function benchSheet(print: (line: string) => void, patience = 120_000): Promise<void> {
  measureOurs(2_000, 10);
  const sizes = [10_000, 100_000, 1_000_000];
  const ours = sizes.map((rows) => measureOurs(rows, 10));
  print(
    "sheet, 10 derived columns".padEnd(28) +
      sizes.map((rows) => `${rows} rows`.padStart(16)).join("") +
      "   x per x10 rows".padStart(18),
  );
  for (const operation of operations) {
    const values = ours.map((row) => row[operation]);
    const growth = (values[2] as number) / (values[1] as number);
    print(
      operation.padEnd(28) +
        values.map((value) => show(operation, value).padStart(16)).join("") +
        growth.toFixed(1).padStart(18),
    );
  }

  const five = measureOurs(100_000, 5);
  const general = await measureGeneral(100_000, 5, patience);
  print("");
  print(
    "100000 rows, 5 derived".padEnd(28) +
      "this engine".padStart(16) +
      "general engine".padStart(16) +
      "ratio".padStart(10),
  );
  for (const operation of operations) {
    const [own, other] = [five[operation], general[operation]];
    const given = other === Number.POSITIVE_INFINITY ? patience : other;
    const ratio =
      own === undefined || given === undefined
        ? "-"
        : `${other === Number.POSITIVE_INFINITY ? ">" : ""}${(given / own).toFixed(0)}`;
    print(
      operation.padEnd(28) +
        show(operation, own).padStart(16) +
        show(operation, other).padStart(16) +
        ratio.padStart(10),
    );
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await benchSheet((line) => process.stdout.write(`${line}\n`), Number(process.argv[2] ?? 120) * 1000);
}
