import type { Browser, BrowserContext } from "playwright-core";
import { afterAll, afterEach, beforeAll, describe, expect, test } from "vitest";
import { launchChromium } from "../../../browser/launchChromium.js";
import type { Served } from "../../../browser/serveFiles.js";
import { openTab, type StoreTab, serveStore } from "./storePage.js";

let served: Served;
let browser: Browser;

beforeAll(async () => {
  [served, browser] = await Promise.all([serveStore(), launchChromium()]);
});

afterAll(async () => {
  await browser?.close();
  await served?.close();
});

let contexts: BrowserContext[] = [];

afterEach(async () => {
  await Promise.all(contexts.map((context) => context.close()));
  contexts = [];
});

/** Contexts of the browser are private windows, each with a storage of its own. */
async function tabs(count: number): Promise<StoreTab[]> {
  const context = await browser.newContext();
  contexts.push(context);
  const opened: StoreTab[] = [];
  for (let index = 0; index < count; index++) opened.push(await openTab(context, served.base));
  return opened;
}

async function newTable(tab: StoreTab, title = "Mine"): Promise<string> {
  await tab.call("start");
  await tab.call("newBook", title, ["Target", "Period [d]"]);
  return (await tab.call("state")).id;
}

describe("a book in the browser's storage", () => {
  test("is as it was after the page is loaded anew, and opens first", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    const id = await newTable(tab);
    await tab.call("type", 1, 1, "4.23");
    await tab.call("type", 1, 2, "=B2*2");
    await tab.call("settled");
    expect((await tab.call("state")).saved.is).toBe("saved");
    const before = await tab.call("cells");
    await tab.page.reload();
    const state = await tab.call("start");
    expect(state).toMatchObject({ id, title: "Mine", saved: { is: "saved" } });
    expect(await tab.call("cells")).toEqual(before);
    expect(before).toContain("=B2*2 8.46");
  });

  test("is saved within a second, by itself", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    await newTable(tab);
    await tab.call("settled");
    await tab.call("type", 1, 0, "Lantern");
    await tab.page.waitForTimeout(1000);
    await tab.restart();
    await tab.call("start");
    expect(await tab.call("cells")).toContain(" Lantern");
  });

  test("comes back to the bit, whatever was saved over it, and leaves nothing behind", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    expect(await tab.call("roundTrips", 60)).toBe("all came back");
  });

  test("is written in parts: one change to 100,000 rows writes three of them, after loading as before", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    const { whole, one, again } = await tab.call("largeBook", 100_000, 25);
    // A chunk, its column, the book's record and which book was the last; five derived columns do not follow.
    expect(one.puts).toBe(4);
    expect(whole.puts).toBeGreaterThan(25 * 12);
    // After loading, the small records of all columns are written once more, the chunks are not.
    expect(again.puts).toBeLessThanOrEqual(30 + 3);
  });

  test("is whole after its worker was ended in the middle of saving", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    for (const pause of [150, 400]) {
      tab.call("saveForever", 20_000, 12).catch(() => undefined);
      await tab.page.waitForFunction(() => (globalThis as unknown as { saved: number }).saved > 1);
      await tab.page.waitForTimeout(pause);
      await tab.restart();
      const told = await tab.page.evaluate(() => (globalThis as unknown as { saved: number }).saved);
      expect(await tab.call("lastForever", 20_000, 12)).toBeGreaterThanOrEqual(told);
      await tab.page.evaluate(() => {
        (globalThis as unknown as { saved: number }).saved = 0;
      });
    }
  });

  test("keeps its name, its marks of time and what is typed and not entered", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    await newTable(tab);
    await tab.call("renameBook", "Winter targets");
    await tab.call("keepDraft", { place: { sheet: 0, row: 3, column: 1 }, text: "=BARY.AX" });
    await tab.call("settled");
    await tab.restart();
    expect((await tab.call("start")).title).toBe("Winter targets");
    expect(await tab.call("keptDraft")).toEqual({ place: { sheet: 0, row: 3, column: 1 }, text: "=BARY.AX" });
    await tab.call("keepDraft", undefined);
    expect(await tab.call("keptDraft")).toBeUndefined();
  });

  test("is kept even if it is the untouched demo in which a draft was begun", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    const { id } = await tab.call("start");
    await tab.call("keepDraft", { place: { sheet: 0, row: 1, column: 2 }, text: "31" });
    await tab.call("settled");
    await tab.restart();
    expect((await tab.call("start")).id).toBe(id);
    expect(await tab.call("keptDraft")).toMatchObject({ text: "31" });
  });
});

describe("several books", () => {
  test("are listed, the last changed first, removed and taken back", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    const first = await newTable(tab, "First");
    await tab.call("type", 1, 0, "a");
    const second = await newTable(tab, "Second");
    await tab.call("settled");
    expect((await tab.call("books")).map(({ title }) => title)).toEqual(["Second", "First"]);
    await tab.call("removeBook", second);
    expect(await tab.call("state")).toMatchObject({ id: first, title: "First" });
    expect((await tab.call("books")).map(({ title }) => title)).toEqual(["First"]);
    expect((await tab.call("openBook", second)).is).toBe("opened");
    await tab.call("takeBack", second);
    expect((await tab.call("books")).map(({ title }) => title).sort()).toEqual(["First", "Second"]);
    await tab.call("removeBook", first);
    expect(await tab.call("sweepTomorrow")).toBe(1);
    expect(await tab.call("openBook", "no such")).toEqual({
      is: "refused",
      message: "That book is no longer in this browser's storage.",
    });
  });
});

describe("opening files in the worker", () => {
  test("a file becomes a book that is kept; one that is no table leaves the open book as it was", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    await tab.call("start");
    expect(await tab.call("openContent", "mine.csv", "Target,Period [d]", 3)).toEqual({
      is: "opened",
      said: "Opened mine.csv: 2 rows.",
      findings: [],
    });
    await tab.call("settled");
    await tab.call("openContent", "mine.csv", "Target,Period [d]", 3);
    expect((await tab.call("state")).title).toBe("mine 2");
    await tab.call("settled");
    expect(await tab.call("openContent", "x.csv", "MZ\u0090", 1)).toMatchObject({ is: "refused" });
    await tab.restart();
    expect(await tab.call("start")).toMatchObject({ title: "mine 2", history: { labels: ["opened"] } });
  });

  test("is stopped on the way, and the open book stays", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    const { id } = await tab.call("start");
    const opening = tab.call("openContent", "long.csv", "Lantern 1 b,0.123456789", 700_000);
    await tab.page.waitForTimeout(30);
    await tab.call("cancelOpening");
    expect(await opening).toEqual({ is: "cancelled" });
    expect((await tab.call("state")).id).toBe(id);
  });
});

describe("a stored book that cannot be read", () => {
  test("by a newer program: it is told, left as it is, and the page opens with something else", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    const id = await newTable(tab);
    await tab.call("settled");
    await tab.call("storeAsNewer");
    await tab.restart();
    const message = '"Mine" was saved by a newer Barycell; load the page anew, or use the newer program.';
    expect(await tab.call("start")).toMatchObject({ title: "Demo survey", saved: { is: "not saved", message } });
    expect(await tab.call("openBook", id)).toEqual({ is: "refused", message });
  });

  test("with a part gone: the same", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    const id = await newTable(tab);
    await tab.call("settled");
    await tab.call("losePart");
    await tab.restart();
    await tab.call("start");
    expect(await tab.call("openBook", id)).toEqual({
      is: "refused",
      message: 'A part of "Mine" is gone from the browser\'s storage.',
    });
  });
});

describe("two tabs with one book", () => {
  test("one saves; the other says so and makes a copy with its first change; nothing is lost", async () => {
    const [winner, loser] = (await tabs(2)) as [StoreTab, StoreTab];
    const id = await newTable(winner);
    await winner.call("settled");
    const seen = await loser.call("start");
    expect(seen).toMatchObject({
      id,
      saved: {
        is: "not saved",
        message: "Another tab has this book open and saves it. With the first change made here, this becomes a copy.",
      },
    });
    await loser.call("type", 1, 0, "from the second");
    await winner.call("type", 1, 0, "from the first");
    await Promise.all([winner.call("settled"), loser.call("settled")]);
    const copy = await loser.call("state");
    expect(copy.title).toBe("Mine (copy)");
    expect(copy.id).not.toBe(id);
    expect(copy.saved.is).toBe("saved");
    await loser.restart();
    await winner.restart();
    await winner.call("start");
    await winner.call("openBook", id);
    expect(await winner.call("cells")).toContain(" from the first");
    await winner.call("openBook", copy.id);
    expect(await winner.call("cells")).toContain(" from the second");
  });

  test("the other follows when the first is closed", async () => {
    const [winner, loser] = (await tabs(2)) as [StoreTab, StoreTab];
    await newTable(winner);
    await winner.call("settled");
    await loser.call("start");
    await winner.call("type", 1, 0, "the last word");
    await winner.call("settled");
    await winner.page.close();
    await expect.poll(async () => (await loser.call("state")).saved.is, { timeout: 5000 }).toBe("saved");
    expect(await loser.call("cells")).toContain(" the last word");
  });

  test("a worker that is started anew has its own book again", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    await newTable(tab);
    await tab.call("settled");
    await tab.restart();
    expect((await tab.call("start")).saved.is).toBe("saved");
  });
});

describe("storage that is full or denied", () => {
  test("full: it says so and what to do, keeps what was saved, and saves again once there is room", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    await newTable(tab);
    await tab.call("settled");
    await tab.call("fullStorage", true);
    await tab.call("type", 1, 0, "too much");
    await tab.call("settled");
    expect((await tab.call("state")).saved).toEqual({
      is: "not saved",
      message:
        "Not saved: the browser's storage is full. Save a copy as a Barycell book, then remove books that are no longer needed; both are in the menu Book.",
    });
    expect(await tab.call("cells")).toContain(" too much");
    await tab.call("fullStorage", false);
    await tab.call("type", 2, 0, "more");
    await tab.call("settled");
    expect((await tab.call("state")).saved.is).toBe("saved");
    await tab.restart();
    await tab.call("start");
    expect(await tab.call("cells")).toEqual(expect.arrayContaining([" too much", " more"]));
  });

  test("denied: the demo opens, can be worked on, and says that nothing is kept", async () => {
    const [tab] = (await tabs(1)) as [StoreTab];
    await tab.call("deniedStorage");
    const state = await tab.call("start");
    const message =
      "Not saved: the browser keeps nothing for this page, as in a private window or where storage is switched off. Save a copy of the book before you close the page.";
    expect(state).toMatchObject({ title: "Demo survey", saved: { is: "not saved", message } });
    await tab.call("type", 1, 0, "still here");
    await tab.call("settled");
    expect((await tab.call("state")).saved).toEqual({ is: "not saved", message });
    expect(await tab.call("cells")).toContain(" still here");
    expect(await tab.call("books")).toHaveLength(1);
    await tab.call("allowedStorage");
    await tab.call("type", 2, 0, "kept");
    await tab.call("settled");
    expect((await tab.call("state")).saved.is).toBe("saved");
  });
});
