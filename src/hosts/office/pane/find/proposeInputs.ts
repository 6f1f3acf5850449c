import type { Definition, Input } from "../../../../functions/definition.js";
import type { Quantity } from "../../../../functions/quantity.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import type { PlannedColumn } from "../../../../table/tableOf.js";
import { areaText } from "../areaText.js";
import { columnAt, dataCell, headerArea, isInRows, type SheetTable } from "../sheetTable.js";
import type { Area } from "../worksheet.js";
import { type InputField, takesHeader } from "./callFields.js";

const leftOut: InputField = { text: "", header: "" };

/** A field for each input: the column of the table that holds it, with the uncertainties beside it, where one does. */
export function proposeInputs(definition: Definition, table: SheetTable | undefined): readonly InputField[] {
  const used = new Set<PlannedColumn>();
  return (definition.inputs as readonly Input[]).map((input): InputField => {
    if (!table || input.takes !== "quantity" || table.plan.rows === 0) return leftOut;
    const column = columnFor(input.quantity, table, used);
    if (!column) return leftOut;
    used.add(column);
    const columns = 1 + uncertaintiesAfter(column, table);
    const home = table.used.area.sheet;
    return {
      text: areaText({ ...dataCell(table, column, 0), columns }, home),
      header: areaText(headerArea(table, column), home, "row"),
    };
  });
}

/** The field for cells that were picked: the first row of the table where they lie in it, else where they are, fixed. */
export function pickedField(input: Input, picked: Area, table: SheetTable | undefined, home: string): InputField {
  const columns = takesHeader(input) ? Math.min(picked.columns, 3) : 1;
  const column = table && columnAt(table, picked.column);
  const isHeader =
    table && picked.sheet === table.used.area.sheet && picked.row < table.used.area.row + table.plan.firstRow;
  if (table && table.plan.rows > 0 && column && (isInRows(table, picked) || isHeader)) {
    return {
      text: areaText({ ...dataCell(table, column, 0), columns }, home),
      header: takesHeader(input) ? areaText(headerArea(table, column), home, "row") : "",
    };
  }
  const fixed = isInRows(table, picked) || !table ? "none" : "all";
  return { text: areaText({ ...picked, rows: 1, columns }, home, fixed), header: "" };
}

function columnFor(quantity: Quantity, table: SheetTable, used: ReadonlySet<PlannedColumn>): PlannedColumn | undefined {
  const known = table.plan.columns
    .filter((column) => !used.has(column))
    .map((column) => ({ column, ...recogniseColumn(column.header, column.unitCell) }))
    .filter(({ isUncertainty }) => !isUncertainty);
  const named = known.find((column) => column.quantity?.name === quantity.name && fits(column, quantity));
  const alike = known.find(
    (column) => column.quantity && isFamily(column.quantity, quantity) && fits(column, quantity),
  );
  return (named ?? alike)?.column;
}

function fits({ unit }: { readonly unit: { readonly kind: string } | undefined }, quantity: Quantity): boolean {
  return unit === undefined || unit.kind === quantity.kind;
}

/** A minimum mass may stand where a planet's mass is asked for: they share the headers or the meaning. */
function isFamily(a: Quantity, b: Quantity): boolean {
  return a.kind === b.kind && (a.headers === b.headers || (isPlanetMass(a) && isPlanetMass(b)));
}

function isPlanetMass({ name }: Quantity): boolean {
  return name === "planet mass" || name === "minimum mass";
}

/** How many columns to the right of one hold its uncertainties: none, one, or an upper and a lower one. */
function uncertaintiesAfter(column: PlannedColumn, table: SheetTable): number {
  const isUncertainty = (index: number) => {
    const next = table.plan.columns.find((candidate) => candidate.index === index);
    return next !== undefined && recogniseColumn(next.header, next.unitCell).isUncertainty;
  };
  if (!isUncertainty(column.index + 1)) return 0;
  return isUncertainty(column.index + 2) ? 2 : 1;
}
