import { namespace } from "../../../../call/cellFunctionOf.js";
import { takesHeaders, takesResult } from "../../../../functions/argumentNames.js";
import type { Input } from "../../../../functions/definition.js";
import { areaText, readArea } from "../areaText.js";
import type { Area } from "../worksheet.js";
import { type CallFields, readField, takesHeader } from "./callFields.js";

/** The formula of a call, for the cell of its first row. */
export function callFormula(fields: CallFields): string {
  const { definition, sheet, inputs, result } = fields;
  const parts = inputs.map(({ text }) => argumentText(text, sheet));
  if (takesHeaders(definition)) parts.push(headersText(fields));
  if (takesResult(definition)) parts.push(argumentText(result, sheet));
  while (parts.at(-1) === "") parts.pop();
  return `=${namespace}.${definition.name}(${parts.join(", ").replace(/, (?=,|$)/g, ",")})`;
}

/**
 * The header cells in the order of the inputs. Side by side they are a range; else a text list that the worksheet puts
 * together from the cells, so that a unit changed in a header is still followed.
 */
function headersText(fields: CallFields): string {
  const slots = headerSlots(fields);
  const cells = slots.filter((slot) => slot !== undefined);
  const [first] = cells;
  if (!first) return "";
  const inLine = cells.every(
    ({ sheet, row, column }, index) => sheet === first.sheet && row === first.row && column === first.column + index,
  );
  if (inLine && cells.length === slots.length) {
    return areaText({ ...first, columns: cells.length }, fields.sheet, "row");
  }
  return slots.reduce((text, slot, index) => joined(text, slot, index, fields.sheet), "");
}

/** `B$1&";;"&D$1`: texts next to each other are one. */
function joined(text: string, slot: Area | undefined, index: number, home: string): string {
  const between = index === 0 ? text : text.endsWith('"') ? `${text.slice(0, -1)};"` : `${text}${text ? "&" : ""}";"`;
  if (!slot) return between;
  return `${between}${between ? "&" : ""}${areaText(slot, home, "row")}`;
}

/** A header for each column of each input up to the last that is given; undefined where none states the unit. */
export function headerSlots({ definition, sheet, inputs }: CallFields): readonly (Area | undefined)[] {
  const headed = (definition.inputs as readonly Input[]).flatMap((input, index) =>
    takesHeader(input) ? [inputs[index]!] : [],
  );
  const last = headed.findLastIndex(({ text }) => text.trim() !== "");
  return headed.slice(0, last + 1).flatMap(({ text, header }) => {
    const field = readField(text, sheet);
    const width = field.is === "cells" ? field.area.columns : 1;
    const area = field.is === "cells" ? readArea(header, sheet) : undefined;
    return Array.from({ length: width }, (_, index) =>
      area ? { ...area, column: area.column + index, rows: 1, columns: 1 } : undefined,
    );
  });
}

function argumentText(text: string, sheet: string): string {
  const field = readField(text, sheet);
  switch (field.is) {
    case "left out":
      return "";
    case "number":
      return String(field.value);
    case "cells":
      return field.text;
    case "text":
      return `"${field.text.replaceAll('"', '""')}"`;
  }
}
