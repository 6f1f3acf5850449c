import type { Grid } from "../grid/grid.js";
import type { Page } from "../page.js";
import type { AddressField } from "./addressField.js";
import type { DraftKeeper } from "./draftKeeper.js";
import type { Edit } from "./edit.js";
import type { ReferenceMarks } from "./referenceMarks.js";
import type { Surface } from "./surface.js";
import type { Told } from "./told.js";
import type { FormulaView } from "./view/formulaView.js";

/** What the parts of the editor work on together. */
export interface Desk {
  readonly page: Page;
  readonly grid: Grid;
  readonly formula: FormulaView;
  readonly surface: Surface;
  readonly address: AddressField;
  readonly drafts: DraftKeeper;
  readonly told: Told;
  readonly marks: ReferenceMarks;
  /** Undefined while nothing is typed. */
  edit: Edit | undefined;
}
