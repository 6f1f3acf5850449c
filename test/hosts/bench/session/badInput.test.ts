import type { BrowserContext, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import {
  downloaded,
  openSessionBrowser,
  patience,
  type SessionBrowser,
  type Tab,
  tabOf,
  wholeSession,
} from "./openSession.js";

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

/** What the page shows above the table until it is closed. */
const trouble = (page: Page) => page.locator("[role=alert]");

async function isTrouble({ page }: Tab, text: string | RegExp): Promise<void> {
  const told = () => trouble(page).locator(".caution > span:not(.mark)").allTextContents();
  await expect
    .poll(async () => (await told())[0]?.trim(), { timeout: patience })
    .toEqual(typeof text === "string" ? text : expect.stringMatching(text));
}

/** The demo is there as it was. */
async function isAsBefore(tab: Tab): Promise<void> {
  await tab.shows("A2", "Lantern 1 b");
  await tab.shows("B2", "6.41");
  expect(await tab.page.title()).toBe("Demo survey - Barycell");
}

describe("files", () => {
  test("of 2 GB is refused before it is read", { timeout: wholeSession }, async () => {
    const tab = await session.visit();
    await tab.page.evaluate(() => {
      // The same megabyte again and again: it lies in memory once.
      const megabyte = new Blob([new Uint8Array(1_000_000).fill(48)]);
      const transfer = new DataTransfer();
      transfer.items.add(new File(Array(2000).fill(megabyte), "survey.csv"));
      const input = document.querySelector<HTMLInputElement>("input[type=file]")!;
      input.files = transfer.files;
      input.dispatchEvent(new Event("change"));
    });
    await isTrouble(tab, /survey\.csv"?: It has 2,000 MB; .* are read at most/);
    await isAsBefore(tab);
    await tab.context.close();
  });

  test("that is a program by another name is refused", { timeout: wholeSession }, async () => {
    const tab = await session.visit();
    const buffer = Buffer.concat([Buffer.from("MZ\x90\0\x03\0\0\0", "latin1"), Buffer.alloc(5000)]);
    await choose(tab.page, { name: "targets.csv", mimeType: "text/csv", buffer });
    await isTrouble(tab, /^"?targets\.csv"?: .*is a program/);
    await isAsBefore(tab);
    await tab.page.getByRole("alert").getByRole("button", { name: "Close" }).click();
    await expect.poll(() => trouble(tab.page).textContent(), { timeout: patience }).toBe("");
    await tab.context.close();
  });

  test("of a single column opens, and the page says what may be wrong", { timeout: wholeSession }, async () => {
    const tab = await session.visit();
    await choose(tab.page, { name: "one.csv", mimeType: "text/csv", buffer: Buffer.from("Period [d]\n1.5\n2.5\n") });
    await tab.shows("A3", "2.5");
    await isTrouble(tab, /single column/);
    await tab.context.close();
  });
});

async function choose(page: Page, file: { name: string; mimeType: string; buffer: Buffer }): Promise<void> {
  const chooser = page.waitForEvent("filechooser");
  await page.keyboard.press("Control+o");
  await (await chooser).setFiles(file);
}

describe("what is typed and pasted", () => {
  test("a formula of 10,000 characters is refused with the limit, and stays", { timeout: wholeSession }, async () => {
    const tab = await session.visit();
    const { page } = tab;
    const formula = `=${"1+".repeat(5000)}1`;
    await tab.press("B2");
    await page.keyboard.type("=");
    await page.keyboard.insertText(formula.slice(1));
    await page.keyboard.press("Enter");
    const message = page.locator(".editor-message", { hasText: "it has 10002 characters; 8192 are the most" });
    await message.waitFor();
    expect(await tab.line()).toBe(formula);
    await page.keyboard.press("Escape");
    await isAsBefore(tab);
    await tab.context.close();
  });

  test("a paste that is longer than a sheet is refused whole", { timeout: wholeSession }, async () => {
    const tab = await session.visit();
    const { page } = tab;
    await tab.press("B2");
    await page.evaluate(() => navigator.clipboard.writeText("7\n".repeat(1_048_577)));
    await page.keyboard.press("Control+v");
    await isTrouble(tab, /^paste: 1,048,577 x 1 cells do not fit from there on; the sheet ends at row 1,048,576/);
    await isAsBefore(tab);
    await tab.context.close();
  });
});

describe("storage", () => {
  test("that is full: it says so; a copy can be saved, and it goes on when there is room", {
    timeout: wholeSession,
  }, async () => {
    const tab = await session.visit();
    const { page } = tab;
    await page.workers()[0]!.evaluate(() => {
      const { put } = IDBObjectStore.prototype;
      IDBObjectStore.prototype.put = () => {
        throw new DOMException("no room", "QuotaExceededError");
      };
      Object.assign(globalThis, { makeRoom: () => Object.assign(IDBObjectStore.prototype, { put }) });
    });
    await type(tab, "B2", "7.5");
    await expect
      .poll(() => page.locator(".shell-saved").textContent(), { timeout: patience })
      .toContain("Not saved: the browser's storage is full.");
    await tab.shows("B2", "7.5");
    await page.keyboard.press("Control+s");
    const copy = await downloaded(page, () => page.getByRole("button", { name: /^CSV/ }).click());
    expect(copy.bytes.toString("utf8").split("\n")[1]).toMatch(/^Lantern 1 b,7\.5,/);
    await page.workers()[0]!.evaluate(() => (globalThis as unknown as { makeRoom(): void }).makeRoom());
    await type(tab, "B3", "8.5");
    await tab.kept();
    await page.reload();
    await tab.shows("B2", "7.5");
    await tab.shows("B3", "8.5");
    await tab.context.close();
  });

  test("that is denied: the page works and says that nothing is kept", { timeout: wholeSession }, async () => {
    const context = await session.browser.newContext({ serviceWorkers: "block" });
    await withWorker(
      context,
      (worker) => `IDBFactory.prototype.open = () => {
      throw new DOMException("denied", "SecurityError");
    };${worker}`,
    );
    const tab = tabOf(await context.newPage());
    await tab.page.goto(session.address);
    await isAsBefore(tab);
    await expect
      .poll(() => tab.page.locator(".shell-saved").textContent(), { timeout: patience })
      .toContain("Not saved: the browser keeps nothing for this page");
    await type(tab, "B2", "7.5");
    await tab.shows("B2", "7.5");
    await context.close();
  });
});

async function type(tab: Tab, address: string, text: string): Promise<void> {
  await tab.press(address);
  await tab.page.keyboard.type(text);
  await tab.page.keyboard.press("Enter");
}

/** Pages of the context get another worker, made of the one that is served. */
async function withWorker(context: BrowserContext, make: (worker: string) => string): Promise<void> {
  await context.route("**/worker.js", async (route) => {
    const response = await route.fetch();
    await route.fulfill({ response, body: make(await response.text()) });
  });
}

describe("the worker breaks down", () => {
  test("while it works something out: the last whole sheet is back, and what was entered can be entered again", {
    timeout: wholeSession,
  }, async () => {
    const tab = await session.visit();
    const { page } = tab;
    await type(tab, "B2", "7.5");
    await tab.kept();
    await page.workers()[0]!.evaluate(() => {
      // Before the worker itself hears of it.
      self.addEventListener(
        "message",
        (event) => {
          if (event.data.method !== "act") return;
          event.stopImmediatePropagation();
          throw new Error("out of memory");
        },
        { capture: true },
      );
    });
    await type(tab, "B3", "8.5");
    await isTrouble(
      tab,
      /^The calculation broke down by a fault of this program \(.*out of memory\)\. The book is as it was/,
    );
    await tab.shows("B2", "7.5");
    await expect.poll(tab.line, { timeout: patience }).toBe("8.5");
    await page.keyboard.press("Enter");
    await tab.shows("B3", "8.5");
    await tab.kept();
    await tab.context.close();
  });

  test("again and again: it is stopped, and the page says what to do", { timeout: wholeSession }, async () => {
    const context = await session.browser.newContext({ serviceWorkers: "block" });
    await withWorker(context, () => 'throw new Error("no memory at all");');
    const tab = tabOf(await context.newPage());
    await tab.page.goto(session.address);
    await isTrouble(tab, /This page could not start|breaks down again and again.*Load the page again/);
    expect(tab.page.workers().length).toBeLessThan(2);
    await context.close();
  });
});

test("two tabs on one book: the second says so and works on a copy; both keep what was typed", {
  timeout: wholeSession,
}, async () => {
  const first = await session.visit();
  await type(first, "B2", "7.5");
  await first.kept();
  const second = tabOf(await first.context.newPage());
  await second.page.goto(session.address);
  await second.shows("B2", "7.5");
  await second.says(/^Another tab has this/);
  await type(second, "B3", "8.5");
  await second.kept();
  expect(await second.page.title()).toBe("Demo survey (copy) - Barycell");
  await first.page.bringToFront();
  await type(first, "B3", "9.5");
  await first.kept();
  await first.shows("B3", "9.5");
  await second.page.bringToFront();
  await second.shows("B3", "8.5");
  await second.menu("Book", "All books…");
  const books = second.page.locator(".shell-book b");
  await expect
    .poll(async () => (await books.allTextContents()).sort(), { timeout: patience })
    .toEqual(["Demo survey", "Demo survey (copy)"]);
  await first.context.close();
});
