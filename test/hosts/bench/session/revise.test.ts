import axe from "axe-core";
import type { Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { downloaded, openSessionBrowser, patience, type SessionBrowser, wholeSession } from "./openSession.js";
import { amplitudes, movedSigmas, revisedAmplitudes, targetsFile } from "./targets.js";

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

/** The same masses as elsewhere, by name, in another order, with a stranger. */
const revised = `Name,Star mass [solMass]
KEEL,0.52
Tiller,0.95
Beacon,1.1
Spar,1.1
Harbour,1.04
Buoy,3
`;

async function goTo(page: Page, address: string): Promise<void> {
  await page.keyboard.press("Control+g");
  await page.keyboard.type(address);
  await page.keyboard.press("Enter");
  await page.locator("[role=grid]:focus").waitFor();
}

/** The whole page. */
async function expectSound(page: Page): Promise<void> {
  await page.evaluate(axe.source);
  const { violations } = await page.evaluate(() =>
    (globalThis as unknown as { axe: typeof axe }).axe.run(document, {
      runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"],
    }),
  );
  expect(violations.map(({ id, nodes }) => [id, nodes.map(({ html }) => html)])).toEqual([]);
}

test("masses are revised: shown, applied, told, drawn and taken back", { timeout: wholeSession }, async () => {
  const tab = await session.visit();
  const { page } = tab;
  await page.locator("input[type=file]").first().setInputFiles(targetsFile);
  await tab.shows("A2", "Harbour");
  await goTo(page, "H1");
  await page.keyboard.type("K [m/s]");
  await page.keyboard.press("Enter");
  await page.keyboard.type("=BARY.REFLEX(B2,C2:D2,E2:F2,,,B$1:F$1,H$1)");
  await page.keyboard.press("Enter");
  await goTo(page, "H2:H6");
  await page.keyboard.press("Control+d");

  await page.keyboard.press("Alt+r");
  await page.getByRole("button", { name: "Show what would change" }).press("Enter");
  await tab.says("Choose the file with the revised values first.");
  await page.getByLabel("Thresholds to watch, one a line").fill("K [m/s] >= 12.2 kg");
  await page
    .locator(".revise-file input")
    .setInputFiles({ name: "masses.csv", mimeType: "text/csv", buffer: Buffer.from(revised) });
  await page.getByRole("button", { name: "Show what would change" }).press("Enter");
  await tab.says(/^The condition "K \[m\/s\] >= 12\.2 kg"/);
  await page.getByLabel("Thresholds to watch, one a line").fill("K [m/s] >= 12.2 m/s");
  await page.getByRole("button", { name: "Show what would change" }).press("Enter");
  await tab.says("5 of 5 rows matched, 1 of them without regard to blanks and capitals.");
  await tab.says('1 row of the revision is not in the table and was left aside: "Buoy".');
  // Nothing is done before it is asked for.
  expect(await tab.text("C2")).toBe("1");
  await expectSound(page);

  await page.getByRole("button", { name: "Apply 4 changes from masses.csv" }).press("Enter");
  await tab.shows("C2", "1.04");
  const moved = page.locator(".revise-ledger tbody tr");
  await expect.poll(() => moved.count(), { timeout: patience }).toBe(4);
  const told = (await moved.all()).map((row) => row.locator("th button, td").allInnerTexts());
  const rows = await Promise.all(told);
  expect(Object.fromEntries(rows.map(([name, change]) => [name, change]))).toEqual(movedSigmas);
  for (const [name, , by, before, after] of rows as string[][]) {
    expect(Number.parseFloat(before!) / amplitudes[name!]!).toBeCloseTo(1, 3);
    expect(Number.parseFloat(after!) / revisedAmplitudes[name!]!).toBeCloseTo(1, 3);
    expect(by).toBe("Star mass");
  }
  await tab.says("Lost");
  await expectSound(page);
  const report = await downloaded(page, () => page.getByRole("button", { name: "Save Markdown" }).click());
  expect(report.name).toMatch(/^masses ledger \d{4}-\d\d-\d\d\.md$/);
  expect(report.bytes.toString()).toContain("| lost | Harbour | 12.46 | 12.14 |");
  await page.locator(".revise-ledger").getByRole("button", { name: "Spar" }).press("Enter");
  await expect.poll(tab.line, { timeout: patience }).toMatch(/^=BARY\.REFLEX\(B4/);

  await page.getByRole("button", { name: "Plot it" }).click();
  await page.getByRole("img", { name: /before and after masses\.csv, 4 rows that moved$/ }).waitFor();
  await expectSound(page);

  // It comes back with the book, without the table as it was.
  await tab.kept();
  await page.reload();
  await tab.shows("C2", "1.04");
  await expect.poll(() => moved.count(), { timeout: patience }).toBe(4);
  expect(await page.getByLabel("Thresholds to watch, one a line").inputValue()).toBe("K [m/s] >= 12.2 m/s");
  await page.getByRole("button", { name: "Write it to a sheet" }).press("Enter");
  await page.getByRole("tab", { name: "Ledger" }).waitFor();
  expect(tab.complaints).toEqual([]);
});

test("one undo takes a revision back", { timeout: wholeSession }, async () => {
  const tab = await session.visit();
  const { page } = tab;
  const mass = await tab.text("D2");
  await page.keyboard.press("Alt+r");
  const file = {
    name: "one.csv",
    mimeType: "text/csv",
    buffer: Buffer.from("Planet,Star mass [solMass]\nLantern 1 b,0.5\n"),
  };
  await page.locator(".revise-file input").setInputFiles(file);
  await page.getByRole("button", { name: "Show what would change" }).click();
  await page.getByRole("button", { name: "Apply 1 change from one.csv" }).click();
  await tab.shows("D2", "0.5");
  await tab.says("What a revision moved");
  await tab.press("A3");
  await page.keyboard.press("Control+z");
  await tab.shows("D2", mass);
  await page.locator(".revise-ledger").waitFor({ state: "detached" });
  expect(tab.complaints).toEqual([]);
});
