import { extname } from "node:path";
import { UsageProblem } from "./usageProblem.js";

/** The forms that tables are written in. */
export const tableForms = ["csv", "tsv", "ecsv", "votable", "votable-binary2", "xlsx"] as const;

export type TableForm = (typeof tableForms)[number];

const formsOfExtensions: Readonly<Record<string, TableForm>> = {
  ".csv": "csv",
  ".tsv": "tsv",
  ".tab": "tsv",
  ".ecsv": "ecsv",
  ".xml": "votable",
  ".vot": "votable",
  ".votable": "votable",
  ".xlsx": "xlsx",
};

/** The form that the end of a file's name asks for; undefined where it names none. */
export function formOfPath(path: string): TableForm | undefined {
  return formsOfExtensions[extname(path).toLowerCase()];
}

export function formNamed(name: string): TableForm {
  const form = tableForms.find((known) => known === name.toLowerCase());
  if (form === undefined) throw new UsageProblem(`--to is "${name}"; it is one of ${tableForms.join(", ")}.`);
  return form;
}
