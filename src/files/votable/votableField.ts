import type { DeclaredType } from "../table/declaredCell.js";
import type { ColumnNotes } from "../table/tableFile.js";

/** The types of VOTable and the bytes that one value of each fills; a bit is packed with its neighbours. */
export const bytesOfType = {
  boolean: 1,
  bit: 1 / 8,
  unsignedByte: 1,
  short: 2,
  int: 4,
  long: 8,
  char: 1,
  unicodeChar: 2,
  float: 4,
  double: 8,
  floatComplex: 8,
  doubleComplex: 16,
} as const;

export type Datatype = keyof typeof bytesOfType;

/** A FIELD of a VOTable. */
export interface VotableField {
  readonly notes: ColumnNotes;
  readonly datatype: Datatype;
  /** As the file writes it; undefined for one value a cell. */
  readonly arraysize: string | undefined;
  /** How many values a cell holds; undefined where each cell says so itself. */
  readonly count: number | undefined;
  /** What stands for no value, in fields of integers. */
  readonly nullText: string | undefined;
}

export function isDatatype(text: string | undefined): text is Datatype {
  return text !== undefined && Object.hasOwn(bytesOfType, text);
}

/** Values a cell, from `5`, `3x2`, `*`, `10*`, `8x*`; undefined where it varies. */
export function countOfArraysize(arraysize: string | undefined): number | undefined {
  if (arraysize === undefined || arraysize.trim() === "") return 1;
  if (arraysize.includes("*")) return undefined;
  return arraysize.split("x").reduce((count, part) => count * Number(part), 1);
}

export function declaredTypeOf({ datatype, count }: VotableField): DeclaredType {
  if (isText(datatype) || isArray({ datatype, count })) return "text";
  if (datatype === "boolean") return "logical";
  return datatype === "float" || datatype === "double" ? "number" : "integer";
}

/** Whether cells hold several values, which no cell of ours can; a complex number is two. */
export function isArray({ datatype, count }: Pick<VotableField, "datatype" | "count">): boolean {
  return !isText(datatype) && (count !== 1 || datatype === "floatComplex" || datatype === "doubleComplex");
}

export function isText(datatype: Datatype): boolean {
  return datatype === "char" || datatype === "unicodeChar";
}
