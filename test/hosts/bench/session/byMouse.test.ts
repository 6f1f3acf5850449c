import Papa from "papaparse";
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
import { amplitudes, movedSigmas, revisedAmplitudes, revisedMasses, targetsFile } from "./targets.js";

let session: SessionBrowser;

beforeAll(async () => {
  session = await openSessionBrowser();
});

afterAll(() => session?.close());

test(
  "a newcomer by mouse: from a file to K, what a revision moved, and the files to take away",
  longSession,
  async () => {
    const tab = await session.visit();
    const { page } = tab;

    const chooser = page.waitForEvent("filechooser");
    await tab.menu("Book", "Open a file…");
    await (await chooser).setFiles(targetsFile);
    await tab.shows("A2", "Harbour");
    await tab.says("Nothing is worked out in this table yet.");
    await page.getByRole("button", { name: "Close what is beside the table" }).click();

    await tab.press("H1");
    await page.keyboard.type("K [m/s]");
    await page.keyboard.press("Enter");
    await page.keyboard.type("=how fast");
    await page.locator(".editor-list li", { hasText: "BARY.REFLEX" }).click();
    await tab.press("B2");
    await page.keyboard.type(",");
    await tab.drag("C2", "D2");
    await page.keyboard.type(",");
    await tab.drag("E2", "F2");
    expect(await tab.line()).toBe("=BARY.REFLEX(B2,C2:D2,E2:F2");
    await page.locator(".editor-keys button", { hasText: "completes the headers" }).click();
    await expect.poll(tab.line, { timeout: patience }).toMatch(/B\$1:F\$1/);
    await expect.poll(() => page.locator(".editor-preview").textContent(), { timeout: patience }).toMatch(/^= 12\.4/);
    await page.keyboard.press("Enter");
    await expect.poll(() => tab.text("H2"), { timeout: patience }).toMatch(/^12\.459/);

    await tab.press("H2");
    const handle = await page.locator(".grid-handle:visible").boundingBox();
    await page.mouse.dblclick(handle!.x + handle!.width / 2, handle!.y + handle!.height / 2);
    await expect.poll(() => tab.text("H6"), { timeout: patience }).toMatch(/^11\.129/);

    await tab.menu("Look", "Mark and compare");
    await page.getByRole("button", { name: "Mark the table as it is now" }).click();
    await tab.says("Nothing moved.");
    await tab.press("C2");
    await page.evaluate((text) => navigator.clipboard.writeText(text), revisedMasses);
    await page.keyboard.press("Control+v");
    await tab.shows("C3", "0.95");
    const moved = page.locator(".panel-movements tbody tr");
    await expect.poll(() => moved.count(), { timeout: patience }).toBeGreaterThan(3);
    const told = await moved.evaluateAll((rows) =>
      rows.map((row) => [...row.children].map((cell) => cell.textContent?.trim() ?? "")),
    );
    for (const name of ["Harbour", "Tiller", "Spar", "Keel"]) {
      const row = told.find(([key, header]) => key === name && header?.startsWith("K"));
      expect(row, name).toBeDefined();
      expect(Number.parseFloat(row![3]!)).toBeCloseTo(amplitudes[name]!, 1);
      expect(Number.parseFloat(row![4]!)).toBeCloseTo(revisedAmplitudes[name]!, 1);
      expect(row![2]).toBe(movedSigmas[name]);
    }
    expect(told.filter(([key]) => key === "Beacon")).toEqual([]);

    await tab.press("G2");
    await tab.menu("Rows", "Sort…");
    await page.getByLabel("By", { exact: true }).selectOption({ label: "Visits" });
    await page.getByRole("button", { name: "Sort", exact: true }).click();
    await tab.shows("A2", "Spar");
    await tab.shows("A6", "Keel");

    await tab.menu("Look", "Nothing beside the table");
    await tab.menu("Look", "Plots");
    const plot = page.locator(".plot-canvas");
    await plot.waitFor();
    const area = (await plot.boundingBox())!;
    // From the middle of the periods to the right, over all of K: Spar, Beacon and Harbour have the longest.
    await page.mouse.move(area.x + area.width * 0.35, area.y + 4);
    await page.mouse.down();
    await page.mouse.move(area.x + area.width - 4, area.y + area.height - 4, { steps: 4 });
    await page.mouse.up();
    await tab.says("3 rows are marked.");
    await expect.poll(() => page.locator(".grid-marked").count(), { timeout: patience }).toBe(3);
    await page.getByRole("button", { name: "Show only these" }).click();
    await tab.says("3 of 5 rows are shown");
    await tab.shows("A2", "Spar");
    await tab.shows("A3", "Harbour");
    await tab.shows("A4", "Beacon");
    await tab.shows("A5", "");
    await page.getByRole("button", { name: "Show all rows" }).click();
    await tab.shows("A6", "Keel");
    await tab.menu("Look", "Plots");

    await page.keyboard.press("Control+s");
    const copy = await downloaded(page, () => page.getByRole("button", { name: /^CSV/ }).click());
    const { data } = Papa.parse<Record<string, string>>(copy.bytes.toString("utf8").trim(), { header: true });
    expect(data).toHaveLength(5);
    for (const row of data) {
      const wanted = revisedAmplitudes[row.Name!]!;
      expect(Math.abs(Number(row["K [m/s]"]) / wanted - 1), row.Name).toBeLessThan(1e-12);
    }
    await tab.menu("Book", "Save a copy…");
    const book = await downloaded(page, () => page.getByRole("button", { name: /^Barycell book/ }).click());
    expect(book.name).toMatch(/\.barycell$/);
    expect(book.bytes.length).toBeGreaterThan(500);

    await tab.menu("Look", "History");
    const history = await page.locator(".panel-history li").allTextContents();
    expect(history.map((label) => label.trim())).toEqual([
      "sorted by Visits as it is now",
      "pasted Star mass in 5 rows",
      "filled K down 4 rows",
      "entered a formula for K in row 2",
      'named a column "K [m/s]"',
      "opened targets.csv: 5 rows, 7 columns",
    ]);
    await tab.menu("Look", "Nothing beside the table");

    await tab.kept();
    await page.reload();
    await tab.shows("A2", "Spar");
    await expect.poll(() => tab.text("H3"), { timeout: patience }).toMatch(/^12\.13/);

    await tab.press("A8");
    await page.keyboard.type("=1+");
    await expect.poll(() => isDraftKept(page), { timeout: patience }).toBe(true);
    const crashed = page.waitForEvent("crash");
    await page.goto("chrome://crash").catch(() => undefined);
    await crashed;
    const again = tabOf(await tab.context.newPage());
    await again.page.goto(session.address);
    await again.shows("A2", "Spar");
    await again.says("What you were typing when the page was closed is here again.");
    expect(await again.line()).toBe("=1+");
    expect(again.complaints).toEqual([]);
    expect(tab.complaints).toEqual([]);
  },
);
