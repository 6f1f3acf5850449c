import { describeReading } from "../../../catalog/describeReading.js";
import { describeUnits } from "../../../catalog/describeUnits.js";
import type { Command } from "../command.js";
import { exitCode } from "../exitCode.js";

export const units: Command = {
  name: "units",
  summary: "tell how a unit, header or quantity is read, or list the units",
  help: `barycell units [TEXT]

Without TEXT, lists every unit that is read, its spellings and where they come from.
With TEXT, a unit, a header or a number with its unit, tells what was understood.

  barycell units "km s-1"
  barycell units "Mass [Mjup]"
  barycell units "4.2308(2) d"
`,
  options: {},
  async run(line, terminal) {
    if (line.operands.length === 0) {
      await terminal.out(`${describeUnits().join("\n")}\n`);
      return exitCode.done;
    }
    const { lines, understood } = describeReading(line.operands.join(" "));
    await terminal.out(`${lines.join("\n")}\n`);
    return understood ? exitCode.done : exitCode.cellError;
  },
};
