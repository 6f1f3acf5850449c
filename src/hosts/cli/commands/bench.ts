import { access } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import type { Command } from "../command.js";
import { optionValue } from "../commandLine.js";
import { exitCode } from "../exitCode.js";
import { IoProblem, ioProblem } from "../ioProblem.js";
import { openBrowser } from "../serve/openBrowser.js";
import { serveSomewhere } from "../serve/serveSomewhere.js";
import type { Terminal } from "../terminal.js";
import { UsageProblem } from "../usageProblem.js";

const usualPort = 4680;

export const bench: Command = {
  name: "bench",
  summary: "serve the worksheet page to this machine's browser",
  help: `barycell bench [--port N] [--open]

Serves the worksheet page at http://127.0.0.1:${usualPort}/ to this machine alone, until Ctrl+C. Everything is calculated and
kept in the browser. Where the port is taken, the next free one is used; a browser keeps the sheets of each port apart.

  --port N   serve at this port
  --open     open the page in the system's browser
`,
  options: { "--port": 1, "--open": 0 },
  async run(line, terminal) {
    if (line.operands.length > 0) throw new UsageProblem("it takes no operands; the page opens files itself.");
    const port = portOf(optionValue(line, "--port"));
    const folder = new URL(/* webpackIgnore: true */ "bench/", import.meta.url);
    await access(new URL("index.html", folder)).catch(() => {
      throw new IoProblem(`the page is not built: there is no "${fileURLToPath(folder)}"; npm run build makes it.`);
    });
    const serving = await serveSomewhere(folder, port).catch((error) => {
      throw ioProblem("listen at", `127.0.0.1:${port}`, error);
    });
    const open = line.options.has("--open");
    if (serving.is === "served already") {
      await terminal.out(`Barycell is served already: ${serving.address}\n`);
      if (open) await show(serving.address, terminal);
      return exitCode.done;
    }
    const { served } = serving;
    const ended = interrupted();
    await terminal.out(`Barycell is at ${served.address} until Ctrl+C\n`);
    if (port !== 0 && served.port !== port) {
      terminal.note(
        `Port ${port} is taken. A browser keeps the sheets of each port apart: those made at ${port} are not seen at ${served.port}.\n`,
      );
    }
    if (open) await show(served.address, terminal);
    await ended;
    await served.close();
    return exitCode.done;
  },
};

function portOf(text: string | undefined): number {
  if (text === undefined) return usualPort;
  if (/^\d{1,5}$/.test(text) && Number(text) <= 65_535) return Number(text);
  throw new UsageProblem(`--port is ${text}; a number up to 65535 is needed, for example ${usualPort}.`);
}

async function show(address: string, terminal: Terminal): Promise<void> {
  if (!(await openBrowser(address))) terminal.note(`No browser could be started; open ${address} yourself.\n`);
}

function interrupted(): Promise<void> {
  return new Promise((resolve) => {
    process.once("SIGINT", () => resolve());
    process.once("SIGTERM", () => resolve());
  });
}
