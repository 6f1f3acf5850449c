import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import type { Browser, Page } from "playwright-core";
import type { Cell } from "../../../../src/call/cell.js";
import { launchChromium } from "../../../browser/launchChromium.js";
import { paneFiles } from "./paneFiles.js";
import type { StandIn } from "./standIn/standInOffice.js";

export interface Surroundings {
  /** The ground of the host's own windows. */
  readonly theme?: string;
  /** Of the window. */
  readonly size?: { readonly width: number; readonly height: number };
  readonly media?: Parameters<Page["emulateMedia"]>[0];
}

export interface PaneBrowser {
  /** The pane, started anew. */
  open(cells: readonly (readonly Cell[])[], surroundings?: Surroundings): Promise<PanePage>;
  close(): Promise<void>;
}

export interface PanePage {
  readonly page: Page;
  /** What the analyst does in the worksheet, and what stands there. */
  readonly sheet: SheetHand;
  /** Messages of the page's console and errors that nobody caught; a sound page has none. */
  readonly complaints: string[];
}

type Sheet = StandIn["sheet"];
export type SheetHand = {
  [Name in keyof Sheet]: (...given: Parameters<Sheet[Name]>) => Promise<ReturnType<Sheet[Name]>>;
};

const types: Readonly<Record<string, string>> = { html: "text/html", css: "text/css", js: "text/javascript" };

/** A browser that shows the pane beside a stand-in of the worksheet; every request is answered here. */
export async function openPaneBrowser(): Promise<PaneBrowser> {
  const [browser, files] = await Promise.all([launchChromium(), paneFiles()]);
  const server = createServer((request, response) => {
    const name = request.url!.slice(1).replace(/\?.*$/, "");
    const body = files.get(name) ?? "";
    response.writeHead(files.has(name) ? 200 : 204, {
      "Content-Type": `${types[name.split(".").pop()!] ?? "text/plain"}; charset=utf-8`,
      "Cache-Control": "max-age=600",
    });
    response.end(body);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const home = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  // A page that was there before starts anew much faster than another one.
  const pane = await newPage(browser, home);
  let loads = 0;
  return {
    open: async (cells, { theme, size = { width: 340, height: 800 }, media = {} } = {}) => {
      await pane.page.setViewportSize(size);
      await pane.page.emulateMedia({ colorScheme: "light", reducedMotion: null, forcedColors: null, ...media });
      const start = encodeURIComponent(JSON.stringify({ cells, theme }));
      await pane.page.goto(`${home}/pane.html?${++loads}#${start}`);
      await pane.page.getByRole("tab", { name: "Find" }).waitFor();
      return pane;
    },
    close: async () => {
      await browser.close();
      server.close();
    },
  };
}

async function newPage(browser: Browser, home: string): Promise<PanePage> {
  const page = await browser.newPage();
  page.setDefaultTimeout(10_000);
  const complaints: string[] = [];
  page.on("console", (message) => complaints.push(message.text()));
  page.on("pageerror", (error) => complaints.push(error.message));
  page.on("request", (request) => {
    if (!request.url().startsWith(home)) complaints.push(`asked for ${request.url()}`);
  });
  const hand =
    (name: string) =>
    (...given: unknown[]) =>
      page.evaluate(
        ([name, given]) =>
          (globalThis as unknown as { standIn: { sheet: Record<string, (...given: unknown[]) => unknown> } }).standIn
            .sheet[name as string]!(...(given as unknown[])),
        [name, given],
      );
  const sheet = new Proxy({}, { get: (_, name: string) => hand(name) }) as SheetHand;
  return { page, sheet, complaints };
}
