import type { Cell } from "../../../../call/cell.js";
import { CellError } from "../../../../call/cell.js";
import type { Argument } from "../../../../call/cellFunction.js";
import { blockOf } from "../../../../call/column.js";
import { type CallStory, tellCall } from "../../../../call/tellCall.js";
import { areaText, cellIn } from "../areaText.js";
import type { Area, AreaCells, Worksheet } from "../worksheet.js";
import { type CallArgument, type FormulaCall, readCall } from "./readCall.js";

/** What there is to say of one cell. */
export type CellStory = { readonly address: string; readonly value: Cell } & (
  | { readonly is: "empty" | "value" }
  | { readonly is: "other formula"; readonly formula: string }
  /** One of our functions, with an argument that is worked out within the formula. */
  | { readonly is: "hidden argument"; readonly formula: string; readonly name: string }
  | {
      readonly is: "call";
      readonly formula: string;
      readonly story: CallStory;
      readonly whole: boolean;
      /** The cell whose formula filled this one, where it is another. */
      readonly source: string | undefined;
    }
);

/** Columns larger than this are not read only to tell of one row. */
const mostCells = 400_000;

/** Reads the formula of a cell, and all that goes into it. */
export async function tellCell(worksheet: Worksheet, selection: Area): Promise<CellStory> {
  const cell = cellIn(selection);
  const address = areaText(cell);
  const [own] = await worksheet.read([cell]);
  const value = own?.values[0]?.[0] ?? null;
  const source = own?.formulas[0]?.[0] === undefined ? await sourceOf(worksheet, cell) : undefined;
  const formula = own?.formulas[0]?.[0] ?? source?.formula;
  if (formula === undefined) return { address, value, is: value === null ? "empty" : "value" };
  const from = source?.area ?? cell;
  const call = readCall(formula, cell.sheet);
  if (!call) return { address, value, is: "other formula", formula };
  const parameters = await loadParameters(worksheet, call);
  if (!parameters) return { address, value, is: "hidden argument", formula, name: call.definition.name };
  const story = tellCall(call.definition, parameters, cell.row - from.row);
  return { address, value, is: "call", formula, story, whole: call.whole, source: source && areaText(source.area) };
}

async function sourceOf(worksheet: Worksheet, cell: Area) {
  const area = await worksheet.spillSource(cell);
  const [source] = area ? await worksheet.read([area]) : [];
  const formula = source?.formulas[0]?.[0];
  return area && formula !== undefined ? { area, formula } : undefined;
}

async function loadParameters(worksheet: Worksheet, call: FormulaCall): Promise<readonly Argument[] | undefined> {
  const sized: CallArgument[] = [];
  for (const parameter of call.parameters) {
    sized.push(parameter.is === "spill" ? await spilled(worksheet, parameter) : parameter);
  }
  const areas = sized.flatMap(areasOf);
  if (areas.reduce((cells, { rows, columns }) => cells + rows * columns, 0) > mostCells) return undefined;
  const answers = await worksheet.read(areas);
  const cellsOf = new Map(areas.map((area, index) => [area, answers[index]]));
  const loaded = sized.map((parameter) => argumentFrom(parameter, cellsOf));
  return loaded.some((argument) => argument === "unknown") ? undefined : (loaded as Argument[]);
}

/** The rows below that the same formula filled. */
async function spilled(worksheet: Worksheet, argument: Extract<CallArgument, { is: "spill" }>): Promise<CallArgument> {
  const used = await worksheet.usedArea(argument.area.sheet);
  const end = used ? used.row + used.rows : argument.area.row + 1;
  let rows = 1;
  for (; argument.area.row + rows < end; rows++) {
    const source = await worksheet.spillSource(cellIn(argument.area, rows));
    if (source?.row !== argument.area.row || source.column !== argument.area.column) break;
  }
  return { is: "cells", area: { ...argument.area, rows }, text: argument.text };
}

function areasOf(argument: CallArgument): readonly Area[] {
  if (argument.is === "cells") return [argument.area];
  return argument.is === "joined" ? argument.parts.flatMap(areasOf) : [];
}

function argumentFrom(argument: CallArgument, cellsOf: ReadonlyMap<Area, AreaCells | undefined>): Argument | "unknown" {
  switch (argument.is) {
    case "left out":
      return undefined;
    case "value":
      return { block: blockOf([[argument.value]]) };
    case "cells": {
      const cells = cellsOf.get(argument.area);
      return cells ? { block: blockOf(cells.values), address: argument.text.replace(/[:#].*$/, "") } : "unknown";
    }
    case "joined": {
      const parts = argument.parts.map((part) => argumentFrom(part, cellsOf));
      const texts = parts.map((part) => (part && part !== "unknown" ? firstText(part) : undefined));
      return texts.includes(undefined) ? "unknown" : { block: blockOf([[texts.join("")]]) };
    }
    default:
      return "unknown";
  }
}

function firstText({ block }: Exclude<Argument, undefined>): string {
  const column = block.columns[0]!;
  const other = column.others?.[0];
  const cell: Cell = other === undefined ? column.numbers[0]! : other;
  return cell === null ? "" : cell instanceof CellError ? cell.code : String(cell);
}
