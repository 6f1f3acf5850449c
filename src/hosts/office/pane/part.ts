import type { TemplateResult } from "lit-html";
import type { Worksheet } from "./worksheet.js";

/** One of the parts of the pane. */
export interface Part {
  readonly id: string;
  readonly title: string;
  view(): TemplateResult;
  /** The part has come into view. */
  shown(): void;
  /** Another cell was selected while the part is in view. */
  selected(): void;
}

/** What the pane does for its parts. */
export interface Surroundings {
  readonly worksheet: Worksheet;
  redraw(): void;
  /** Says something once, seen and spoken. */
  announce(text: string): void;
  /** Runs work with the worksheet; what goes wrong is shown. */
  attempt(work: () => Promise<void>): void;
}
