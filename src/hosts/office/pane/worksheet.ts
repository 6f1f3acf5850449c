import type { Cell } from "../../../call/cell.js";

/** A rectangle of cells of one worksheet; rows and columns count from zero. */
export interface Area {
  readonly sheet: string;
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
}

export interface AreaCells {
  readonly area: Area;
  readonly values: readonly (readonly Cell[])[];
  /** The formula of each cell, with its "="; undefined where it has none. */
  readonly formulas: readonly (readonly (string | undefined)[])[];
}

/** All that the pane knows of the worksheet host, and all that it can do there. */
export interface Worksheet {
  selection(): Promise<Area>;
  /** All areas as they are at one moment; undefined where a sheet is not there. */
  read(areas: readonly Area[]): Promise<readonly (AreaCells | undefined)[]>;
  /** The cells in use on a sheet, on the one that is seen where none is named; undefined where it is empty. */
  usedArea(sheet?: string): Promise<Area | undefined>;
  /** The cell whose formula filled this one; undefined where none did, or where the host cannot say. */
  spillSource(cell: Area): Promise<Area | undefined>;
  write(area: Area, cells: readonly (readonly Cell[])[]): Promise<void>;
  insertFormula(cell: Area, formula: string): Promise<void>;
  /** Fills the formula of the first cell of an area of one column down over the others. */
  fillDown(area: Area): Promise<void>;
  /** Adds a sheet with these cells and shows it; another number is appended where the name is taken. */
  addSheet(name: string, cells: readonly (readonly Cell[])[]): Promise<string>;
  goTo(area: Area): Promise<void>;
  watchSelection(changed: () => void): Promise<void>;
  /** Texts kept with the workbook, by name. */
  kept(name: string): Promise<string | undefined>;
  keep(name: string, text: string): Promise<void>;
}
