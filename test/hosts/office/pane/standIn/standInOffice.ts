import { type Cell, CellError } from "../../../../../src/call/cell.js";
import { cellFunctionNames, findCellFunction } from "../../../../../src/call/cellFunctions.js";
import { areaText, readArea } from "../../../../../src/hosts/office/pane/areaText.js";
import type { Area } from "../../../../../src/hosts/office/pane/worksheet.js";
import { type Book, columnAt } from "../../../../../src/sheet/book/book.js";
import { bookOf } from "../../../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../../../src/sheet/book/formulaOf.js";
import { change } from "../../../../../src/sheet/change.js";
import type { Edit } from "../../../../../src/sheet/edit/draft.js";
import { fillCells } from "../../../../../src/sheet/edit/fillCells.js";
import { type Entry, setCells } from "../../../../../src/sheet/edit/setCells.js";
import { addSheet } from "../../../../../src/sheet/edit/sheets.js";
import type { Functions } from "../../../../../src/sheet/formula/functions.js";
import { loadable, type Queue } from "./loadable.js";

const functions: Functions = { cellFunction: findCellFunction, cellFunctionNames: () => cellFunctionNames };
const mostCellsInAnAnswer = 400_000;

/** A worksheet host in a few lines: the objects that the pane uses, over our own sheets, with load and sync. */
export function standInOffice(cells: readonly (readonly Cell[])[], theme?: string) {
  let book: Book = bookOf([{ name: "Targets", columns: [] }]);
  let active = "Targets";
  let selection: Area = { sheet: "Targets", row: 0, column: 0, rows: 1, columns: 1 };
  const watchers: (() => Promise<void>)[] = [];
  const settings = new Map<string, unknown>();
  const saved = new Map<string, unknown>();
  const faults = { saving: false, editing: false };

  const apply = (edit: Edit) => {
    book = change(book, [edit], functions);
  };
  const indexOf = (sheet: string) => book.sheets.findIndex(({ name }) => name === sheet);
  const placeOf = ({ sheet, row, column }: Area) => ({ sheet: indexOf(sheet), row, column });
  const set = (area: Area, rows: readonly (readonly unknown[])[]) => {
    apply(
      setCells(
        placeOf(area),
        rows.map((row) => row.map(entryOf)),
      ),
    );
  };
  const select = (area: Area) => {
    selection = area;
    active = area.sheet;
    for (const watcher of watchers) void watcher();
  };
  const cellAt = (area: Area, down: number, right: number) => {
    const place = placeOf({ ...area, row: area.row + down, column: area.column + right });
    const value = cellOf(book, place);
    return { value: shown(value), formula: formulaOf(book, place) ?? shown(value) };
  };
  const grid = <T>(area: Area, each: (down: number, right: number) => T) =>
    Array.from({ length: area.rows }, (_, down) =>
      Array.from({ length: area.columns }, (_, right) => each(down, right)),
    );

  function usedArea(sheet: string): Area | undefined {
    const { columns } = book.sheets[indexOf(sheet)]!;
    const filled: [number, number][] = [];
    columns.forEach((_, column) => {
      for (let row = 0; row < 2000; row++) {
        if (cellOf(book, { sheet: indexOf(sheet), row, column }) !== null) filled.push([row, column]);
      }
    });
    if (filled.length === 0) return undefined;
    const [rows, across] = [filled.map(([row]) => row), filled.map(([, column]) => column)];
    const [row, column] = [Math.min(...rows), Math.min(...across)];
    return { sheet, row, column, rows: Math.max(...rows) - row + 1, columns: Math.max(...across) - column + 1 };
  }

  function spillSource(area: Area): Area | undefined {
    const { column, row } = area;
    const claim = columnAt(book, indexOf(area.sheet), column).claims.find(({ from, to }) => row >= from && row < to);
    return claim && { ...area, column: claim.column, row: claim.row ?? row };
  }

  function rangeObject(queue: Queue, areaNow: () => Area | undefined) {
    const fetch = () => {
      const area = areaNow();
      if (!area) return undefined;
      if (area.rows * area.columns > mostCellsInAnAnswer) throw new Error("ResponsePayloadSizeLimitExceeded");
      return {
        address: areaText(area, ""),
        get values() {
          return grid(area, (down, right) => cellAt(area, down, right).value);
        },
        get formulas() {
          return grid(area, (down, right) => cellAt(area, down, right).formula);
        },
      };
    };
    const write = (rows: readonly (readonly unknown[])[]) =>
      queue.waiting.push(() => {
        const area = areaNow()!;
        if (rows.length !== area.rows || rows.some((row) => row.length !== area.columns)) {
          throw new Error("InvalidArgument: the rectangle and the range differ in size");
        }
        set(area, rows);
      });
    const members = {
      select: () => queue.waiting.push(() => select(areaNow()!)),
      autoFill: (to: { area: () => Area }) =>
        queue.waiting.push(() => {
          const { row, column, sheet, rows } = to.area();
          const own = { sheet: indexOf(sheet), top: row, bottom: row, left: column, right: column };
          if (rows > 1) apply(fillCells(own, "down", rows - 1));
        }),
      getSpillParentOrNullObject: () => rangeObject(queue, () => spillSource(areaNow()!)),
      area: areaNow,
    };
    const range = loadable(queue, fetch, members);
    return new Proxy(range, {
      set(_, name, value) {
        if (name !== "values" && name !== "formulas") return false;
        write(value);
        return true;
      },
    });
  }

  function sheetObject(queue: Queue, name: () => string) {
    return loadable(queue, () => (indexOf(name()) < 0 ? undefined : { name: name() }), {
      getRange: (address: string) => rangeObject(queue, () => readArea(address, name())),
      getUsedRangeOrNullObject: () => rangeObject(queue, () => usedArea(name())),
      activate: () =>
        queue.waiting.push(() => {
          active = name();
        }),
    });
  }

  function context(queue: Queue) {
    const worksheets = loadable(queue, () => ({ items: book.sheets.map(({ name }) => ({ name })) }), {
      getActiveWorksheet: () => sheetObject(queue, () => active),
      getItem: (name: string) => sheetObject(queue, () => name),
      getItemOrNullObject: (name: string) => sheetObject(queue, () => name),
      add: (name: string) => {
        queue.waiting.push(() => apply(addSheet(name)));
        return sheetObject(queue, () => name);
      },
    });
    return {
      workbook: {
        worksheets,
        getSelectedRange: () => rangeObject(queue, () => selection),
        onSelectionChanged: { add: (watcher: () => Promise<void>) => queue.waiting.push(() => watchers.push(watcher)) },
      },
      sync: async () => {
        await Promise.resolve();
        if (faults.editing) throw new Error("the cell is being edited");
        for (const work of queue.waiting.splice(0)) work();
      },
    };
  }

  set({ sheet: "Targets", row: 0, column: 0, rows: cells.length, columns: cells[0]?.length ?? 0 }, cells);
  return {
    Excel: {
      run: async (work: (context: unknown) => Promise<unknown>) => {
        const queue: Queue = { waiting: [] };
        const own = context(queue);
        const answer = await work(own);
        await own.sync();
        return answer;
      },
    },
    Office: {
      onReady: async () => ({ host: "Excel" }),
      AsyncResultStatus: { Failed: "failed", Succeeded: "succeeded" },
      context: {
        officeTheme: theme === undefined ? undefined : { bodyBackgroundColor: theme },
        requirements: { isSetSupported: () => true },
        document: {
          settings: {
            get: (name: string) => settings.get(name) ?? null,
            set: (name: string, value: unknown) => settings.set(name, value),
            saveAsync: (done: (result: unknown) => void) => {
              if (faults.saving) return done({ status: "failed", error: { message: "the workbook is read-only" } });
              for (const [name, value] of settings) saved.set(name, value);
              done({ status: "succeeded" });
            },
          },
        },
      },
    },
    /** What the analyst does in the worksheet. */
    sheet: {
      select: (address: string) => select(readArea(address, active)!),
      type: (address: string, value: unknown) => set(readArea(address, active)!, [[value]]),
      value: (address: string) => cellAt(readArea(address, active)!, 0, 0).value,
      formula: (address: string) => cellAt(readArea(address, active)!, 0, 0).formula,
      message: (address: string) => {
        const cell = cellOf(book, placeOf(readArea(address, active)!));
        return cell instanceof CellError ? cell.message : undefined;
      },
      active: () => active,
      selected: () => areaText(selection, selection.sheet),
      show: (sheet: string) => {
        active = sheet;
      },
    },
    saved,
    faults,
  };
}

export type StandIn = ReturnType<typeof standInOffice>;

function shown(value: Cell): string | number | boolean {
  return value === null ? "" : value instanceof CellError ? value.code : value;
}

function entryOf(value: unknown): Entry {
  if (value === "" || value === null || value === undefined) return null;
  if (typeof value === "string" && value.startsWith("=")) return { formula: value };
  if (typeof value === "string" && value.startsWith("'")) return value.slice(1);
  return value as Cell;
}
