import type { Area, Place } from "../../../sheet/book/book.js";
import type { Bench } from "../protocol/bench.js";
import type { BookState, SheetState } from "../protocol/bookState.js";
import type { Outcome } from "../protocol/request.js";
import { createCellStore } from "./createCellStore.js";
import type { Page, PageChange, Preferences, Remote, Selection, SelectOptions } from "./page.js";
import { keepPreferences, readPreferences, wearTheme } from "./shell/preferences.js";

/** What only the shell does with a page. */
export interface OwnedPage extends Page {
  receive(state: BookState): void;
  /** Shows what came of an action. */
  settle(outcome: Outcome): boolean;
  onSelect(listener: (options: SelectOptions) => void): void;
}

export interface Voice {
  announce(text: string): void;
  trouble(text: string): void;
  /** Offers something to do; it stays until it is taken or closed. */
  offer(text: string, action: string, run: () => void): void;
}

/** The state that the parts of the page share, from the first state the worker gave. */
export function createPage(bench: Remote<Bench>, first: BookState, voice: Voice): OwnedPage {
  const listeners = new Set<(change: PageChange) => void>();
  const revealers = new Set<(options: SelectOptions) => void>();
  const cells = createCellStore(bench);
  let state = first;
  let sheet = 0;
  const selections = new Map<number, Selection>();
  let preferences = readPreferences();
  let marked: ReadonlySet<number> = new Set();

  cells.refresh(state, sheet);
  wearTheme(preferences.theme);

  const tell = (change: PageChange) => {
    for (const listener of listeners) listener(change);
  };

  const selection = (): Selection => selections.get(sheet) ?? firstCell(sheet);

  function select(area: Area, active?: Place, options: SelectOptions = {}): void {
    if (area.sheet !== sheet) showSheet(area.sheet);
    selections.set(sheet, { area, active: active ?? { sheet, row: area.top, column: area.left } });
    tell("selection");
    for (const reveal of revealers) reveal(options);
  }

  function showSheet(wanted: number): void {
    if (wanted === sheet || state.sheets[wanted] === undefined) return;
    sheet = wanted;
    cells.refresh(state, sheet);
    markRows([]);
    tell("sheet");
    tell("selection");
  }

  function markRows(rows: Iterable<number>): void {
    const wanted = new Set(rows);
    if (wanted.size === 0 && marked.size === 0) return;
    marked = wanted;
    tell("marked");
  }

  function settle(outcome: Outcome): boolean {
    if (outcome.is === "refused") voice.trouble(outcome.message);
    if (outcome.is === "cancelled") voice.announce("Stopped; nothing was changed.");
    if (outcome.is !== "done") return false;
    if (outcome.said) voice.announce(outcome.said);
    if (outcome.select) select(outcome.select);
    return true;
  }

  return {
    bench,
    cells,
    state: () => state,
    sheet: () => sheet,
    sheetState: () => state.sheets[sheet] as SheetState,
    showSheet,
    selection,
    select,
    settle,
    marked: () => marked,
    markRows,
    async act(action) {
      try {
        return settle(await bench.act(action));
      } catch (fault) {
        voice.trouble(faultText(fault));
        return false;
      }
    },
    announce: voice.announce,
    trouble: voice.trouble,
    preferences: () => preferences,
    prefer(change: Partial<Preferences>) {
      preferences = { ...preferences, ...change };
      keepPreferences(preferences);
      wearTheme(preferences.theme);
      tell("preferences");
    },
    onChange(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    onSelect: (listener) => revealers.add(listener),
    receive(next) {
      const isOther = next.id !== state.id;
      state = next;
      if (isOther) selections.clear();
      if (isOther || state.sheets[sheet] === undefined) sheet = 0;
      cells.refresh(state, sheet);
      tell("state");
      if (isOther) {
        tell("sheet");
        tell("selection");
      }
    },
  };
}

function firstCell(sheet: number): Selection {
  return {
    area: { sheet, top: 1, left: 0, bottom: 1, right: 0 },
    active: { sheet, row: 1, column: 0 },
  };
}

export function faultText(fault: unknown): string {
  const message = fault instanceof Error ? fault.message : String(fault);
  return `That was not done, by a fault of this program: ${message.replace(/[^.!?]$/, "$&.")} Nothing in the book was changed.`;
}
