import { signature } from "../../../catalog/signature.js";
import { definitions } from "../../../functions/definitions.js";
import type { Command } from "../command.js";
import { exitCode } from "../exitCode.js";
import { UsageProblem } from "../usageProblem.js";

export const functions: Command = {
  name: "functions",
  summary: "list the functions and the questions they answer",
  help: `barycell functions

Lists every function: how it is called and the question it answers. Inputs in square brackets may be left out.
`,
  options: {},
  async run(line, terminal) {
    if (line.operands.length > 0)
      throw new UsageProblem("it takes no operands; barycell explain NAME tells about one function.");
    const lines = definitions.map((definition) => `${signature(definition)}\n    ${definition.question}\n`);
    await terminal.out(lines.join(""));
    return exitCode.done;
  },
};
