import { CellError } from "../../../call/cell.js";
import type { Operand } from "../../values/operand.js";
import { define } from "../define/define.js";
import { anything, rest } from "../define/parameters.js";
import type { Others } from "../gather/numbersOf.js";
import { numbersOf } from "../gather/numbersOf.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** A function of all the numbers in its arguments. */
export function aggregate(
  name: string,
  compute: (numbers: Float64Array, name: string) => Operand,
  others: Others = "leave out",
): WorksheetFunction {
  return define(name, [rest(anything("number"))] as const, (given) => {
    const numbers = numbersOf(
      given.map((each) => each.operand),
      `${name}: number`,
      others,
    );
    return numbers instanceof CellError ? numbers : compute(numbers, name);
  });
}

/** The error of a function that finds fewer numbers than it needs. */
export function tooFew(
  name: string,
  found: number,
  least: number,
  code: "#DIV/0!" | "#NUM!" | "#N/A" = "#DIV/0!",
): CellError {
  const some = found === 0 ? "no numbers" : found === 1 ? "1 number" : `${found} numbers`;
  return new CellError(
    code,
    `${name}: too few numbers`,
    `${name}: the arguments hold ${some}; at least ${least} ${least === 1 ? "is" : "are"} needed`,
  );
}
