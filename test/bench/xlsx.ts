import { readXlsx, writeXlsx } from "hucre/xlsx";
import type { Column } from "../../src/call/column.js";
import { columnOf } from "../../src/call/column.js";
import { readWorkbook } from "../../src/files/xlsx/readWorkbook.js";
import { writeWorkbook } from "../../src/files/xlsx/writeWorkbook.js";
import { bookOf } from "../../src/sheet/book/bookOf.js";
import { cellOf } from "../../src/sheet/book/cellOf.js";
import { consume, randomNumbers } from "./timing.js";

interface Measured<T> {
  readonly seconds: number;
  /** Time of all processors, which other work on the machine disturbs less. */
  readonly processor: number;
  /** Growth of memory at its highest, sampled while it ran [byte]. */
  readonly memory: number;
  readonly result: T;
}

async function measured<T>(work: () => Promise<T>): Promise<Measured<T>> {
  globalThis.gc?.();
  const used = () => process.memoryUsage().heapUsed + process.memoryUsage().arrayBuffers;
  const before = used();
  let highest = before;
  const sample = () => {
    highest = Math.max(highest, used());
  };
  const timer = setInterval(sample, 100);
  const start = performance.now();
  const startOfProcessor = process.cpuUsage();
  const result = await work();
  const seconds = (performance.now() - start) / 1000;
  const { user, system } = process.cpuUsage(startOfProcessor);
  sample();
  clearInterval(timer);
  return { seconds, processor: (user + system) / 1e6, memory: highest - before, result };
}

/** 21 columns of numbers with all their digits, two of names, one of a few classes, one with gaps. */
function drawColumns(rows: number): Column[] {
  const random = randomNumbers(25);
  const of = (draw: (row: number) => number | string | null) => {
    const cells = Array.from({ length: rows }, (_, row) => draw(row));
    return columnOf(["header [m/s]", ...cells]);
  };
  return [
    ...Array.from({ length: 21 }, () => of(() => random() * 1000)),
    of((row) => `Target ${row}`),
    of((row) => `HIP ${(row * 7919) % 120_000}`),
    of((row) => ["G2V", "K0V", "M4V"][row % 3] as string),
    of((row) => (row % 5 === 0 ? null : random())),
  ];
}

/** Writes and reads a workbook of 100,000 x 25, and the same with a general library. */
export async function benchXlsx(print: (line: string) => void, rows = 100_000): Promise<void> {
  const columns = drawColumns(rows);
  const workbook = { book: bookOf([{ name: "Targets", columns }]), sheets: [], notes: [] };
  const place = { sheet: 0, row: rows, column: 0 };
  const table = Array.from({ length: rows + 1 }, (_, row) =>
    columns.map((_, column) => cellOf(workbook.book, { sheet: 0, row, column }) as number | string | null),
  );
  const write = await measured(() => writeWorkbook(workbook));
  const otherWrite = await measured(() => writeXlsx({ sheets: [{ name: "Targets", rows: table }] }));
  const read = await measured(() => readWorkbook(write.result));
  const otherRead = await measured(() => readXlsx(otherWrite.result));
  if (cellOf(read.result.book, place) !== cellOf(workbook.book, place)) {
    throw new Error("the workbook did not come back");
  }
  consume(otherRead.result);
  print(`${rows} x 25`.padEnd(20) + ["this", "general library", "ratio"].map((text) => text.padStart(18)).join(""));
  const line = (what: string, own: number, other: number, unit: string) =>
    print(
      what.padEnd(20) +
        [`${own.toFixed(2)} ${unit}`, `${other.toFixed(2)} ${unit}`, (other / own).toFixed(1)]
          .map((text) => text.padStart(18))
          .join(""),
    );
  line("write", write.seconds, otherWrite.seconds, "s");
  line("read", read.seconds, otherRead.seconds, "s");
  line("processor of write", write.processor, otherWrite.processor, "s");
  line("processor of read", read.processor, otherRead.processor, "s");
  line("memory of write", write.memory / 1e6, otherWrite.memory / 1e6, "MB");
  line("memory of read", read.memory / 1e6, otherRead.memory / 1e6, "MB");
  line("size", write.result.length / 1e6, otherWrite.result.length / 1e6, "MB");
}
