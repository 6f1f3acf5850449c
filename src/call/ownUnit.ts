import type { NumberDefinition } from "../functions/definition.js";
import type { Unit } from "../units/unit.js";
import { CellError } from "./cell.js";
import { cellAt } from "./column.js";
import { noHeader } from "./headerUnit.js";
import type { CallInputs } from "./inputColumns.js";
import { readCell } from "./readCell.js";
import { knownUnit } from "./resultUnit.js";

/** The unit of the result where none is asked for: the definition's, or that of the input it is like. */
export function ownUnit(definition: NumberDefinition, call: CallInputs | undefined): Unit {
  const { as, unit, quantity } = definition.result;
  const own = knownUnit(unit);
  const cells = call?.inputs.find(({ input }) => input.name === as);
  const [column] = cells?.columns ?? [];
  if (as === undefined || !cells || !column) return own;
  const header = cells.headers[0] ?? noHeader;
  for (let row = 0; row < column.length; row++) {
    const reading = readCell(as, cellAt(column, row), header, quantity);
    if (!(reading instanceof CellError) && !("about" in reading)) return knownUnit(reading.unit.text);
  }
  return own;
}
