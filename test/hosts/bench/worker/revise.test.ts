import { createHash } from "node:crypto";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../../../src/call/cell.js";
import { calculateAll } from "../../../../src/files/bookFile/calculateAll.js";
import { readBookFile } from "../../../../src/files/bookFile/readBookFile.js";
import { writeBookFile } from "../../../../src/files/bookFile/writeBookFile.js";
import type {
  LedgerView,
  ReviseAnswer,
  ReviseWords,
  RevisionMoves,
  RevisionPreview,
} from "../../../../src/hosts/bench/protocol/revise.js";
import { functions } from "../../../../src/hosts/bench/worker/functions.js";
import { keptRevisions } from "../../../../src/hosts/bench/worker/revise/keptRevisions.js";
import { openSession } from "../../../../src/hosts/bench/worker/session.js";
import { sheetService } from "../../../../src/hosts/bench/worker/sheetService.js";
import { lastMovedBy } from "../../../../src/revision/lastMovedBy.js";
import { ledgerOf } from "../../../../src/revision/ledgerOf.js";
import { ledgerRecord } from "../../../../src/revision/ledgerRecord.js";
import { change } from "../../../../src/sheet/change.js";
import { changes } from "../../../../src/sheet/history/changes.js";
import { area, at, type OpenTable, openTable } from "./openTable.js";

const headers = [
  "Name",
  "Period [d]",
  "Star mass [solMass]",
  "Star mass sigma [solMass]",
  "Half [d]",
  "Grown [solMass]",
];
const stars: readonly (readonly Cell[])[] = [
  headers,
  ["Harbour", 4332.589, 1, 0.02],
  ["Tiller", 11.5, 0.9, 0.03],
  ["Spar", 300, 1.2, 0.05],
  ["Keel", 1.5, 0.5, 0.02],
];
// Beside the table: a name written otherwise, one that is not in it, a mass in another unit's header.
const masses = "Name,Star mass [kg]\nharbour,1.98840987069805e30\nTiller B,1.98840987069805e30\nSpar,2.3860918448e30\n";
const plain =
  "Name,Star mass [solMass],Star mass sigma [solMass]\nHarbour,1.06,0.01\nTiller,0.9,0.03\nSpar,1.1,0.05\nBuoy,2,1\n";

const file = (text: string, name = "new.csv") => new File([text], name);
const words: ReviseWords = { key: "", aliases: "", conditions: "", table: "", erases: false };

async function table(): Promise<OpenTable> {
  const open = openTable(stars);
  await open.service.act({ do: "type over", area: area("E2:E5"), place: at("E2"), text: "=B2/2" });
  await open.service.act({ do: "type over", area: area("F2:F5"), place: at("F2"), text: "=2*C2+0*B2" });
  return open;
}

async function shown(open: OpenTable, text: string, change: Partial<ReviseWords> = {}): Promise<RevisionPreview> {
  const answer = await open.service.reviseFrom(file(text), 0, { ...words, ...change });
  if (answer.is !== "preview") throw new Error(JSON.stringify(answer));
  return answer.preview;
}

async function applied(open: OpenTable, text: string, change: Partial<ReviseWords> = {}) {
  await shown(open, text, change);
  const revised = await open.service.applyRevision();
  if (revised.is !== "revised") throw new Error(JSON.stringify(revised));
  return revised.ledger;
}

async function problems(text: string, change: Partial<ReviseWords> = {}, name = "new.csv"): Promise<string[]> {
  const open = await table();
  const answer: ReviseAnswer = await open.service.reviseFrom(file(text, name), 0, { ...words, ...change });
  if (answer.is !== "problems") throw new Error(answer.is);
  expect(await open.service.applyRevision()).toMatchObject({ is: "refused" });
  return answer.problems.map(({ word, message }) => `${word}: ${message}`);
}

describe("what a file would change", () => {
  test("is shown, and nothing is done", async () => {
    const open = await table();
    const before = open.book();
    const preview = await shown(open, plain);
    expect(open.book()).toBe(before);
    expect(preview).toMatchObject({
      file: "new.csv",
      sheet: 0,
      sheetName: "Targets",
      keys: ["Name", "Star mass [solMass]"],
      key: "Name",
      rows: { matched: 3, onlyInTable: 1, onlyInFile: 1, ambiguous: 0 },
      // Two masses and one uncertainty differ, counted by hand.
      cells: 3,
    });
    const [mass, ...others] = preview.columns;
    expect(others).toEqual([]);
    expect(mass).toMatchObject({ header: "Star mass [solMass]", values: 2, uncertainties: 1, from: undefined });
    // 0.06 of 0.02 is 3 sigma; -0.1 of 1.2 is -8.3 per cent, by hand.
    expect(mass!.bySigma).toMatchObject({ key: "Harbour", place: at("C2"), before: 1, after: 1.06 });
    expect(mass!.bySigma!.sigmas).toBeCloseTo(3, 10);
    expect(mass!.byPart).toMatchObject({ key: "Spar", place: at("C4") });
    expect(mass!.byPart!.relative).toBeCloseTo(-0.1 / 1.2, 10);
    expect(preview.matched).toBe("3 of 4 rows matched.");
    expect(preview.findings).toEqual([
      '1 row of the table is not in the revision and stays as before: "Keel".',
      '1 row of the revision is not in the table and was left aside: "Buoy".',
    ]);
  });

  test("in another unit, under other names", async () => {
    const open = await table();
    const preview = await shown(open, masses, { aliases: "Tiller = Tiller B\n" });
    expect(preview.columns[0]).toMatchObject({ from: "Star mass [kg]", convertedFrom: "kg" });
    expect(preview.rows).toMatchObject({ matched: 3 });
    await open.service.applyRevision();
    // A nominal solar mass parameter over G of CODATA 2018 gives 1.98841e30 kg (IAU 2015 B3).
    expect(open.cell("C2")).toBeCloseTo(1, 4);
    expect(open.cell("C4")).toBeCloseTo(1.2, 4);
  });

  test.each([
    [
      "Star,V\nHarbour,8\n",
      {},
      'key: no column of the file is headed as one of the table\'s, so rows cannot be matched; the table has "Name", "Period", "Star mass" and 1 more, the file "Star", "V".',
    ],
    [
      "Name,Star mass [solMass]\nBuoy,2\n",
      {},
      'key: no row of the revision is in the table; the first is "Buoy" in the revision and "Harbour" in the table. Name the column that both share, or give aliases.',
    ],
    [plain, { key: "Nane" }, 'key: the table has no column "Nane"; did you mean "Name"?'],
    [
      plain,
      { aliases: "Harbour\n" },
      'aliases: the alias "Harbour" cannot be read; write old = new, for example "HD 1 = HIP 1234".',
    ],
    [
      plain,
      { conditions: "Half [d] >= 3 kg" },
      expect.stringMatching(/^conditions: the condition "Half \[d\] >= 3 kg" /),
    ],
  ] as readonly (readonly [string, Partial<ReviseWords>, string])[])(
    "%j %j is refused",
    async (text, given, message) => {
      expect(await problems(text, given)).toEqual([message]);
    },
  );

  test("a damaged file is refused", async () => {
    // The signature of a packed archive, cut off (APPNOTE 4.3.7).
    const [message] = await problems("PK\u0003\u0004 and then nothing", {}, "new.xlsx");
    expect(message).toMatch(/^file: new\.xlsx: /);
  });

  test("wrong kinds are told and nothing can be applied", async () => {
    const open = await table();
    const preview = await shown(open, "Name,Star mass [km]\nHarbour,3\n");
    expect(preview.cells).toBe(0);
    expect(preview.findings).toContain(
      '"Star mass [km]" holds a length and "Star mass [solMass]" a mass; it was left aside. Correct the name or the unit.',
    );
    expect(await open.service.applyRevision()).toEqual({
      is: "refused",
      message: 'revise: "new.csv" changes nothing in this table, so there is nothing to apply.',
    });
  });
});

describe("applying it", () => {
  test("is one step, told in the history, and undone whole", async () => {
    const open = await table();
    const before = open.book();
    const steps = open.session().history.versions.length;
    const summary = await applied(open, plain);
    expect(open.session().history.versions).toHaveLength(steps + 1);
    expect(open.state().history.labels.at(-1)).toBe("revised 3 cells from new.csv");
    expect([open.cell("C2"), open.cell("D2"), open.cell("F2"), open.cell("C4")]).toEqual([1.06, 0.01, 2.12, 1.1]);
    expect(summary).toMatchObject({
      file: "new.csv",
      sheet: "Targets",
      sha256: createHash("sha256").update(plain).digest("hex"),
      isWhole: true,
    });
    await open.service.undo();
    expect(open.book()).toBe(before);
    expect(await open.service.ledgers()).toEqual([]);
    await open.service.redo();
    expect(await open.service.ledgers()).toHaveLength(1);
  });

  test("is refused when nothing is shown, twice, or after the book changed", async () => {
    const open = await table();
    const none = "revise: no revision is shown; choose a file and look at what it would change.";
    expect(await open.service.applyRevision()).toEqual({ is: "refused", message: none });
    await shown(open, plain);
    await open.type("B2", [["4000"]]);
    expect(await open.service.applyRevision()).toEqual({
      is: "refused",
      message: "revise: the book has changed since this was shown; show again what would change.",
    });
    await applied(open, plain);
    expect(await open.service.applyRevision()).toEqual({ is: "refused", message: none });
    expect((await shown(open, plain)).cells).toBe(0);
  });

  test("the ledger is that of the same two books", async () => {
    const open = await table();
    const before = open.book();
    const summary = await applied(open, plain, { conditions: "Grown [solMass] >= 2.1 solMass" });
    const { date, file: name, sha256 } = summary;
    const own = ledgerOf(
      before,
      open.book(),
      0,
      ["Grown [solMass] >= 2.1 solMass"],
      { date, file: name, sha256 },
      "Name",
    );
    const record = ledgerRecord(own);
    const { changes: count, key, ...kept } = open.session().history.versions.at(-1)!.ledger!;
    expect(kept).toEqual(record);
    expect([count, key]).toEqual([record.entries.length, "Name"]);

    const view = (await open.service.ledger(summary.id, 10)) as LedgerView;
    // Twice the masses: 2 to 2.12 and 2.4 to 2.2, by hand.
    expect(
      view.moved.map(({ key: row, place, before: was, after: is, movedBy }) => [row, place, was, is, movedBy]),
    ).toEqual([
      ["Spar", at("F4"), "2.4000 solMass", "2.2000 solMass", "Star mass"],
      ["Harbour", at("F2"), "2.0000 solMass", "2.1200 solMass", "Star mass"],
    ]);
    expect(view.conditions).toMatchObject([
      { before: 1, after: 2, gained: [{ key: "Harbour", place: at("F2") }], lost: [] },
    ]);
    expect(open.service.why(at("F4"))).toMatchObject({
      changedBy: expect.stringMatching(/^the revision new\.csv of \d{4}-/),
    });
    expect(open.service.why(at("E4"))).toMatchObject({ changedBy: expect.stringMatching(/Half/) });
    // Rows that are put elsewhere are found again.
    await open.service.act({ do: "insert rows", sheet: 0, at: 1, count: 2 });
    const moved = (await open.service.ledger(summary.id, 10)) as LedgerView;
    expect(moved.moved.map(({ place }) => place)).toEqual([at("F6"), at("F4")]);
  });

  test("what it left is written to a sheet, as Markdown and as JSON", async () => {
    const open = await table();
    const { id } = await applied(open, plain);
    expect(await open.service.writeLedger(id, "sheet")).toMatchObject({ is: "done", select: { sheet: 1 } });
    expect(open.state().history.labels.at(-1)).toBe("wrote the ledger of new.csv to the sheet Ledger");
    expect([open.cell("A2", 1), open.cell("B2", 1), open.cell("A3", 1)]).toEqual([
      "Spar",
      "Grown [solMass]",
      "Harbour",
    ]);
    const json = await open.service.writeLedger(id, "json");
    const markdown = await open.service.writeLedger(id, "markdown");
    if (json.is !== "file" || markdown.is !== "file") throw new Error("no file");
    expect(json.file.name).toMatch(/^new ledger \d{4}-\d\d-\d\d\.json$/);
    const record = JSON.parse(new TextDecoder().decode(json.file.bytes));
    expect(lastMovedBy([record], { key: "Spar", header: "Grown" })).toMatchObject({ before: 2.4, after: 2.2 });
    expect(new TextDecoder().decode(markdown.file.bytes)).toMatch(/^# Revision\n\n`new\.csv`, /);
    await open.service.undo();
    await open.service.undo();
    expect(await open.service.writeLedger(id, "json")).toEqual({
      is: "refused",
      message: "ledger: its revision was undone; redo it, or choose another ledger.",
    });
  });

  test("two columns before and after, for the rows that moved", async () => {
    const open = await table();
    await applied(open, plain);
    const moves = (await open.service.revisionMoves("", "Period [d]", "Grown [solMass]")) as RevisionMoves;
    if (moves.is !== "moves") throw new Error(moves.message);
    expect([...moves.rows]).toEqual([1, 3]);
    expect([...moves.x.before]).toEqual([4332.589, 300]);
    expect([[...moves.y.before], [...moves.y.after]]).toEqual([
      [2, 2.4],
      [2.12, 2.2],
    ]);
    expect(moves.y).toMatchObject({ name: "Grown", unit: "solMass" });
    expect(await open.service.revisionMoves("", "Period [d]", "Half [d]")).toEqual({
      is: "missing",
      message: "The revision moved no number of Period [d] or Half [d]; choose other columns.",
    });
  });
});

describe("kept with the book", () => {
  async function reopened(open: OpenTable, alter = (text: string) => text) {
    const document = {
      title: "Test",
      book: open.book(),
      presentation: [],
      marks: [],
      history: [],
      revisions: keptRevisions(open.session()),
    };
    const read = readBookFile(alter([...writeBookFile(document)].join("")), functions);
    const book = change(read.book, [calculateAll(read.book)], functions);
    let session = openSession({ ...read, id: "again", book });
    const holder = {
      session: () => session,
      replace(next: typeof session) {
        session = next;
      },
      emit() {},
    };
    return { service: sheetService(holder) as unknown as OpenTable["service"], session: () => session, book };
  }

  test("texts and ledgers come back from a book file; what they tell is the same", async () => {
    const open = await table();
    await open.service.keepRevisionTexts({
      aliases: "Tiller = Tiller B",
      conditions: "Grown [solMass] >= 2.1 solMass",
    });
    const { id } = await applied(open, plain, { conditions: "Grown [solMass] >= 2.1 solMass" });
    const again = await reopened(open);
    expect([...changes(open.book(), again.book)]).toEqual([]);
    expect(await again.service.revisionTexts()).toEqual({
      aliases: "Tiller = Tiller B",
      conditions: "Grown [solMass] >= 2.1 solMass",
    });
    const view = (await open.service.ledger(id, 10)) as LedgerView;
    expect(await again.service.ledger(id, 10)).toEqual({ ...view, isWhole: false });
    expect(again.service.why(at("F4"))).toMatchObject({
      changedBy: expect.stringMatching(/^the revision new\.csv of /),
    });
    expect(await again.service.writeLedger(id, "sheet")).toMatchObject({ is: "done" });
    const markdown = await again.service.writeLedger(id, "markdown");
    if (markdown.is !== "file") throw new Error("no file");
    expect(new TextDecoder().decode(markdown.file.bytes)).toContain("| Spar | Grown \\[solMass\\] | 2.4 | 2.2 |");
    expect(await again.service.revisionMoves(id, "Period [d]", "Grown [solMass]")).toEqual({
      is: "missing",
      message:
        'The table before and after "new.csv" is held only until the page is closed; its ledger tells what moved.',
    });
  });

  test("a book without any has none, and a ledger that is not understood is kept as it is", async () => {
    const open = await table();
    expect(keptRevisions(open.session())).toBeUndefined();
    await applied(open, plain);
    const later = await reopened(open, (text) =>
      text.replace('"barycell-ledger","version":1', '"barycell-ledger","version":2'),
    );
    expect(await later.service.ledgers()).toEqual([]);
    expect(keptRevisions(later.session())!.ledgers).toMatchObject([{ version: 2, changes: expect.any(Number) }]);
    await expect(reopened(open, (text) => text.replace('"barycell-ledger"', '"ledger"'))).rejects.toThrow(
      'The book file is damaged or was changed by hand: revisions.ledgers[0].kind is "ledger"; "barycell-ledger" is needed.',
    );
  });

  test("the latest 20, with 2,000 entries at most", async () => {
    const count = 2100;
    const names = Array.from({ length: count }, (_, row) => `S${row}`);
    const open = openTable([["Name", "Star mass [solMass]", "Twice"], ...names.map((name) => [name, 1, null])]);
    const whole = area(`C2:C${count + 1}`);
    await open.service.act({ do: "type over", area: whole, place: at("C2"), text: "=2*B2" });
    const text = (value: number) => `Name,Star mass [solMass]\n${names.map((name) => `${name},${value}`).join("\n")}\n`;
    for (let index = 0; index < 21; index++) {
      const summary = await applied(open, text(index === 0 ? 2 : 3).replace("S0,3", `S0,${3 + index}`));
      if (index === 0) expect(summary).toMatchObject({ changes: 2 * count, entries: 2000 });
    }
    const kept = await open.service.ledgers();
    expect(kept).toHaveLength(20);
    expect(kept[0]).toMatchObject({ changes: 2 });
  });
});
