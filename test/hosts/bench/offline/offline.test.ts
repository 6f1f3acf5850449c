import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";
import { build } from "esbuild";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { keptFilesLine } from "../../../../src/hosts/bench/build/keptFiles.js";
import { type ServedFolder, serveFolder } from "../../../../src/hosts/cli/serve/serveFolder.js";
import { launchChromium } from "../../../browser/launchChromium.js";

let browser: Browser;
let folder: string;
let scripts: { readonly page: string; readonly worker: string };
let served: ServedFolder;

async function bundled(path: string): Promise<string> {
  const { outputFiles } = await build({
    entryPoints: [fileURLToPath(new URL(path, import.meta.url))],
    bundle: true,
    write: false,
    format: "iife",
    target: "es2022",
  });
  return outputFiles[0]!.text;
}

/** A page whose only word is its version, with the service worker of the real one. */
async function publish(version: string): Promise<void> {
  const files = new Map([
    ["index.html", `<!doctype html><title>offline</title><script src="main.js" defer></script>`],
    ["main.js", `document.title = "${version}";\n${scripts.page}`],
  ]);
  for (const [name, text] of files) await writeFile(join(folder, name), text);
  await writeFile(join(folder, "service-worker.js"), keptFilesLine(files) + scripts.worker);
}

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "barycell-offline-"));
  const [page, worker] = await Promise.all([
    bundled("offlinePage.ts"),
    bundled("../../../../src/hosts/bench/offline/serviceWorker.ts"),
  ]);
  scripts = { page, worker };
  await publish("one");
  served = await serveFolder(pathToFileURL(`${folder}/`), 0, "test");
  browser = await launchChromium();
});

afterAll(async () => {
  await browser?.close();
  await served?.close();
  await rm(folder, { recursive: true, force: true });
});

const isControlled = () => navigator.serviceWorker.controller !== null;
const isOffered = () => document.documentElement.dataset.offered === "yes";

async function opened(): Promise<Page> {
  const page = await (await browser.newContext()).newPage();
  await page.goto(served.address);
  await page.waitForFunction(isControlled);
  return page;
}

test("a newer version is offered, comes when it is let in, and the page then opens without the server", async () => {
  const page = await opened();
  expect(await page.title()).toBe("one");
  expect(await page.evaluate(isOffered)).toBe(false);

  await publish("two");
  await page.reload();
  expect(await page.title()).toBe("one");
  await page.waitForFunction(isOffered);
  await page.evaluate(() => (globalThis as unknown as { takeOver: () => void }).takeOver());
  await page.waitForFunction(() => document.title === "two");

  const [caches] = await page.evaluate(async () => [await globalThis.caches.keys()]);
  expect(caches).toHaveLength(1);
  const port = served.port;
  await served.close();
  await page.reload();
  expect(await page.title()).toBe("two");
  served = await serveFolder(pathToFileURL(`${folder}/`), port, "test");
});

test("a version of which one file does not fit its digest is not taken", async () => {
  const page = await opened();
  const version = await page.title();
  await publish("three");
  await writeFile(join(folder, "main.js"), "document.title = 'torn'");
  await page.reload();
  const state = await page.evaluate(async () => {
    const registration = await navigator.serviceWorker.getRegistration();
    await registration?.update().catch(() => undefined);
    const coming = registration?.installing;
    await new Promise<void>((resolve) => {
      if (!coming) return resolve();
      coming.addEventListener("statechange", () => resolve());
      return undefined;
    });
    return coming?.state ?? "none";
  });
  expect(["redundant", "none"]).toContain(state);
  await page.reload();
  expect(await page.title()).toBe(version);
  expect(await page.evaluate(isOffered)).toBe(false);
  await publish(version);
});
