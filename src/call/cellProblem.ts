import type { Definition } from "../functions/definition.js";
import type { CallProblem } from "./callProblem.js";
import { CellError } from "./cell.js";
import { explain } from "./explain.js";

/** The error a cell gets for a problem: #N/A where something is not there yet, #VALUE! for all else. */
export function cellProblem(definition: Definition, problem: CallProblem): CellError {
  const code = problem.about === "blank" || problem.about === "missing" ? "#N/A" : "#VALUE!";
  return new CellError(code, topicOf(definition, problem), () => explain(definition, problem));
}

function topicOf(definition: Definition, problem: CallProblem): string {
  const parts = [definition.name, problem.about];
  if ("input" in problem) parts.push(problem.input);
  if ("unit" in problem) parts.push(problem.unit.text);
  if ("side" in problem) parts.push(problem.side);
  return parts.join(": ");
}
