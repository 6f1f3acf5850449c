import { readFile } from "node:fs/promises";
import type { Browser, Page } from "playwright-core";
import { launchChromium } from "../../../browser/launchChromium.js";
import { serveFiles } from "../../../browser/serveFiles.js";
import type { standIn as StandIn } from "./standIn/main.js";

declare global {
  var standIn: typeof StandIn;
}

export interface EditorBrowser {
  /** The page, started anew; `broken` are methods of the worker that fail. */
  open(theme?: string, broken?: string): Promise<EditorPage>;
  close(): Promise<void>;
}

export interface EditorPage {
  readonly page: Page;
  /** Errors nobody caught, refused styles: a sound page has none. */
  readonly complaints: string[];
  /** What is being typed, or what the line shows. */
  text(): Promise<string>;
  /** The texts that were entered, with their address. */
  entered(): Promise<unknown[]>;
  select(row: number, column: number): Promise<void>;
}

const folder = new URL("../../../../src/hosts/bench/page/", import.meta.url);
const policy = "default-src 'none'; script-src 'self'; style-src 'self'";
const frame = `body { margin: 0.5rem; background: var(--ground); color: var(--ink); font-family: var(--font-body) }
  table { border-collapse: collapse; margin-top: 0.5rem; user-select: none } td { width: 6rem; height: 1.6rem; border: 1px solid var(--line) }
  .room { position: fixed; z-index: 3; min-height: 1.6rem; outline: 2px solid var(--accent) }`;

/** The editor alone, over a stand-in of the page, under the page's own content policy. */
export async function openEditorBrowser(): Promise<EditorBrowser> {
  const [browser, served] = await Promise.all([launchChromium(), editorFiles().then(serveFiles)]);
  // A page that was there before starts anew much faster than another one.
  const editor = await openPage(browser);
  let loads = 0;
  return {
    async open(theme = "light", broken = "") {
      await editor.page.goto(`${served.base}${theme}.html?${++loads}#${broken}`);
      await editor.page
        .locator(".cm-content")
        .waitFor()
        .catch(() => Promise.reject(new Error(editor.complaints.join("\n"))));
      return editor;
    },
    close: async () => {
      await browser.close();
      await served.close();
    },
  };
}

async function editorFiles(): Promise<Map<string, Buffer>> {
  const { build } = await import("esbuild");
  const bundle = await build({
    entryPoints: [new URL("standIn/main.ts", import.meta.url).pathname],
    bundle: true,
    format: "esm",
    target: "es2022",
    write: false,
  });
  const page = (theme: string) => `<!doctype html><html lang="en" data-theme="${theme}"><head><meta charset="utf-8">
    <meta name="viewport" content="width=device-width, initial-scale=1">
    <meta http-equiv="Content-Security-Policy" content="${policy}"><title>Editor</title>
    <link rel="stylesheet" href="tokens.css"><link rel="stylesheet" href="editor.css"><link rel="stylesheet" href="frame.css">
    </head><body><main><h1>Editor</h1><div id="line"></div><div id="grid"></div></main>
    <script type="module" src="main.js"></script></body></html>`;
  return new Map<string, Buffer>([
    ...["light", "dark", "red"].map((theme) => [`${theme}.html`, Buffer.from(page(theme))] as const),
    ["main.js", Buffer.from(bundle.outputFiles[0]!.contents)],
    ["tokens.css", await readFile(new URL("tokens.css", folder))],
    ["editor.css", await readFile(new URL("editor/editor.css", folder))],
    ["frame.css", Buffer.from(frame)],
  ]);
}

async function openPage(browser: Browser): Promise<EditorPage> {
  const page = await browser.newPage({ viewport: { width: 1280, height: 720 } });
  page.setDefaultTimeout(10_000);
  const complaints: string[] = [];
  page.on("console", (message) => complaints.push(message.text()));
  page.on("pageerror", (error) => complaints.push(error.stack ?? error.message));
  return {
    page,
    complaints,
    text: async () => (await page.locator(".cm-content").textContent()) ?? "",
    entered: () =>
      page.evaluate(() => standIn.log.filter(({ what }) => what === "act").map(({ given }) => structuredClone(given))),
    select: (row, column) =>
      page.evaluate(
        ([row, column]) => standIn.page.select({ sheet: 0, top: row!, left: column!, bottom: row!, right: column! }),
        [row, column],
      ),
  };
}
