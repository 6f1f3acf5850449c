import { fileURLToPath } from "node:url";
import { build } from "esbuild";
import type { BrowserContext, Page } from "playwright-core";
import { type Served, serveFiles } from "../../../browser/serveFiles.js";
import type { createBenchWorkerParts } from "./harness/parts.js";

type Parts = ReturnType<typeof createBenchWorkerParts>;

/** A tab whose worker holds books, driven from here. */
export interface StoreTab {
  readonly page: Page;
  call<Name extends keyof Parts>(
    name: Name,
    ...given: Parameters<Parts[Name]>
  ): Promise<Awaited<ReturnType<Parts[Name]>>>;
  /** Ends the worker at once, whatever it is doing, and starts another one. */
  restart(): Promise<void>;
}

const page = `<!doctype html><title>store</title><script src="page.js"></script>`;

const pageScript = `
  let worker, last = 0, waiting = new Map();
  globalThis.saved = 0;
  globalThis.restart = () => {
    worker?.terminate();
    waiting.clear();
    worker = new Worker("worker.js");
    worker.onmessage = ({ data }) => {
      if (data.saved !== undefined) globalThis.saved = data.saved;
      const call = waiting.get(data.id);
      waiting.delete(data.id);
      if (data.fault !== undefined) call?.reject(new Error(data.fault));
      else if (data.id !== undefined) call?.resolve(data.answer);
    };
  };
  globalThis.call = (method, given) => new Promise((resolve, reject) => {
    waiting.set(++last, { resolve, reject });
    worker.postMessage({ id: last, method, given });
  });
  restart();
`;

/** The worker of the tests, bundled and served on this machine. */
export async function serveStore(): Promise<Served> {
  const entry = fileURLToPath(new URL("harness/worker.ts", import.meta.url));
  const { outputFiles } = await build({
    entryPoints: [entry],
    bundle: true,
    minify: true,
    write: false,
    format: "iife",
    target: "es2022",
  });
  const script = Buffer.from(outputFiles[0]!.contents);
  return serveFiles(
    new Map([
      ["", Buffer.from(page)],
      ["index.html", Buffer.from(page)],
      ["page.js", Buffer.from(pageScript)],
      ["worker.js", script],
    ]),
  );
}

export async function openTab(context: BrowserContext, base: string): Promise<StoreTab> {
  const tab = await context.newPage();
  await tab.goto(`${base}index.html`);
  return {
    page: tab,
    call: (name, ...given) =>
      tab.evaluate(
        ([method, values]) =>
          (globalThis as unknown as { call: (m: string, g: unknown[]) => never }).call(method, values),
        [name as string, given] as [string, unknown[]],
      ),
    restart: () => tab.evaluate(() => (globalThis as unknown as { restart: () => void }).restart()),
  };
}
