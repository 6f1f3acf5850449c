import axe from "axe-core";
import type { Locator, Page } from "playwright-core";
import { afterAll, afterEach, beforeAll, describe, expect, test } from "vitest";
import type { Cell } from "../../../../src/call/cell.js";
import { call, headerRow } from "../../../call/door.js";
import { openPaneBrowser, type PaneBrowser, type PanePage, type Surroundings } from "./openPane.js";
import { faulty, targets } from "./targets.js";

let browser: PaneBrowser;
let pane: PanePage | undefined;

beforeAll(async () => {
  browser = await openPaneBrowser();
});

afterAll(() => browser.close());

afterEach(() => {
  // A refused inline style, a request to anywhere, an error that nobody caught: all of them land here.
  expect(pane?.complaints.splice(0)).toEqual([]);
});

async function open(cells: readonly (readonly Cell[])[], surroundings?: Surroundings) {
  pane = await browser.open(cells, surroundings);
  return pane;
}

async function chooseReflex(page: Page) {
  await page.getByLabel("What do you want to know?").fill("how fast does this planet make its star move");
  await page.getByRole("button", { name: /REFLEX/ }).click();
  await page.getByText("first row").waitFor();
}

const plain = (text: string | null) => (text ?? "").replace(/\s+/g, " ").trim();

const textOf = async (locator: Locator) => plain(await locator.textContent());

const faults = (page: Page, set: Readonly<Record<string, boolean>>) =>
  page.evaluate(
    (set) => Object.assign((globalThis as unknown as { standIn: { faults: object } }).standIn.faults, set),
    set,
  );

const focused = (page: Page) =>
  page.evaluate(() => document.activeElement?.textContent?.replace(/\s+/g, " ").trim() || document.activeElement?.id);

/** Tab, and Tab again, until what is in focus is called so. */
async function tabTo(page: Page, name: string | RegExp) {
  const isThere = (text: string | undefined) => (typeof name === "string" ? text === name : name.test(text ?? ""));
  for (let step = 0; step < 60; step++) {
    if (isThere(await focused(page))) return;
    await page.keyboard.press("Tab");
  }
  throw new Error(`no way by Tab to ${name}`);
}

describe("find a function and build its call", () => {
  const reflexOf = (row: readonly Cell[]) =>
    call(
      "REFLEX",
      row[1],
      [[row[2]!, row[3]!]],
      [[row[4]!, row[5]!]],
      row[6],
      undefined,
      headerRow("B$1", ...targets[0]!.slice(1)),
      "m/s",
    )[0]!;

  test("by mouse: columns proposed, previewed, inserted with a header, filled down", async () => {
    const { page, sheet } = await open(targets);
    await chooseReflex(page);
    for (const [label, text] of [
      ["period", "B2"],
      ["star mass", "C2:D2"],
      ["planet mass", "E2:F2"],
      ["eccentricity optional", "G2"],
      ["header of star mass", "C$1"],
    ]) {
      expect(await page.getByLabel(label!, { exact: true }).inputValue(), label).toBe(text);
    }
    const [value, sigma] = reflexOf(targets[1]!) as number[];
    expect(await textOf(page.getByRole("status", { name: "First row" }))).toContain(
      `${value!.toFixed(1)} \u00b1 ${sigma!.toFixed(1)} m/s`,
    );
    await page.getByRole("button", { name: "Insert the formula" }).click();
    await page.getByText("REFLEX is in H2:H6.").waitFor();
    expect(await sheet.formula("H2")).toBe("=BARY.REFLEX(B2, C2:D2, E2:F2, G2,, B$1:G$1, H$1)");
    expect([await sheet.value("H1"), await sheet.value("I1")]).toEqual(["K [m/s]", "K uncertainty [m/s]"]);
    for (const [index, row] of targets.slice(1).entries()) {
      expect([await sheet.value(`H${index + 2}`), await sheet.value(`I${index + 2}`)]).toEqual(reflexOf(row));
    }
    expect(await sheet.selected()).toBe("H2:H6");
  });

  test("by keyboard alone", async () => {
    const { page, sheet } = await open(targets);
    await tabTo(page, "question");
    await page.keyboard.type("smallest planet");
    await tabTo(page, /MINMASS$/);
    await page.keyboard.press("Enter");
    expect(await focused(page)).toBe("What is the smallest planet that gives this semi-amplitude?");
    await page.getByText("first row").waitFor();
    await tabTo(page, "input-0");
    await page.keyboard.type("55.9 m/s");
    await page.getByText("Typed; clear the field").waitFor();
    await tabTo(page, "result");
    await page.keyboard.press("Control+A");
    await page.keyboard.type("earthMass");
    await tabTo(page, "Insert the formula");
    await page.keyboard.press("Enter");
    await page.getByText("MINMASS is in H2:H6.").waitFor();
    expect(await sheet.formula("H2")).toBe(
      '=BARY.MINMASS("55.9 m/s", B2, C2:D2, G2, ";"&B$1&";"&C$1&";"&D$1&";"&G$1, H$1)',
    );
    expect(await sheet.value("H1")).toBe("Minimum mass [earthMass]");
    const headers = "; Period [d]; Star mass [solMass]; Star mass sigma [solMass]; Eccentricity";
    expect(await sheet.value("H3")).toBe(
      call("MINMASS", "55.9 m/s", 41.7, [[0.94, 0.03]], 0.11, headers, "earthMass")[0]![0],
    );
  });

  test("a field follows the selection until Escape, and never takes what was typed", async () => {
    const { page, sheet } = await open(targets);
    await chooseReflex(page);
    const mass = page.getByLabel("planet mass", { exact: true });
    await mass.focus();
    await sheet.select("C4");
    await expect.poll(() => mass.inputValue()).toBe("C2");
    expect(await page.getByLabel("header of planet mass").inputValue()).toBe("C$1");
    await sheet.select("K20");
    await expect.poll(() => mass.inputValue()).toBe("$K$20");
    await mass.fill("1 jupiterMass");
    await sheet.select("C4");
    await page.getByText("Typed; clear the field").waitFor();
    expect(await mass.inputValue()).toBe("1 jupiterMass");
    await mass.fill("");
    await page.keyboard.press("Escape");
    await sheet.select("E3");
    await page.getByText("1.1 solMass").first().waitFor({ state: "hidden" });
    expect(await mass.inputValue()).toBe("");
  });

  test("the message of the call is shown while it is built", async () => {
    const { page } = await open(targets);
    await chooseReflex(page);
    await page.getByLabel("header of planet mass").fill("");
    await page.getByText(/#VALUE!.*REFLEX: planet mass is 0.71 with no unit/).waitFor();
  });

  test("headers that do not stand side by side, and a target that was picked", async () => {
    const shuffled = targets.map((row) => [row[0]!, row[4]!, row[1]!, row[2]!, null]);
    const { page, sheet } = await open(shuffled);
    await chooseReflex(page);
    await page.getByLabel("formula goes into").focus();
    await sheet.select("G5");
    await expect.poll(() => page.getByLabel("formula goes into").inputValue()).toBe("G5");
    await page.keyboard.press("Escape");
    await page.getByText("fills G2:G6").waitFor();
    await page.getByRole("button", { name: "Insert the formula" }).click();
    await page.getByText("REFLEX is in G2:G6.").waitFor();
    expect(await sheet.formula("G2")).toBe('=BARY.REFLEX(C2, D2, B2,,, C$1&";"&D$1&";"&B$1, G$1)');
    expect(await sheet.value("G2")).toBe(
      call("REFLEX", 3.0821, 0.94, 0.71, undefined, undefined, "d; solMass; jupiterMass")[0]![0],
    );
  });

  test("cells that are not blank are written over only when asked twice", async () => {
    const { page, sheet } = await open(targets.map((row, index) => [...row, index === 4 ? "keep me" : null]));
    await chooseReflex(page);
    await page.getByLabel("formula goes into").fill("H2");
    await page.getByRole("button", { name: "Insert the formula" }).click();
    await page.getByRole("alert").getByText("H2:I6 is not blank").waitFor();
    expect(await sheet.value("H5")).toBe("keep me");
    await page.getByRole("button", { name: "Insert and write over" }).click();
    await page.getByText("REFLEX is in").waitFor();
    expect(await sheet.value("H5")).toBeTypeOf("number");
  });
});

describe("why this cell", () => {
  const withResult = targets.map((row, index) => [
    ...row,
    index === 0
      ? "K [m/s]"
      : `=BARY.REFLEX(B${index + 1}, C${index + 1}:D${index + 1}, E${index + 1}:F${index + 1}, G${index + 1},, B$1:G$1, H$1)`,
  ]);

  test("the full story of a value, by keyboard", async () => {
    const { page, sheet } = await open(withResult);
    await sheet.select("H2");
    await tabTo(page, "Find");
    await page.keyboard.press("ArrowRight");
    expect(await focused(page)).toBe("Why");
    const panel = page.getByRole("tabpanel", { name: "Why" });
    await panel.getByText("Inputs as they were read").waitFor();
    const text = await textOf(panel);
    // A day is 86400 s: 3.0821 d are 266293.44 s.
    for (const part of [
      "H2",
      "103.3 \u00b1 6.2 m/s",
      "3.0821 d",
      "266293.440 s",
      "0.940 \u00b1 0.030 solMass",
      "left out: 90 deg, edge-on",
      "B$1: Period [d]",
      "Lovis & Fischer 2010",
      "planet mass 87.5 %",
      "star mass 12.5 %",
    ]) {
      expect(text).toContain(part);
    }
    expect(text).toContain(`exactly ${await sheet.value("H2")}`);
  });

  test("the whole message of an error, by mouse, following the selection", async () => {
    const { page, sheet } = await open(withResult);
    await sheet.type("E4", -1);
    await page.getByRole("tab", { name: "Why" }).click();
    await sheet.select("H4");
    const message = await sheet.message("H4");
    expect(message).toContain("planet mass is -1 jupiterMass");
    await page.getByText(message!).waitFor();
    await sheet.select("A2");
    await page.getByText("typed there").waitFor();
    await sheet.select("M9");
    await page.getByText("This cell is blank").waitFor();
    await sheet.type("M9", "=B2*2");
    await sheet.select("M9");
    await page.getByText("No BARY function is in this formula.").waitFor();
    await sheet.type("M9", '=BARY.AXIS(B2*2, "1 solMass", , "d")');
    await sheet.select("M9");
    await page.getByText("is worked out within the formula").waitFor();
  });

  test("a row of a whole column is told as that row; a call inside another formula as itself", async () => {
    const { page, sheet } = await open(targets);
    await sheet.type("J2", '=BARY.AXIS(B2:B6, C2:C6,, B$1:C$1, "AU")');
    await sheet.type("L2", '=ROUND(BARY.AXIS(B2, C2,, "d;solMass"), 3)');
    await page.getByRole("tab", { name: "Why" }).click();
    await sheet.select("J6");
    await page.getByText("Filled by the formula in J2.").waitFor();
    // The orbit of 1 AU about the Sun takes a Gaussian year, 365.2568983 d: (365.25 / 365.2568983)^(2/3) = 0.9999874.
    await page.getByText("365.25 d").waitFor();
    expect(await textOf(page.locator(".answerLine"))).toBe("0.999987 AU");
    await sheet.select("L2");
    await page.getByText("The call is a part of this formula").waitFor();
  });
});

describe("check this table", () => {
  test("what was understood, findings, and Enter goes to the cell", async () => {
    const { page, sheet } = await open(faulty);
    await page.getByRole("tab", { name: "Check" }).click();
    await page.getByText("6 columns, 3 rows: 5 things to look at.").waitFor();
    await tabTo(page, /the median is 300 jupiterMass.*Is the unit earthMass\?/);
    await page.keyboard.press("Enter");
    await expect.poll(() => sheet.selected()).toBe("D1");
    await page.getByRole("button", { name: /first "n\/a" in E3/ }).click();
    await expect.poll(() => sheet.selected()).toBe("E3");
    expect(await textOf(page.getByRole("row", { name: /Star mass/ }))).toMatch(/star mass\s+solMass/);
    await sheet.type("E3", 60);
    await page.getByRole("button", { name: "Check again" }).click();
    await page.getByText("6 columns, 3 rows: 4 things to look at.").waitFor();
  });

  test("a clean table and an empty sheet", async () => {
    const { page, sheet } = await open(targets);
    await page.getByRole("tab", { name: "Check" }).click();
    await page.getByText("7 columns, 5 rows: nothing to look at.").waitFor();
    for (let column = 0; column < 7; column++) {
      for (let row = 1; row <= 6; row++) await sheet.type(`${"ABCDEFG"[column]}${row}`, null);
    }
    await page.getByRole("button", { name: "Check again" }).click();
    await page.getByText("No row of headers was found").waitFor();
  });
});

describe("mark and compare", () => {
  const derived = targets.map((row, index) => [
    ...row,
    index === 0
      ? "K [m/s]"
      : `=BARY.REFLEX(B${index + 1}, C${index + 1}:D${index + 1}, E${index + 1}:F${index + 1}, G${index + 1},, B$1:G$1, H$1)`,
    index === 0 ? "K uncertainty [m/s]" : null,
  ]);

  test("what moved, the most important first, written to a sheet; by keyboard", async () => {
    const { page, sheet } = await open(derived);
    await tabTo(page, "Find");
    await page.keyboard.press("End");
    await tabTo(page, "Mark the present values");
    await page.keyboard.press("Enter");
    await page.getByText("1 column of 5 rows marked.").waitFor();
    const before = (await sheet.value("H4")) as number;
    const sigma = (await sheet.value("I4")) as number;
    await sheet.type("E4", 3);
    await sheet.type("C2", 0.95);
    await sheet.type("C5", null);
    await tabTo(page, "Compare with now");
    await page.keyboard.press("Enter");
    await page.getByText("3 values moved.").waitFor();
    const moved = (await page.locator(".movement").allTextContents()).map(plain);
    expect(moved.map((text) => /^\w+ \d \w K/.exec(text)?.[0])).toEqual([
      "Quarry 1 b K",
      "Lantern 2 b K",
      "Lantern 1 b K",
    ]);
    expect(moved[0]).toContain("became an error");
    await tabTo(page, /^Lantern 2 b/);
    await page.keyboard.press("Enter");
    await expect.poll(() => sheet.selected()).toBe("H4");
    await tabTo(page, "Write all to a new sheet");
    await page.keyboard.press("Enter");
    await page.getByText('The comparison is in the sheet "Comparison".').waitFor();
    expect(await sheet.active()).toBe("Comparison");
    const now = (await call("REFLEX", 412.6, 1.21, 3, 0.31, undefined, "d;solMass;jupiterMass;")[0]![0]) as number;
    const row = await Promise.all(["A3", "B3", "C3", "D3", "E3", "F3", "G3"].map((address) => sheet.value(address)));
    expect(row).toEqual([
      "Lantern 2 b",
      "K [m/s]",
      before,
      now,
      now - before,
      100 * ((now - before) / before),
      (now - before) / sigma,
    ]);
    expect(await sheet.value("D2")).toBe("#N/A");
  });

  test("a mark is forgotten only when asked twice, and never said to be kept when it is not", async () => {
    const { page } = await open(derived);
    await page.getByRole("tab", { name: "Compare" }).click();
    await faults(page, { saving: true });
    await page.getByRole("button", { name: "Mark the present values" }).click();
    await page.getByText("The worksheet did not answer: the workbook is read-only").waitFor();
    expect(await page.getByLabel("compare with the mark of").count()).toBe(0);
    await faults(page, { saving: false });
    for (let mark = 0; mark < 2; mark++) await page.getByRole("button", { name: "Mark the present values" }).click();
    await page.getByRole("option").nth(1).waitFor({ state: "attached" });
    await page.getByRole("button", { name: "Forget this mark" }).click();
    expect(await page.getByRole("option").count()).toBe(2);
    await page.getByRole("button", { name: "Forget it for good" }).click();
    await page.getByRole("option").nth(1).waitFor({ state: "detached" });
    expect(await page.getByRole("option").count()).toBe(1);
  });

  test("marks of a newer version stay as they are", async () => {
    const { page } = await open(derived);
    await page.evaluate(() => {
      const { Office } = globalThis as unknown as {
        Office: { context: { document: { settings: { set(name: string, text: string): void } } } };
      };
      Office.context.document.settings.set("barycell.marks", '{"version":2}');
    });
    await page.getByRole("tab", { name: "Compare" }).click();
    await page.getByText("kept by a newer version").waitFor();
    await page.getByRole("button", { name: "Mark the present values" }).click();
    await page.getByText("kept by a newer version").waitFor();
    const kept = await page.evaluate(() =>
      (
        globalThis as unknown as { Office: { context: { document: { settings: { get(name: string): string } } } } }
      ).Office.context.document.settings.get("barycell.marks"),
    );
    expect(kept).toBe('{"version":2}');
  });

  test("a sheet without formulas has nothing to mark", async () => {
    const { page } = await open(targets);
    await page.getByRole("tab", { name: "Compare" }).click();
    await page.getByRole("button", { name: "Mark the present values" }).click();
    await page.getByText("there is nothing to mark").waitFor();
  });
});

describe("the pane as a whole", () => {
  async function everyPart(page: Page, look: (part: string) => Promise<void>) {
    await look("find");
    await chooseReflex(page);
    await page.getByText("Inputs, formula and source").click();
    await page.getByLabel("header of planet mass").fill("");
    await page.getByLabel("star mass", { exact: true }).focus();
    await page.getByText("#VALUE!").waitFor();
    await look("build");
    await page.getByRole("button", { name: "Insert the formula" }).click();
    await page.getByText("REFLEX is in").waitFor();
    await page.getByRole("tab", { name: "Why" }).click();
    await page.getByText("Inputs as they were read").waitFor();
    await look("why");
    await page.getByRole("tab", { name: "Check" }).click();
    await page.getByText("What was understood").waitFor();
    await look("check");
    await page.getByRole("tab", { name: "Compare" }).click();
    await page.getByRole("button", { name: "Mark the present values" }).click();
    await page.getByText("marked.").waitFor();
    await page.evaluate(() =>
      (
        globalThis as unknown as { standIn: { sheet: { type(address: string, value: number): void } } }
      ).standIn.sheet.type("B3", 50),
    );
    await page.getByRole("button", { name: "Compare with now" }).click();
    await page.getByText(/moved/).first().waitFor();
    await look("compare");
  }

  test.each(["light", "dark"] as const)("no barrier that axe knows, %s", async (colorScheme) => {
    const { page } = await open(faultyMasses, { media: { colorScheme } });
    await everyPart(page, async (part) => {
      if (!(await page.evaluate(() => "axe" in globalThis))) await page.evaluate(axe.source);
      const { violations } = await page.evaluate(() => (globalThis as unknown as { axe: typeof axe }).axe.run());
      expect(violations.map(({ id, nodes }) => `${part}: ${id}: ${nodes[0]!.html}`)).toEqual([]);
    });
  });

  test.each([
    ["320 px", 320, "100%"],
    ["text twice as large", 320, "200%"],
    ["320 px at twice the size", 160, "100%"],
  ])("nothing is cut off at %s", async (_, width, fontSize) => {
    const { page } = await open(faultyMasses, { size: { width, height: 640 } });
    await page.evaluate((size) => {
      document.documentElement.style.fontSize = size;
    }, fontSize);
    await everyPart(page, async (part) => {
      const over = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(`${part}: ${over}`).toBe(`${part}: 0`);
    });
  });

  test("follows the colours of the host before those of the system", async () => {
    const ground = async (colorScheme: "light" | "dark", theme?: string) => {
      const { page } = await open(targets, { media: { colorScheme }, ...(theme ? { theme } : {}) });
      return page.evaluate(() => getComputedStyle(document.body).backgroundColor);
    };
    const [light, dark] = [await ground("light"), await ground("dark")];
    expect(await ground("light", "#262626")).toBe(dark);
    expect(await ground("dark", "#ffffff")).toBe(light);
    expect(light).not.toBe(dark);
  });

  test("nothing moves for those who want it so", async () => {
    const { page } = await open(targets, { media: { reducedMotion: "reduce" } });
    const durations = await page.evaluate(() =>
      Array.from(document.querySelectorAll("*"), (element) => getComputedStyle(element).transitionDuration),
    );
    expect(new Set(durations)).toEqual(new Set(["0s"]));
  });

  test("a host that does not answer is said to, and can be asked again", async () => {
    const { page } = await open(targets);
    await faults(page, { editing: true });
    await page.getByRole("tab", { name: "Check" }).click();
    await page.getByRole("alert").getByText("the cell is being edited").waitFor();
    await faults(page, { editing: false });
    await page.getByRole("button", { name: "Check again" }).click();
    await page.getByText("nothing to look at").waitFor();
  });
});

/** A table with a fault, in which a call can be built nevertheless. */
const faultyMasses = targets.map((row, index) => (index === 0 ? row : [...row.slice(0, 4), 300, ...row.slice(5)]));
