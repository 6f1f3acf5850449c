import { readXlsx } from "hucre/xlsx";
import { afterAll, beforeAll, expect, test } from "vitest";
import { packed } from "../../../files/xlsx/packed.js";
import {
  downloaded,
  openSessionBrowser,
  patience,
  type SessionBrowser,
  type Tab,
  tabOf,
  wholeSession,
} from "./openSession.js";

let browser: SessionBrowser;

beforeAll(async () => {
  browser = await openSessionBrowser();
});

afterAll(() => browser?.close());

const text = (address: string, words: string) => `<c r="${address}" t="inlineStr"><is><t>${words}</t></is></c>`;
/** ECMA-376 part 1, section 18.3; invented data. The file says what the formula gave. */
const workbook = packed({
  data: `<row r="1">${text("A1", "Name")}${text("B1", "P [d]")}${text("C1", "Twice [d]")}</row><row r="2">${text("A2", "Ember b")}<c r="B2"><v>4.25</v></c><c r="C2"><f>B2*2</f><v>8.5</v></c></row>`,
});
/** IVOA VOTable 1.4, section 4; invented data. */
const votable = `<?xml version="1.0"?><VOTABLE version="1.4" xmlns="http://www.ivoa.net/xml/VOTable/v1.3"><RESOURCE><TABLE>
<FIELD name="Name" datatype="char" arraysize="*"/><FIELD name="P" datatype="double" unit="d" ucd="time.period"/>
<DATA><TABLEDATA><TR><TD>Cinder c</TD><TD>41.5</TD></TR></TABLEDATA></DATA></TABLE></RESOURCE></VOTABLE>`;

async function openIn(tab: Tab, name: string, content: Uint8Array | string): Promise<void> {
  const buffer = Buffer.from(content);
  await tab.page.locator("input[type=file]").setInputFiles({ name, mimeType: "application/octet-stream", buffer });
}

test(
  "a workbook and a VOTable open without a network, and what was changed goes back into a workbook",
  async () => {
    const tab = await browser.visit();
    await tab.page.waitForFunction(() => navigator.serviceWorker.controller !== null);
    await tab.context.setOffline(true);
    await openIn(tab, "table.vot", votable);
    await tab.shows("A2", "Cinder c");
    await tab.shows("B2", "41.5");
    await openIn(tab, "targets.xlsx", workbook);
    await tab.shows("C2", "8.5");
    await tab.press("B2");
    await tab.page.keyboard.type("5\n");
    await tab.shows("C2", "10");
    const { name, bytes } = await downloaded(tab.page, async () => {
      await tab.menu("Book", "Save a copy…");
      await tab.page.getByRole("button", { name: /^Workbook/ }).click();
    });
    expect(name).toBe("targets.xlsx");
    expect((await readXlsx(bytes)).sheets[0]?.rows).toEqual([
      ["Name", "P [d]", "Twice [d]"],
      ["Ember b", 5, 10],
    ]);
    expect(tab.complaints).toEqual([]);
    await tab.context.close();
  },
  wholeSession,
);

test(
  "a formula copied in one tab moves into another",
  async () => {
    const tab = await browser.visit();
    await openIn(tab, "targets.xlsx", workbook);
    await tab.shows("C2", "8.5");
    const other = tabOf(await tab.context.newPage());
    await other.page.goto(browser.address);
    await openIn(other, "other.csv", "a,b,c,d\n1,2,3,4\n5,6,7,8\n");
    await other.shows("D3", "8");
    await tab.page.bringToFront();
    await tab.drag("B2", "C2");
    await tab.page.keyboard.press("Control+C");
    await tab.says("2 cells copied.");
    await other.page.bringToFront();
    await other.press("A3");
    await other.page.keyboard.press("Control+V");
    await other.shows("B3", "8.5");
    await other.press("B3");
    await expect.poll(() => other.line(), { timeout: patience }).toBe("=A3*2");
    await tab.context.close();
  },
  wholeSession,
);
