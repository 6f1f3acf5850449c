import { fileURLToPath } from "node:url";
import type { Command } from "../command.js";
import { readCommandLine } from "../commandLine.js";
import { demoColumns } from "../demoColumns.js";
import type { Terminal } from "../terminal.js";
import { fill } from "./fill.js";

export const demo: Command = {
  name: "demo",
  summary: "derive the columns of an invented survey",
  help: `barycell demo

Runs barycell fill over the table of an invented survey that comes with the package, from orbit to shift and back, and
prints the command and the table. A mass is missing and an eccentricity is wrong on purpose.
`,
  options: {},
  async run(_, terminal: Terminal) {
    const path = fileURLToPath(new URL("../demo.csv", import.meta.url));
    const sets = demoColumns.flatMap(({ header, formula }) => ["--set", header, formula]);
    await terminal.out(`barycell fill ${path} --show 20 \\\n${demoColumns.map(setText).join(" \\\n")}\n\n`);
    return fill.run(readCommandLine([path, "--show", "20", ...sets], fill.options), terminal);
  },
};

function setText({ header, formula }: { readonly header: string; readonly formula: string }): string {
  return `  --set '${header}' '${formula}'`;
}
