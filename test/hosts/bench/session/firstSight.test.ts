import { afterAll, beforeAll, expect, test } from "vitest";
import { openSessionBrowser, patience, type SessionBrowser, wholeSession } from "./openSession.js";

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

test("who comes first sees in a line what to do, and is led to what is worked out", {
  timeout: wholeSession,
}, async () => {
  const tab = await session.visit();
  const { page } = tab;
  await tab.says("Go to one to see why it has its value; type over an input, and what follows from it changes.");
  await page.getByRole("button", { name: "N2", exact: true }).click();
  await tab.says("How fast does this planet make its star move along the line of sight?");
  await expect.poll(() => page.locator(".editor-address").inputValue(), { timeout: patience }).toBe("N2");
  await tab.context.close();
});

test("a sentence that holds for several columns is told once, with the count of its cells", {
  timeout: wholeSession,
}, async () => {
  const tab = await session.visit();
  const { page } = tab;
  await page.keyboard.press("Alt+k");
  await tab.says("Cells that could not be worked out");
  const told = await page.locator(".panel-findings .panel-finding > span:last-child").allTextContents();
  const sentences = told.map((text) => text.replace(/\s*[\d,]+ cells$/, "").trim());
  expect(sentences.length).toBeGreaterThan(2);
  expect(new Set(sentences).size).toBe(sentences.length);
  const counts = told.map((text) => Number(/([\d,]+) cells$/.exec(text.trim())?.[1] ?? 1));
  const all = await page.locator(".shell-problems").textContent();
  expect(`${counts.reduce((sum, count) => sum + count)} cells need attention`).toBe(all?.trim());
  await tab.context.close();
});

test("a whole column that is copied counts the cells in use", { timeout: wholeSession }, async () => {
  const tab = await session.visit();
  await tab.press("B2");
  await tab.page.keyboard.press("Control+Space");
  await tab.page.keyboard.press("Control+c");
  // The demo has 60 targets under its headers.
  await tab.says("61 cells copied.");
  await tab.context.close();
});

test("a dialog opens right after another was closed, and the focus goes back to the cells", {
  timeout: wholeSession,
}, async () => {
  const tab = await session.visit();
  const { page } = tab;
  await tab.press("B2");
  await page.keyboard.press("Alt+s");
  await page.keyboard.press("Escape");
  await page.keyboard.press("Alt+f");
  await page.getByRole("heading", { name: "Filter rows" }).waitFor();
  await page.getByRole("button", { name: "Filter", exact: true }).waitFor();
  await page.keyboard.press("Escape");
  await page.locator("[role=grid]:focus").waitFor();
  await tab.context.close();
});
