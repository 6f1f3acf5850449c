import axe from "axe-core";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { openSessionBrowser, patience, type SessionBrowser, type Tab, wholeSession } from "./openSession.js";

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

const menus = ["Book", "Edit", "Columns", "Rows", "Look", "Help"];

/** The demo in a theme, the amplitude of one target selected. */
async function visit(theme: string, width = 1280, height = 800): Promise<Tab> {
  const tab = await session.visit({ viewport: { width, height } });
  await tab.page.evaluate(
    (chosen) => localStorage.setItem("barycell.preferences", JSON.stringify({ theme: chosen })),
    theme,
  );
  await tab.page.reload();
  await tab.shows("A2", "Lantern 1 b");
  await tab.page.locator(".editor-address").fill("N3");
  await tab.page.keyboard.press("Enter");
  await tab.says("Whose uncertainty it is");
  return tab;
}

/** Every look of the page, one after the other; `look` is called in each. */
async function eachLook(tab: Tab, look: (what: string) => Promise<void>): Promise<void> {
  const { page } = tab;
  const { keyboard } = page;
  const grid = page.locator("[role=grid]");
  const panels = await page.locator(".shell-side [role=tab]").evaluateAll((tabs) => tabs.map(({ id }) => id));
  expect(panels.length).toBeGreaterThan(4);
  for (const id of panels) {
    await page.locator(`#${id}`).click();
    await page.locator(`#${id}[aria-selected=true]`).waitFor();
    await page.locator(".shell-panel :is(p, label, button):visible").first().waitFor();
    if (id === "side-check") await tab.says("Cells that could not be worked out");
    await look(id);
  }
  await grid.focus();
  await keyboard.press("Alt+p");
  await page.locator(".plot-canvas[aria-label]").waitFor();
  await look("plots");
  await grid.focus();
  await keyboard.press("Alt+p");
  for (const menu of menus) {
    await page.locator(`#menu-${menu}`).click();
    const items = page.locator(`#menu-${menu}-list [role^=menuitem]:not([aria-disabled]) > span`);
    await items.first().waitFor();
    await look(`menu ${menu}`);
    const opening = (await items.allTextContents()).filter(
      (words) => menu === "Help" || (words.endsWith("…") && words !== "Open a file…"),
    );
    await keyboard.press("Escape");
    for (const words of opening) {
      await tab.menu(menu, words);
      await page.locator("dialog[open]").waitFor();
      await look(words);
      await keyboard.press("Escape");
      await page.locator("dialog:not([open])").waitFor({ state: "attached" });
    }
  }
  await grid.focus();
  await keyboard.type("=BARY.REFLEX(C3,D3");
  await page.locator(".editor-message").waitFor();
  await look("a formula being typed");
  await keyboard.press("Escape");
  await keyboard.press("Escape");
}

describe.each(["light", "dark", "red"])("%s", (theme) => {
  // By axe: the rules of WCAG 2.2 A and AA that can be told by a program, and best practices. Colours alone differ.
  test("no barrier that axe knows, whatever is open", { timeout: wholeSession }, async () => {
    const tab = await visit(theme);
    const { page } = tab;
    await page.evaluate(axe.source);
    const barriers: string[] = [];
    const rules = theme === "light" ? {} : { runOnly: ["color-contrast"] };
    await eachLook(tab, async (what) => {
      const { violations } = await page.evaluate(
        (rules) => (globalThis as unknown as { axe: typeof axe }).axe.run(rules),
        rules,
      );
      for (const { id, nodes } of violations) barriers.push(`${what}: ${id}, ${nodes[0]?.target.join(" ")}`);
    });
    expect(barriers).toEqual([]);
    expect(tab.complaints).toEqual([]);
    await tab.context.close();
  });
});

/** Controls that reach beyond the window across, or are covered, and cannot be scrolled to. */
function unreachable(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const shown = (element: Element) => element.checkVisibility() && element.getBoundingClientRect().width > 1;
    const isCells = (element: Element) => element.closest(".grid, .grid-inset, .editor-tips") !== null;
    const modal = document.querySelector("dialog[open]");
    const all = [...(modal ?? document.body).querySelectorAll("button, input, select, textarea, [role=tab]")];
    return all
      .filter((element) => shown(element) && !isCells(element))
      .filter((element) => {
        element.scrollIntoView({ block: "nearest", inline: "nearest" });
        const { left, right, top, bottom } = element.getBoundingClientRect();
        if (left < -1 || right > innerWidth + 1 || top < -1 || bottom > innerHeight + 1) return true;
        const hit = document.elementFromPoint((left + right) / 2, (top + bottom) / 2);
        const isOverlaid = hit?.closest("[role=menu], .shell-said, .editor-tips") !== null;
        return !isOverlaid && hit !== element && !element.contains(hit) && !hit?.contains(element);
      })
      .map((element) => element.outerHTML.slice(0, 120));
  });
}

// 640 by 400 is a window of 1280 by 800 in which everything is drawn twice as large.
describe.each([
  [1280, 800],
  [720, 800],
  [640, 400],
])("%i by %i", (width, height) => {
  test("nothing reaches beyond the window across, and every control can be come to", {
    timeout: wholeSession,
  }, async () => {
    const tab = await visit("light", width, height);
    const { page } = tab;
    const lost: string[] = [];
    await eachLook(tab, async (what) => {
      const across = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
      if (across > 0) lost.push(`${what}: ${across} px beyond`);
      for (const each of await unreachable(page)) lost.push(`${what}: ${each}`);
    });
    expect(lost).toEqual([]);
    await expect.poll(() => page.locator("[role=grid]").isVisible(), { timeout: patience }).toBe(true);
    await tab.context.close();
  });
});
