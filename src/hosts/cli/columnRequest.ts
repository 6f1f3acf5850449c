import { checkFormula } from "../../sheet/formula/readFormula.js";
import type { CommandLine } from "./commandLine.js";
import { formulaComplaint } from "./formulaComplaint.js";
import { UsageProblem } from "./usageProblem.js";
import { functions } from "./worksheet.js";

/** A column asked for: its header, and the formula of its first data row. */
export interface ColumnRequest {
  readonly header: string;
  readonly formula: string;
}

/** The columns that a command line asks for with --set. */
export function columnRequests(line: CommandLine): readonly ColumnRequest[] {
  return (line.options.get("--set") ?? []).map(([header, formula]) => readColumnRequest(header!, formula!));
}

/** A formula that cannot be read stops everything before a file is touched. */
function readColumnRequest(header: string, text: string): ColumnRequest {
  const formula = text.startsWith("=") ? text : `=${text}`;
  const problem = checkFormula(formula, functions);
  if (problem)
    throw new UsageProblem(`the formula of "${header}" cannot be read:\n${formulaComplaint(formula, problem)}`);
  return { header, formula };
}
