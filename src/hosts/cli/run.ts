import { nearest } from "../../units/nearest.js";
import type { Command } from "./command.js";
import { readCommandLine } from "./commandLine.js";
import { bench } from "./commands/bench.js";
import { calc } from "./commands/calc.js";
import { check } from "./commands/check.js";
import { convert } from "./commands/convert.js";
import { demo } from "./commands/demo.js";
import { explain } from "./commands/explain.js";
import { fill } from "./commands/fill.js";
import { functions } from "./commands/functions.js";
import { plan } from "./commands/plan.js";
import { recalc } from "./commands/recalc.js";
import { revise } from "./commands/revise.js";
import { units } from "./commands/units.js";
import { exitCode } from "./exitCode.js";
import { IoProblem } from "./ioProblem.js";
import type { Terminal } from "./terminal.js";
import { UsageProblem } from "./usageProblem.js";
import { version } from "./version.js";

const commands: readonly Command[] = [
  bench,
  calc,
  fill,
  plan,
  convert,
  check,
  recalc,
  revise,
  functions,
  explain,
  units,
  demo,
];

const help = `barycell: unit-safe functions for radial-velocity target tables

${commands.map(({ name, summary }) => `  barycell ${name.padEnd(10)} ${summary}`).join("\n")}

  barycell COMMAND --help tells about one command; barycell --version prints the version.

Exit codes: ${exitCode.done} done; ${exitCode.cellError} a formula or a cell has an error (fill: with --strict), or there is something to look at
(check), or nothing could be taken over (revise); ${exitCode.usage} the command line cannot be understood; ${exitCode.file} a file cannot be
read or written; ${exitCode.changed} values of a workbook are not what its formulas give (recalc); ${exitCode.crossed} a row crossed a
condition (revise: with --fail-on-crossing).
`;

/** Runs one command line; resolves to the exit code. */
export async function run(words: readonly string[], terminal: Terminal): Promise<number> {
  const [name, ...rest] = words;
  if (name === "help" && rest.length > 0) return run([...rest, "--help"], terminal);
  if (name === undefined || name === "--help" || name === "-h" || name === "help") {
    await terminal.out(help);
    return name === undefined ? exitCode.usage : exitCode.done;
  }
  if (name === "--version") {
    await terminal.out(`${version}\n`);
    return exitCode.done;
  }
  const command = commands.find((candidate) => candidate.name === name);
  if (!command) return complain(terminal, "barycell", unknownCommand(name), exitCode.usage);
  if (rest.includes("--help") || rest.includes("-h")) {
    await terminal.out(command.help);
    return exitCode.done;
  }
  try {
    return await command.run(readCommandLine(rest, command.options), terminal);
  } catch (error) {
    if (error instanceof UsageProblem) {
      const more = `\nbarycell ${name} --help tells more.`;
      return complain(terminal, `barycell ${name}`, `${error.message}${more}`, exitCode.usage);
    }
    if (error instanceof IoProblem) return complain(terminal, `barycell ${name}`, error.message, exitCode.file);
    throw error;
  }
}

function unknownCommand(name: string): string {
  const near = nearest(
    name,
    commands.map((command) => command.name),
  );
  return `there is no command ${name}; ${near ? `did you mean ${near}?` : "barycell --help lists them."}`;
}

function complain(terminal: Terminal, who: string, message: string, code: number): number {
  terminal.note(`${who}: ${message}\n`);
  return code;
}
