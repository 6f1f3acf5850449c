import { readFileSync } from "node:fs";

export type Row = Readonly<Record<string, string>>;

/** The rows of a comma-separated table beside the tests: names in its first line, notes in lines that start with #. */
export function readTable(file: URL): Row[] {
  const lines = readFileSync(file, "utf8")
    .split("\n")
    .filter((line) => line !== "" && !line.startsWith("#"));
  const [names, ...rows] = lines.map((line) => line.split(","));
  return rows.map((cells) => Object.fromEntries(names.map((name, index) => [name, cells[index]])));
}
