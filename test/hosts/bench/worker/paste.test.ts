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
    expect(text).toBe("1\r\n2\r\n3");
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
    const { html } = openTable([["<b>", 'a&"b"']]).service.copy(area("A1:B1"));
    expect(html).toMatch(/>&lt;b&gt;<\/td><td[^<>]*>a&amp;&quot;b&quot;<\/td><\/tr>/);
    expect(html).not.toContain("<b>");
  });

  test("text keeps every digit and guards what looks like a formula", () => {
    // 0.1 + 0.2 as a double: 0.30000000000000004 (IEEE 754, its shortest decimal).
    const open = openTable([[0.1 + 0.2, "=1+1", "007"]]);
    expect(open.service.copy(area("A1:C1")).text).toBe("0.30000000000000004\t'=1+1\t007");
  });
});

describe("in another tab of this page", () => {
  const copyFrom = async () => {
    const open = openTable([
      ["x", "y"],
      [0.1 + 0.2, null],
      ["007", null],
      [-0, null],
    ]);
    await open.type("B2", [["=A2*2"], ["=A$2+1"], ['=IF(A4=0,"=zero",1)']]);
    return open;
  };
  const elsewhere = () => openTable([["p", "q", "r"]]);

  test("values come to the last bit, formulas with their relative references", async () => {
    const { text, html, own } = (await copyFrom()).service.copy(area("A2:B4"));
    const open = elsewhere();
    await open.service.act({ do: "paste", place: at("B3"), clipboard: { text, html, own }, what: "formulas" });
    expect(["B3", "B4", "B5"].map((address) => open.cell(address))).toEqual([0.30000000000000004, "007", -0]);
    expect(["C3", "C4", "C5"].map((address) => formulaOf(open.book(), at(address)))).toEqual([
      "=B3*2",
      "=B$2+1",
      '=IF(B5=0,"=zero",1)',
    ]);
    expect([open.cell("C3"), open.cell("C5")]).toEqual([0.6000000000000001, "=zero"]);
  });

  test("values alone where they are wanted", async () => {
    const { text, html } = (await copyFrom()).service.copy(area("A2:B4"));
    const open = elsewhere();
    await open.service.act({ do: "paste", place: at("A2"), clipboard: { text, html }, what: "values" });
    expect(["B2", "B4"].map((address) => open.cell(address))).toEqual([0.6000000000000001, "=zero"]);
    expect(formulaOf(open.book(), at("B2"))).toBeUndefined();
    expect(formulaOf(open.book(), at("B4"))).toBeUndefined();
  });

  test("rows under a filter come close together, their formulas reading their own row", async () => {
    const from = openTable([
      ["n", "x", "y"],
      ["a", 1, null],
      ["b", 2, null],
      ["c", 3, null],
    ]);
    await from.type("C2", [["=B2*10"], ["=B3*10"], ["=B4*10"]]);
    from.service.filter(0, [{ column: 0, test: "<>", text: "b" }]);
    const { text, html } = from.service.copy(area("B2:C4"));
    const open = elsewhere();
    await open.service.act({ do: "paste", place: at("A2"), clipboard: { text, html }, what: "formulas" });
    expect(["A2", "A3", "B2", "B3"].map((address) => open.cell(address))).toEqual([1, 3, 10, 30]);
    expect(formulaOf(open.book(), at("B3"))).toBe("=A3*10");
  });

  test("a block is repeated where it fits, formulas with it", async () => {
    const { text, html } = (await copyFrom()).service.copy(area("A2:B2"));
    const open = elsewhere();
    const over = area("A2:B4");
    await open.service.act({ do: "paste", place: at("A2"), clipboard: { text, html }, what: "formulas", over });
    expect(["B2", "B3", "B4"].map((address) => formulaOf(open.book(), at(address)))).toEqual([
      "=A2*2",
      "=A3*2",
      "=A4*2",
    ]);
  });
});

describe("HTML from elsewhere", () => {
  const pasteHtml = async (html: string, text: string) => {
    const open = openTable([["x", "y"]]);
    await open.service.act({ do: "paste", place: at("A2"), clipboard: { text, html }, what: "formulas" });
    return open;
  };

  test("what looks like a formula stays text, even where it has our marks without a table of ours", async () => {
    const html = '<table><tr><td data-barycell-formula="=1+1">=1+1</td><td>=A1</td></tr></table>';
    for (const text of ["", "=1+1\t=A1"]) {
      const open = await pasteHtml(html, text);
      expect([open.cell("A2"), open.cell("B2")]).toEqual(["=1+1", "=A1"]);
      expect(formulaOf(open.book(), at("A2"))).toBeUndefined();
    }
  });

  test("its table counts where the plain text is none", async () => {
    const open = await pasteHtml("<table><tr><td>a<td>1.5<tr><td>b<td>2e-3</table>", "a\n1.5\nb\n2e-3");
    expect(["A2", "B2", "A3", "B3"].map((address) => open.cell(address))).toEqual(["a", 1.5, "b", 2e-3]);
  });

  test("plain text that is a table counts before HTML that says no more", async () => {
    const open = await pasteHtml("<p>page</p><table><tr><td>other<td>9</table>", "a\t1");
    expect([open.cell("A2"), open.cell("B2")]).toEqual(["a", 1]);
  });

  // Worksheet programs put the digits they show into the plain text, and the number into an attribute: common practice, from memory.
  test("numbers that it states in full are taken in full", async () => {
    const html = '<table><tr><td x:num="12.345678901234567">12.35</td><td x:str>x</td></tr></table>';
    const open = await pasteHtml(html, "12.35\tx");
    expect([open.cell("A2"), open.cell("B2")]).toEqual([12.345678901234567, "x"]);
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
    expect(open.service.copy(area("A2:B6")).text).toBe("a\t1\r\nc\t3\r\ne\t5");
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
