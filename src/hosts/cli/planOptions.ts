import * as quantity from "../../functions/quantities.js";
import type { Quantity } from "../../functions/quantity.js";
import type { Limits } from "../../plan/limits.js";
import type { PlanWish } from "../../plan/planTable.js";
import { readOption } from "../../plan/readOption.js";
import { readInstant } from "../../units/readInstant.js";
import { type CommandLine, optionValue } from "./commandLine.js";
import { UsageProblem } from "./usageProblem.js";

/** What the command line says of a plan, but for the site, which may stand in the table. */
export interface PlanOptions {
  readonly wish: PlanWish;
  readonly budget: number;
  readonly from: number;
  readonly to: number;
  readonly site: string;
  readonly must: readonly string[];
  readonly excluded: readonly string[];
  readonly limits: Limits;
}

export function planOptions(line: CommandLine): PlanOptions {
  const needed = (name: string, example: string) => {
    const text = optionValue(line, name);
    if (text === undefined) throw new UsageProblem(`${name} is missing; give it, for example ${name} ${example}.`);
    return text;
  };
  const given = (name: string) => (line.options.get(name) ?? []).map(([text]) => text!);
  const day = 86400;
  const from = readDate("--from", needed("--from", "2027-02-01"));
  const to = readDate("--to", needed("--to", "2027-07-31"));
  if (to < from) throw new UsageProblem("--to lies before --from; give the first night first.");
  return {
    wish: {
      value: needed("--value", '"Priority"'),
      name: optionValue(line, "--name"),
      named: readColumns(given("--column")),
      phases: readPhases(optionValue(line, "--phases") ?? "quadrature"),
      efficiency: readNamed("--efficiency", quantity.efficiency, optionValue(line, "--efficiency") ?? "1"),
    },
    budget: readHours(needed("--hours", "120")),
    from,
    to,
    site: needed("--site", '"-70.7345 deg, -29.2584 deg, 2400 m"'),
    must: given("--must"),
    excluded: given("--exclude"),
    limits: {
      airmass: readNamed("--airmass", quantity.airmass, optionValue(line, "--airmass") ?? "2"),
      sunBelow: readNamed("--sun", quantity.sunBelow, optionValue(line, "--sun") ?? "-18 deg"),
      moonDistance: readNamed("--moon", quantity.moonDistance, optionValue(line, "--moon") ?? "0 deg"),
      gap: readNamed("--gap", quantity.overhead, optionValue(line, "--gap") ?? "0 s") / day,
      phaseWidth: readWidth(optionValue(line, "--width") ?? "0.1"),
      perNight: readCount(optionValue(line, "--per-night") ?? "1"),
    },
  };
}

function readNamed(name: string, one: Quantity, text: string): number {
  const read = readOption({ ...one, name }, text);
  if (typeof read !== "number") throw new UsageProblem(read.problem);
  return read;
}

/** The ephemeris and the leap seconds reach from 1972 to 2035. */
function readDate(name: string, text: string): number {
  const date = /^\d{4}-\d\d-\d\d$/.test(text) ? readInstant(text)?.value : undefined;
  const { lower, upper } = quantity.night;
  if (date !== undefined && date >= lower!.at && date < upper!.at - 1) return date;
  throw new UsageProblem(`${name} is "${text}"; it is a date from 1972-01-01 to 2035-12-30, for example 2027-02-01.`);
}

function readHours(text: string): number {
  const hours = Number(/^\s*([\d.eE+]+)\s*h?\s*$/.exec(text)?.[1] ?? Number.NaN);
  if (hours > 0 && Number.isFinite(hours)) return hours;
  throw new UsageProblem(`--hours is "${text}"; it is a number of hours above 0, for example 120.`);
}

function readCount(text: string): number {
  const count = Number(text);
  if (Number.isInteger(count) && count > 0) return count;
  throw new UsageProblem(`--per-night is "${text}"; it is a number of visits, for example 1.`);
}

function readWidth(text: string): number {
  const width = Number(text);
  if (width > 0 && width <= 0.5) return width;
  throw new UsageProblem(`--width is "${text}"; it is a part of the period above 0 and at most 0.5, for example 0.1.`);
}

function readPhases(text: string): PlanWish["phases"] {
  if (text === "quadrature") return text;
  if (text === "any") return [];
  const phases = text.split(",").map((part) => (part.trim() === "" ? Number.NaN : Number(part)));
  if (phases.every((phase) => phase >= 0 && phase < 1)) return phases;
  throw new UsageProblem(`--phases is "${text}"; it is quadrature, any, or phases from 0 to 1 such as 0.25,0.75.`);
}

function readColumns(texts: readonly string[]): Map<string, string> {
  return new Map(
    texts.map((text) => {
      const at = text.indexOf("=");
      if (at > 0) return [text.slice(0, at).trim(), text.slice(at + 1).trim()];
      throw new UsageProblem(`--column is "${text}"; it is a quantity and a header, for example "period=P orb [d]".`);
    }),
  );
}
