import { once } from "node:events";
import { run } from "./run.js";

// A reader such as `head` that has seen enough closes the pipe: that is no failure.
process.stdout.on("error", (error: NodeJS.ErrnoException) => {
  if (error.code === "EPIPE") process.exit(0);
  throw error;
});

process.exitCode = await run(process.argv.slice(2), {
  input: process.stdin,
  isScreen: process.stderr.isTTY === true,
  note: (text) => void process.stderr.write(text),
  async out(text) {
    if (!process.stdout.write(text)) await once(process.stdout, "drain");
  },
});
