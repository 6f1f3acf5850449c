import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, expect, test } from "vitest";
import type { Served } from "../../../browser/serveFiles.js";
import { startChromium } from "../../../browser/startChromium.js";
import { openTab, serveStore } from "./storePage.js";

let served: Served;
let profile: string;

beforeAll(async () => {
  served = await serveStore();
  profile = await mkdtemp(join(tmpdir(), "barycell-crash-"));
});

afterAll(async () => {
  await served?.close();
  await rm(profile, { recursive: true, force: true, maxRetries: 5 });
});

const [rows, columns] = [20_000, 12];
const savedSoFar = () => (globalThis as unknown as { saved: number }).saved;

test("a browser killed while it saves leaves a whole version, no older than the last it told of", async () => {
  let least = 0;
  for (const pause of [120, 260]) {
    const chromium = await startChromium(profile);
    try {
      const [context] = chromium.browser.contexts();
      const tab = await openTab(context!, served.base);
      if (least > 0) {
        const left = await tab.call("lastForever", rows, columns);
        expect(left).toBeGreaterThanOrEqual(least);
        await tab.restart();
      }
      tab.call("saveForever", rows, columns).catch(() => undefined);
      await tab.page.waitForFunction(() => (globalThis as unknown as { saved: number }).saved > 1);
      await tab.page.waitForTimeout(pause);
      least = await tab.page.evaluate(savedSoFar);
    } finally {
      await chromium.kill();
    }
  }
  const chromium = await startChromium(profile);
  try {
    const tab = await openTab(chromium.browser.contexts()[0]!, served.base);
    expect(await tab.call("lastForever", rows, columns)).toBeGreaterThanOrEqual(least);
  } finally {
    await chromium.kill();
  }
});
