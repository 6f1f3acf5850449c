import { CellError } from "../../call/cell.js";
import { type Column, cellAt } from "../../call/column.js";
import { recogniseColumn } from "../../table/recogniseColumn.js";
import { ucdOfQuantity } from "../../table/ucds.js";
import { one, type Unit } from "../../units/unit.js";
import type { DescribedTable } from "./describedTable.js";
import { headerOfField } from "./headerOfField.js";
import { unitInBrackets } from "./unitInBrackets.js";

/** What the cells of a column are written as: one type a column, and blanks. */
export type WrittenType = "double" | "integer" | "logical" | "text";

/** A column in the parts that described formats have. */
export interface WrittenColumn {
  /** Not empty, and no other column's. */
  readonly name: string;
  readonly unit: Unit | undefined;
  /** A unit that is not known, as it stands in the header. */
  readonly unknownUnit: string | undefined;
  readonly description: string | undefined;
  readonly ucd: string | undefined;
  readonly type: WrittenType;
  readonly column: Column;
}

/** How a table is written, and in a sentence each what of it such a file cannot hold. */
export interface WrittenTable {
  readonly columns: readonly WrittenColumn[];
  readonly losses: readonly string[];
}

export function writtenTable(table: DescribedTable): WrittenTable {
  const rows = table.columns[0]?.length ?? 0;
  if (table.header.length !== table.columns.length || table.columns.some(({ length }) => length !== rows)) {
    throw new RangeError(`${table.columns.length} columns of ${rows} rows, ${table.header.length} headers`);
  }
  const taken = new Set<string>();
  const losses: string[] = [];
  const columns = table.columns.map((column, index): WrittenColumn => {
    const parts = partsOf(table, index);
    const name = freeName(parts.name || `column ${index + 1}`, taken);
    if (name !== parts.name)
      losses.push(
        `Column ${index + 1} is written as "${shortened(name)}": such a file wants a name of its own for each column.`,
      );
    const contents = contentsOf(column);
    losses.push(...contentLosses(name, contents));
    const isMeasured = parts.unit !== undefined || parts.unknownUnit !== undefined;
    // A measured quantity is no integer, even where all its values happen to be whole.
    const type =
      isMeasured && contents.type !== "text" && contents.type !== "logical" ? "double" : (contents.type ?? "text");
    return { ...parts, name, type, column };
  });
  return { columns, losses };
}

function partsOf({ header, unitsRow, notes }: DescribedTable, index: number) {
  const text = header[index]!;
  const unitCell = unitsRow?.[index];
  const own = notes?.[index];
  const { name, unit, problem, quantity, isUncertainty } = recogniseColumn(text, unitCell, own?.ucd);
  // The header may say more than the name did: the word that marks an uncertainty.
  const isOwn = own !== undefined && unitsRow === undefined && headerOfField(own) === text;
  return {
    name: isOwn ? own.name : name,
    unit: unit?.text === one.text ? undefined : unit,
    unknownUnit: problem && (unitInBrackets(text) ?? unitCell?.trim()),
    description: own?.description,
    ucd: own?.ucd ?? (quantity && ucdOfQuantity(quantity, isUncertainty)),
  };
}

function freeName(wanted: string, taken: Set<string>): string {
  let name = wanted;
  for (let number = 2; taken.has(name); number++) name = `${wanted} (${number})`;
  taken.add(name);
  return name;
}

interface Contents {
  /** Undefined where every cell is blank. */
  readonly type: WrittenType | undefined;
  readonly numbers: number;
  readonly errors: number;
}

const infinity = /^[+-]?inf(?:inity)?$/i;

export function infinityOf(text: string): number | undefined {
  return infinity.test(text) ? (text.startsWith("-") ? Number.NEGATIVE_INFINITY : Number.POSITIVE_INFINITY) : undefined;
}

function contentsOf(column: Column): Contents {
  const counts = { numbers: 0, logicals: 0, texts: 0, errors: 0, infinities: 0 };
  let isWhole = true;
  for (let row = 0; row < column.length; row++) {
    const cell = cellAt(column, row);
    if (typeof cell === "number") {
      counts.numbers++;
      if (isWhole && (!Number.isSafeInteger(cell) || Object.is(cell, -0))) isWhole = false;
    } else if (typeof cell === "boolean") counts.logicals++;
    else if (cell instanceof CellError) counts.errors++;
    else if (cell !== null) {
      if (infinity.test(cell)) counts.infinities++;
      counts.texts++;
    }
  }
  return { ...counts, type: typeOf(counts, isWhole) };
}

function typeOf(
  { numbers, logicals, texts, infinities }: Readonly<Record<"numbers" | "logicals" | "texts" | "infinities", number>>,
  isWhole: boolean,
): WrittenType | undefined {
  if (numbers + logicals + texts === 0) return undefined;
  if (numbers > 0 && logicals === 0 && texts === infinities) return texts === 0 && isWhole ? "integer" : "double";
  return logicals > 0 && numbers + texts === 0 ? "logical" : "text";
}

function contentLosses(name: string, { type, numbers, errors }: Contents): string[] {
  const losses: string[] = [];
  const column = `Column "${shortened(name)}"`;
  if (type === "text" && numbers > 0)
    losses.push(
      `${column} holds numbers and other cells; such a file has one type a column, so its numbers are written as text.`,
    );
  if (errors > 0)
    losses.push(
      `${column} has ${errors.toLocaleString("en")} ${errors === 1 ? "error, which is" : "errors, which are"} written as blank.`,
    );
  return losses;
}

function shortened(name: string): string {
  return name.length > 40 ? `${name.slice(0, 39)}…` : name;
}
