import { addressText } from "../../../sheet/book/address.js";
import type { SheetColumn } from "../../../sheet/book/book.js";
import { emptyColumn } from "../../../sheet/book/book.js";
import type { Span } from "../../../sheet/book/spans.js";
import type { Formula } from "../../../sheet/formula/formula.js";
import { damaged } from "../../zip/zipProblem.js";
import { fileFormula } from "../formula/fileFormula.js";
import { decodeText } from "../xml/xmlText.js";
import { readArea } from "./cellAddress.js";
import type { CellReading, ExplainError, RawCell } from "./cellOfRaw.js";
import { cellOfRaw } from "./cellOfRaw.js";
import type { CellsBuilder } from "./cellsBuilder.js";
import { cellsBuilder, spendCells } from "./cellsBuilder.js";
import type { FormatsBuilder } from "./formatsBuilder.js";
import { formatsBuilder } from "./formatsBuilder.js";
import type { Filling } from "./placeFilled.js";
import { placeFilled } from "./placeFilled.js";
import { usualStyle } from "./readStyles.js";
import type { RunsBuilder } from "./runsBuilder.js";
import { runsBuilder } from "./runsBuilder.js";

interface ColumnBuilder {
  readonly cells: CellsBuilder;
  readonly formats: FormatsBuilder;
  runs: RunsBuilder | undefined;
  stale: Span[];
}

export interface BuiltSheet {
  readonly columns: readonly SheetColumn[];
  readonly formats: ReadonlyMap<number, FormatsBuilder>;
  /** Formulas whose value the file does not tell, or not all of it, by column. */
  readonly stale: ReadonlyMap<number, readonly Span[]>;
  readonly hasOtherFormulas: boolean;
}

export interface SheetBuilder {
  cell(row: number, column: number, raw: RawCell): void;
  finish(): BuiltSheet;
}

/** Makes the columns of a sheet from its cells, row by row. */
export function sheetBuilder(reading: CellReading, explain: ExplainError): SheetBuilder {
  const columns = new Map<number, ColumnBuilder>();
  const shared = new Map<string, Formula>();
  const fillings: Filling[] = [];
  let count = 0;
  let filled = 0;
  let hasOtherFormulas = false;

  const columnFor = (index: number): ColumnBuilder => {
    const known = columns.get(index);
    if (known !== undefined) {
      return known;
    }
    const made = { cells: cellsBuilder(reading.budget), formats: formatsBuilder(), runs: undefined, stale: [] };
    columns.set(index, made);
    return made;
  };

  /** Whether the cell has a formula now. */
  const putFormula = (row: number, column: number, builder: ColumnBuilder, raw: RawCell): boolean => {
    const text = decodeText(raw.formula as string);
    builder.runs ??= runsBuilder(column, reading);
    const known = raw.formulaType === "shared" ? shared.get(raw.sharedIndex) : undefined;
    if (known !== undefined && text === "") {
      builder.runs.put(row, known);
      return true;
    }
    if (text === "" || raw.formulaType === "dataTable") {
      hasOtherFormulas = true;
      return false;
    }
    if (raw.formulaType === "shared") {
      const formula = fileFormula(text, row, column, false, reading);
      shared.set(raw.sharedIndex, formula);
      builder.runs.put(row, formula);
      return true;
    }
    builder.runs.putText(row, text, raw.formulaType === "array");
    if (raw.formulaType === "array" && raw.formulaArea.includes(":")) {
      const { top, left, bottom, right } = readArea(raw.formulaArea);
      if (top === row && left === column && (bottom > top || right > left)) {
        fillings.push({ row, column, rows: bottom - top + 1, width: right - left + 1 });
        filled += (bottom - top + 1) * (right - left + 1);
      }
    }
    return true;
  };

  return {
    cell(row, column, raw) {
      const builder = columnFor(column);
      const { cells } = builder;
      const style = reading.styles[raw.style] ?? usualStyle;
      const hasFormula = raw.formula !== undefined && putFormula(row, column, builder, raw);
      const value = cellOfRaw(raw, row, column, hasFormula, style, reading, explain);
      if (row < cells.next) {
        throw damaged(`the cell ${addressText(row, column)} stands in it twice or out of order`);
      }
      if (value !== null || hasFormula) {
        cells.put(row, value);
        count++;
      }
      if (hasFormula && (raw.value === undefined || mayBeBlocked(raw))) {
        addStale(builder, row);
      }
      builder.formats.put(row, style);
    },
    finish() {
      const runs = new Map([...columns].map(([column, each]) => [column, each.runs?.finish() ?? []]));
      // Rectangles far larger than what the file holds are not what a formula filled.
      const believable = filled <= 16 * count + 4096 ? fillings : [];
      const placed = placeFilled(believable, (column) => runs.get(column) ?? []);
      for (const { row, column } of believable === fillings ? placed.refused : fillings) {
        columns.get(column)?.stale.push({ from: row, to: row + 1 });
      }
      const width = [...columns.keys(), ...placed.columns.keys()].reduce((most, each) => Math.max(most, each + 1), 0);
      spendCells(reading.budget, width);
      const made = new Array<SheetColumn>(width).fill(emptyColumn);
      for (const [column, each] of columns) {
        made[column] = { ...emptyColumn, cells: each.cells.finish(), runs: runs.get(column) ?? [] };
      }
      for (const [column, filledColumn] of placed.columns) {
        made[column] = { ...(made[column] as SheetColumn), ...filledColumn };
      }
      return {
        columns: made,
        formats: new Map([...columns].map(([column, each]) => [column, each.formats])),
        stale: new Map([...columns].map(([column, each]) => [column, each.stale])),
        hasOtherFormulas,
      };
    },
  };
}

/** No file tells whether an array formula gave an error or found no room; only a calculation finds out. */
function mayBeBlocked({ type, formulaType, formulaArea }: RawCell): boolean {
  return type === "e" && formulaType === "array" && !formulaArea.includes(":");
}

function addStale({ stale }: ColumnBuilder, row: number): void {
  const last = stale.at(-1);
  if (last !== undefined && last.to === row) {
    stale[stale.length - 1] = { from: last.from, to: row + 1 };
  } else {
    stale.push({ from: row, to: row + 1 });
  }
}
