import * as quantity from "../functions/quantities.js";
import type { Quantity } from "../functions/quantity.js";
import { readInstant } from "../units/readInstant.js";
import type { Limits } from "./limits.js";
import type { PlanWish } from "./planTable.js";
import { readOption } from "./readOption.js";
import type { usualPlanTexts } from "./usualPlanTexts.js";

/** What was typed of a plan, but for the site, which may stand in the table. */
export interface PlanTexts {
  readonly hours: string;
  readonly from: string;
  readonly to: string;
  /** Header of the column of values; `name` that of names, where it is not to be guessed. */
  readonly value: string;
  readonly name: string | undefined;
  /** Headers by the name of the quantity. */
  readonly named: ReadonlyMap<string, string>;
  readonly must: readonly string[];
  readonly excluded: readonly string[];
  readonly phases: string;
  readonly efficiency: string;
  readonly airmass: string;
  readonly sun: string;
  readonly moon: string;
  readonly width: string;
  readonly perNight: string;
  readonly gap: string;
}

/** The texts that are read here; whether the others mean anything is seen with the table. */
export type PlanField = "hours" | "from" | "to" | keyof typeof usualPlanTexts;

export interface PlanOptions {
  readonly wish: PlanWish;
  /** Telescope time there is [h]. */
  readonly budget: number;
  /** Dates of the first and of the last night [d from J2000.0]. */
  readonly from: number;
  readonly to: number;
  readonly must: readonly string[];
  readonly excluded: readonly string[];
  readonly limits: Limits;
}

export interface FieldProblem<Field extends string> {
  readonly field: Field;
  readonly problem: string;
}

type Read<Value> = Value | { readonly problem: string };

/** Reads what was typed; `labelOf` is what a host calls a field in its sentences. */
export function readPlanOptions(
  texts: PlanTexts,
  labelOf: (field: PlanField) => string,
): PlanOptions | { readonly problems: readonly FieldProblem<PlanField>[] } {
  const problems: FieldProblem<PlanField>[] = [];
  const read = <Value>(field: PlanField, of: (text: string, label: string) => Read<Value>): Value => {
    const found = of(texts[field], labelOf(field));
    if (typeof found === "object" && found !== null && "problem" in found) {
      problems.push({ field, problem: found.problem });
    }
    return found as Value;
  };
  const day = 86400;
  const from = read("from", readDate);
  const to = read("to", readDate);
  if (to < from) problems.push({ field: "to", problem: laterFirst(labelOf("from"), labelOf("to")) });
  const phases = read("phases", readPhases);
  const efficiency = read("efficiency", quantityOf(quantity.efficiency));
  const budget = read("hours", readHours);
  const limits: Limits = {
    airmass: read("airmass", quantityOf(quantity.airmass)),
    sunBelow: read("sun", quantityOf(quantity.sunBelow)),
    moonDistance: read("moon", quantityOf(quantity.moonDistance)),
    gap: read("gap", quantityOf(quantity.overhead)) / day,
    phaseWidth: read("width", readWidth),
    perNight: read("perNight", readCount),
  };
  if (problems.length > 0) return { problems };
  const { value, name, named, must, excluded } = texts;
  return { wish: { value, name, named, phases, efficiency }, budget, from, to, must, excluded, limits };
}

export function laterFirst(from: string, to: string): string {
  return `${to} lies before ${from}; give the first night first.`;
}

/** A quantity with its unit, under a host's own name for it. */
export function quantityOf(one: Quantity) {
  return (text: string, label: string) => readOption({ ...one, name: label }, text);
}

/** The ephemeris and the leap seconds reach from 1972 to 2035. */
export function readDate(text: string, label: string): Read<number> {
  const bare = text.trim();
  const date = /^\d{4}-\d\d-\d\d$/.test(bare) ? readInstant(bare)?.value : undefined;
  const { lower, upper } = quantity.night;
  if (date !== undefined && date >= lower!.at && date < upper!.at - 1) return date;
  return wrong(label, text, "it is a date from 1972-01-01 to 2035-12-30, for example 2027-02-01");
}

function readHours(text: string, label: string): Read<number> {
  const hours = Number(/^\s*([\d.eE+]+)\s*h?\s*$/.exec(text)?.[1] ?? Number.NaN);
  if (hours > 0 && Number.isFinite(hours)) return hours;
  return wrong(label, text, "it is a number of hours above 0, for example 120");
}

function readCount(text: string, label: string): Read<number> {
  const count = Number(text);
  if (Number.isInteger(count) && count > 0) return count;
  return wrong(label, text, "it is a number of visits, for example 1");
}

function readWidth(text: string, label: string): Read<number> {
  const width = Number(text);
  if (width > 0 && width <= 0.5) return width;
  return wrong(label, text, "it is a part of the period above 0 and at most 0.5, for example 0.1");
}

function readPhases(text: string, label: string): Read<PlanWish["phases"]> {
  const bare = text.trim();
  if (bare === "quadrature") return bare;
  if (bare === "any") return [];
  const phases = bare.split(",").map((part) => (part.trim() === "" ? Number.NaN : Number(part)));
  if (phases.every((phase) => phase >= 0 && phase < 1)) return phases;
  return wrong(label, text, "it is quadrature, any, or phases from 0 to 1 such as 0.25,0.75");
}

function wrong(label: string, text: string, needed: string): { readonly problem: string } {
  return { problem: `${label} is ${text.trim() === "" ? "blank" : `"${text}"`}; ${needed}.` };
}
