import type { Page, PageChange, Preferences, Selection } from "../../../../../src/hosts/bench/page/page.js";
import type { BookState, SheetState } from "../../../../../src/hosts/bench/protocol/bookState.js";
import type { Action } from "../../../../../src/hosts/bench/protocol/request.js";
import type { ShownCell } from "../../../../../src/hosts/bench/protocol/shown.js";
import type { Area, Place } from "../../../../../src/sheet/book/book.js";
import { columnStates, tableCell } from "./standInTable.js";

/** A page without a worker: a generated table, and a record of what the grid asked for. */
export interface StandInPage extends Page {
  readonly actions: Action[];
  readonly said: string[];
  /** Other facts of the sheet in view; the version grows. */
  change(sheet: Partial<SheetState>): void;
  /** Cells from now on, as if they were typed or calculated. */
  setCell(row: number, column: number, cell: ShownCell): void;
  /** While late, cells come after so long [ms]. */
  late: number | undefined;
  /** Sheet rows that a filter leaves, the header among them. */
  filterRows(rows: readonly number[] | undefined): void;
  reveal: (place: Place) => void;
}

export function standInPage(rows: number): StandInPage {
  const listeners = new Set<(change: PageChange) => void>();
  const arrivals = new Set<() => void>();
  const set = new Map<string, ShownCell>();
  const made = new Map<string, ShownCell>();
  const actions: Action[] = [];
  const said: string[] = [];
  let filtered: readonly number[] | undefined;
  let sheets: readonly SheetState[] = ["Targets", "Other"].map((name) => ({
    name,
    rows,
    columns: columnStates.length,
    visibleRows: rows,
    filter: [],
    frozenColumns: 1,
    columnStates,
  }));
  let version = 1;
  let sheet = 0;
  let marked: ReadonlySet<number> = new Set();
  let selection: Selection = {
    area: { sheet: 0, top: 1, left: 0, bottom: 1, right: 0 },
    active: { sheet: 0, row: 1, column: 0 },
  };
  let preferences: Preferences = { theme: "light", flash: true, panel: "", panelWidth: 300, plots: false };
  const tell = (change: PageChange) => {
    for (const listener of listeners) listener(change);
  };
  const sheetRow = (viewRow: number) => filtered?.[viewRow] ?? viewRow;

  function cellAt(viewRow: number, column: number): ShownCell | undefined {
    const row = sheetRow(viewRow);
    const key = `${row}:${column}`;
    const known = set.get(key) ?? made.get(key);
    if (known) return known;
    if (row >= rows) return undefined;
    const cell = tableCell(row, column);
    if (made.size > 50_000) made.clear();
    if (page.late === undefined) made.set(key, cell);
    else {
      setTimeout(() => {
        made.set(key, cell);
        for (const listener of arrivals) listener();
      }, page.late);
      return undefined;
    }
    return cell;
  }

  /** The last cell of a block of filled ones, as jumps by keyboard take it. */
  function edge({ row, column }: Place, toward: string): Place {
    const last = { row: rows - 1, column: columnStates.length - 1 };
    if (toward === "down") return { sheet, row: column === 10 && row < 20 ? 20 : last.row, column };
    if (toward === "up") return { sheet, row: 0, column };
    return { sheet, row, column: toward === "right" ? last.column : 0 };
  }

  const page: StandInPage = {
    bench: { edge: async (place: Place, toward: string) => edge(place, toward) } as unknown as Page["bench"],
    cells: {
      cellAt,
      sheetRow,
      viewRow: (row) => (filtered ? filtered.filter((kept) => kept < row).length : row),
      viewRows: () => filtered?.length ?? rows,
      onArrival: (listener) => {
        arrivals.add(listener);
        return () => arrivals.delete(listener);
      },
    },
    actions,
    said,
    late: undefined,
    reveal: () => {},
    state: () => ({ version, sheets }) as unknown as BookState,
    sheet: () => sheet,
    sheetState: () => sheets[sheet]!,
    showSheet(wanted) {
      sheet = wanted;
      selection = {
        area: { sheet, top: 1, left: 0, bottom: 1, right: 0 },
        active: { sheet, row: 1, column: 0 },
      };
      tell("sheet");
      tell("selection");
    },
    selection: () => selection,
    select(area: Area, active?: Place, options = {}) {
      selection = { area, active: active ?? { sheet, row: area.top, column: area.left } };
      tell("selection");
      if (options.reveal !== false) page.reveal(selection.active);
    },
    async act(action) {
      actions.push(action);
      const states = page.sheetState().columnStates;
      const alter = (columns: readonly number[], more: object) =>
        page.change({
          columnStates: states.map((state, column) => (columns.includes(column) ? { ...state, ...more } : state)),
        });
      if (action.do === "width") alter(action.columns, { width: action.width });
      if (action.do === "hide columns") alter(action.columns, { hidden: action.hidden });
      return true;
    },
    announce: (text) => said.push(text),
    trouble: (text) => said.push(text),
    marked: () => marked,
    markRows(rows) {
      marked = new Set(rows);
      tell("marked");
    },
    preferences: () => preferences,
    prefer(change) {
      preferences = { ...preferences, ...change };
      tell("preferences");
    },
    onChange(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    change(more) {
      version += 1;
      sheets = sheets.map((state, index) => (index === sheet ? { ...state, ...more } : state));
      tell("state");
    },
    setCell(row, column, cell) {
      set.set(`${row}:${column}`, cell);
    },
    filterRows(kept) {
      filtered = kept;
      page.change({
        visibleRows: kept?.length ?? rows,
        filter: kept ? [{ column: 0, test: "not blank", text: "" }] : [],
      });
    },
  };
  return page;
}
