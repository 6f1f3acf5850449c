import { once } from "node:events";
import { exitCode } from "./exitCode.js";
import { ioProblem } from "./ioProblem.js";
import { run } from "./run.js";

process.stdout.on("error", (error: NodeJS.ErrnoException) => {
  // A reader such as `head` that has seen enough closes the pipe: that is no failure.
  if (error.code === "EPIPE") process.exit(exitCode.done);
  process.stderr.write(`barycell: ${ioProblem("write", "standard output", error).message}\n`);
  process.exit(exitCode.file);
});

let isMidLine = false;

process.exitCode = await run(process.argv.slice(2), {
  input: process.stdin,
  isScreen: process.stderr.isTTY === true,
  note(text) {
    // A table without a last line ending, and what is said of it, may share a screen.
    if (isMidLine && process.stdout.isTTY && process.stderr.isTTY) process.stderr.write("\n");
    isMidLine = false;
    process.stderr.write(text);
  },
  async out(piece) {
    if (piece.length > 0) isMidLine = typeof piece === "string" && !piece.endsWith("\n");
    if (!process.stdout.write(piece)) await once(process.stdout, "drain");
  },
});
