import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { type Browser, chromium } from "playwright-core";
import { findChromium } from "./findChromium.js";

export interface StartedChromium {
  readonly browser: Browser;
  /** Ends the browser as a crash would: it has no time to write anything. */
  kill(): Promise<void>;
}

/** Chromium as a process of its own, with a profile that outlives it. */
export async function startChromium(profile: string): Promise<StartedChromium> {
  const executable = findChromium();
  if (!executable) throw new Error("no Chromium: set CHROMIUM to its path, or install the package chromium");
  const child = spawn(
    executable,
    [
      "--headless=new",
      "--no-sandbox",
      "--disable-gpu",
      "--no-first-run",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
      "--remote-debugging-port=0",
      `--user-data-dir=${profile}`,
    ],
    // A group of its own, so that its helpers end with it.
    { stdio: ["ignore", "ignore", "pipe"], detached: true },
  );
  const browser = await chromium.connectOverCDP(await debuggingAddress(child));
  return {
    browser,
    async kill() {
      const ended = once(child, "exit");
      process.kill(-(child.pid as number), "SIGKILL");
      await ended;
    },
  };
}

function debuggingAddress(child: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    let told = "";
    child.stderr?.on("data", (piece) => {
      told += piece;
      const address = /DevTools listening on (ws:\S+)/.exec(told)?.[1];
      if (address) resolve(address);
    });
    child.once("exit", () => reject(new Error(`Chromium ended: ${told}`)));
  });
}
