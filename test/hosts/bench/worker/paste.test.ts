import { describe, expect, test } from "vitest";
import type { Area } from "../../../../src/sheet/book/book.js";
import { formulaOf } from "../../../../src/sheet/book/formulaOf.js";
import { area, at, type OpenTable, openTable } from "./openTable.js";

const clipboard = (text: string, own?: string) => ({ text, html: "", ...(own === undefined ? {} : { own }) });

async function pasteText(table: OpenTable, address: string, text: string, over?: Area) {
  const place = at(address);
  return table.service.act({
    do: "paste",
    place,
    clipboard: clipboard(text),
    what: "formulas",
    ...(over ? { over } : {}),
  });
}

describe("text from elsewhere", () => {
  test.each<[string, string, readonly (readonly unknown[])[]]>([
    [
      "numbers and texts",
      "a\t1\r\nb\t2.5e-3\r\n",
      [
        ["a", 1],
        ["b", 2.5e-3],
      ],
    ],
    ["what looks like a formula stays text", "=1+1\t+2\t-x", [["=1+1", 2, "-x"]]],
    ["quotes hold tabs and line ends", '"a\tb"\t"c\nd"\t"say ""x"""', [["a\tb", "c\nd", 'say "x"']]],
    ["coordinates are no times of day", "12:30:15.5\t1,234", [["12:30:15.5", "1,234"]]],
    [
      "a quote that is not closed is a character",
      '"5 inch\t1\nb\t2',
      [
        ['"5 inch', 1],
        ["b", 2],
      ],
    ],
    ["blanks clear", "\t1", [[null, 1]]],
    ["truth values", "TRUE\tFalse", [[true, "False"]]],
  ])("%s", async (_, text, expected) => {
    const table = openTable([
      ["x", "y", "z"],
      ["p", "q", "r"],
      ["s", "t", "u"],
    ]);
    expect((await pasteText(table, "A2", text)).is).toBe("done");
    for (const [row, line] of expected.entries()) {
      expect(line.map((_, column) => table.cell(`${"ABC"[column]}${row + 2}`))).toEqual(line);
    }
  });

  test("one cell fills a selection, a block is repeated where it fits, else it is put once", async () => {
    const table = openTable([["x", "y", "z"]]);
    await pasteText(table, "A2", "7", area("A2:B4"));
    expect(["A2", "B4"].map((address) => table.cell(address))).toEqual([7, 7]);
    await pasteText(table, "A2", "1\n2", area("A2:A5"));
    expect(["A2", "A3", "A4", "A5", "A6"].map((address) => table.cell(address))).toEqual([1, 2, 1, 2, null]);
    const outcome = await pasteText(table, "C2", "1\n2", area("C2:C4"));
    expect(outcome).toEqual({ is: "done", select: area("C2:C3") });
  });
});

describe("what was copied here", () => {
  const table = () =>
    openTable([
      ["x", "y"],
      [1, null],
      [2, null],
      [3, null],
    ]);

  test("formulas come with their relative references, values without", async () => {
    const open = table();
    await open.service.act({ do: "type over", area: area("B2:B4"), place: at("B2"), text: "=A2*$A$2" });
    const { own, text } = open.service.copy(area("B2:B4"));
    expect(text).toBe("1\n2\n3");
    await open.service.act({ do: "paste", place: at("C2"), clipboard: clipboard(text, own), what: "formulas" });
    expect(formulaOf(open.book(), at("C3"))).toBe("=B3*$A$2");
    await open.service.act({ do: "paste", place: at("D2"), clipboard: clipboard(text, own), what: "values" });
    expect(["D2", "D3", "D4"].map((address) => open.cell(address))).toEqual([1, 2, 3]);
    expect(formulaOf(open.book(), at("D3"))).toBeUndefined();
  });

  test("the copy is of the moment it was taken", async () => {
    const open = table();
    const { own, text } = open.service.copy(area("A2"));
    await open.type("A2", [["99"]]);
    await open.service.act({ do: "paste", place: at("B2"), clipboard: clipboard(text, own), what: "formulas" });
    expect(open.cell("B2")).toBe(1);
  });

  test("a token that is not the last one gives way to the text", async () => {
    const open = table();
    await open.service.act({ do: "paste", place: at("B2"), clipboard: clipboard("5", "other"), what: "formulas" });
    expect(open.cell("B2")).toBe(5);
  });

  test("HTML is escaped", () => {
    const open = openTable([["<b>", 'a&"b"']]);
    expect(open.service.copy(area("A1:B1")).html).toBe(
      "<table><tr><td>&lt;b&gt;</td><td>a&amp;&quot;b&quot;</td></tr></table>",
    );
  });
});

describe("under a filter only the rows in view change", () => {
  async function filtered(): Promise<OpenTable> {
    const open = openTable([
      ["Name", "x", "y"],
      ["a", 1, 10],
      ["b", 2, 20],
      ["c", 3, 30],
      ["d", 4, 40],
      ["e", 5, 50],
    ]);
    open.service.filter(0, [
      { column: 0, test: "contains", text: "" },
      { column: 1, test: "<>", text: "2" },
      { column: 1, test: "<>", text: "4" },
    ]);
    expect([...open.service.visibleRows(0)!]).toEqual([0, 1, 3, 5]);
    return open;
  }
  const column = (open: OpenTable, letter: string) => [2, 3, 4, 5, 6].map((row) => open.cell(`${letter}${row}`));

  test("clear", async () => {
    const open = await filtered();
    await open.service.act({ do: "clear", area: area("C2:C6") });
    expect(column(open, "C")).toEqual([null, 20, null, 40, null]);
    expect(open.state().history.labels.at(-1)).toBe("cleared y in 3 rows");
  });

  test("paste and type go into the rows in view", async () => {
    const open = await filtered();
    await pasteText(open, "C2", "7\n8\n9");
    expect(column(open, "C")).toEqual([7, 20, 8, 40, 9]);
    await open.type("C2", [["1"], ["2"]]);
    expect(column(open, "C")).toEqual([1, 20, 2, 40, 9]);
  });

  test("copy takes the rows in view, fill and type over reach them only", async () => {
    const open = await filtered();
    expect(open.service.copy(area("A2:B6")).text).toBe("a\t1\nc\t3\ne\t5");
    await open.service.act({ do: "type over", area: area("D2:D6"), place: at("D2"), text: "=B2*10" });
    expect(column(open, "D")).toEqual([10, null, 30, null, 50]);
    await open.service.act({ do: "fill over", area: area("C2:C6") });
    expect(column(open, "C")).toEqual([10, 20, 10, 40, 10]);
    await open.type("E2", [["=B2+1"]]);
    await open.service.act({ do: "fill to end", area: area("E2") });
    expect(column(open, "E")).toEqual([2, null, 4, null, 6]);
  });

  test("replace, delete rows", async () => {
    const open = await filtered();
    await open.service.act({ do: "replace", area: area("A1:A6"), search: "e", replacement: "E" });
    expect(column(open, "A")).toEqual(["a", "b", "c", "d", "E"]);
    await open.service.act({ do: "delete rows", sheet: 0, at: 1, count: 3 });
    expect(column(open, "A")).toEqual(["b", "d", "E", null, null]);
  });

  test.each([
    [
      { do: "sort", area: area("A2:C6"), keys: [{ column: 0 }] },
      "sort: the filter hides rows, and they would be sorted too; take the filter off before.",
    ],
    [
      { do: "move", area: area("A2:A6"), place: at("E2") },
      "move: the filter hides rows between these; take the filter off before, or copy and paste.",
    ],
    [
      { do: "fill", area: area("B2:B2"), toward: "down", count: 3, series: true },
      "fill: a series would go over rows that the filter hides; take the filter off, or fill without a series.",
    ],
  ] as const)("%j is refused", async (action, message) => {
    const open = await filtered();
    expect(await open.service.act(action)).toEqual({ is: "refused", message });
  });
});
