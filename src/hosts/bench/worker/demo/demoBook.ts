import { columnOf } from "../../../../call/column.js";
import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import { readDelimitedText } from "../../../../files/delimited/readDelimited.js";
import { bookOf } from "../../../../sheet/book/bookOf.js";
import { change } from "../../../../sheet/change.js";
import type { NumberFormat } from "../../../../sheet/display/numberFormat.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import { fillFormula } from "../../../../sheet/edit/fillFormula.js";
import { defineName } from "../../../../sheet/edit/names.js";
import { setCells } from "../../../../sheet/edit/setCells.js";
import type { ColumnPresentation } from "../../../../sheet/presentation/presentation.js";
import { tableColumns } from "../files/tableColumns.js";
import { functions } from "../functions.js";
import { survey } from "./survey.js";

interface Derived {
  /** More than one where the result has uncertainties beside it. */
  readonly headers: readonly string[];
  /** For the first row below the headers; its own headers stand in `N$1` for column N. */
  readonly formula: string;
  readonly format: NumberFormat;
}

const digits = (count: number): NumberFormat => ({ kind: "significant", digits: count });

/** Masses may carry their own unit, which takes room. */
const typedWidths: Readonly<Record<number, ColumnPresentation>> = { 5: { width: 140 }, 6: { width: 152 } };

/** Columns L and on. */
const derived: readonly Derived[] = [
  {
    headers: ["Axis [AU]", "Axis sigma [AU]"],
    formula: "=BARY.AXIS(C2,D2:E2,F2:G2,C$1:G$1,L$1)",
    format: digits(4),
  },
  {
    headers: ["K [m/s]", "K sigma [m/s]"],
    formula: "=BARY.REFLEX(C2,D2:E2,F2:G2,H2,I2,C$1:I$1,N$1)",
    format: digits(3),
  },
  { headers: ["Shift"], formula: "=BARY.SHIFT(N2,,N$1)", format: { kind: "scientific", digits: 3 } },
  {
    headers: ["Line shift [nm]"],
    formula: '=BARY.LINESHIFT(reference_line,N2,,"nm; m/s",Q$1)',
    format: { kind: "scientific", digits: 3 },
  },
  {
    headers: ["Pixel shift [pixel]"],
    formula: '=BARY.PIXELSHIFT(N2,resolving_power,pixels_per_element,"m/s; 1; pixel",R$1)',
    format: digits(3),
  },
  {
    headers: ["Minimum mass [earthMass]", "Minimum mass sigma [earthMass]"],
    formula: '=IF(ISBLANK(J2),"",BARY.MINMASS(J2:K2,C2,D2:E2,H2,"m/s; m/s; d; solMass; solMass; 1",S$1))',
    format: digits(3),
  },
  // 1 where the measured K and the mass in the table agree; 300 tells of a Jupiter mass among Earth masses.
  { headers: ["Measured over table"], formula: '=IF(ISBLANK(J2),"",S2/BARY.INTO(F2,F$1,S$1))', format: digits(3) },
  {
    headers: ["Noise a visit [m/s]"],
    formula: "=SQRT((photon_noise*10^(0.2*(B2-anchor_magnitude)))^2+Assumptions!B$7^2)",
    format: digits(3),
  },
  {
    headers: ["Visits"],
    formula: "=ROUNDUP(2*(significance*V2/N2)^2,0)",
    format: { kind: "fixed", decimals: 0, grouped: true },
  },
];

/** What the derived columns assume; a value belongs to the words to its left, units in brackets. */
const assumptions: readonly (readonly [name: string, value: number, note: string, defined?: string])[] = [
  ["Resolving power", 115_000, "invented spectrograph", "resolving_power"],
  ["Pixels per resolution element [pixel]", 3.2, "sampling along the dispersion", "pixels_per_element"],
  ["Reference line [nm]", 550, "wavelength at rest", "reference_line"],
  ["Photon noise [m/s]", 0.45, "of one visit at the anchor magnitude", "photon_noise"],
  ["Anchor magnitude [mag]", 8, "noise grows by 10^0.2 a magnitude", "anchor_magnitude"],
  ["Noise floor [m/s]", 0.3, "of the instrument; added in quadrature"],
  ["Significance", 10, "K over its uncertainty that is asked for", "significance"],
  ["Site longitude [deg]", -70.4, "an invented site"],
  ["Site latitude [deg]", -24.6, ""],
  ["Site height [m]", 2400, ""],
];

/** The survey with its derived columns and its assumptions, calculated. */
export function demoBook(): BookDocument {
  const table = readDelimitedText(survey, { isUnit: () => false, unitsRow: false });
  const texts = [["Assumption", "Value", "Note"], ...assumptions.map(([name, value, note]) => [name, value, note])];
  const columns = [0, 1, 2].map((index) => columnOf(texts.map((row) => row[index] || null)));
  const values = bookOf([
    { name: "Survey", columns: tableColumns(table) },
    { name: "Assumptions", columns },
  ]);
  const names = assumptions.flatMap(([, , , defined], row) =>
    defined === undefined ? [] : [defineName(defined, `=Assumptions!$B$${row + 2}`, 1)],
  );
  const book = change(values, [...names, ...derivedEdits(table.columns.length, table.rows)], functions);
  const formats = derived.flatMap(({ headers, format }) => headers.map((): ColumnPresentation => ({ format })));
  return {
    title: "Demo survey",
    book,
    presentation: [
      { frozenColumns: 1, columns: [...table.columns.map((_, column) => typedWidths[column]), ...formats] },
      { frozenColumns: 1, columns: [{ width: 280 }, undefined, { width: 300 }] },
    ],
    marks: [],
    history: [],
  };
}

function derivedEdits(first: number, rows: number): Edit[] {
  let column = first;
  return derived.flatMap(({ headers, formula }) => {
    const edits = [
      setCells({ sheet: 0, row: 0, column }, [headers]),
      fillFormula({ sheet: 0, column, from: 1, to: rows + 1 }, formula),
    ];
    column += headers.length;
    return edits;
  });
}
