import { readFile } from "node:fs/promises";
import type { Browser, BrowserContext, BrowserContextOptions, Locator, Page } from "playwright-core";
import { expect } from "vitest";
import { type ServedFolder, serveFolder } from "../../../../src/hosts/cli/serve/serveFolder.js";
import { readAddress } from "../../../../src/sheet/book/address.js";
import { launchChromium } from "../../../browser/launchChromium.js";

/** As long as a busy machine may take to show what it was asked for. */
export const patience = 30_000;

/** For a whole session on such a machine. */
export const wholeSession = 300_000;

/** A session of hundreds of key presses on a machine that is busy may lose one to the driver: it is tried once more. */
export const longSession = { timeout: wholeSession, retry: 1 } as const;

export interface SessionBrowser {
  readonly browser: Browser;
  readonly address: string;
  /** A browser that was never here, with the page open. */
  visit(options?: BrowserContextOptions): Promise<Tab>;
  close(): Promise<void>;
}

/** One tab as somebody in front of it sees and uses it. */
export interface Tab {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Errors nobody caught, refused styles: a sound page has none. */
  readonly complaints: string[];
  cell(address: string): Locator;
  /** Waits until a cell shows this text. */
  shows(address: string, text: string): Promise<void>;
  text(address: string): Promise<string>;
  /** The middle of a cell on the screen. */
  middle(address: string): Promise<{ readonly x: number; readonly y: number }>;
  press(address: string): Promise<void>;
  drag(from: string, to: string): Promise<void>;
  /** What is typed, or what the line shows. */
  line(): Promise<string>;
  menu(name: string, words: string): Promise<void>;
  says(text: string | RegExp): Promise<void>;
  kept(): Promise<void>;
}

/** The page as it is built, served as `barycell bench` serves it. */
export async function openSessionBrowser(): Promise<SessionBrowser> {
  const served: ServedFolder = await serveFolder(new URL("../../../../dist/bench/", import.meta.url), 0, "test");
  const browser = await launchChromium();
  return {
    browser,
    address: served.address,
    async visit(options = {}) {
      const context = await browser.newContext({
        viewport: { width: 1280, height: 800 },
        permissions: ["clipboard-read", "clipboard-write"],
        ...options,
      });
      const page = await context.newPage();
      const tab = tabOf(page);
      await page.goto(served.address);
      await tab.shows("A2", "Lantern 1 b");
      return tab;
    },
    close: async () => {
      await browser.close();
      await served.close();
    },
  };
}

export function tabOf(page: Page): Tab {
  page.setDefaultTimeout(patience);
  const complaints: string[] = [];
  page.on("console", (message) => message.type() === "error" && complaints.push(message.text()));
  // Asks for files are held from now on, not only from when a test waits for one.
  page.on("filechooser", () => undefined);
  page.on("pageerror", (error) => complaints.push(error.stack ?? error.message));

  function cell(address: string): Locator {
    const place = readAddress(address);
    if (!place) throw new Error(`${address} is no cell`);
    return page.locator(
      `[role=row]:not([hidden])[aria-rowindex="${place.row + 2}"] [aria-colindex="${place.column + 2}"]:not([hidden])`,
    );
  }
  /** Empty while the cell is not there. */
  const text = async (address: string) => (await cell(address).allTextContents())[0] ?? "";
  const line = async () => (await page.locator(".cm-content").allTextContents())[0] ?? "";

  async function middle(address: string) {
    await cell(address).waitFor();
    const [box, view] = await Promise.all([cell(address).boundingBox(), page.locator(".grid-scroll").boundingBox()]);
    const right = box && view && Math.min(box.x + box.width, view.x + view.width);
    if (!right || right - box.x < 16) throw new Error(`${address} is not in view`);
    return { x: (box.x + right) / 2, y: box.y + box.height / 2 };
  }

  return {
    page,
    context: page.context(),
    complaints,
    cell,
    text,
    line,
    middle,
    shows: (address, wanted) => expect.poll(() => text(address), { timeout: patience }).toBe(wanted),
    async press(address) {
      const { x, y } = await middle(address);
      await page.mouse.click(x, y);
    },
    async drag(from, to) {
      const [start, end] = [await middle(from), await middle(to)];
      await page.mouse.move(start.x, start.y);
      await page.mouse.down();
      await page.mouse.move(end.x, end.y, { steps: 3 });
      await page.mouse.up();
    },
    async menu(name, words) {
      await page.getByRole("menuitem", { name, exact: true }).click();
      await page.locator(`#menu-${name}-list`).getByText(words, { exact: true }).click();
    },
    says: (wanted) => page.getByText(wanted).first().waitFor(),
    kept: () => page.getByText("Kept in this browser").waitFor(),
  };
}

/** The text of what a press lets the browser save. */
export async function downloaded(page: Page, ask: () => Promise<void>): Promise<{ name: string; bytes: Buffer }> {
  const coming = page.waitForEvent("download");
  await ask();
  const download = await coming;
  return { name: download.suggestedFilename(), bytes: await readFile(await download.path()) };
}

/** Whether the storage of the page holds a text that is typed and not entered. */
export function isDraftKept(page: Page): Promise<boolean> {
  return page.evaluate(
    () =>
      new Promise<boolean>((resolve) => {
        const asked = indexedDB.open("barycell");
        asked.onsuccess = () => {
          const database = asked.result;
          const found = database.transaction("drafts").objectStore("drafts").count();
          found.onsuccess = () => {
            database.close();
            resolve(found.result > 0);
          };
        };
      }),
  );
}
