import {
  ARABIC,
  CONVERT,
  CUMIPMT,
  CUMPRINC,
  DB,
  DDB,
  DOLLARDE,
  DOLLARFR,
  EFFECT,
  FV,
  IPMT,
  ISPMT,
  NOMINAL,
  NPER,
  PDURATION,
  PMT,
  PPMT,
  PV,
  ROMAN,
  RRI,
  SLN,
  SYD,
} from "@formulajs/formulajs";
import type { Cell, ErrorCode } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Operand } from "../../values/operand.js";
import { define, notFinite } from "../define/define.js";
import type { Read } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

type LibraryFunction = (...values: never[]) => unknown;

/** Named one by one, so that a bundle takes no more of the library than these, and nothing that it stands on. */
export const library = {
  ARABIC,
  CONVERT,
  CUMIPMT,
  CUMPRINC,
  DB,
  DDB,
  DOLLARDE,
  DOLLARFR,
  EFFECT,
  FV,
  IPMT,
  ISPMT,
  NOMINAL,
  NPER,
  PDURATION,
  PMT,
  PPMT,
  PV,
  ROMAN,
  RRI,
  SLN,
  SYD,
} satisfies Readonly<Record<string, LibraryFunction>>;

export type LibraryName = keyof typeof library;

/**
 * A worksheet function computed by the formulajs library. Values go in read and checked by our parameters; what comes
 * out is a cell: its errors become ours, and undefined, NaN, Infinity or an exception never leave here.
 */
export function fromLibrary<A extends readonly unknown[]>(
  name: LibraryName,
  parameters: Read<A>,
  check: (...values: A) => CellError | undefined = () => undefined,
): WorksheetFunction {
  const compute: LibraryFunction = library[name];
  return define(name, parameters, (...values: A): Operand => {
    const problem = check(...values);
    return problem ?? cellFrom(name, attempt(compute, values));
  });
}

function attempt(compute: LibraryFunction, values: readonly unknown[]): unknown {
  try {
    return compute(...(values as never[]));
  } catch (error) {
    // The library throws for some inputs where it should give an error value.
    return error;
  }
}

const codes: readonly string[] = ["#VALUE!", "#N/A", "#DIV/0!", "#REF!", "#NAME?", "#NUM!", "#NULL!"];

function cellFrom(name: string, result: unknown): Cell {
  if (typeof result === "number") {
    return Number.isFinite(result) ? result + 0 : notFinite(name);
  }
  if (typeof result === "string" || typeof result === "boolean") {
    return result;
  }
  const message = result instanceof Error ? result.message : "";
  const code = (codes.includes(message) ? message : "#VALUE!") as ErrorCode;
  return new CellError(
    code,
    `${name}: no result for these inputs`,
    `${name}: these inputs have no result; inputs within the limits of the function are needed`,
  );
}
