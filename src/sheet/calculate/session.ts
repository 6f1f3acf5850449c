import type { Book, Claim, ColumnSpan, Run, Sheet, SheetColumn, Spill } from "../book/book.js";
import { columnAt, emptyColumn } from "../book/book.js";
import { readCell, sliceCells } from "../book/cells.js";
import { spillSize } from "../book/spillSize.js";
import { columnsInUse, usedLength } from "../book/usedRows.js";
import type { WorkingCells } from "../book/workingCells.js";
import { workOn } from "../book/workingCells.js";
import type { World } from "../evaluate/world.js";

/** A column while results are written into it. */
export interface WorkingColumn {
  readonly cells: WorkingCells;
  readonly runs: readonly Run[];
  /** Its runs for changing in place. */
  ownRuns(): Run[];
  spills: readonly Spill[];
  claims: readonly Claim[];
}

interface FinishableColumn extends WorkingColumn {
  finish(): SheetColumn;
}

/** Cells that were touched, and when. */
export interface TouchedSpan extends ColumnSpan {
  readonly group: number;
}

/** A book while it is edited or recalculated. The book it began with stays whole. */
export interface Session {
  readonly world: World;
  /** For writing. */
  column(sheet: number, column: number): WorkingColumn;
  /** For reading, without making a working column. */
  peek(sheet: number, column: number): Pick<SheetColumn, "runs" | "spills" | "claims">;
  sheetName(sheet: number): string;
  /** Cells filled or cleared besides those that were known to change. */
  readonly touched: TouchedSpan[];
  touch(span: ColumnSpan): void;
  /** How many groups of runs have been begun: what is calculated in a later one has seen what was touched before. */
  group: number;
  /** Whether results of several cells are refused: they have pushed each other about for too long. */
  refusesSpills: boolean;
  snapshot(): Book;
}

export function openSession(book: Book): Session {
  const working = book.sheets.map(() => new Map<number, FinishableColumn>());
  const indexByName = new Map(book.sheets.map(({ name }, index) => [name.toUpperCase(), index]));
  const names = new Map(book.names.map(({ name, formula }) => [name.toUpperCase(), formula]));

  const peek = (sheet: number, column: number) => working[sheet]?.get(column) ?? columnAt(book, sheet, column);
  const world: World = {
    read(sheet, row, column) {
      const own = working[sheet]?.get(column);
      return own === undefined ? readCell(columnAt(book, sheet, column).cells, row) : own.cells.read(row);
    },
    slice(sheet, column, from, to) {
      const own = working[sheet]?.get(column);
      return own === undefined ? sliceCells(columnAt(book, sheet, column).cells, from, to) : own.cells.slice(from, to);
    },
    usedRows: (sheet, column) =>
      usedLength(working[sheet]?.get(column)?.cells.peek() ?? columnAt(book, sheet, column).cells),
    usedColumns(sheet) {
      let last = columnsInUse(book.sheets[sheet]);
      for (const [column, { cells }] of working[sheet] ?? []) {
        last = column >= last && usedLength(cells.peek()) > 0 ? column + 1 : last;
      }
      return last;
    },
    sheetIndex: (name) => indexByName.get(name.toUpperCase()) ?? -1,
    sheetNames: () => book.sheets.map(({ name }) => name),
    spillAt: (sheet, row, column) => spillSize(peek(sheet, column), row),
    definedName: (name) => names.get(name.toUpperCase()),
    definedNames: () => book.names.map(({ name }) => name),
  };

  const touched: TouchedSpan[] = [];
  return {
    world,
    peek,
    touched,
    group: 0,
    refusesSpills: false,
    touch(span) {
      touched.push({ ...span, group: this.group });
    },
    sheetName: (sheet) => book.sheets[sheet]?.name ?? "",
    column(sheet, column) {
      let own = working[sheet]?.get(column);
      if (own === undefined) {
        own = workOnColumn(columnAt(book, sheet, column));
        working[sheet]?.set(column, own);
      }
      return own;
    },
    snapshot: () => ({ ...book, sheets: book.sheets.map((sheet, index) => finishSheet(sheet, working[index])) }),
  };
}

function workOnColumn({ cells, runs, spills, claims }: SheetColumn): FinishableColumn {
  const working = workOn(cells);
  let current = runs;
  let own: Run[] | undefined;
  return {
    cells: working,
    get runs() {
      return current;
    },
    ownRuns() {
      own ??= current.slice();
      current = own;
      return own;
    },
    spills,
    claims,
    finish() {
      // From now on others hold these runs: the next change copies them again.
      own = undefined;
      return { cells: working.finish(), runs: current, spills: this.spills, claims: this.claims };
    },
  };
}

function finishSheet(sheet: Sheet, working: ReadonlyMap<number, FinishableColumn> | undefined): Sheet {
  if (working === undefined || working.size === 0) {
    return sheet;
  }
  const columns = sheet.columns.slice();
  for (const [index, column] of working) {
    while (columns.length < index) {
      columns.push(emptyColumn);
    }
    columns[index] = column.finish();
  }
  return { ...sheet, columns };
}
