import { cellAt } from "../../call/column.js";
import { recogniseColumn } from "../../table/recogniseColumn.js";
import { isProblem } from "../../units/problem.js";
import { readUnit } from "../../units/readUnit.js";
import { one } from "../../units/unit.js";
import { cellOfField } from "../cell/cellOfField.js";
import { guardFormula } from "../cell/guardFormula.js";
import type { DescribedTable } from "../table/describedTable.js";
import { unitInBrackets } from "../table/unitInBrackets.js";
import type { TableToWrite } from "./writeDelimited.js";

/** Where the units of a table stand in delimited text; left out, where they stood in the table. */
export type UnitsPlace = "header" | "row";

/** A table as delimited text has it, and in a sentence each what such text cannot hold. */
export interface DelimitedForm {
  readonly table: TableToWrite;
  readonly losses: readonly string[];
}

export function delimitedOfTable(table: DescribedTable, units?: UnitsPlace): DelimitedForm {
  const { header, unitsRow } = units === undefined ? asItStands(table) : withUnits(table, units);
  const losses = [
    ...describedLosses(table),
    ...unitLosses(unitsRow),
    ...table.columns.flatMap((_, index) => textLosses(table, index)),
  ];
  return { table: { header, columns: table.columns, ...(unitsRow ? { unitsRow } : {}) }, losses };
}

interface Heads {
  readonly header: readonly string[];
  readonly unitsRow: readonly string[] | undefined;
}

function asItStands({ header, unitsRow }: DescribedTable): Heads {
  return { header, unitsRow };
}

function withUnits({ header, unitsRow }: DescribedTable, place: UnitsPlace): Heads {
  const parts = header.map((text, index) => nameAndUnit(text, unitsRow?.[index]));
  if (place === "header") {
    return { header: parts.map(({ name, unit }) => (unit === "" ? name : `${name} [${unit}]`)), unitsRow: undefined };
  }
  const hasUnits = parts.some(({ unit }) => unit !== "");
  return { header: parts.map(({ name }) => name), unitsRow: hasUnits ? parts.map(({ unit }) => unit) : undefined };
}

function nameAndUnit(header: string, unitCell: string | undefined) {
  const { name, unit, problem } = recogniseColumn(header, unitCell);
  const written = problem && (unitInBrackets(header) ?? unitCell);
  return { name, unit: unit ? (unit.text === one.text ? "" : unit.text) : (written?.trim() ?? "") };
}

function describedLosses({ notes = [], remarks = [] }: DescribedTable): string[] {
  const described = notes.filter((own) => own?.description !== undefined || own?.ucd !== undefined).length;
  const parts = [
    described > 0 && `what is said of ${counted(described, "column")} (descriptions, UCDs)`,
    remarks.length > 0 && `${counted(remarks.length, "remark")} on the table`,
  ].filter(Boolean);
  return parts.length > 0
    ? [`Delimited text has no place for ${parts.join(" and ")}; ECSV and VOTable keep them.`]
    : [];
}

/** The reader takes a row for units only where all of it is known. */
function unitLosses(unitsRow: readonly string[] | undefined): string[] {
  const unknown = unitsRow?.find((unit) => unit.trim() !== "" && unit.trim() !== "-" && isProblem(readUnit(unit)));
  return unknown === undefined
    ? []
    : [
        `The row of units holds "${unknown.slice(0, 40)}", which is not a known unit: whoever reads the file must say that the row is one (--units-row yes).`,
      ];
}

function textLosses({ columns, header }: DescribedTable, index: number): string[] {
  const column = columns[index]!;
  let count = 0;
  let first = "";
  for (let row = 0; column.others && row < column.length; row++) {
    const cell = cellAt(column, row);
    if (typeof cell !== "string" || cell === "" || cellOfField(guardFormula(cell)) === cell) continue;
    if (count === 0) first = cell;
    count++;
  }
  if (count === 0) return [];
  const [verb, them] = count === 1 ? ["reads", "it"] : ["read", "them"];
  return [
    `Column "${header[index]!.slice(0, 40)}" has ${counted(count, "text")} that ${verb} as another kind of cell in delimited text, first "${first.slice(0, 40)}"; ECSV and VOTable keep ${them} as text.`,
  ];
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}
