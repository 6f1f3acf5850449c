import type { Area, Place } from "../../../sheet/book/book.js";
import type { Bench } from "../protocol/bench.js";
import type { BookState, SheetState } from "../protocol/bookState.js";
import type { Action } from "../protocol/request.js";
import type { CellStore } from "./cellStore.js";

/** The worker's methods as the page calls them. */
export type Remote<T> = {
  readonly [Name in keyof T]: T[Name] extends (...given: infer Given) => infer Answer
    ? (...given: Given) => Promise<Awaited<Answer>>
    : never;
};

/** The cells selected; the active one lies inside and takes what is typed. Rows are rows of the sheet. */
export interface Selection {
  readonly area: Area;
  readonly active: Place;
}

export interface SelectOptions {
  /** Scrolls the active cell into view; true unless said otherwise. */
  readonly reveal?: boolean;
  readonly focus?: boolean;
}

/** What the parts of the page share. */
export interface Page {
  readonly bench: Remote<Bench>;
  readonly cells: CellStore;
  state(): BookState;
  /** The sheet in view. */
  sheet(): number;
  sheetState(): SheetState;
  showSheet(sheet: number): void;
  selection(): Selection;
  select(area: Area, active?: Place, options?: SelectOptions): void;
  /** Rows of the sheet in view that a brush in a plot set apart. */
  marked(): ReadonlySet<number>;
  markRows(rows: Iterable<number>): void;
  /** Carries an action out; a refusal is shown. Resolves with whether it was done. */
  act(action: Action): Promise<boolean>;
  /** Says something once, seen and spoken. */
  announce(text: string): void;
  /** Shows what went wrong until it is closed. */
  trouble(text: string): void;
  preferences(): Preferences;
  prefer(change: Partial<Preferences>): void;
  /** Called after the state, the sheet in view, the selection or the preferences changed. */
  onChange(listener: (change: PageChange) => void): () => void;
}

export type PageChange = "state" | "sheet" | "selection" | "marked" | "preferences";

export interface Preferences {
  readonly theme: "system" | "light" | "dark" | "red";
  /** Cells that changed flash softly; never under reduced motion. */
  readonly flash: boolean;
  /** The panel beside the grid; empty while none is seen. */
  readonly panel: string;
  /** In px. */
  readonly panelWidth: number;
  readonly plots: boolean;
}
