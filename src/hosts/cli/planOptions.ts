import { type PlanField, type PlanOptions, readPlanOptions } from "../../plan/readPlanOptions.js";
import { usualPlanTexts } from "../../plan/usualPlanTexts.js";
import { type CommandLine, optionValue } from "./commandLine.js";
import { UsageProblem } from "./usageProblem.js";

/** What the command line says of a plan; the site as typed, for it may stand in the table. */
export function planOptions(line: CommandLine): PlanOptions & { readonly site: string } {
  const needed = (name: string, example: string) => {
    const text = optionValue(line, name);
    if (text === undefined) throw new UsageProblem(`${name} is missing; give it, for example ${name} ${example}.`);
    return text;
  };
  const given = (name: string) => (line.options.get(name) ?? []).map(([text]) => text!);
  const usual = (field: keyof typeof usualPlanTexts) => optionValue(line, optionName(field)) ?? usualPlanTexts[field];
  const texts = {
    from: needed("--from", "2027-02-01"),
    to: needed("--to", "2027-07-31"),
    value: needed("--value", '"Priority"'),
    name: optionValue(line, "--name"),
    named: readColumns(given("--column")),
    hours: needed("--hours", "120"),
    must: given("--must"),
    excluded: given("--exclude"),
    phases: usual("phases"),
    efficiency: usual("efficiency"),
    airmass: usual("airmass"),
    sun: usual("sun"),
    moon: usual("moon"),
    width: usual("width"),
    perNight: usual("perNight"),
    gap: usual("gap"),
  };
  const site = needed("--site", '"-70.7345 deg, -29.2584 deg, 2400 m"');
  const read = readPlanOptions(texts, optionName);
  if ("problems" in read) throw new UsageProblem(read.problems[0]!.problem);
  return { ...read, site };
}

function optionName(field: PlanField): string {
  return field === "perNight" ? "--per-night" : `--${field}`;
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
