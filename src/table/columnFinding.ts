import { quote, unitSentence } from "../call/explain.js";
import type { Quantity } from "../functions/quantity.js";
import { kindPhrase } from "../units/kind.js";
import type { UnitProblem } from "../units/problem.js";
import type { Unit } from "../units/unit.js";

/** Something about a column that an analyst should look at: facts, with the row of the table it is seen in first. */
export type ColumnFinding =
  | { readonly about: "no unit"; readonly quantity: Quantity }
  | { readonly about: "unit problem"; readonly unit: UnitProblem }
  | { readonly about: "kind"; readonly quantity: Quantity; readonly unit: Unit }
  | {
      readonly about: "implausible";
      readonly quantity: Quantity;
      readonly unit: Unit;
      readonly median: number;
      readonly better: string | undefined;
    }
  | {
      readonly about: "mixed";
      readonly text: string;
      readonly row: number;
      readonly count: number;
      readonly numbers: number;
    }
  | { readonly about: "out of range"; readonly problem: string; readonly row: number; readonly count: number }
  | { readonly about: "error cell"; readonly code: string; readonly row: number; readonly count: number }
  | { readonly about: "uncertainty without value" };

/** The sentence for a finding; `header` is the column's header, `rowText` names a row as the host counts it. */
export function sentenceOfColumnFinding(
  finding: ColumnFinding,
  header: string,
  rowText: (row: number) => string,
): string {
  const column = quote(header);
  switch (finding.about) {
    case "no unit": {
      const { meaning, unit } = finding.quantity;
      return `${column} looks like ${meaning} but states no unit; write for example ${quote(`${header.trim()} [${unit}]`)}.`;
    }
    case "unit problem":
      return `${column}: ${unitSentence(finding.unit)}.`.replace("?.", "?");
    case "kind":
      return `${column} looks like ${finding.quantity.meaning}, ${kindPhrase(finding.quantity.kind)}, but its unit ${finding.unit.text} is ${kindPhrase(finding.unit.kind)}; correct the name or the unit.`;
    case "implausible": {
      const { quantity, unit, median, better } = finding;
      const instead = better ? `; as ${better} it would be usual. Is the unit ${better}?` : "; check the unit.";
      return `${column}: the median is ${short(median)} ${unit.text}, unusual for ${quantity.meaning}${instead}`;
    }
    case "mixed":
      return `${column} holds ${counted(finding.numbers, "number")} and ${counted(finding.count, "text")} that ${finding.count === 1 ? "is" : "are"} none, first ${quote(finding.text)} in ${rowText(finding.row)}; leave the cell blank or type a number.`;
    case "out of range":
      return `${column}: ${counted(finding.count, "cell")} outside the range, first in ${rowText(finding.row)}: ${finding.problem}`;
    case "error cell":
      return `${column} holds ${counted(finding.count, "error")}, first ${finding.code} in ${rowText(finding.row)}.`;
    case "uncertainty without value":
      return `${column} looks like an uncertainty, but the column to its left is no value it could belong to; put it to the right of its value.`;
  }
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}

function short(value: number): string {
  return String(Number(value.toPrecision(4)));
}
