import type { Definition } from "../../../../functions/definition.js";
import type { SheetTable } from "../sheetTable.js";
import type { CallFields, InputField } from "./callFields.js";
import type { Preview } from "./previewCall.js";

/** What follows the selection: an input by its place, or the cell for the formula. */
export type Picking = number | "target" | undefined;

export interface BuildState {
  readonly table: SheetTable | undefined;
  readonly fields: CallFields;
  readonly target: string;
  readonly fillsDown: boolean;
  readonly writesHeader: boolean;
  readonly picking: Picking;
  readonly preview: Preview | undefined;
  /** The cells that hold something, once the analyst was told of them. */
  readonly warned: string | undefined;
}

export interface FindState {
  readonly query: string;
  readonly found: readonly Definition[];
  readonly chosen: Definition | undefined;
  readonly build: BuildState | undefined;
}

export interface FindActions {
  search(query: string): void;
  choose(definition: Definition): void;
  leave(): void;
  pick(picking: Picking): void;
  setInput(index: number, field: Partial<InputField>): void;
  set(change: Partial<Pick<BuildState, "target" | "fillsDown" | "writesHeader">> & { readonly result?: string }): void;
  insert(): void;
}
