import axe from "axe-core";
import { afterAll, afterEach, beforeAll, describe, expect, test } from "vitest";
import { type EditorBrowser, type EditorPage, openEditorBrowser } from "./openEditor.js";

let browser: EditorBrowser;
let editor: EditorPage;

beforeAll(async () => {
  browser = await openEditorBrowser();
});

afterAll(() => browser.close());

afterEach(() => {
  // A refused style, an error that nobody caught: all of them land here.
  expect(editor.complaints.splice(0)).toEqual([]);
});

async function open(theme?: string, broken?: string) {
  editor = await browser.open(theme, broken);
  const { page } = editor;
  return { ...editor, list: page.getByRole("listbox"), card: page.locator(".editor-card") };
}

const typed = (row: number, column: number, text: string, sheet = 0) => ({
  do: "type",
  place: { sheet, row, column },
  texts: [[text]],
});
const said = () => editor.page.evaluate(() => [...standIn.said]);
const drafts = () =>
  editor.page.evaluate(() =>
    standIn.log.filter(({ what }) => what === "keepDraft").map(({ given }) => given as object),
  );
const active = () => editor.page.evaluate(() => standIn.page.selection().active);
const outlined = () =>
  editor.page.evaluate(() =>
    standIn.marks.map(({ area: { top, left, bottom, right }, colour }) => [top, left, bottom, right, colour]),
  );
const press = async (...keys: readonly string[]) => {
  for (const key of keys) await editor.page.keyboard.press(key);
};
const type = (text: string) => editor.page.keyboard.type(text);

describe("the line and the cell", () => {
  test("the line shows what the active cell holds, whole", async () => {
    const { text, select, page } = await open();
    await select(1, 1);
    await expect.poll(text).toBe("4.230785");
    expect(await page.getByLabel("Go to a cell or name").inputValue()).toBe("B2");
    await select(1, 4);
    await expect.poll(text).toBe("=B2*2+C$2");
    expect(await page.getByRole("textbox", { name: "Formula line, E2" }).textContent()).toBe("=B2*2+C$2");
  });

  test("however slowly entries come, the line never shows another cell's", async () => {
    const { text, select, page } = await open();
    await select(1, 1);
    await expect.poll(text).toBe("4.230785");
    await page.evaluate(() => {
      standIn.delays.entryOf = 300;
    });
    await select(1, 4);
    expect(await text()).toBe("");
    await expect.poll(text).toBe("=B2*2+C$2");
  });

  test("typing that begins before the entry came goes on behind it", async () => {
    const { text, select, page, entered } = await open();
    await page.evaluate(() => {
      standIn.delays.entryOf = 300;
    });
    await select(1, 4);
    await press("F2");
    await type("+1");
    expect(await text()).toBe("+1");
    await expect.poll(text).toBe("=B2*2+C$2+1");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 4, "=B2*2+C$2+1")]);
  });

  test("what is typed over a cell is entered by Enter, and the selection goes on", async () => {
    const { entered } = await open();
    await type("=B2*2");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "=B2*2")]);
    expect(await active()).toEqual({ sheet: 0, row: 2, column: 5 });
    await type("12");
    await press("Tab");
    await type("x");
    await press("Shift+Tab");
    await type("y");
    await press("Shift+Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "=B2*2"), typed(2, 5, "12"), typed(2, 6, "x"), typed(2, 5, "y")]);
    expect(await active()).toEqual({ sheet: 0, row: 1, column: 5 });
  });

  test("keys pressed right after Enter belong to the next cell", async () => {
    const { entered, page } = await open();
    await page.evaluate(() => {
      standIn.delays.act = 300;
    });
    await type("1");
    await press("Enter");
    await type("2");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "1"), typed(2, 5, "2")]);
  });

  test("Escape restores, and nothing is entered that did not change", async () => {
    const { text, select, entered } = await open();
    await select(1, 1);
    await expect.poll(text).toBe("4.230785");
    await press("F2");
    await type("9");
    await press("Escape");
    await expect.poll(text).toBe("4.230785");
    await press("F2", "Enter");
    await select(2, 1);
    await expect.poll(text).toBe("two lines");
    await press("F2", "Enter");
    expect(await entered()).toEqual([]);
  });

  test("caret and undo stay when the editing moves between line and cell", async () => {
    const { page, text, select } = await open();
    await select(1, 4);
    await expect.poll(text).toBe("=B2*2+C$2");
    await press("F2");
    await page.getByRole("textbox", { name: "Cell E2" }).waitFor();
    await type("+7");
    await press("ArrowLeft");
    await page.evaluate(() => standIn.editor.beginInLine());
    await page.getByRole("textbox", { name: "Formula line, E2" }).waitFor();
    await type("3");
    expect(await text()).toBe("=B2*2+C$2+37");
    await page.evaluate(() => standIn.editor.beginInCell(undefined));
    await press("Control+z", "Control+z", "Control+z");
    expect(await text()).toBe("=B2*2+C$2");
    await press("Control+Shift+Z");
    expect(await text()).toBe("=B2*2+C$2+7");
  });

  test("the line shows what is typed in the cell; a press there goes on in the line", async () => {
    const { page, text } = await open();
    await type("=B2+C2");
    const mirror = page.locator(".editor-mirror");
    expect(await mirror.textContent()).toBe("=B2+C2");
    expect(await mirror.locator("span").first().getAttribute("class")).toContain("editor-reference-0");
    await mirror.click({ position: { x: 16, y: 12 } });
    await type("1*");
    expect(await text()).toBe("=1*B2+C2");
  });

  test("line breaks that are pasted become blanks", async () => {
    const { text, page } = await open();
    await type("=");
    await page.evaluate(() => {
      const data = new DataTransfer();
      data.setData("text/plain", "B2\n  + C2\r\n*2\n");
      const content = document.querySelector(".cm-content")!;
      content.dispatchEvent(new ClipboardEvent("paste", { clipboardData: data, bubbles: true, cancelable: true }));
    });
    expect(await text()).toBe("=B2 + C2 *2");
    await press("Alt+Enter");
    expect(await text()).toBe("=B2 + C2 *2");
  });

  test("another selection enters what is typed", async () => {
    const { entered, page } = await open();
    await type("12");
    await page.locator("#B4").click();
    await expect.poll(entered).toEqual([typed(1, 5, "12")]);
    expect(await active()).toEqual({ sheet: 0, row: 3, column: 1 });
  });

  test("an arrow leaves a cell that was typed over, and moves the caret in one that is edited", async () => {
    const { entered, select, text } = await open();
    await type("12");
    await press("ArrowDown");
    await expect.poll(entered).toEqual([typed(1, 5, "12")]);
    await select(1, 1);
    await expect.poll(text).toBe("4.230785");
    await press("F2", "ArrowLeft");
    await type("0");
    expect(await text()).toBe("4.2307805");
  });

  test("Ctrl+Enter enters over all that is selected", async () => {
    const { entered, page } = await open();
    const area = { sheet: 0, top: 1, left: 5, bottom: 4, right: 5 };
    await page.evaluate((area) => standIn.page.select(area, { sheet: 0, row: 2, column: 5 }), area);
    await type("=B3");
    await press("Control+Enter");
    await expect
      .poll(entered)
      .toEqual([{ do: "type over", area, place: { sheet: 0, row: 2, column: 5 }, text: "=B3" }]);
  });

  test("an address is gone to", async () => {
    const { page } = await open();
    await page.getByLabel("Go to a cell or name").click();
    await type("nowhere");
    await press("Enter");
    await expect
      .poll(said)
      .toEqual(["Nothing is called nowhere; an address such as H12, a name or a target's name is needed."]);
    await type("c4");
    await press("Enter");
    await expect.poll(active).toEqual({ sheet: 0, row: 3, column: 2 });
  });
});

describe("offers", () => {
  test("a function by what it answers", async () => {
    const { list, text, card } = await open();
    await type("=how fast");
    const option = list.getByRole("option", { name: "BARY.REFLEX" });
    await option.waitFor();
    expect(await option.textContent()).toContain(
      "How fast does this planet make its star move along the line of sight?",
    );
    await option.click();
    expect(await text()).toBe("=BARY.REFLEX(");
    await card.getByText("orbital period").waitFor();
  });

  test("a function by name with Enter or Tab, and the cell of a column by its header", async () => {
    const { list, text } = await open();
    await type("=refl");
    await list.getByRole("option", { name: "BARY.REFLEX" }).waitFor();
    await editor.page.waitForTimeout(100);
    await press("Enter");
    expect(await text()).toBe("=BARY.REFLEX(");
    await type("peri");
    await list.getByRole("option", { name: "B2" }).waitFor();
    expect(await list.getByRole("option").first().textContent()).toBe("B2Period [d]");
    await editor.page.waitForTimeout(100);
    await press("Tab");
    expect(await text()).toBe("=BARY.REFLEX(B2");
    await type(",star m");
    await list.getByRole("option", { name: "C2" }).waitFor();
    await editor.page.waitForTimeout(100);
    await press("Enter");
    expect(await text()).toBe("=BARY.REFLEX(B2,C2");
  });

  test("words in the line, which are entered as they stand unless one is chosen", async () => {
    const { list, text, page, entered } = await open();
    await page.locator(".cm-content").click();
    await type("smallest planet");
    await list.getByRole("option", { name: "BARY.MINMASS" }).waitFor();
    await page.waitForTimeout(100);
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "smallest planet")]);
    await page.locator(".cm-content").click();
    await type("smallest planet");
    await list.getByRole("option", { name: "BARY.MINMASS" }).waitFor();
    await page.waitForTimeout(100);
    await press("ArrowDown", "Enter");
    expect(await text()).toMatch(/^=BARY\.\w+\($/);
  });

  test("Escape closes the list first", async () => {
    const { list, text } = await open();
    await type("=refl");
    await list.waitFor();
    await press("Escape");
    await list.waitFor({ state: "hidden" });
    expect(await text()).toBe("=refl");
    await press("Escape");
    await expect.poll(text).toBe("");
  });
});

describe("hints", () => {
  test("the present argument, its meaning, and the keys", async () => {
    const { card, page } = await open();
    await type("=BARY.REFLEX(B2,C2,D2,");
    expect(await card.locator(".editor-present").textContent()).toBe("[eccentricity]");
    const text = await card.textContent();
    for (const part of ["left out: a circular orbit", "in m/s unless the result header says otherwise", "Alt+C"]) {
      expect(text).toContain(part);
    }
    await press("ArrowLeft", "ArrowLeft", "F2", "ArrowLeft");
    await expect.poll(() => page.locator("#editor-description").textContent()).toContain("Enter enters");
  });

  test("the headers are completed by a key", async () => {
    const { text, entered } = await open();
    await type("=BARY.REFLEX(B2,C2,D2");
    await press("Alt+c");
    await expect.poll(text).toBe("=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,E$1)");
    expect(await said()).toEqual(["The headers are B$1:D$1 and E$1."]);
    await press("Control+z");
    expect(await text()).toBe("=BARY.REFLEX(B2,C2,D2");
    await press("F8");
    await expect.poll(text).toContain("E$1)");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,E$1)")]);
  });

  test.each(["F4", "Control+Shift+4"])("%s steps a reference through its forms", async (key) => {
    const { text } = await open();
    await type("=1+B2:D9");
    const forms = [];
    for (let step = 0; step < 4; step++) {
      await press(key);
      forms.push(await text());
    }
    // The order: common practice, no source.
    expect(forms).toEqual(["=1+$B$2:$D$9", "=1+B$2:D$9", "=1+$B2:$D9", "=1+B2:D9"]);
    await type("*2");
    expect(await text()).toBe("=1+B2:D9*2");
  });
});

describe("picking", () => {
  test("by mouse: a press, another one instead, a drag, a column", async () => {
    const { page, text } = await open();
    await type("=");
    await page.locator("#B3").click();
    expect(await text()).toBe("=B3");
    await page.locator("#C4").click();
    expect(await text()).toBe("=C4");
    await type("+SUM(");
    await page.locator("#A2").hover();
    await page.mouse.down();
    await page.locator("#B3").hover();
    await page.mouse.up();
    expect(await text()).toBe("=C4+SUM(A2:B3");
    expect(await outlined()).toEqual([
      [3, 2, 3, 2, 0],
      [1, 0, 2, 1, 1],
    ]);
    await type(",");
    await page.locator("#column-D").click();
    await type(",");
    await page.locator("#B1").click();
    expect(await text()).toBe("=C4+SUM(A2:B3,D:D,B$1");
  });

  test("by arrows, with Shift, to the edge; F2 gives the arrows to the caret", async () => {
    const { text } = await open();
    await type("=");
    await press("ArrowLeft");
    expect(await text()).toBe("=E2");
    await press("ArrowLeft", "ArrowDown");
    expect(await text()).toBe("=D3");
    await press("Shift+ArrowDown", "Shift+ArrowRight");
    expect(await text()).toBe("=D3:E4");
    await type("*");
    await press("ArrowUp");
    expect(await text()).toBe("=D3:E4*F$1");
    await type("+");
    await press("ArrowLeft", "Control+Shift+ArrowDown");
    await expect.poll(text).toBe("=D3:E4*F$1+E2:E100000");
    await type("-");
    await press("F2", "ArrowLeft");
    expect(await text()).toBe("=D3:E4*F$1+E2:E100000-");
    await type("1");
    expect(await text()).toBe("=D3:E4*F$1+E2:E1000001-");
  });

  test("on another sheet, which is named; Enter goes back", async () => {
    const { page, text, entered } = await open();
    await type("=");
    await page.evaluate(() => standIn.page.showSheet(1));
    expect(await text()).toBe("=");
    await page.locator("#B3").click();
    expect(await text()).toBe("='More stars'!B3");
    expect(await outlined()).toEqual([[2, 1, 2, 1, 0]]);
    await press("ArrowDown");
    expect(await text()).toBe("='More stars'!B4");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "='More stars'!B4")]);
    expect(await active()).toEqual({ sheet: 0, row: 2, column: 5 });
    expect(await outlined()).toEqual([]);
  });

  test("not where no reference may stand: the press enters the formula", async () => {
    const { page, entered } = await open();
    await type("=B2");
    await page.locator("#C4").click();
    await expect.poll(entered).toEqual([typed(1, 5, "=B2")]);
  });
});

describe("faults and values before Enter", () => {
  test("the value, spoken and seen", async () => {
    const { card, page } = await open();
    await type("=BARY.REFLEX(B2,C2,D2");
    await card.getByText("= 58.61 m/s").waitFor();
    const status = page.getByRole("status");
    expect(await status.textContent()).toContain("planet mass: ");
    expect(await status.textContent()).toContain("gives 58.61 m/s");
    const described = await page.locator(".cm-content").getAttribute("aria-describedby");
    expect(described).toContain((await status.getAttribute("id"))!);
  });

  test("a fault is underlined where it is; a formula on its way has none", async () => {
    const { card, page } = await open();
    await type("=SUM(B2)+NOSUCH(1)");
    await card.locator(".editor-message[data-severity=error]").getByText("NOSUCH").waitFor();
    expect(await page.locator(".editor-wrong").textContent()).toBe("N");
    await type("+");
    await card.locator(".editor-message[data-severity=hint]").waitFor();
  });

  test("an answer that comes late is for another text", async () => {
    const { card, page } = await open();
    await page.evaluate(() => {
      standIn.delays.checkFormula = 250;
    });
    await type("=BARY.REFLEX(B2,C2,D2)");
    await page.waitForTimeout(200);
    await type("/2");
    await page.waitForTimeout(300);
    expect(await card.locator(".editor-preview").count()).toBe(0);
  });

  test("what cannot be read is refused and stays, wherever it was to go", async () => {
    const { card, text, entered, page } = await open();
    await type("=SUM(B2;C2)");
    await press("Enter");
    await card.getByText('arguments are separated by ","').waitFor();
    expect(await page.getByRole("status").textContent()).toContain('arguments are separated by ","');
    await page.locator("#A5").click();
    expect(await text()).toBe("=SUM(B2;C2)");
    expect(await active()).toEqual({ sheet: 0, row: 1, column: 5 });
    expect(await page.evaluate(() => standIn.editor.commit())).toBe(false);
    expect(await entered()).toEqual([]);
    await press("End", "ArrowLeft", "ArrowLeft", "ArrowLeft", "Backspace");
    await type(",");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "=SUM(B2,C2)")]);
  });

  test("a name that nobody knows is entered all the same", async () => {
    const { entered } = await open();
    await type("=nosuch+1");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "=nosuch+1")]);
  });

  test("a text that the worker refuses comes back, even after another one was begun", async () => {
    const { text, page, entered } = await open();
    await page.evaluate(() => {
      standIn.delays.act = 200;
    });
    await type("refuse me");
    await press("Enter");
    await type("next");
    await expect.poll(said).toEqual(["That cell is kept."]);
    expect(await text()).toBe("next");
    await press("Enter");
    await expect.poll(text).toBe("refuse me");
    expect(await page.evaluate(() => standIn.editor.editing())).toEqual({ sheet: 0, row: 1, column: 5 });
    await press("Escape");
    await expect.poll(async () => (await entered()).length).toBe(2);
  });

  test("ten thousand characters can be typed in, and are refused with the limit", async () => {
    const { text, page, card } = await open();
    await type("=");
    const long = `SUM(${Array.from({ length: 1999 }, (_, index) => `B${index + 2}`).join(",")})`.slice(0, 9_999);
    await page.evaluate((long) => standIn.editor.insert(long), long);
    await type("+1");
    expect(await text()).toBe(`=${long}+1`);
    await press("Enter");
    await card.getByText("8192 are the most").waitFor();
    expect((await text()).length).toBe(10_002);
  });
});

describe("drafts", () => {
  test("are kept while one types, and let go when entered or given up", async () => {
    await open();
    await type("=B2");
    await expect.poll(drafts).toEqual([{ place: { sheet: 0, row: 1, column: 5 }, text: "=B2" }]);
    await press("Enter");
    await expect.poll(async () => (await drafts()).at(-1)).toBeNull();
    await type("12");
    await expect.poll(async () => (await drafts()).at(-1)).toMatchObject({ text: "12" });
    await press("Escape");
    await expect.poll(async () => (await drafts()).at(-1)).toBeNull();
  });

  test("the draft of the next cell outlives the one that was entered", async () => {
    const { page } = await open();
    await page.evaluate(() => {
      standIn.delays.act = 600;
    });
    await type("1");
    await page.waitForTimeout(300);
    await press("Enter");
    await type("2");
    await page.waitForTimeout(800);
    expect((await drafts()).at(-1)).toMatchObject({ text: "2" });
  });

  test("are taken up again", async () => {
    const { text, page, entered } = await open();
    await page.evaluate(() => standIn.editor.resume({ sheet: 0, row: 3, column: 2 }, "=B4*"));
    expect(await text()).toBe("=B4*");
    expect(await active()).toEqual({ sheet: 0, row: 3, column: 2 });
    await type("2");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(3, 2, "=B4*2")]);
  });
});

describe("when the worker breaks down", () => {
  test("what can no longer be done is told once, and typing goes on", async () => {
    const { text } = await open("light", "functions,keepDraft,checkFormula,entryOf,searchFunctions,completeHeaders");
    await type("=how fast");
    await editor.page.waitForTimeout(400);
    await type("+1");
    await editor.page.waitForTimeout(400);
    await press("F8");
    expect(await text()).toBe("=how fast+1");
    expect(await said()).toEqual([
      "The functions could not be listed, so none are offered: the worker broke down",
      "What is being typed could not be kept against a crash: the worker broke down",
      "That key did nothing: the worker broke down",
    ]);
  });

  test("what was entered comes back", async () => {
    const { text, page } = await open();
    await page.evaluate(() => standIn.broken.add("act"));
    await type("12");
    await press("Enter");
    await expect.poll(text).toBe("12");
    expect(await active()).toEqual({ sheet: 0, row: 1, column: 5 });
  });
});

describe("for everyone", () => {
  test.each(["light", "dark", "red"])("the accessibility rules hold while a call is typed: %s", async (theme) => {
    const { page, list } = await open(theme);
    const problems = async () => {
      await page.evaluate(axe.source);
      const { violations } = await page.evaluate(() => (globalThis as unknown as { axe: typeof axe }).axe.run());
      return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(" ")}`);
    };
    await type("=BARY.REFLEX(B2,C2,D2");
    await page.locator(".editor-preview").waitFor();
    expect(await problems()).toEqual([]);
    await type(",ecc");
    await type("+how fast");
    await list.waitFor();
    expect(await problems()).toEqual([]);
  });

  test("the view is styled without a rule that the content policy refuses", async () => {
    const { page } = await open();
    expect(await page.locator("style").count()).toBe(0);
    expect(await page.evaluate(() => document.adoptedStyleSheets.length)).toBe(1);
    // The library's own rule: a text that is typed keeps its blanks.
    expect(await page.locator(".cm-content").evaluate((element) => getComputedStyle(element).whiteSpace)).toMatch(
      /^(break-spaces|pre-wrap)$/,
    );
    expect(await page.evaluate(() => document.head.tagName)).toBe("HEAD");
  });

  test("the keyboard comes through the line without typing in it, and Enter begins", async () => {
    const { page, entered } = await open();
    await page.getByLabel("Go to a cell or name").focus();
    await press("Tab");
    expect(await page.evaluate(() => document.activeElement?.className)).toContain("cm-content");
    await press("Tab");
    expect(await page.evaluate(() => standIn.editor.editing())).toBeUndefined();
    await press("Shift+Tab", "Enter");
    await type("5");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "5")]);
  });

  test("letters that are composed are not taken for keys", async () => {
    const { page, text, entered } = await open();
    await type("a");
    const session = await page.context().newCDPSession(page);
    await session.send("Input.imeSetComposition", { text: "ほし", selectionStart: 2, selectionEnd: 2 });
    expect(await text()).toBe("aほし");
    await session.send("Input.insertText", { text: "星" });
    expect(await text()).toBe("a星");
    await press("Enter");
    await expect.poll(entered).toEqual([typed(1, 5, "a星")]);
  });
});
