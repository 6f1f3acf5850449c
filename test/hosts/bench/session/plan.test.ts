import axe from "axe-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { openSessionBrowser, patience, type SessionBrowser } from "./openSession.js";

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

test("a plan: asked for in words, mended where it is wrong, written to a sheet and taken back", async () => {
  const tab = await session.visit();
  const { page } = tab;
  await page.keyboard.press("Alt+l");
  await tab.says("From the sheet Assumptions; east is positive.");
  await page.getByLabel("Hours", { exact: true }).fill("few");
  await page.getByLabel("First night").fill("2027-01-01");
  await page.getByLabel("Last night").fill("2027-06-30");
  await page.getByRole("button", { name: "Make the plan" }).click();
  await tab.says('The budget is "few"; it is a number of hours above 0, for example 120.');
  expect(await page.evaluate(() => document.activeElement?.id)).toBe("plan-hours");

  await tab.drag("A7", "A8");
  await page.getByRole("group", { name: "Left out" }).getByRole("button", { name: "Add the selected rows" }).click();
  await page.getByRole("button", { name: "Take Lantern 5 b from this list" }).click();
  await page.getByLabel("Hours", { exact: true }).fill("40");
  await page.getByRole("button", { name: "Make the plan" }).click();
  await tab.says(/^\d+ of 56 targets chosen, worth \d+, for [\d.]+ h of 40 h\.$/);
  const left = page.locator(".plan-left li");
  await expect
    .poll(() => left.allTextContents(), { timeout: patience })
    .toContainEqual(expect.stringMatching(/^\s*Lantern 4 b\s+it is excluded\.\s*$/));
  await left.getByRole("button", { name: "Thistle 8 b" }).click();
  await expect.poll(tab.line, { timeout: patience }).toBe("Thistle 8 b");

  await page.evaluate(axe.source);
  const { violations } = await page.evaluate(() =>
    (globalThis as unknown as { axe: typeof axe }).axe.run({
      runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"],
    }),
  );
  expect(violations.map(({ id, nodes }) => [id, nodes.map(({ html }) => html)])).toEqual([]);

  await page.getByRole("button", { name: "Write the visits to a sheet" }).click();
  await tab.says('The visits are in the sheet "Plan"');
  await page.getByRole("button", { name: "Show them" }).click();
  await expect.poll(() => tab.text("A1"), { timeout: patience }).toMatch(/^Target/);
  await expect.poll(() => tab.text("B2"), { timeout: patience }).toMatch(/^2027-0[1-6]-\d\d$/);
  const summary = page.getByRole("tab", { name: "Plan summary" });
  await summary.waitFor();
  await page.keyboard.press("Control+z");
  await summary.waitFor({ state: "detached" });

  // What was asked is remembered for this book.
  await tab.kept();
  await page.reload();
  await tab.shows("A2", "Lantern 1 b");
  await expect.poll(() => page.getByLabel("Hours", { exact: true }).inputValue(), { timeout: patience }).toBe("40");
  await page.getByRole("button", { name: "Take Lantern 4 b from this list" }).waitFor();
  expect(tab.complaints).toEqual([]);
});
