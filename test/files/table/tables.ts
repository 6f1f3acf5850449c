import fc from "fast-check";
import type { Cell } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
import type { DescribedTable } from "../../../src/files/table/describedTable.js";

/** What XML, YAML and delimited text can all hold: no zero, no control characters but tab and line ends. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters that are left out
const unholdable = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g;
const piece = fc.constantFrom(
  "a",
  "007",
  "1.5",
  "1234567890123456789",
  "=1+1",
  "-",
  "@x",
  "'",
  '"',
  ",",
  " ",
  "\t",
  "\n",
  "\r\n",
  "<b>",
  "&amp;",
  "]]>",
  "#",
  "\u00e9",
  "\u{1d6fc}",
  "__proto__",
  "constructor",
  "[",
  "]",
  "TRUE",
  "nan",
);
const text = fc
  .oneof(
    fc.array(piece, { maxLength: 5 }).map((parts) => parts.join("")),
    fc.string({ unit: "grapheme", maxLength: 12 }),
    fc.string({ unit: "binary", maxLength: 6 }),
  )
  .map((value) => value.replace(unholdable, ""));
const someText = text.filter((value) => value !== "");
const double = fc.double({ noNaN: true, noDefaultInfinity: true });
const blank = fc.constant<Cell>(null);

/** Names that hold no unit, have no blanks around them and are one line. */
const name = text.map((value) => value.replace(/[[\]()\s]+/g, " ").trim());
// IVOA VOUnits 1.1, and what it does not list.
const unit = fc.constantFrom(
  "",
  "d",
  "m/s",
  "solMass",
  "jupiterMass",
  "earthRad",
  "deg",
  "log(cm/s**2)",
  "ppm",
  "BJD_TDB",
  "MJD_UTC",
  "BJD_TDB-2450000",
  "jupiterMass/yr",
  "W.m**-2.um**-1",
);

const cellsOfOneKind: readonly fc.Arbitrary<Cell>[] = [double, fc.maxSafeInteger(), fc.boolean(), someText];

/** Tables of one kind of cell a column, as described formats hold them. `emptyTexts`: with texts that are empty. */
export function describedTables({ emptyTexts = false } = {}): fc.Arbitrary<DescribedTable> {
  return fc
    .record({ width: fc.integer({ min: 1, max: 5 }), rows: fc.integer({ min: 1, max: 6 }) })
    .chain(({ width, rows }) => {
      const column = fc
        .constantFrom(...cellsOfOneKind, ...(emptyTexts ? [fc.oneof(someText, fc.constant(""))] : []))
        .chain((cell) =>
          fc.array(fc.oneof({ weight: 5, arbitrary: cell }, { weight: 1, arbitrary: blank }), {
            minLength: rows,
            maxLength: rows,
          }),
        );
      const heads = fc.uniqueArray(fc.tuple(name, unit), {
        minLength: width,
        maxLength: width,
        selector: ([own]) => own,
      });
      return fc
        .record({
          heads,
          columns: fc.array(column, { minLength: width, maxLength: width }),
          descriptions: fc.array(fc.option(text, { nil: undefined }), { minLength: width, maxLength: width }),
          title: fc.option(someText, { nil: undefined }),
          remarks: fc.array(someText, { maxLength: 2 }),
        })
        .map(({ heads, columns, descriptions, title, remarks }) => ({
          header: heads.map(([own, ofIt], index) => `${own || "n"} ${index}${ofIt && ` [${ofIt}]`}`),
          columns: columns.map((cells) => columnOf(cells)),
          notes: heads.map(([own, ofIt], index) => ({
            name: `${own || "n"} ${index}`,
            unit: ofIt || undefined,
            description: descriptions[index]?.replace(/\s+/g, " ").trim() || undefined,
            ucd: undefined,
          })),
          name: title?.replace(/\s+/g, " ").trim() || undefined,
          remarks: remarks.map((remark) => remark.replace(/\s+/g, " ").trim()).filter((remark) => remark !== ""),
        }));
    });
}
