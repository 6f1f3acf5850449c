import { afterAll, beforeAll, expect, test } from "vitest";
import { openSessionBrowser, patience, type SessionBrowser, wholeSession } from "./openSession.js";

const rows = 100_000;

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

/** Semi-amplitude of a circular orbit seen edge-on of a Jupiter mass, 1 Julian year, by the coefficient of IAU 2015 B3. */
const perJupiterMass = 28.4324740778828;

/** K in m/s by K = k m M_tot^(-2/3), m in Jupiter masses, M in solar masses, for a year; nominal masses of IAU 2015 B3. */
const amplitude = (starMass: number, planetMass: number) =>
  perJupiterMass * planetMass * (starMass + planetMass / 1047.56551466048) ** (-2 / 3);

test("a hundred thousand rows: filled, scrolled to the end, one mass revised, undone", {
  timeout: wholeSession,
}, async () => {
  const tab = await session.visit();
  const { page } = tab;
  const lines = Array.from({ length: rows }, (_, row) => `T${row + 1},1,${1 + (row % 5) / 10},${1 + (row % 7)}`);
  const buffer = Buffer.from(["Target,Period [yr],Star mass [solMass],Planet mass [jupiterMass]", ...lines].join("\n"));
  await page.locator('input[type="file"]').setInputFiles({ name: "large.csv", mimeType: "text/csv", buffer });
  await tab.shows("A2", "T1");

  await tab.press("E1");
  await page.keyboard.type("K [m/s]");
  await page.keyboard.press("Enter");
  await page.keyboard.type("=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,E$1)");
  // What is typed stands there at once, whatever the size of the table.
  expect(await tab.line()).toBe("=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,E$1)");
  await page.keyboard.press("Control+Enter");
  await expect.poll(() => tab.text("E2"), { timeout: patience }).toMatch(/^28\.41/);
  await page.keyboard.press("Control+Shift+D");
  await expect.poll(async () => Number(await tab.text("E3")), { timeout: patience }).toBeCloseTo(amplitude(1.1, 2), 6);

  await page.keyboard.press("Control+End");
  const last = `E${rows + 1}`;
  const expected = amplitude(1 + ((rows - 1) % 5) / 10, 1 + ((rows - 1) % 7));
  await expect.poll(async () => Number(await tab.text(last)), { timeout: patience }).toBeCloseTo(expected, 6);
  expect(await page.getByRole("gridcell").count()).toBeLessThan(2000);

  const mass = `C${rows + 1}`;
  await tab.press(mass);
  await page.keyboard.type("2.5");
  await page.keyboard.press("Enter");
  const revised = amplitude(2.5, 1 + ((rows - 1) % 7));
  await expect.poll(async () => Number(await tab.text(last)), { timeout: patience }).toBeCloseTo(revised, 6);
  await page.keyboard.press("Control+z");
  await expect.poll(async () => Number(await tab.text(last)), { timeout: patience }).toBeCloseTo(expected, 6);

  await tab.kept();
  await page.reload();
  await tab.shows("A2", "T1");
  await expect.poll(async () => Number(await tab.text("E3")), { timeout: patience }).toBeCloseTo(amplitude(1.1, 2), 6);
  expect(tab.complaints).toEqual([]);
});
