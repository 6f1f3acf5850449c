import { describeFunction } from "../../../catalog/describeFunction.js";
import { definitions } from "../../../functions/definitions.js";
import { nearest } from "../../../units/nearest.js";
import type { Command } from "../command.js";
import { exitCode } from "../exitCode.js";
import { UsageProblem } from "../usageProblem.js";

export const explain: Command = {
  name: "explain",
  summary: "tell all about one function, its examples run",
  help: `barycell explain NAME

Tells how a function is called, what its inputs are and between which bounds, its formula and source, and runs its
examples. NAME is REFLEX or BARY.REFLEX, capitals or not.
`,
  options: {},
  async run(line, terminal) {
    const [asked, ...more] = line.operands;
    if (asked === undefined || more.length > 0) throw new UsageProblem("give one function's name, for example REFLEX.");
    const name = asked.toUpperCase().replace(/^BARY\./, "");
    const found = definitions.find((definition) => definition.name === name);
    if (!found) {
      const near = nearest(
        name,
        definitions.map((definition) => definition.name),
      );
      throw new UsageProblem(
        `there is no function ${asked}; ${near ? `did you mean ${near}?` : "barycell functions lists them."}`,
      );
    }
    await terminal.out(`${describeFunction(found).join("\n")}\n`);
    return exitCode.done;
  },
};
