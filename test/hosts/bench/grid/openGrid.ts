import type { Browser, BrowserContextOptions, Page } from "playwright-core";
import { styleSheet } from "../../../../src/hosts/bench/build/styleSheet.js";
import { launchChromium } from "../../../browser/launchChromium.js";
import { type Served, serveFiles } from "../../../browser/serveFiles.js";

export interface GridBrowser {
  open(setting?: BrowserContextOptions & { readonly rows?: number; readonly theme?: string }): Promise<GridPage>;
  close(): Promise<void>;
}

export interface GridPage {
  readonly page: Page;
  /** Errors nobody caught, refused styles: a sound page has none. */
  readonly complaints: string[];
  /** The middle of a cell on the screen, by its address in rows of the sheet. */
  at(row: number, column: number): Promise<{ readonly x: number; readonly y: number }>;
  close(): Promise<void>;
}

const folder = new URL("../../../../src/hosts/bench/page/", import.meta.url);
const policy = "default-src 'none'; script-src 'self'; style-src 'self'";

/** The grid alone, over a generated table, under the page's own content policy. */
export async function openGridBrowser(): Promise<GridBrowser> {
  const [browser, served] = await Promise.all([launchChromium(), gridFiles().then(serveFiles)]);
  return {
    open: (setting) => openGrid(browser, served, setting),
    close: async () => {
      await browser.close();
      await served.close();
    },
  };
}

async function gridFiles(): Promise<Map<string, Buffer>> {
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
    <meta http-equiv="Content-Security-Policy" content="${policy}"><title>Grid</title>
    <link rel="stylesheet" href="bench.css"><link rel="stylesheet" href="frame.css">
    </head><body><main id="host"></main><script type="module" src="main.js"></script></body></html>`;
  return new Map<string, Buffer>([
    ...["light", "dark", "red"].map((theme) => [`${theme}.html`, Buffer.from(page(theme))] as const),
    ["main.js", Buffer.from(bundle.outputFiles[0]!.contents)],
    ["bench.css", Buffer.from(await styleSheet(folder))],
    [
      "frame.css",
      Buffer.from(
        "html, body { height: 100%; margin: 0 } main { display: block; height: 100%; margin: 0; padding: 0 }",
      ),
    ],
  ]);
}

async function openGrid(
  browser: Browser,
  served: Served,
  { rows = 1_000_000, theme = "light", ...setting }: Parameters<GridBrowser["open"]>[0] = {},
): Promise<GridPage> {
  const context = await browser.newContext({ viewport: { width: 1280, height: 720 }, ...setting });
  const page = await context.newPage();
  page.setDefaultTimeout(10_000);
  const complaints: string[] = [];
  page.on("console", (message) => complaints.push(message.text()));
  page.on("pageerror", (error) => complaints.push(error.stack ?? error.message));
  await page.goto(`${served.base}${theme}.html?rows=${rows}`);
  await page.getByRole("grid").waitFor();
  return {
    page,
    complaints,
    async at(row, column) {
      const box = await page.evaluate(
        ([row, column]) => gridStandIn.grid.boxOf({ sheet: 0, row: row!, column: column! })?.toJSON(),
        [row, column],
      );
      if (!box) throw new Error(`row ${row}, column ${column} is out of view`);
      return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
    },
    close: () => context.close(),
  };
}
