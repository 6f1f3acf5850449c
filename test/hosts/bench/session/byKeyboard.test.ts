import Papa from "papaparse";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import {
  downloaded,
  isDraftKept,
  longSession,
  openSessionBrowser,
  patience,
  type SessionBrowser,
  tabOf,
} from "./openSession.js";
import { movedSigmas, revisedAmplitudes, revisedMasses, targetsFile } from "./targets.js";

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

/** Presses a key until what has the focus fits. */
async function pressUntil(page: Page, key: string, selector: string, most = 12): Promise<void> {
  const isThere = () => page.evaluate((wanted) => document.activeElement?.matches(wanted) ?? false, selector);
  for (let count = 0; !(await isThere()); count++) {
    if (count === most) throw new Error(`${key} does not lead to ${selector}`);
    await page.keyboard.press(key);
  }
}

/** A command through the menus, whose keys need not be known. */
async function choose(page: Page, menu: string, words: string): Promise<void> {
  await pressUntil(page, "F6", "[role=menubar] *");
  await pressUntil(page, "ArrowRight", `#menu-${menu}`);
  await page.keyboard.press("ArrowDown");
  const isThere = () => page.evaluate(() => document.activeElement?.querySelector("span")?.textContent ?? "");
  for (let count = 0; (await isThere()) !== words; count++) {
    if (count === 20) throw new Error(`${menu} has no ${words}`);
    await page.keyboard.press("ArrowDown");
  }
  await page.keyboard.press("Enter");
}

async function goTo(page: Page, address: string): Promise<void> {
  await page.keyboard.press("Control+g");
  await page.keyboard.type(address);
  await page.keyboard.press("Enter");
  await page.locator("[role=grid]:focus").waitFor();
  await expect.poll(() => page.locator(".editor-address").inputValue(), { timeout: patience }).toBe(address);
}

async function times(page: Page, count: number, key: string): Promise<void> {
  for (let pressed = 0; pressed < count; pressed++) await page.keyboard.press(key);
}

test("the same without a mouse", longSession, async () => {
  const tab = await session.visit();
  const { page } = tab;
  const { keyboard } = page;

  const chooser = page.waitForEvent("filechooser");
  await keyboard.press("Control+o");
  await (await chooser).setFiles(targetsFile);
  await tab.shows("A2", "Harbour");

  await goTo(page, "H1");
  await keyboard.type("K [m/s]");
  await keyboard.press("Enter");
  await keyboard.type("=how fast");
  const reflex = page.locator(".editor-list li[aria-selected]", { hasText: "BARY.REFLEX" });
  await page.locator(".editor-list li", { hasText: "BARY.REFLEX" }).waitFor();
  // The list may still change with the last words; it is chosen from once it stays.
  let stays = 0;
  const chosen = async () => {
    if ((await reflex.count()) > 0) return ++stays;
    stays = 0;
    await keyboard.press("ArrowDown");
    return stays;
  };
  await expect.poll(chosen, { timeout: patience, interval: 100 }).toBeGreaterThan(4);
  await keyboard.press("Enter");
  await expect.poll(tab.line, { timeout: patience }).toBe("=BARY.REFLEX(");
  await times(page, 6, "ArrowLeft");
  await expect.poll(tab.line, { timeout: patience }).toBe("=BARY.REFLEX(B2");
  await keyboard.type(",");
  await times(page, 5, "ArrowLeft");
  await keyboard.press("Shift+ArrowRight");
  await expect.poll(tab.line, { timeout: patience }).toBe("=BARY.REFLEX(B2,C2:D2");
  await keyboard.type(",");
  await times(page, 3, "ArrowLeft");
  await keyboard.press("Shift+ArrowRight");
  await expect.poll(tab.line, { timeout: patience }).toBe("=BARY.REFLEX(B2,C2:D2,E2:F2");
  await keyboard.press("Alt+c");
  await expect.poll(tab.line, { timeout: patience }).toMatch(/B\$1:F\$1/);
  await expect.poll(() => page.locator(".editor-preview").textContent(), { timeout: patience }).toMatch(/^= 12\.4/);
  await keyboard.press("Enter");
  await expect.poll(() => tab.text("H2"), { timeout: patience }).toMatch(/^12\.459/);
  await keyboard.press("ArrowUp");
  await keyboard.press("Control+Shift+D");
  await expect.poll(() => tab.text("H6"), { timeout: patience }).toMatch(/^11\.129/);

  await keyboard.press("Alt+m");
  await pressUntil(page, "F6", "[role=tab][aria-controls=side-panel]");
  await pressUntil(page, "Tab", ".panel-actions button");
  await keyboard.press("Enter");
  await tab.says("Nothing moved.");
  await pressUntil(page, "F6", "[role=grid]");
  await goTo(page, "C2");
  await page.evaluate((text) => navigator.clipboard.writeText(text), revisedMasses);
  await keyboard.press("Control+v");
  for (const [name, moved] of Object.entries(movedSigmas)) {
    await page.locator(".panel-movements tr", { hasText: name }).filter({ hasText: moved }).first().waitFor();
  }

  await goTo(page, "G2");
  await keyboard.press("Alt+s");
  await pressUntil(page, "Tab", "dialog button.main");
  await keyboard.press("Enter");
  await tab.shows("A2", "Spar");
  await tab.shows("A6", "Keel");

  await keyboard.press("Alt+0");
  await keyboard.press("Alt+p");
  await page.locator(".plot-canvas").waitFor();
  await pressUntil(page, "F6", "#plot-kind");
  await pressUntil(page, "F6", "[role=grid]");
  await goTo(page, "A3");
  await times(page, 2, "Shift+ArrowDown");
  await choose(page, "Rows", "Show only the marked or selected rows");
  await tab.says("3 of 5 rows are shown");
  await tab.shows("A2", "Harbour");
  await tab.shows("A4", "Tiller");
  await tab.shows("A5", "");
  await choose(page, "Rows", "Show all rows");
  await tab.shows("A6", "Keel");
  await keyboard.press("Alt+p");

  await keyboard.press("Control+s");
  await pressUntil(page, "Tab", ".shell-choices button");
  const copy = await downloaded(page, () => keyboard.press("Enter"));
  const { data } = Papa.parse<Record<string, string>>(copy.bytes.toString("utf8").trim(), { header: true });
  expect(data).toHaveLength(5);
  for (const row of data) {
    expect(Math.abs(Number(row["K [m/s]"]) / revisedAmplitudes[row.Name!]! - 1), row.Name).toBeLessThan(1e-12);
  }

  await keyboard.press("Alt+y");
  await page.locator(".panel-history li").first().waitFor();
  await tab.kept();
  await pressUntil(page, "F6", "[role=grid]");
  await goTo(page, "A8");
  await keyboard.type("=1+");
  await expect.poll(() => isDraftKept(page), { timeout: patience }).toBe(true);
  const again = tabOf(await tab.context.newPage());
  await page.close({ runBeforeUnload: false });
  await again.page.goto(session.address);
  await again.says("What you were typing when the page was closed is here again.");
  await again.shows("A2", "Spar");
  expect(await again.line()).toBe("=1+");
  expect([...tab.complaints, ...again.complaints]).toEqual([]);
  await tab.context.close();
});

test("F6 goes through all parts of the page that are there, Shift+F6 back", longSession, async () => {
  const tab = await session.visit();
  const { page } = tab;
  await page.keyboard.press("Alt+p");
  await page.locator("#plot-kind").waitFor();
  await page.locator("[role=grid]").focus();
  const parts = ["plots", "side", "foot", "head", "line", "grid"];
  const seen = async (key: string) => {
    await page.keyboard.press(key);
    return page.evaluate(
      (names) => names.find((name) => document.querySelector(`.shell-${name}`)?.contains(document.activeElement)),
      parts,
    );
  };
  for (const part of parts) expect(await seen("F6")).toBe(part);
  for (const part of ["line", "head", "foot"]) expect(await seen("Shift+F6")).toBe(part);
  await tab.context.close();
});

test(
  "a command enters first what is being typed, and what cannot be entered keeps it from being done",
  longSession,
  async () => {
    const tab = await session.visit();
    const { page } = tab;
    await tab.press("B2");
    await page.keyboard.type("6.5");
    await tab.menu("Rows", "Insert above");
    await tab.shows("B3", "6.5");
    await tab.shows("B2", "");
    await tab.press("B3");
    await page.keyboard.type("=1+");
    await tab.menu("Rows", "Insert above");
    await expect
      .poll(() => page.locator(".editor-message").textContent(), { timeout: patience })
      .toMatch(/^formula: =1\+/);
    expect(await tab.line()).toBe("=1+");
    await tab.shows("A3", "Lantern 1 b");
    await page.keyboard.press("Escape");
    await tab.press("B3");
    await page.keyboard.press("Shift+F2");
    await page.locator(".editor-line .cm-content:focus").waitFor();
    await page.keyboard.type("4");
    await page.keyboard.press("Enter");
    await tab.shows("B3", "6.54");
    await tab.context.close();
  },
);
