import { readFormula } from "../../sheet/formula/readFormula.js";
import { readHeader } from "../../units/readHeader.js";
import type { ColumnRequest } from "./columnRequest.js";
import { functions } from "./worksheet.js";

/**
 * The headers of the columns that a result fills. Beside the result of one of our functions stand its uncertainty, or
 * the upper and the lower; what else stands beside a result is counted.
 */
export function headersOfResult({ header, formula }: ColumnRequest, width: number): string[] {
  const { name, unit } = readHeader(header);
  const beside = (text: string) => `${name || header} ${text}${name && unit ? ` [${unit.text}]` : ""}`;
  const isMeasured = width <= 3 && callsOurs(formula);
  const sigmas = width === 2 ? ["sigma"] : ["sigma+", "sigma-"];
  const counted = Array.from({ length: width - 1 }, (_, index) => String(index + 2));
  return width === 1 ? [header] : [header, ...(isMeasured ? sigmas : counted).map(beside)];
}

function callsOurs(formula: string): boolean {
  let found = false;
  const watched = {
    ...functions,
    cellFunction(name: string) {
      const called = functions.cellFunction(name);
      found ||= called !== undefined;
      return called;
    },
  };
  readFormula(formula, 0, 0, watched);
  return found;
}
