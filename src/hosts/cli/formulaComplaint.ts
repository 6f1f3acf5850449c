import type { FormulaProblem } from "../../sheet/formula/formula.js";

/** A formula that cannot be read, with a mark under the place in question. */
export function formulaComplaint(formula: string, problem: FormulaProblem): string {
  const shown = formula.replace(/[\n\t]/g, " ");
  const from = Math.max(0, problem.position - 60);
  const part = `${from > 0 ? "\u2026" : ""}${shown.slice(from, from + 100)}${shown.length > from + 100 ? "\u2026" : ""}`;
  const before = problem.position - from + (from > 0 ? 1 : 0);
  return `  ${part}\n  ${" ".repeat(Math.max(0, before))}^\n${problem.message}`;
}
