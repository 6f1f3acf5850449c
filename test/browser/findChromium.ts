import { accessSync, constants } from "node:fs";

const places = [process.env.CHROMIUM, "/usr/bin/chromium", "/usr/bin/chromium-browser"];

/** The browser of the system: the one that CHROMIUM names, or else where Debian puts it; undefined where there is none. */
export function findChromium(): string | undefined {
  return places.find((path) => path !== undefined && isRunnable(path));
}

function isRunnable(path: string): boolean {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
