import type { OwnedPage } from "../createPage.js";
import type { Editor } from "../editor/editor.js";
import type { Grid } from "../grid/grid.js";
import type { Dialogs } from "./dialogs.js";
import type { Files } from "./files.js";

/** What commands and dialogs work with. */
export interface Shell {
  readonly page: OwnedPage;
  readonly dialogs: Dialogs;
  readonly grid: Grid;
  readonly editor: Editor;
  readonly files: Files;
  showPanel(id: string): void;
  /** Runs what the worker is asked; what goes wrong is shown. */
  attempt(work: () => Promise<void>): void;
}
