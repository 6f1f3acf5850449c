import { cellAt } from "../call/column.js";
import { required } from "../functions/definition.js";
import * as quantity from "../functions/quantities.js";
import type { Quantity } from "../functions/quantity.js";
import type { TableColumn } from "../table/checkTable.js";
import { readCells, readOption } from "./readOption.js";
import type { Site } from "./site.js";

/**
 * A site from "-70.7345 deg, -29.2584 deg, 2400 m": longitude (east positive), latitude and height; or from the headers of
 * three columns of the table, in which every row has the same. Without a height it is 0.
 */
export function readSite(text: string, table: readonly TableColumn[]): Site | { readonly problem: string } {
  const parts = text.split(",").map((part) => part.trim());
  if (parts.length < 2 || parts.length > 3) {
    return {
      problem: `the site is "${text}"; longitude, latitude and height are needed, for example "-70.7345 deg, -29.2584 deg, 2400 m".`,
    };
  }
  const quantities = [quantity.longitude, quantity.latitude, quantity.height];
  const read = parts.map((part, index) => readSitePart(quantities[index]!, part, table));
  const wrong = read.find((value) => typeof value !== "number");
  if (wrong !== undefined && typeof wrong !== "number") return { problem: `of the site, ${wrong.problem}` };
  const [longitude, latitude, height = 0] = read as number[];
  return { longitude: longitude!, latitude: latitude!, height };
}

/** One of the three: a quantity, or the header of a column. */
export function readSitePart(one: Quantity, text: string, table: readonly TableColumn[]) {
  const column = table.find(({ header }) => header === text.trim());
  return column ? sameInEveryRow(column, one) : readOption(one, text);
}

function sameInEveryRow({ header, unitCell, column }: TableColumn, one: Quantity) {
  const headed = unitCell === undefined ? header : `${header} [${unitCell}]`;
  const filled = Array.from({ length: column.length }, (_, row) => row).filter((row) => cellAt(column, row) !== null);
  const read = readCells(required(one), column, headed);
  const values = filled.map((row) => read[row]!);
  const first = values[0] ?? { problem: `${one.name} is blank in the column "${header}"; give it in every row.` };
  const other = values.findIndex((value) => typeof value !== "number" || value !== first);
  if (typeof first !== "number" || other < 0) return first;
  const value = values[other]!;
  return typeof value === "number"
    ? {
        problem: `${one.name} in the column "${header}" differs between rows ${filled[0]! + 1} and ${filled[other]! + 1}; plan the targets of one site at a time.`,
      }
    : value;
}
