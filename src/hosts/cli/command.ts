import type { CommandLine, OptionShapes } from "./commandLine.js";
import type { Terminal } from "./terminal.js";

/** One command of the command line. */
export interface Command {
  readonly name: string;
  /** One line for the list of commands. */
  readonly summary: string;
  readonly help: string;
  readonly options: OptionShapes;
  /** Resolves to the exit code. */
  run(line: CommandLine, terminal: Terminal): Promise<number>;
}
