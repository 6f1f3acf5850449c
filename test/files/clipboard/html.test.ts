import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { entriesAt } from "../../../src/files/clipboard/clipboardTable.js";
import { readHtmlTable } from "../../../src/files/clipboard/readHtmlTable.js";
import { writeHtmlTable } from "../../../src/files/clipboard/writeHtmlTable.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { ownFunctions } from "../../../src/files/xlsx/ownFunctions.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../src/sheet/book/formulaOf.js";
import { change } from "../../../src/sheet/change.js";
import type { Entry } from "../../../src/sheet/edit/setCells.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";

const rowsOf = (html: string) => readHtmlTable(html)?.rows;
const empty = bookOf([{ name: "Targets", columns: [] }]);
const bookWith = (rows: readonly (readonly Entry[])[], row = 0, column = 0) =>
  change(empty, [setCells({ sheet: 0, row, column }, rows)], ownFunctions);

// The HTML standard, sections 4.9 and 13.1.2.4 (end tags that may be left out), as browsers show it.
describe("tables of other programs", () => {
  test.each<[string, string, unknown]>([
    [
      "end tags left out",
      "<table><tr><td>a<td>1.5<tr><td>b<td>2",
      [
        ["a", 1.5],
        ["b", 2],
      ],
    ],
    ["rows left out", "<table><td>a<td>b</table>", [["a", "b"]]],
    ["no table", "<p>1</p>", undefined],
    ["an empty table, then one with cells", "<table></table><table><tr><td>1</table>", [[1]]],
    [
      "heads, bodies, feet",
      "<TABLE><THEAD><TR><TH>P [d]</TH></TR></THEAD><TBODY><TR><TD>4.23</TD></TR></TBODY></TABLE>",
      [["P [d]"], [4.23]],
    ],
    [
      "styles, comments, scripts",
      "<style>td{color:red}</style><table><!-- <td>no --><tr><!--[if x]><td>0<![endif]--><td>1<script>'<td>2'</script></table>",
      [[1]],
    ],
    [
      "a cell over two columns",
      "<table><tr><td colspan=2>a<td>b<tr><td>1<td>2<td>3",
      [
        ["a", null, "b"],
        [1, 2, 3],
      ],
    ],
    [
      "a cell over two rows",
      '<table><tr><td rowspan="2">a<td>1<tr><td>2<tr><td>b<td>3',
      [
        ["a", 1],
        [null, 2],
        ["b", 3],
      ],
    ],
    ["line breaks", "<table><td>a<br>b<br/>c</table>", [["a\nb\nc"]]],
    ["white space", "<table><td>\n  a\n  b\t c  </table>", [["a b c"]]],
    [
      "characters",
      "<table><td>&Omega;&plusmn;&#8857;&#x2295;&nbsp;x &unknown; &amp;lt; &#150;</table>",
      [["Ω±⊙⊕ x &unknown; &lt; –"]],
    ],
    ["a table within a cell", "<table><tr><td>a<table><tr><td>b</table><td>c", [["a\nb", "c"]]],
    ["broken tags", "<table><tr><td>1 < 2<td a='b' =>3<td", [["1 < 2", 3]]],
    [
      "what looks like a formula",
      "<table><td>=1+1<td>+3<td>-x<td data-barycell-formula='=2'>5",
      [["=1+1", 3, "-x", 5]],
    ],
    ["identifiers", "<table><td>1234567890123456789<td>007", [["1234567890123456789", "007"]]],
    ["a minus", "<table><td>\u22124.5<td>&minus;", [[-4.5, "\u2212"]]],
    [
      "a raised exponent is no digit",
      "<table><td>10<sup>3</sup><td>m s<sup>-1</sup><td>4.2<sup>a</sup>",
      [["10^3", "m s^-1", "4.2^a"]],
    ],
    [
      "uncertainties above and below",
      "<table><td>4.23<sup>+0.10</sup><sub>-0.20</sub><td>M<sub>&odot;</sub>",
      [["4.23 +0.10 -0.20", "M⊙"]],
    ],
    // From memory: what worksheet programs add to the digits they show.
    [
      "exact numbers",
      '<table><td x:num="0.123456789012345">0.12<td sdval="1e-300" sdnum="1033;">0.00<td data-sheets-value=\'{"1":3,"3":0.1}\'>0<td data-sheets-value=\'{"1":2,"2":"7"}\'>7<td x:str>8',
      [[0.123456789012345, 1e-300, 0.1, "7", "8"]],
    ],
    [
      "keys of a prototype",
      '<table><td data-sheets-value=\'{"__proto__":{"3":1}}\' __proto__="1" constructor="2">x',
      [["x"]],
    ],
  ])("%s", (_, html, rows) => {
    expect(rowsOf(html)).toEqual(rows);
  });

  test("never fail, whatever the text", () => {
    const piece = fc.constantFrom("<table>", "<tr", "<td", ">", "</td>", "<td colspan=3>", " rowspan='2'", "<!--", "-->", "&", "&#1;", "<sup>", "x", "\"", "'", "=", "<script>", "</", "</table>", "<br>"); // biome-ignore format: one list
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 30 }), (pieces) => {
        const rows = rowsOf(pieces.join("")) ?? [[]];
        expect(new Set(rows.map((row) => row.length)).size).toBe(1);
      }),
      { numRuns: 500 },
    );
  });

  test("of endless spans are refused", () => {
    const html = `<table>${"<tr><td colspan=1000 rowspan=65534>1".repeat(100)}`;
    expect(() => readHtmlTable(html)).toThrow(FileProblem);
    expect(() => readHtmlTable(html)).toThrow("The table has more than 5,000,000 cells; save it as a file and open that file."); // biome-ignore format: one message
  });
});

describe("a table copied from here", () => {
  test("comes back: values to the last bit, formulas", () => {
    const text = fc.oneof(
      fc.string({ unit: "binary", maxLength: 8 }),
      fc.constantFrom("", " a  b ", "007", "1e5", "a\r\nb", "<td>&amp;\"'"),
    );
    const cell = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.constant(123456789012345680), fc.boolean(), fc.constant(null), text); // biome-ignore format: one arbitrary
    fc.assert(
      fc.property(fc.array(fc.array(cell, { minLength: 2, maxLength: 2 }), { minLength: 1, maxLength: 5 }), (rows) => {
        const html = writeHtmlTable(bookWith(rows), { sheet: 0, top: 0, left: 0, bottom: rows.length - 1, right: 1 });
        expect(rowsOf(html)).toStrictEqual(rows);
      }),
    );
  });

  test("takes its formulas along, relative to where it is put", () => {
    const book = bookWith([[2, { formula: "=B3*$B$3" }, { formula: '=SEQUENCE(1,2)&"<"' }]], 2, 1);
    const html = writeHtmlTable(book, { sheet: 0, top: 2, left: 1, bottom: 2, right: 4 });
    const table = readHtmlTable(html);
    expect(table?.rows).toEqual([[2, { formula: "=B3*$B$3" }, { formula: '=SEQUENCE(1,2)&"<"' }, null]]);
    const entries = entriesAt(table as NonNullable<typeof table>, { row: 9, column: 3 }, ownFunctions);
    const put = change(book, [setCells({ sheet: 0, row: 9, column: 3 }, entries)], ownFunctions);
    expect(formulaOf(put, { sheet: 0, row: 9, column: 4 })).toBe("=D10*$B$3");
    expect(cellOf(put, { sheet: 0, row: 9, column: 4 })).toBe(4);
    expect(cellOf(put, { sheet: 0, row: 9, column: 6 })).toBe("2<");
  });

  test("shows other programs the same digits and codes", () => {
    const html = writeHtmlTable(bookWith([[0.1, "a\nb", { formula: "=1/0" }]]), { sheet: 0, top: 0, left: 0, bottom: 0, right: 2 }); // biome-ignore format: one call
    expect(html.replace(/<(td|table)[^>]*>/g, "<$1>")).toBe(
      "<table><tbody><tr><td>0.1</td><td>a<br>b</td><td>#DIV/0!</td></tr></tbody></table>",
    );
  });
});
