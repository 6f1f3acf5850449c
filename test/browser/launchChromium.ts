import { type Browser, chromium } from "playwright-core";
import { findChromium } from "./findChromium.js";

/** The system's Chromium without a window, kept from calling anywhere of its own accord. */
export function launchChromium(): Promise<Browser> {
  const executablePath = findChromium();
  if (!executablePath) throw new Error("no Chromium: set CHROMIUM to its path, or install the package chromium");
  return chromium.launch({
    executablePath,
    args: [
      "--no-sandbox",
      "--disable-gpu",
      "--disable-quic",
      "--no-first-run",
      "--disable-background-networking",
      "--disable-component-update",
      "--disable-sync",
    ],
  });
}
