import { FileProblem } from "../fileProblem.js";

export function damaged(what: string): FileProblem {
  return new FileProblem(
    "damaged",
    `The file is damaged or was cut off: ${what}; copy it again from where it came, or save it again there.`,
  );
}

export function tooLarge(what: string): FileProblem {
  return new FileProblem(
    "too-large",
    `The file would unpack to more than can be held: ${what}; save only the sheets that are needed, or as CSV.`,
  );
}

export function megabytes(bytes: number): string {
  return `${Math.round(bytes / 1e6).toLocaleString("en")} MB`;
}
