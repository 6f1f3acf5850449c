import type { TemplateResult } from "lit-html";
import type { Page, PageChange } from "./page.js";

/** One of the parts beside the grid: Why, Check, Compare, History, Find. */
export interface Panel {
  readonly id: string;
  readonly title: string;
  /** The keys that show it, as told in the interface: "Alt+W". */
  readonly keys: string;
  view(): TemplateResult;
  shown(): void;
  hidden(): void;
  changed(change: PageChange): void;
}

/** `enterTyped` enters what is being typed in a cell; it resolves with false where that cannot be entered. */
export type CreatePanel = (page: Page, redraw: () => void, enterTyped: () => Promise<boolean>) => Panel;
