import * as quantity from "../../../../functions/quantities.js";
import type { Quantity } from "../../../../functions/quantity.js";
import {
  laterFirst,
  type PlanField,
  type PlanOptions,
  quantityOf,
  readDate,
  readPlanOptions,
} from "../../../../plan/readPlanOptions.js";
import { readSitePart } from "../../../../plan/readSite.js";
import type { Site } from "../../../../plan/site.js";
import type { TableColumn } from "../../../../table/checkTable.js";
import type { PlanProblem, PlanWord, PlanWords } from "../../protocol/plan.js";

/** What the fields are called in sentences. */
const labels: Readonly<Record<PlanField, string>> = {
  hours: "the budget",
  from: "the first night",
  to: "the last night",
  airmass: "the airmass limit",
  sun: "the Sun's altitude",
  moon: "the distance from the Moon",
  phases: "the choice of phases",
  width: "the width",
  perNight: "the limit of visits a night",
  gap: "the time between visits",
  efficiency: "the usable part",
};

interface Problems {
  readonly problems: readonly PlanProblem[];
}

/** What was typed, in base units; problems are those of one field each. */
export function readWords(
  words: PlanWords,
  table: readonly TableColumn[],
): (PlanOptions & { readonly site: Site }) | Problems {
  const read = readPlanOptions({ ...words, name: undefined, named: namedColumns(words) }, (field) => labels[field]);
  const site = siteOfWords(words, table);
  const problems: PlanProblem[] = "problems" in site ? [...site.problems] : [];
  if ("problems" in read) problems.push(...read.problems.map(({ field, problem }) => told(field, problem)));
  if (words.value === "") problems.push(told("value", "choose the column that says what a target is worth."));
  else if (!table.some(({ header }) => header === words.value)) {
    problems.push(told("value", `no column is headed "${words.value}"; choose another.`));
  }
  for (const [name, header] of namedColumns(words)) {
    if (table.some((column) => column.header === header)) continue;
    problems.push(told("columns", `${name} is to be in "${header}", and no column is headed so; choose another.`));
  }
  if (problems.length > 0 || "problems" in read || "problems" in site) return { problems };
  return { ...read, site };
}

export interface NightWords {
  readonly from: number;
  readonly to: number;
  readonly airmass: number;
  readonly sunBelow: number;
  readonly site: Site;
}

/** The part that says when and from where the sky is seen. */
export function readNightWords(words: PlanWords, table: readonly TableColumn[]): NightWords | Problems {
  const read = {
    from: readDate(words.from, labels.from),
    to: readDate(words.to, labels.to),
    airmass: quantityOf(quantity.airmass)(words.airmass, labels.airmass),
    sun: quantityOf(quantity.sunBelow)(words.sun, labels.sun),
  };
  const site = siteOfWords(words, table);
  const problems: PlanProblem[] = "problems" in site ? [...site.problems] : [];
  for (const [word, value] of Object.entries(read)) {
    if (typeof value !== "number") problems.push(told(word as PlanWord, value.problem));
  }
  const { from, to, airmass, sun } = read as Record<keyof typeof read, number>;
  if (to < from) problems.push(told("to", laterFirst(labels.from, labels.to)));
  return problems.length > 0 || "problems" in site ? { problems } : { from, to, airmass, sunBelow: sun, site };
}

/** Without a height it is at sea level. */
function siteOfWords(words: PlanWords, table: readonly TableColumn[]): Site | Problems {
  const problems: PlanProblem[] = [];
  const part = (word: "longitude" | "latitude" | "height", one: Quantity): number => {
    if (word === "height" && words.height.trim() === "") return 0;
    const read = readSitePart(one, words[word], table);
    if (typeof read === "number") return read;
    problems.push(told(word, read.problem));
    return Number.NaN;
  };
  const site = {
    longitude: part("longitude", quantity.longitude),
    latitude: part("latitude", quantity.latitude),
    height: part("height", quantity.height),
  };
  return problems.length > 0 ? { problems } : site;
}

export function namedColumns({ columns }: PlanWords): Map<string, string> {
  return new Map(Object.entries(columns).filter(([, header]) => header !== ""));
}

function told(word: PlanWord, message: string): PlanProblem {
  return { word, message };
}
