import type { Cell } from "../../call/cell.js";
import type { Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import type { Area, Run } from "../book/book.js";
import { mergeSpans, spanAt } from "../book/spans.js";
import { cellByCell } from "../evaluate/operateColumns.js";
import type { Content } from "./content.js";
import { contentOf } from "./content.js";
import type { Edit } from "./draft.js";
import { sameRun, writeContent } from "./draft.js";
import { refuseOffSheet, writeMoved } from "./pasteCells.js";
import { placeFormula } from "./placeFormula.js";

export type Direction = "down" | "up" | "right" | "left";

/**
 * Repeats an area over `count` rows or columns next to it: formulas with their relative references moving, values as
 * they are. With `series`, lines of plain numbers (dates too) go on by their last step instead.
 */
export function fillCells(area: Area, direction: Direction, count: number, series = false): Edit {
  return direction === "down" || direction === "up"
    ? fillRows(area, direction, count, series)
    : fillColumns(area, direction, count, series);
}

function fillRows(area: Area, direction: Direction, count: number, series: boolean): Edit {
  const { sheet, top, bottom } = area;
  const height = bottom - top + 1;
  const from = direction === "down" ? bottom + 1 : top - count;
  return (draft) => {
    refuseOffSheet("fill", { sheet, row: from, column: area.left }, { ...area, bottom: top + count - 1 });
    const book = draft.session.snapshot();
    for (let column = area.left; column <= area.right; column++) {
      const { values, runs } = contentOf(book, area, column);
      const next = series && runs.length === 0 ? seriesOf(height, (index) => cellAt(values, index)) : undefined;
      const filled = cellByCell(
        count,
        (row) => next?.(from + row - top) ?? cellAt(values, wrap(from + row - top, height)),
      );
      writeContent(draft, { sheet, column, from }, filled, repeatRuns(runs, area, column, from, from + count));
    }
  };
}

function repeatRuns(
  runs: readonly Run[],
  { top, bottom }: Area,
  column: number,
  from: number,
  to: number,
): readonly Run[] {
  const height = bottom - top + 1;
  const only = runs.length === 1 ? runs[0] : undefined;
  if (only !== undefined && only.to - only.from === height) {
    return placeFormula(only.formula, column, from, to);
  }
  const repeated: Run[] = [];
  const first = top + Math.floor((from - top) / height) * height;
  for (let start = first; start < to; start += height) {
    for (const run of runs) {
      const low = Math.max(from, start + run.from - top);
      const high = Math.min(to, start + run.to - top);
      if (low < high) {
        repeated.push(...placeFormula(run.formula, column, low, high));
      }
    }
  }
  return mergeSpans(repeated, sameRun);
}

function fillColumns(area: Area, direction: Direction, count: number, series: boolean): Edit {
  const { sheet, left, right, top } = area;
  const width = right - left + 1;
  const first = direction === "right" ? right + 1 : left - count;
  return (draft) => {
    refuseOffSheet("fill", { sheet, row: top, column: first }, { ...area, right: left + count - 1 });
    const book = draft.session.snapshot();
    const contents = Array.from({ length: width }, (_, index) => contentOf(book, area, left + index));
    const lines = series ? lineSeries(contents, top) : [];
    for (let column = first; column < first + count; column++) {
      const content = contents[wrap(column - left, width)] as Content;
      const values = lines.length === 0 ? content.values : continued(content.values, lines, column - left);
      writeMoved(draft, { ...content, values }, top, { sheet, row: top, column });
    }
  };
}

function continued(values: Column, lines: readonly (Series | undefined)[], index: number): Column {
  return cellByCell(values.length, (row) => lines[row]?.(index) ?? cellAt(values, row));
}

/** For each row the series its cells begin, where all of them are plain numbers. */
function lineSeries(contents: readonly Content[], top: number): (Series | undefined)[] {
  const height = contents[0]?.values.length ?? 0;
  return Array.from({ length: height }, (_, row) =>
    contents.some(({ runs }) => spanAt(runs, top + row) !== undefined)
      ? undefined
      : seriesOf(contents.length, (index) => cellAt((contents[index] as Content).values, row)),
  );
}

type Series = (index: number) => number;

/** Numbers going on before and after those given, by the first and the last of their steps; one number goes on by 1. */
function seriesOf(length: number, at: (index: number) => Cell): Series | undefined {
  const numbers = Array.from({ length }, (_, index) => at(index));
  if (!numbers.every((each) => typeof each === "number")) {
    return undefined;
  }
  const last = length - 1;
  const [start, end] = [numbers[0] as number, numbers[last] as number];
  const firstStep = length === 1 ? 1 : (numbers[1] as number) - start;
  const lastStep = length === 1 ? 1 : end - (numbers[last - 1] as number);
  return (index) => (index < 0 ? start + index * firstStep : end + (index - last) * lastStep);
}

function wrap(index: number, length: number): number {
  return ((index % length) + length) % length;
}
