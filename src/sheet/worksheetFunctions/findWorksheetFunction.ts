import { counts } from "./aggregates/counts.js";
import { summaries } from "./aggregates/summaries.js";
import { sumProduct } from "./aggregates/sumProduct.js";
import { matrices } from "./arrays/matrices.js";
import { orders } from "./arrays/orders.js";
import { shapes } from "./arrays/shapes.js";
import { conditionals } from "./conditional/conditionals.js";
import { databases } from "./database/databases.js";
import { dates } from "./dates/dates.js";
import { dayCounts } from "./dates/dayCounts.js";
import { workdays } from "./dates/workdays.js";
import { betas } from "./distributions/betas.js";
import { continuous } from "./distributions/continuous.js";
import { discrete } from "./distributions/discrete.js";
import { normals } from "./distributions/normals.js";
import { students } from "./distributions/students.js";
import { numberBases } from "./engineering/bases.js";
import { bessels } from "./engineering/bessels.js";
import { complexes } from "./engineering/complexes.js";
import { conversions } from "./engineering/conversions.js";
import { annuities } from "./financial/annuities.js";
import { cashFlows } from "./financial/cashFlows.js";
import { informations } from "./information/informations.js";
import { logicals } from "./logical/logicals.js";
import { lookups } from "./lookup/lookups.js";
import { xlookups } from "./lookup/xlookups.js";
import { bits } from "./mathematics/bits.js";
import { combinatorics } from "./mathematics/combinatorics.js";
import { elementary } from "./mathematics/elementary.js";
import { special } from "./mathematics/special.js";
import { roundings } from "./rounding/roundings.js";
import { frequencies } from "./statistics/frequencies.js";
import { hypothesisTests } from "./statistics/hypothesisTests.js";
import { pairStatistics } from "./statistics/pairs.js";
import { ranks } from "./statistics/ranks.js";
import { regressions } from "./statistics/regressions.js";
import { joins } from "./text/joins.js";
import { textFormat } from "./text/textFormat.js";
import { texts } from "./text/texts.js";
import type { WorksheetFunction } from "./worksheetFunction.js";

/** A family of functions under the heading of the reference table. */
export interface Family {
  readonly heading: string;
  readonly functions: readonly WorksheetFunction[];
}

export const families: readonly Family[] = [
  { heading: "Mathematics", functions: [...elementary, ...combinatorics, ...special, ...bits, ...bessels] },
  { heading: "Rounding", functions: roundings },
  { heading: "Sums and counts", functions: [...counts, ...summaries, sumProduct, ...conditionals] },
  {
    heading: "Statistics",
    functions: [...ranks, ...pairStatistics, ...regressions, ...frequencies, ...hypothesisTests],
  },
  { heading: "Distributions", functions: [...normals, ...continuous, ...betas, ...students, ...discrete] },
  { heading: "Lookup", functions: [...lookups, ...xlookups] },
  { heading: "Arrays", functions: [...shapes, ...orders, ...matrices] },
  { heading: "Logical", functions: logicals },
  { heading: "Information", functions: informations },
  { heading: "Text", functions: [...texts, ...joins, textFormat] },
  { heading: "Dates and times", functions: [...dates, ...dayCounts, ...workdays] },
  { heading: "Engineering", functions: [...numberBases, ...complexes, ...conversions] },
  { heading: "Finance", functions: [...annuities, ...cashFlows] },
  { heading: "Records", functions: databases },
];

const byName = new Map(families.flatMap((family) => family.functions).map((each) => [each.name, each]));

/** The function of a name, in capital letters or not. */
export function findWorksheetFunction(name: string): WorksheetFunction | undefined {
  return byName.get(name.toUpperCase());
}

/** All names, in alphabetical order, for a nearest name. */
export const worksheetFunctionNames: readonly string[] = [...byName.keys()].sort();
