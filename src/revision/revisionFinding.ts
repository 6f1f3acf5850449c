import { unitSentence } from "../call/explain.js";
import type { Quantity } from "../functions/quantity.js";
import { kindPhrase } from "../units/kind.js";
import type { UnitProblem } from "../units/problem.js";
import { one, type Unit } from "../units/unit.js";
import type { Alias } from "./matchKeys.js";
import type { UnitSlip } from "./unitSlips.js";
import { counted, listed, quoted, short } from "./words.js";

/** Something about a revision that an analyst should know before it is applied; `header` is that of the table. */
export type RevisionFinding =
  | { readonly about: "only in table"; readonly keys: readonly string[] }
  | { readonly about: "only in revision"; readonly keys: readonly string[] }
  | { readonly about: "repeated in table"; readonly keys: readonly string[]; readonly rows: number }
  | { readonly about: "ambiguous in revision"; readonly keys: readonly string[] }
  | { readonly about: "alias unused"; readonly alias: Alias }
  | { readonly about: "columns left"; readonly headers: readonly string[] }
  | { readonly about: "derived"; readonly header: string }
  | { readonly about: "several columns"; readonly header: string; readonly headers: readonly string[] }
  | { readonly about: "unit problem"; readonly header: string; readonly from: string; readonly unit: UnitProblem }
  | { readonly about: "no unit"; readonly header: string; readonly from: string; readonly unit: Unit }
  | { readonly about: "no unit in table"; readonly header: string; readonly from: string; readonly unit: Unit }
  | {
      readonly about: "kind";
      readonly header: string;
      readonly from: string;
      readonly unit: Unit;
      readonly fromUnit: Unit;
    }
  | { readonly about: "no place for uncertainty"; readonly header: string; readonly from: string }
  | { readonly about: "converted"; readonly header: string; readonly unit: Unit; readonly fromUnit: Unit }
  | {
      readonly about: "unit slip";
      readonly header: string;
      readonly unit: Unit;
      readonly slip: UnitSlip;
      readonly changed: number;
      readonly key: string;
      readonly values: readonly [number, number];
    }
  | {
      readonly about: "implausible";
      readonly header: string;
      readonly quantity: Quantity;
      readonly unit: Unit;
      readonly better: string;
      readonly count: number;
      readonly key: string;
      readonly value: number;
    }
  | {
      readonly about: CountedFinding;
      readonly header: string;
      readonly count: number;
      readonly key: string;
      /** What stands there in the revision. */
      readonly text: string;
    };

/** Findings that are about cells of one column: how many, and the first. */
export type CountedFinding =
  | "blank kept"
  | "blank erased"
  | "no value text"
  | "strange text"
  | "outside"
  | "lost uncertainty"
  | "formula kept"
  | "two uncertainties in one";

/** A finding as one sentence of at most 250 characters. */
export function sentenceOfRevisionFinding(finding: RevisionFinding): string {
  switch (finding.about) {
    case "only in table":
      return `${counted(finding.keys.length, "row")} of the table ${finding.keys.length === 1 ? "is" : "are"} not in the revision and ${finding.keys.length === 1 ? "stays" : "stay"} as before: ${listed(finding.keys)}.`;
    case "only in revision":
      return `${counted(finding.keys.length, "row")} of the revision ${finding.keys.length === 1 ? "is" : "are"} not in the table and ${finding.keys.length === 1 ? "was" : "were"} left aside: ${listed(finding.keys)}.`;
    case "repeated in table":
      return `${counted(finding.keys.length, "key")} of the table ${finding.keys.length === 1 ? "stands" : "stand"} in several rows (${listed(finding.keys)}); all ${finding.rows.toLocaleString("en")} rows take the same revision.`;
    case "ambiguous in revision":
      return `${counted(finding.keys.length, "key")} of the revision ${finding.keys.length === 1 ? "stands" : "stand"} in several rows that differ: ${listed(finding.keys)}; none of them was taken. Leave one row each.`;
    case "alias unused":
      return `The alias ${quoted(finding.alias.old)} = ${quoted(finding.alias.new)} was not needed, or one of its names is nowhere.`;
    case "columns left":
      return `${counted(finding.headers.length, "column")} of the revision ${finding.headers.length === 1 ? "has" : "have"} no place in the table and ${finding.headers.length === 1 ? "was" : "were"} left aside: ${listed(finding.headers)}.`;
    case "derived":
      return `Formulas work out ${quoted(finding.header)}, so the revision of it was left aside.`;
    case "several columns":
      return `${listed(finding.headers)} could all revise ${quoted(finding.header)}; none was taken. Name one of them as the table does.`;
    case "unit problem":
      return `${quoted(finding.from)} was left aside: ${unitSentence(finding.unit)}.`.replace("?.", "?");
    case "no unit":
      return `${quoted(finding.from)} states no unit and was left aside; ${quoted(finding.header)} holds ${kindPhrase(finding.unit.kind)}. Write for example ${quoted(`${finding.from} [${finding.unit.text}]`)}.`;
    case "no unit in table":
      return `${quoted(finding.header)} states no unit, so ${quoted(finding.from)} was left aside; give the table's column its unit, for example ${quoted(`${finding.header} [${finding.unit.text}]`)}.`;
    case "kind":
      return `${quoted(finding.from)} holds ${kindPhrase(finding.fromUnit.kind)} and ${quoted(finding.header)} ${kindPhrase(finding.unit.kind)}; it was left aside. Correct the name or the unit.`;
    case "no place for uncertainty":
      return `The uncertainties ${quoted(finding.from)} were left aside: the table has no column for them beside ${quoted(finding.header)}.`;
    case "converted":
      return `${quoted(finding.header)} was converted from ${finding.fromUnit.text} to ${finding.unit.text}.`;
    case "implausible":
      return `${quoted(finding.header)}: ${counted(finding.count, "new value")} where the table had none ${finding.count === 1 ? "is" : "are"} unusual for ${finding.quantity.meaning}; as ${finding.better} usual. First ${quoted(finding.key, 24)}, ${short(finding.value)} ${finding.unit.text}.`;
    case "unit slip":
      return slipSentence(finding);
    default:
      return countedSentence(finding);
  }
}

function slipSentence({
  header,
  unit,
  slip,
  changed,
  key,
  values: [before, after],
}: Extract<RevisionFinding, { about: "unit slip" }>): string {
  const { other, factor, isReversed, rows, isWhole } = slip;
  const how = factor > 1 ? `${short(factor)} times larger` : `${short(1 / factor)} times smaller`;
  const looks = isReversed
    ? `converted from ${other.text} to ${unit.text} once too often`
    : `${other.text} in a column of ${unit.text === one.text ? "plain numbers" : unit.text}`;
  const where =
    isWhole && changed > 1
      ? `${rows.length.toLocaleString("en")} of ${counted(changed, "changed cell")}`
      : counted(rows.length, "cell");
  return `${quoted(header)}: ${where} became about ${how}, which looks like ${looks}; first ${quoted(key, 24)}, ${short(before)} to ${short(after)}.`;
}

function countedSentence({
  about,
  header,
  count,
  key,
  text,
}: Extract<RevisionFinding, { about: CountedFinding }>): string {
  const first = `first ${quoted(key, 24)}`;
  switch (about) {
    case "blank kept":
      return `${quoted(header)}: ${counted(count, "blank")} of the revision ${count === 1 ? "does" : "do"} not erase what stands there, ${first}.`;
    case "blank erased":
      return `${quoted(header)}: ${counted(count, "cell")} ${count === 1 ? "is" : "are"} erased, because the revision has a blank there, ${first}.`;
    case "no value text":
      return `${quoted(header)}: ${counted(count, "text")} such as ${quoted(text, 20)} ${count === 1 ? "stands" : "stand"} for no value and ${count === 1 ? "was" : "were"} taken for blank, ${first}.`;
    case "strange text":
      return `${quoted(header)}: ${counted(count, "cell")} of the revision ${count === 1 ? "is" : "are"} no number and ${count === 1 ? "was" : "were"} left aside, ${first} with ${quoted(text, 20)}.`;
    case "outside":
      return `${quoted(header)}: ${counted(count, "value")} of the revision ${count === 1 ? "is" : "are"} out of range and ${count === 1 ? "was" : "were"} left aside, ${first} with ${text}.`;
    case "lost uncertainty":
      return `${quoted(header)}: ${counted(count, "new value")} ${count === 1 ? "comes" : "come"} without uncertainty; the old one stays beside ${count === 1 ? "it" : "them"}, ${first}.`;
    case "formula kept":
      return `${quoted(header)}: ${counted(count, "cell")} ${count === 1 ? "holds a formula and was" : "hold formulas and were"} left as ${count === 1 ? "it is" : "they are"}, ${first}.`;
    case "two uncertainties in one":
      return `${quoted(header)}: the revision gives an upper and a lower uncertainty and the table has one column; the larger of both counts, in ${counted(count, "row")}.`;
  }
}
