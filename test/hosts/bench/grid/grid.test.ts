import axe from "axe-core";
import { afterAll, afterEach, beforeAll, describe, expect, test } from "vitest";
import type { Area } from "../../../../src/sheet/book/book.js";
import { type GridBrowser, type GridPage, openGridBrowser } from "./openGrid.js";
import { errorMessage } from "./standIn/standInTable.js";

let browser: GridBrowser;
let grid: GridPage;

beforeAll(async () => {
  browser = await openGridBrowser();
});
afterAll(() => browser.close());
afterEach(async () => {
  const { complaints } = grid;
  await grid.close();
  expect(complaints).toEqual([]);
});

const open = async (setting?: Parameters<GridBrowser["open"]>[0]) => {
  grid = await browser.open(setting);
  await grid.page.evaluate(() => gridStandIn.grid.focus());
  return grid;
};

/** As the stand-in's page has it: `H4:J9 H4`, the active cell last. */
const selection = () =>
  grid.page.evaluate(() => {
    const { area, active } = gridStandIn.page.selection();
    return [area.top, area.left, area.bottom, area.right, active.row, active.column];
  });
const actions = () => grid.page.evaluate(() => gridStandIn.page.actions);
const told = (what: string) =>
  grid.page.evaluate((what) => gridStandIn.told.filter((each) => each.what === what).map((each) => each.with), what);
const keys = async (...pressed: string[]) => {
  for (const key of pressed) await grid.page.keyboard.press(key);
};
const press = async (row: number, column: number) => {
  const { x, y } = await grid.at(row, column);
  await grid.page.mouse.click(x, y);
};
const drag = async (from: { x: number; y: number }, to: { x: number; y: number }, release = true) => {
  await grid.page.mouse.move(from.x, from.y);
  await grid.page.mouse.down();
  await grid.page.mouse.move((from.x + to.x) / 2, (from.y + to.y) / 2);
  await grid.page.mouse.move(to.x, to.y);
  if (release) await grid.page.mouse.up();
};
/** The letter of a column and the number of a row, on the screen. */
const letter = async (column: number) => ({ x: (await grid.at(0, column)).x - 20, y: 12 });
const number = async (row: number) => ({ x: 30, y: (await grid.at(row, 0)).y });
const handle = async () => {
  const box = await grid.page.locator(".grid-handle:visible").boundingBox();
  return { x: box!.x + box!.width / 2, y: box!.y + box!.height / 2 };
};
/** The machine may be busy; what is waited for may take its time. */
const within = <Found>(look: () => Found) => expect.poll(look, { timeout: 8000 });
const settle = () => grid.page.evaluate(() => new Promise((done) => requestAnimationFrame(() => setTimeout(done, 30))));
const visible = (selector: string) => grid.page.locator(`${selector}:visible`);
const lastRow = 1_048_575;
const lastColumn = 16_383;

describe("what is shown", () => {
  test("only the cells in view exist, among a million rows", async () => {
    const { page } = await open();
    expect(await page.getByRole("grid").getAttribute("aria-rowcount")).toBe(String(1_000_000 + 200 + 1));
    expect(await page.locator(".grid-cell").count()).toBeLessThan(800);
    await page.evaluate(() => gridStandIn.grid.reveal({ sheet: 0, row: 999_999, column: 0 }));
    await settle();
    expect(await page.getByText("HD 1009999", { exact: true }).isVisible()).toBe(true);
    expect(await page.locator(".grid-cell").count()).toBeLessThan(800);
  });

  test("a turn of the wheel moves as many pixels in a million rows as anywhere, over every pane", async () => {
    const { page } = await open();
    for (const point of [await grid.at(5, 4), await grid.at(5, 0), await number(5), await letter(3)]) {
      const before = (await grid.at(20, 0)).y;
      await page.mouse.move(point.x, point.y);
      await page.mouse.wheel(0, 56);
      await within(async () => Math.round(before - (await grid.at(20, 0)).y)).toBe(56);
    }
  });

  test("every row can be scrolled to by the bar, the last spare one at its end", async () => {
    const { page } = await open();
    await page.locator(".grid-scroll").evaluate((scroller) => {
      scroller.scrollTop = scroller.scrollHeight;
    });
    await settle();
    expect(await page.getByRole("rowheader", { name: "1000200", exact: true }).isVisible()).toBe(true);
    await page.locator(".grid-scroll").evaluate((scroller) => {
      scroller.scrollTop = scroller.scrollHeight / 2;
    });
    await settle();
    const numbers = await page.getByRole("rowheader").allTextContents();
    expect(Math.abs(Number(numbers[10]) - 500_100)).toBeLessThan(5_000);
  });

  test("names and units are set apart, errors are told by more than colour", async () => {
    const { page } = await open();
    const header = page.getByRole("columnheader", { name: /^Period/ });
    expect(await header.locator(".grid-name").textContent()).toBe("Period");
    expect(await header.getByRole("button").textContent()).toBe("d");
    const [outer, inner] = [await header.boundingBox(), await header.getByRole("button").boundingBox()];
    expect(inner!.y + inner!.height).toBeLessThan(outer!.y + outer!.height);
    for (const heard of [
      "Target",
      "Period [d]",
      "σ Period [d], uncertainty of Period",
      "K [m/s], calculated",
      "Speed [m/ss], needs attention",
    ]) {
      expect(await page.getByRole("columnheader", { name: heard, exact: true }).count(), heard).toBe(1);
    }
    const error = page.getByRole("gridcell", { name: "#N/A" }).first();
    expect(await error.evaluate((cell) => getComputedStyle(cell, "::after").borderTopWidth)).toBe("8px");
  });

  test("cells on their way leave a quiet place and shift nothing", async () => {
    const { page } = await open();
    await page.evaluate(() => {
      gridStandIn.page.late = 150;
      gridStandIn.grid.reveal({ sheet: 0, row: 500_000, column: 0 });
    });
    await settle();
    expect(await page.locator(".grid-waiting").count()).toBeGreaterThan(100);
    const before = await grid.at(500_000, 2);
    await page.getByText("HD 510000", { exact: true }).waitFor();
    await within(() => page.locator(".grid-waiting").count()).toBe(0);
    expect(await grid.at(500_000, 2)).toEqual(before);
  });

  test("changed cells flash once, unless the analyst prefers none", async () => {
    const { page } = await open();
    const setCell = (text: string) =>
      page.evaluate((text) => {
        gridStandIn.page.setCell(2, 1, { text, is: "number", flash: "edited" });
        gridStandIn.page.change({});
      }, text);
    const animations = () =>
      page.evaluate(() => document.getAnimations().map((each) => (each as CSSAnimation).animationName));
    await setCell("1.5");
    await settle();
    expect(await animations()).toEqual(["grid-edited-1"]);
    await setCell("1.6");
    await settle();
    expect(await animations()).toEqual(["grid-edited-0"]);
    await page.evaluate(() => gridStandIn.page.prefer({ flash: false }));
    await setCell("1.7");
    await settle();
    expect(await animations()).toEqual([]);
    await page.evaluate(() => gridStandIn.page.prefer({ flash: true }));
    await page.emulateMedia({ reducedMotion: "reduce" });
    await setCell("1.8");
    await settle();
    expect(await animations()).toEqual([]);
  });

  test("rows keep their numbers under a filter, and areas cover what is seen of them", async () => {
    const { page } = await open({ rows: 100 });
    await page.evaluate(() => gridStandIn.page.filterRows([0, 1, 4, 9, 50]));
    await settle();
    expect((await page.locator(".grid-body").getByRole("rowheader").allTextContents()).slice(0, 6)).toEqual([
      "2",
      "5",
      "10",
      "51",
      "101",
      "102",
    ]);
    await press(1, 1);
    await keys("Shift+ArrowDown", "Shift+ArrowDown");
    expect(await selection()).toEqual([1, 1, 9, 1, 1, 1]);
    await keys("ArrowDown");
    expect(await selection()).toEqual([4, 1, 4, 1, 4, 1]);
  });

  test("rows that a plot set apart are marked", async () => {
    const { page } = await open();
    await page.evaluate(() => gridStandIn.page.markRows([4, 6]));
    await settle();
    expect(await page.locator(".grid-marked").allTextContents()).toEqual(["5", "7"]);
  });

  test("several sheets keep how far they were scrolled", async () => {
    const { page } = await open();
    await page.evaluate(() => gridStandIn.grid.reveal({ sheet: 0, row: 700_000, column: 0 }));
    await settle();
    await page.evaluate(() => gridStandIn.page.showSheet(1));
    await settle();
    expect(await page.getByText("HD 10001", { exact: true }).isVisible()).toBe(true);
    await page.evaluate(() => gridStandIn.page.showSheet(0));
    await settle();
    expect(await page.getByText("HD 710000", { exact: true }).isVisible()).toBe(true);
  });
});

describe("selection by mouse", () => {
  test("press, drag and Shift", async () => {
    await open();
    await press(3, 2);
    expect(await selection()).toEqual([3, 2, 3, 2, 3, 2]);
    await drag(await grid.at(3, 2), await grid.at(6, 4));
    expect(await selection()).toEqual([3, 2, 6, 4, 3, 2]);
    await grid.page.keyboard.down("Shift");
    await press(2, 1);
    await grid.page.keyboard.up("Shift");
    expect(await selection()).toEqual([2, 1, 3, 2, 3, 2]);
    await settle();
    expect(await grid.page.locator('.grid-cell[aria-selected="true"]').count()).toBe(4);
  });

  test("letters, row numbers and the corner", async () => {
    const { page } = await open();
    const [b, d] = [await letter(1), await letter(3)];
    await drag(b, d);
    expect(await selection()).toEqual([0, 1, lastRow, 3, 0, 1]);
    await page.mouse.click((await letter(4)).x, 12);
    await page.keyboard.down("Shift");
    await page.mouse.click((await letter(5)).x, 12);
    await page.keyboard.up("Shift");
    expect(await selection()).toEqual([0, 4, lastRow, 5, 0, 4]);
    await drag(await number(4), await number(6));
    expect(await selection()).toEqual([4, 0, 6, lastColumn, 4, 0]);
    await page.mouse.click(20, 12);
    expect((await selection()).slice(0, 4)).toEqual([0, 0, lastRow, lastColumn]);
  });

  test("dragging beyond the edge scrolls on", async () => {
    const { page } = await open();
    await drag(await grid.at(10, 3), { x: 500, y: 760 }, false);
    await within(async () => (await selection())[2]).toBeGreaterThan(60);
    await page.mouse.move(1320, 300);
    await within(async () => (await selection())[3]).toBeGreaterThan(20);
    await page.mouse.up();
  });

  test("a drag that came back stays within the columns that do not scroll only at their start", async () => {
    const { page } = await open();
    await page.evaluate(() => gridStandIn.grid.reveal({ sheet: 0, row: 5, column: 25 }));
    await settle();
    const from = await grid.at(5, 20);
    await drag(from, { x: 100, y: from.y }, false);
    await within(async () => (await selection())[1]).toBe(0);
    await page.mouse.up();
  });
});

/** Keys from A2, and what is then selected: top, left, bottom, right, and the active cell. */
const moves: readonly (readonly [readonly string[], readonly number[]])[] = [
  [
    ["ArrowDown", "ArrowRight"],
    [2, 1, 2, 1, 2, 1],
  ],
  [
    ["Shift+ArrowDown", "Shift+ArrowDown", "Shift+ArrowRight", "Shift+ArrowUp"],
    [1, 0, 2, 1, 1, 0],
  ],
  [["Control+ArrowDown"], [999_999, 0, 999_999, 0, 999_999, 0]],
  [
    ["Control+ArrowRight", "Control+Shift+ArrowLeft"],
    [1, 0, 1, 29, 1, 29],
  ],
  [
    ["Control+ArrowDown", "ArrowDown", "ArrowRight"],
    [1_000_000, 1, 1_000_000, 1, 1_000_000, 1],
  ],
  [["End"], [1, 29, 1, 29, 1, 29]],
  [
    ["End", "Home"],
    [1, 0, 1, 0, 1, 0],
  ],
  [["Control+End"], [999_999, 29, 999_999, 29, 999_999, 29]],
  [
    ["Control+End", "Control+Home"],
    [0, 0, 0, 0, 0, 0],
  ],
  [["Control+Shift+End"], [1, 0, 999_999, 29, 1, 0]],
  [
    ["PageDown", "PageUp"],
    [1, 0, 1, 0, 1, 0],
  ],
  [["Control+A"], [0, 0, 999_999, 29, 1, 0]],
  [
    ["Control+A", "Control+A"],
    [0, 0, lastRow, lastColumn, 1, 0],
  ],
  [
    ["ArrowRight", "Control+Space"],
    [0, 1, lastRow, 1, 1, 1],
  ],
  [
    ["ArrowRight", "Control+Space", "Shift+ArrowRight"],
    [0, 1, lastRow, 2, 1, 1],
  ],
  [
    ["ArrowRight", "Shift+Space", "Shift+ArrowDown"],
    [1, 0, 2, lastColumn, 1, 1],
  ],
  [
    ["Tab", "Tab", "Enter"],
    [2, 0, 2, 0, 2, 0],
  ],
  [
    ["Tab", "ArrowRight", "Enter"],
    [2, 2, 2, 2, 2, 2],
  ],
  [
    ["Enter", "Shift+Enter"],
    [1, 0, 1, 0, 1, 0],
  ],
  [
    ["Shift+ArrowDown", "Shift+ArrowRight", "Enter", "Enter"],
    [1, 0, 2, 1, 1, 1],
  ],
  [
    ["Shift+ArrowDown", "Shift+ArrowRight", "Tab", "Tab"],
    [1, 0, 2, 1, 2, 0],
  ],
  [
    ["Shift+ArrowDown", "Shift+ArrowRight", "Shift+Tab"],
    [1, 0, 2, 1, 2, 1],
  ],
];

describe("selection by keyboard", () => {
  test("every key", async () => {
    const { page } = await open();
    for (const [pressed, expected] of moves) {
      await page.evaluate(() => gridStandIn.page.select({ sheet: 0, top: 1, left: 0, bottom: 1, right: 0 }));
      await keys(...pressed);
      await expect.poll(selection, { timeout: 8000, message: pressed.join(" ") }).toEqual(expected);
    }
  });

  test("what is selected is in view, named to those who hear the page, and spoken", async () => {
    const { page } = await open();
    await keys("Control+ArrowDown", "Control+ArrowRight");
    await within(async () => (await selection())[5]).toBe(29);
    await settle();
    const active = page.locator(`#${await page.getByRole("grid").getAttribute("aria-activedescendant")}`);
    // (999999 * 7919 + 29 * 104729) modulo 100000, over 1000
    expect(await active.textContent()).toBe("29.222");
    await keys("Control+Home", "ArrowDown", "ArrowRight");
    await settle();
    const next = page.locator(`#${await page.getByRole("grid").getAttribute("aria-activedescendant")}`);
    expect(await next.textContent()).toBe("12.648");
    await within(() => page.locator(".grid-live").textContent()).toBe("B2, 12.648 d; Period");
  });

  test("keys pressed while a jump is on its way are about where it lands", async () => {
    const { page } = await open();
    await page.evaluate(() => {
      const edge = gridStandIn.page.bench.edge;
      Object.assign(gridStandIn.page.bench, {
        edge: async (...given: Parameters<typeof edge>) => {
          await new Promise((done) => setTimeout(done, 200));
          return edge(...given);
        },
      });
    });
    await keys("Control+ArrowDown", "ArrowRight", "Delete");
    expect(await actions()).toEqual([]);
    await expect
      .poll(actions)
      .toEqual([{ do: "clear", area: { sheet: 0, top: 999_999, left: 1, bottom: 999_999, right: 1 } }]);
  });

  test("keys that are the page's are left to it", async () => {
    const { page } = await open();
    await page.evaluate(() => {
      document.addEventListener("keydown", (event) => {
        const isModifier = ["Alt", "Shift", "Control"].includes(event.key);
        if (!event.defaultPrevented && !isModifier) gridStandIn.page.announce(event.key);
      });
    });
    await keys("Alt+Shift+PageDown", "Control+f", "F6", "Alt+n", "ArrowDown");
    const said = await page.evaluate(() => gridStandIn.page.said);
    expect(said).toEqual(["PageDown", "f", "F6", "n"]);
    expect(await selection()).toEqual([2, 0, 2, 0, 2, 0]);
  });

  test("Escape and then Tab leave the cells", async () => {
    const { page } = await open();
    const isInGrid = () => page.evaluate(() => document.activeElement === document.querySelector("[role=grid]"));
    await keys("Tab");
    expect(await isInGrid()).toBe(true);
    await keys("Escape", "Tab");
    expect(await isInGrid()).toBe(false);
  });

  test("hidden columns are passed over", async () => {
    const { page } = await open();
    await page.evaluate(() => gridStandIn.page.act({ do: "hide columns", sheet: 0, columns: [1, 2], hidden: true }));
    await settle();
    await keys("ArrowRight");
    expect(await selection()).toEqual([1, 3, 1, 3, 1, 3]);
    await page.getByRole("button", { name: "Show hidden columns B to C" }).click();
    expect((await actions()).at(-1)).toEqual({ do: "hide columns", sheet: 0, columns: [1, 2], hidden: false });
  });
});

describe("editing", () => {
  test("typing, F2 and a double click edit; Delete clears", async () => {
    const { page } = await open();
    await keys("=");
    await keys("F2");
    const { x, y } = await grid.at(4, 2);
    await page.mouse.dblclick(x, y);
    expect(await told("edit")).toEqual(["=", null, null]);
    await keys("Delete");
    expect(await actions()).toEqual([{ do: "clear", area: { sheet: 0, top: 4, left: 2, bottom: 4, right: 2 } }]);
  });

  test("real clipboard events; Escape takes the outline away", async () => {
    const { page } = await open();
    await keys("Control+C");
    await settle();
    expect(await told("copy")).toEqual([false]);
    expect(await visible(".grid-copied").count()).toBe(1);
    await keys("Escape");
    await settle();
    expect(await visible(".grid-copied").count()).toBe(0);
    await keys("Control+X");
    expect(await told("copy")).toEqual([false, true]);
    await page.evaluate(() => {
      const data = new DataTransfer();
      data.setData("text/plain", "1\t2");
      document.activeElement!.dispatchEvent(new ClipboardEvent("paste", { clipboardData: data, bubbles: true }));
    });
    expect(await told("paste")).toEqual(["1\t2"]);
  });

  test("the editor's room lies over its cell and moves with it, under what is frozen", async () => {
    const { page } = await open();
    await page.evaluate(() => {
      const input = document.createElement("input");
      input.ariaLabel = "Cell";
      gridStandIn.grid.openCell({ sheet: 0, row: 5, column: 3 }).append(input);
      input.focus();
    });
    const room = page.locator(".grid-cell-editor");
    const box = (await room.boundingBox())!;
    const cell = await page.evaluate(() => gridStandIn.grid.boxOf({ sheet: 0, row: 5, column: 3 })!.toJSON());
    expect([box.x, box.y]).toEqual([cell.x, cell.y]);
    expect(box.width).toBeGreaterThanOrEqual(cell.width);
    await page.locator(".grid-scroll").evaluate((scroller) => scroller.scrollBy(0, 56));
    await settle();
    expect((await room.boundingBox())!.y).toBe(box.y - 56);
    await keys("4");
    expect(await told("edit")).toEqual([]);
    await page.evaluate(() => gridStandIn.grid.closeCell());
    expect(await room.count()).toBe(0);
  });

  test("step moves as Enter and Tab do", async () => {
    const { page } = await open();
    const step = (down: number, right: number, extend = false) =>
      page.evaluate(
        ([down, right, extend]) =>
          gridStandIn.grid.step(gridStandIn.page.selection().area, down as number, right as number, extend as boolean),
        [down, right, extend],
      );
    expect(await step(1, 0)).toEqual({ sheet: 0, top: 2, left: 0, bottom: 2, right: 0 });
    expect(await step(0, 1, true)).toEqual({ sheet: 0, top: 2, left: 0, bottom: 2, right: 1 });
    expect(await selection()).toEqual([2, 0, 2, 1, 2, 0]);
  });
});

describe("fill", () => {
  const two: Area = { sheet: 0, top: 10, left: 3, bottom: 11, right: 4 };
  test.each([
    ["down", { row: 15, column: 3 }, 4],
    ["up", { row: 7, column: 4 }, 3],
    ["right", { row: 10, column: 6 }, 2],
    ["left", { row: 11, column: 1 }, 2],
  ] as const)("the handle dragged %s", async (toward, { row, column }, count) => {
    await open();
    await drag(await grid.at(10, 3), await grid.at(11, 4));
    await settle();
    await drag(await handle(), await grid.at(row, column), false);
    await settle();
    expect(await visible(".grid-ghost").count()).toBeGreaterThan(0);
    await grid.page.mouse.up();
    expect(await actions()).toEqual([{ do: "fill", area: two, toward, count, series: true }]);
  });

  test("Escape lets a dragged fill go", async () => {
    await open();
    await press(10, 3);
    await settle();
    await drag(await handle(), await grid.at(15, 3), false);
    await keys("Escape");
    await grid.page.mouse.up();
    expect(await actions()).toEqual([]);
  });

  test("one cell is repeated, with Ctrl continued; a double click fills to the end", async () => {
    const { page } = await open();
    await press(10, 3);
    await settle();
    await drag(await handle(), await grid.at(12, 3));
    await drag(await handle(), await grid.at(12, 3), false);
    await page.keyboard.down("Control");
    await page.mouse.up();
    await page.keyboard.up("Control");
    expect((await actions()).map((action) => action.do === "fill" && action.series)).toEqual([false, true]);
    const { x, y } = await handle();
    await page.mouse.dblclick(x, y);
    expect((await actions()).at(-1)).toEqual({
      do: "fill to end",
      area: { sheet: 0, top: 10, left: 3, bottom: 10, right: 3 },
    });
  });

  test("the handle is 24 pixels to the hand", async () => {
    const { page } = await open();
    await press(10, 3);
    await settle();
    const { x, y } = await handle();
    const isHandle = (dx: number, dy: number) =>
      page.evaluate(([x, y]) => document.elementFromPoint(x!, y!)?.className, [x + dx, y + dy]);
    for (const corner of [
      [-15, -15],
      [7, -15],
      [-15, 7],
      [7, 7],
    ]) {
      expect(await isHandle(corner[0]!, corner[1]!)).toBe("grid-handle");
    }
  });

  test("by keyboard", async () => {
    await open();
    await press(10, 3);
    await keys(
      "Control+D",
      "Control+R",
      "Shift+ArrowDown",
      "Shift+ArrowRight",
      "Control+D",
      "Control+R",
      "Control+Shift+D",
    );
    const at = (top: number, left: number, bottom: number, right: number) => ({ sheet: 0, top, left, bottom, right });
    expect(await actions()).toEqual([
      { do: "fill over", area: at(9, 3, 10, 3) },
      { do: "fill", area: at(10, 2, 10, 2), toward: "right", count: 1, series: false },
      { do: "fill over", area: at(10, 3, 11, 4) },
      { do: "fill", area: at(10, 3, 11, 3), toward: "right", count: 1, series: false },
      { do: "fill to end", area: at(10, 3, 11, 4) },
    ]);
  });
});

describe("columns", () => {
  test("the edge sets a width; with Escape it does not", async () => {
    const { page } = await open();
    const box = await page.evaluate(() => gridStandIn.grid.boxOf({ sheet: 0, row: 0, column: 1 })!.toJSON());
    const edge = { x: box.x + box.width - 1, y: 12 };
    await drag(edge, { x: edge.x + 50, y: 12 });
    expect(await actions()).toEqual([{ do: "width", sheet: 0, columns: [1], width: box.width + 50 }]);
    await settle();
    expect((await page.evaluate(() => gridStandIn.grid.boxOf({ sheet: 0, row: 0, column: 1 })!.toJSON())).width).toBe(
      box.width + 50,
    );
    await drag({ x: edge.x + 50, y: 12 }, { x: edge.x, y: 12 }, false);
    await keys("Escape");
    await page.mouse.up();
    expect((await actions()).length).toBe(1);
  });

  test("a double click fits the width to what is in view", async () => {
    const { page } = await open();
    const before = await page.evaluate(() => gridStandIn.grid.boxOf({ sheet: 0, row: 0, column: 6 })!.toJSON());
    await page.mouse.dblclick(before.x + before.width - 1, 12);
    await settle();
    const cell = page.getByRole("gridcell", { name: /^seen 1 times/ }).first();
    expect(await cell.evaluate((each) => each.scrollWidth <= each.clientWidth)).toBe(true);
    const after = await page.evaluate(() => gridStandIn.grid.boxOf({ sheet: 0, row: 0, column: 6 })!.toJSON());
    expect(after.width).toBeGreaterThan(before.width);
  });

  test("by keyboard several steps are one action", async () => {
    await open();
    await press(3, 1);
    await keys("Alt+Shift+ArrowRight", "Alt+Shift+ArrowRight", "Alt+Shift+ArrowRight", "Alt+Shift+ArrowLeft");
    await within(actions).toHaveLength(1);
    expect(await actions()).toEqual([{ do: "width", sheet: 0, columns: [1], width: 92 + 16 }]);
  });

  test("a selected letter dragged puts its columns elsewhere, Alt does it at once", async () => {
    const { page } = await open();
    await drag(await letter(1), await letter(2));
    await drag(await letter(1), { x: (await letter(5)).x, y: 12 }, false);
    await settle();
    expect(await visible(".grid-drop").count()).toBe(1);
    await page.mouse.up();
    expect(await actions()).toEqual([{ do: "reorder columns", sheet: 0, from: 1, count: 2, before: 5 }]);
    await page.keyboard.down("Alt");
    await drag(await letter(7), await letter(4));
    await page.keyboard.up("Alt");
    expect((await actions()).at(-1)).toEqual({ do: "reorder columns", sheet: 0, from: 7, count: 1, before: 4 });
    await page.mouse.click((await letter(1)).x, 12);
    expect(await selection()).toEqual([0, 1, lastRow, 1, 0, 1]);
  });

  test("units by mouse and keyboard; menus of cells, rows and columns", async () => {
    const { page } = await open();
    await page.getByRole("button", { name: "Unit d of Period" }).click();
    await press(3, 3);
    await keys("Alt+u");
    expect(await told("unit")).toEqual([
      { column: 1, text: "d" },
      { column: 3, text: "solMass" },
    ]);
    const cell = await grid.at(5, 5);
    await page.mouse.click(cell.x, cell.y, { button: "right" });
    expect(await selection()).toEqual([5, 5, 5, 5, 5, 5]);
    const row = await number(7);
    await page.mouse.click(row.x, row.y, { button: "right" });
    await page.mouse.click((await letter(2)).x, 12);
    await page.getByRole("button", { name: "Menu of column C", exact: true }).click();
    await keys("Shift+F10");
    expect((await told("menu")).map((each) => (each as { about: string }).about)).toEqual([
      "cells",
      "rows",
      "columns",
      "columns",
    ]);
  });
});

describe("picking cells for a formula", () => {
  test("presses and drags pick, the selection and the focus stay", async () => {
    const { page } = await open();
    await page.evaluate(() => {
      const input = document.createElement("input");
      input.ariaLabel = "Formula";
      gridStandIn.grid.openCell({ sheet: 0, row: 2, column: 3 }).append(input);
      input.focus();
      gridStandIn.pickFor(true);
    });
    await drag(await grid.at(4, 1), await grid.at(6, 2));
    await page.mouse.click((await letter(5)).x, 12);
    await page.getByRole("button", { name: "Unit d of Period" }).click();
    const picked = (await told("pick")) as { area: Area; done: boolean }[];
    expect(picked.filter(({ done }) => done).map(({ area }) => area)).toEqual([
      { sheet: 0, top: 4, left: 1, bottom: 6, right: 2 },
      { sheet: 0, top: 0, left: 5, bottom: lastRow, right: 5 },
      { sheet: 0, top: 0, left: 1, bottom: 0, right: 1 },
    ]);
    expect(await told("unit")).toEqual([]);
    await settle();
    expect(await visible(".grid-picked").count()).toBeGreaterThan(0);
    expect(await selection()).toEqual([1, 0, 1, 0, 1, 0]);
    expect(await page.evaluate(() => document.activeElement!.tagName)).toBe("INPUT");
  });

  test("keys of the editor step from cell to cell and extend", async () => {
    const { page } = await open();
    await page.evaluate(() => gridStandIn.pickFor(true));
    const area = await page.evaluate(() => {
      const { grid } = gridStandIn;
      let area = grid.step({ sheet: 0, top: 5, left: 5, bottom: 5, right: 5 }, 1, 0, false);
      area = grid.step(area, 2, 0, true);
      return grid.step(area, 0, -1, true);
    });
    expect(area).toEqual({ sheet: 0, top: 6, left: 4, bottom: 8, right: 5 });
    expect(await selection()).toEqual([1, 0, 1, 0, 1, 0]);
    await page.evaluate(() => {
      gridStandIn.pickFor(false);
      gridStandIn.grid.showReferences([{ colour: 1, area: { sheet: 0, top: 6, left: 4, bottom: 8, right: 5 } }]);
    });
    await settle();
    expect(await visible(".grid-picked").count()).toBe(0);
    expect(await visible(".grid-mark-label").allTextContents()).toEqual(["E7:F9"]);
  });
});

describe("the sentence of an error", () => {
  test("under the pointer it stays while it is read, Escape takes it away", async () => {
    const { page } = await open();
    const tip = page.getByRole("tooltip");
    const { x, y } = await grid.at(3, 7);
    await page.mouse.move(x, y);
    await tip.waitFor();
    expect(await tip.textContent()).toBe(errorMessage);
    const box = (await tip.boundingBox())!;
    await page.mouse.move(box.x + 10, box.y + box.height / 2);
    await page.waitForTimeout(500);
    expect(await tip.isVisible()).toBe(true);
    await keys("Escape");
    expect(await tip.isVisible()).toBe(false);
  });

  test("for the active cell, which refers to it; also for a header that was not understood", async () => {
    const { page } = await open();
    await press(2, 7);
    await page.mouse.move(900, 650);
    await keys("ArrowDown");
    await page.getByRole("tooltip").waitFor();
    const active = page.locator(`#${await page.getByRole("grid").getAttribute("aria-activedescendant")}`);
    expect(await active.getAttribute("aria-describedby")).toBe(await page.getByRole("tooltip").getAttribute("id"));
    await within(() => page.locator(".grid-live").textContent()).toBe(`H4, #N/A m/s; K; ${errorMessage}`);
    await keys("ArrowRight", "ArrowRight", "Control+ArrowUp");
    await within(() => page.getByRole("tooltip").textContent()).toContain("did you mean");
  });
});

describe("touch", () => {
  test("a finger scrolls, a tap selects, a finger that rested selects an area", async () => {
    const { page } = await open({ hasTouch: true });
    const session = await page.context().newCDPSession(page);
    const touch = (type: "touchStart" | "touchMove" | "touchEnd", points: { x: number; y: number }[]) =>
      session.send("Input.dispatchTouchEvent", { type, touchPoints: points });
    const at = await grid.at(6, 3);
    await page.touchscreen.tap(at.x, at.y);
    expect(await selection()).toEqual([6, 3, 6, 3, 6, 3]);
    await touch("touchStart", [{ x: at.x, y: 600 }]);
    for (let y = 595; y >= 300; y -= 10) {
      await touch("touchMove", [{ x: at.x, y }]);
      await page.waitForTimeout(10);
    }
    await touch("touchEnd", []);
    await page.waitForTimeout(500);
    await settle();
    expect((await grid.at(30, 3)).y).toBeLessThan(700);
    expect(await selection()).toEqual([6, 3, 6, 3, 6, 3]);
    const [from, to] = [await grid.at(20, 2), await grid.at(23, 4)];
    await touch("touchStart", [from]);
    await page.waitForTimeout(600);
    await touch("touchMove", [{ x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 }]);
    await touch("touchMove", [to]);
    await touch("touchEnd", []);
    expect(await selection()).toEqual([20, 2, 23, 4, 20, 2]);
  });
});

describe("for everyone", () => {
  test.each(["light", "dark", "red"])("axe finds nothing in the %s theme", async (theme) => {
    const { page } = await open({ theme });
    await drag(await grid.at(2, 1), await grid.at(5, 7));
    await page.evaluate(() =>
      gridStandIn.grid.showReferences([{ colour: 2, area: { sheet: 0, top: 8, left: 2, bottom: 9, right: 3 } }]),
    );
    await settle();
    // The policy of the page lets no script in but its own; the debugger's is asked instead.
    const cdp = await page.context().newCDPSession(page);
    await cdp.send("Runtime.evaluate", { expression: axe.source });
    const found = await page.evaluate(async () => {
      const { violations } = await (globalThis as unknown as { axe: typeof axe }).axe.run();
      return violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html} ${nodes[0]?.failureSummary}`);
    });
    expect(found).toEqual([]);
  });

  test("narrow windows keep room for the columns that scroll", async () => {
    const { page } = await open({ viewport: { width: 320, height: 500 } });
    await page.evaluate(() => gridStandIn.page.change({ frozenColumns: 4 }));
    await settle();
    const box = await page.evaluate(() => gridStandIn.grid.boxOf({ sheet: 0, row: 1, column: 1 })?.toJSON());
    expect(box?.width).toBe(92);
    await page.evaluate(() => gridStandIn.grid.reveal({ sheet: 0, row: 1, column: 12 }));
    await settle();
    expect(await page.evaluate(() => gridStandIn.grid.boxOf({ sheet: 0, row: 1, column: 12 }) !== undefined)).toBe(
      true,
    );
  });
});
