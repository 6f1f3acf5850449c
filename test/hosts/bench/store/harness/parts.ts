import fc from "fast-check";
import { cellsOf, columnOf } from "../../../../../src/call/column.js";
import { calculateAll } from "../../../../../src/files/bookFile/calculateAll.js";
import type { BenchEvent } from "../../../../../src/hosts/bench/protocol/bench.js";
import { bookMethods } from "../../../../../src/hosts/bench/worker/books/bookMethods.js";
import { bookOfSession, presentationOfSession } from "../../../../../src/hosts/bench/worker/session.js";
import { createBookKeeper } from "../../../../../src/hosts/bench/worker/store/bookKeeper.js";
import { sweepRemoved } from "../../../../../src/hosts/bench/worker/store/bookShelf.js";
import { openDatabase, partsOf } from "../../../../../src/hosts/bench/worker/store/database.js";
import { loadBook } from "../../../../../src/hosts/bench/worker/store/loadBook.js";
import type { Book } from "../../../../../src/sheet/book/book.js";
import { bookOf } from "../../../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../../../src/sheet/book/formulaOf.js";
import { usedColumns, usedRows } from "../../../../../src/sheet/book/usedRows.js";
import { change } from "../../../../../src/sheet/change.js";
import { entryOf } from "../../../../../src/sheet/edit/entryOf.js";
import { fillFormula } from "../../../../../src/sheet/edit/fillFormula.js";
import { setCells } from "../../../../../src/sheet/edit/setCells.js";
import { setColumn } from "../../../../../src/sheet/edit/setColumn.js";
import { changes } from "../../../../../src/sheet/history/changes.js";
import { recordVersion } from "../../../../../src/sheet/history/history.js";
import { anyBook, functions } from "../../../../files/bookFile/anyBook.js";

const mark = {
  id: "m",
  name: "before",
  at: 1,
  sheet: "S",
  table: {
    keys: ["a", "b", "c", "d"],
    columns: [
      { header: "K [m/s]", column: columnOf([null, -0.5, "x", null]), sigma: columnOf([null, null, null, 0.1]) },
    ],
  },
};

/** What the tests ask of a worker: the methods of the bench that are about books, and some doors behind them. */
export function createBenchWorkerParts(emit: (event: BenchEvent) => void) {
  const { desk, methods, cancelOpening } = bookMethods(() => openDatabase(), emit);
  let puts = 0;
  const put = IDBObjectStore.prototype.put;
  IDBObjectStore.prototype.put = function (...given) {
    puts++;
    return put.apply(this, given);
  };
  const counted = IDBObjectStore.prototype.put;
  const open = IDBFactory.prototype.open;

  return {
    ...methods,
    state: () => desk.state(),
    settled: () => desk.settled(),
    /** One cell, as it would be typed. */
    type(row: number, column: number, text: string) {
      const session = desk.session();
      const book = change(bookOfSession(session), [setCells({ sheet: 0, row, column }, [[entryOf(text)]])], functions);
      const version = { name: `typed ${text}`, book, presentation: presentationOfSession(session) };
      const history = recordVersion(session.history, version);
      desk.replace({ ...session, history, version: session.version + 1 });
    },
    /** All of the first sheet: its values and formulas. */
    cells: () => textOf(bookOfSession(desk.session())),
    /** Opens a file as the page hands it over. */
    openContent: (name: string, line: string, count: number) =>
      methods.openFile(new File([`${line}\n`.repeat(count)], name)),
    cancelOpening,
    /** Stores the open book as a newer program would. */
    async storeAsNewer() {
      const database = await openDatabase();
      const record = await database.get("books", desk.state().id);
      if (record) await database.put("books", { ...record, format: record.format + 1 });
    },
    /** Loses a part of the open book, as a fault of the browser might. */
    async losePart() {
      const database = await openDatabase();
      const [first] = await database.getAllKeys("parts", partsOf(desk.state().id));
      if (first) await database.delete("parts", first);
    },
    /** What is stored of removed books when the page starts a day later. */
    async sweepTomorrow() {
      const database = await openDatabase();
      await sweepRemoved(database, Date.now() + 25 * 3600 * 1000);
      return (await database.getAllKeys("books")).length;
    },
    fullStorage(isFull: boolean) {
      IDBObjectStore.prototype.put = isFull
        ? () => {
            throw new DOMException("full", "QuotaExceededError");
          }
        : counted;
    },
    deniedStorage() {
      IDBFactory.prototype.open = () => {
        throw new DOMException("denied", "SecurityError");
      };
    },
    allowedStorage() {
      IDBFactory.prototype.open = open;
    },
    /** Saves random books one after the other under one name; the counterexample, if there is one. */
    async roundTrips(runs: number) {
      const database = await openDatabase("round trips");
      const property = fc.asyncProperty(fc.array(anyBook, { minLength: 1, maxLength: 4 }), async (books) => {
        await database.clear("books");
        await database.clear("parts");
        const keeper = createBookKeeper(database, "b");
        for (const book of [...books, books[0] as Book]) {
          await keeper.save({ title: "t", book, presentation: [], marks: [mark], history: [] }, 1);
          const loaded = await loadBook(database, "b", functions);
          const column = loaded?.document.marks[0]?.table.columns[0];
          const kept = [column?.column, column?.sigma].map((each) => each && cellsOf({ rows: 4, columns: [each] }));
          if (String(kept) !== ",-0.5,x,,,,,0.1") throw new Error(`the mark is ${kept}`);
          const back = loaded?.document.book as Book;
          const calculated = change(back, [calculateAll(back)], functions);
          const [difference] = changes(book, calculated);
          if (difference) throw new Error(`differs in ${difference.row}, ${difference.column}`);
          const stored = await database.getAllKeys("parts", partsOf("b"));
          const named = namedParts(loaded);
          if (stored.length !== named.size) throw new Error(`${stored.length} parts stored, ${named.size} named`);
        }
      });
      const { failed, error } = await fc.check(property, { numRuns: runs }).then(({ failed, errorInstance }) => ({
        failed,
        error: String(errorInstance),
      }));
      return failed ? error : "all came back";
    },
    /** What saving one change to a large book writes, before and after it was loaded anew; and how long it takes [ms]. */
    async largeBook(rows: number, columns: number) {
      const database = await openDatabase("large");
      const values = Array.from({ length: columns }, (_, index) =>
        columnOf(Array.from({ length: rows }, (_, row) => (row === 0 ? `Column ${index}` : row * 0.1 + index))),
      );
      const plain = bookOf([{ name: "S", columns: values }]);
      const filled = Array.from({ length: 5 }, (_, index) =>
        fillFormula({ sheet: 0, column: columns + index, from: 1, to: rows }, "=A2*2"),
      );
      let book = change(plain, filled, functions);
      let keeper = createBookKeeper(database, "big");
      const save = async () => {
        puts = 0;
        const since = performance.now();
        await keeper.save({ title: "big", book, presentation: [], marks: [], history: [] }, 1);
        return { puts, time: performance.now() - since };
      };
      const edit = (row: number) => {
        book = change(book, [setCells({ sheet: 0, row, column: 2 }, [[row]])], functions);
      };
      const whole = await save();
      edit(50_000);
      const one = await save();
      const loaded = await loadBook(database, "big", functions);
      if (!loaded) throw new Error("not there");
      book = change(loaded.document.book, [calculateAll(loaded.document.book)], functions);
      keeper = createBookKeeper(database, "big", loaded.record, loaded.parts);
      keeper.loaded(book, loaded.columns);
      edit(60_000);
      const again = await save();
      return { whole, one, again };
    },
    /** Saves versions of a book without end, each with its own number in every cell; `acknowledge` hears of each. */
    async saveForever(rows: number, columns: number) {
      const database = await openDatabase("forever");
      const keeper = createBookKeeper(database, "b");
      let book = bookOf([{ name: "S", columns: [] }]);
      for (let version = 1; ; version++) {
        const column = { length: rows, numbers: new Float64Array(rows).fill(version), others: undefined };
        const edits = Array.from({ length: columns }, (_, index) =>
          setColumn({ sheet: 0, row: 0, column: index }, column),
        );
        book = change(book, edits, functions);
        await keeper.save({ title: String(version), book, presentation: [], marks: [], history: [] }, version);
        postMessage({ saved: version });
      }
    },
    /** The version in every cell of what saveForever left, or how it is torn. */
    async lastForever(rows: number, columns: number) {
      const loaded = await loadBook(await openDatabase("forever"), "b", functions);
      if (!loaded) return "nothing";
      const book = loaded.document.book;
      if (usedRows(book, 0) !== rows || usedColumns(book, 0) !== columns) return "other size";
      const version = Number(loaded.document.title);
      for (let column = 0; column < columns; column++) {
        for (let row = 0; row < rows; row++) {
          if (cellOf(book, { sheet: 0, row, column }) !== version) return `torn at ${row}, ${column}`;
        }
      }
      return version;
    },
  };
}

function namedParts(loaded: Awaited<ReturnType<typeof loadBook>>): Set<number> {
  const named = new Set<number>(loaded?.record.marks);
  for (const { columns } of loaded?.record.sheets ?? []) for (const part of columns) if (part > 0) named.add(part);
  for (const columns of loaded?.columns ?? []) {
    for (const column of columns) for (const { part } of column?.pieces ?? []) named.add(part);
  }
  return named;
}

function textOf(book: Book): string[] {
  const texts: string[] = [];
  for (let row = 0; row < Math.min(usedRows(book, 0), 100); row++) {
    for (let column = 0; column < usedColumns(book, 0); column++) {
      const place = { sheet: 0, row, column };
      const cell = cellOf(book, place);
      texts.push(`${formulaOf(book, place) ?? ""} ${typeof cell === "object" ? (cell?.code ?? "") : String(cell)}`);
    }
  }
  return texts;
}
