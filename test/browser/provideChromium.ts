import { execFile } from "node:child_process";
import { promisify } from "node:util";
import { findChromium } from "./findChromium.js";

const run = promisify(execFile);

/** Some tests need a browser; on a bare Debian that lets us, it is installed from the system's own packages. */
export default async function provideChromium(): Promise<void> {
  if (findChromium()) return;
  if (process.getuid?.() === 0 && process.platform === "linux") {
    const quiet = { env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" }, maxBuffer: 1 << 26 };
    await run("apt-get", ["update", "-qq"], quiet)
      .then(() => run("apt-get", ["install", "-y", "-qq", "--no-install-recommends", "chromium"], quiet))
      .catch(() => undefined);
    if (findChromium()) return;
  }
  throw new Error(
    "some tests run in Chromium: install it (Debian: apt-get install chromium) or set CHROMIUM to its path",
  );
}
