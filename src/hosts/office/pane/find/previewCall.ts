import type { Cell } from "../../../../call/cell.js";
import type { Argument } from "../../../../call/cellFunction.js";
import { cellFunctionOf } from "../../../../call/cellFunctionOf.js";
import { blockOf, cellsOf } from "../../../../call/column.js";
import { takesHeaders } from "../../../../functions/argumentNames.js";
import { areaText, readArea } from "../areaText.js";
import type { Area, AreaCells, Worksheet } from "../worksheet.js";
import { type CallFields, readField } from "./callFields.js";
import { headerSlots } from "./callFormula.js";

/** What the call answers in its first row. */
export interface Preview {
  /** The value, and its uncertainties beside it. */
  readonly cells: readonly Cell[];
  readonly unit: string | undefined;
}

/** Reads the cells of the call and answers it here, through the same door as the worksheet. */
export async function previewCall(worksheet: Worksheet, fields: CallFields): Promise<Preview> {
  const parameters = await callParameters(worksheet, fields);
  const called = cellFunctionOf(fields.definition);
  const cells = cellsOf(called.once(parameters))[0]!;
  return { cells, unit: typeof cells[0] === "number" ? called.unitOf?.(parameters) : undefined };
}

async function callParameters(worksheet: Worksheet, fields: CallFields): Promise<readonly Argument[]> {
  const { definition, sheet, inputs, result } = fields;
  const slots = headerSlots(fields);
  const wanted = [...inputs.map(({ text }) => areaOf(text, sheet)), ...slots, areaOf(result, sheet)];
  const areas = wanted.filter((area) => area !== undefined);
  const answers = await worksheet.read(areas);
  const cellsAt = (area: Area | undefined) => area && answers[areas.indexOf(area)];
  const parameters = inputs.map(({ text }, index) => argument(text, sheet, cellsAt(wanted[index])));
  if (takesHeaders(definition)) parameters.push(headersArgument(slots, cellsAt, sheet));
  parameters.push(argument(result, sheet, cellsAt(wanted.at(-1))));
  while (parameters.length > 0 && !parameters.at(-1)) parameters.pop();
  return parameters;
}

function areaOf(text: string, sheet: string): Area | undefined {
  const field = readField(text, sheet);
  return field.is === "cells" ? readArea(text, sheet) : undefined;
}

function argument(text: string, sheet: string, cells: AreaCells | undefined): Argument {
  const field = readField(text, sheet);
  if (field.is === "left out") return undefined;
  if (field.is === "cells") {
    return cells && { block: blockOf(cells.values), address: field.text.replace(/:.*$/, "") };
  }
  return { block: blockOf([[field.is === "number" ? field.value : field.text]]) };
}

/** Header cells side by side keep their address for the messages; a list of others is one text in the worksheet too. */
function headersArgument(
  slots: readonly (Area | undefined)[],
  cellsAt: (area: Area | undefined) => AreaCells | undefined,
  sheet: string,
): Argument {
  const [first] = slots;
  if (!slots.some(Boolean)) return undefined;
  const values = slots.map((slot): Cell => (slot ? (cellsAt(slot)?.values[0]?.[0] ?? null) : null));
  const inLine = first && slots.every((slot, index) => slot?.row === first.row && slot.column === first.column + index);
  return { block: blockOf([values]), ...(inLine ? { address: areaText(first, sheet, "row") } : {}) };
}
