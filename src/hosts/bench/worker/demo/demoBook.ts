import { type Column, columnOf } from "../../../../call/column.js";
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
import { ephemerides } from "./ephemerides.js";
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

/** Instants to ten seconds. */
const skyFormats: Readonly<Record<number, ColumnPresentation>> = {
  2: { format: { kind: "fixed", decimals: 4, grouped: false }, width: 136 },
};

/** Columns L to U. */
const derivedOrbits: readonly Derived[] = [
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
];

/** After the places and times of the targets in columns V to AC: what an observation of each would cost. */
const derivedCosts: readonly Derived[] = [
  { headers: ["Overhead [s]"], formula: "=overhead", format: { kind: "general" } },
  {
    headers: ["Photon noise [m/s]"],
    formula: '=BARY.RVNOISE(B2,AC2,anchor_noise,anchor_magnitude,anchor_exposure,,,"mag; s; m/s; mag; s",AE$1)',
    format: digits(3),
  },
  {
    headers: ["Noise [m/s]"],
    formula: '=BARY.NOISESUM(AE2,Assumptions!B$8,"m/s; m/s",AF$1)',
    format: digits(3),
  },
  {
    headers: ["Visits", "Visits sigma"],
    formula: '=BARY.VISITS(N2:O2,AF2,significance,"quadrature",,,"m/s; m/s; m/s; 1",AG$1)',
    format: { kind: "fixed", decimals: 0, grouped: true },
  },
  {
    headers: ["Hours [h]", "Hours sigma [h]"],
    formula: '=BARY.HOURS(AG2:AH2,AC2,AD2,usable_part,"1; 1; s; s; 1",AI$1)',
    format: { kind: "fixed", decimals: 1, grouped: true },
  },
];

/** What the derived columns assume; a value belongs to the words to its left, units in brackets. */
const assumptions: readonly (readonly [name: string, value: number, note: string, defined?: string])[] = [
  ["Resolving power", 115_000, "invented spectrograph", "resolving_power"],
  ["Pixels per resolution element [pixel]", 3.2, "sampling along the dispersion", "pixels_per_element"],
  ["Reference line [nm]", 550, "wavelength at rest", "reference_line"],
  ["Anchor noise [m/s]", 0.45, "photon noise of one visit to a star of the anchor magnitude", "anchor_noise"],
  ["Anchor magnitude [mag]", 8, "a star on which the spectrograph was tried", "anchor_magnitude"],
  ["Anchor exposure [s]", 900, "", "anchor_exposure"],
  ["Noise floor [m/s]", 0.3, "of the instrument; added in quadrature"],
  ["Significance", 10, "K over its uncertainty that is asked for", "significance"],
  ["Overhead [s]", 180, "of one visit, the shutter closed", "overhead"],
  ["Usable part", 0.8, "what weather and faults leave of the time", "usable_part"],
  ["Site longitude [deg]", -69.2, "Cairn Ridge, an invented observatory; east is positive"],
  ["Site latitude [deg]", -25.3, ""],
  ["Site height [m]", 2900, ""],
];

/** The survey with its derived columns and its assumptions, calculated. */
export function demoBook(): BookDocument {
  const [planets, skies] = [survey, ephemerides].map(typedColumns) as [TypedColumns, TypedColumns];
  const { rows } = planets;
  const firstDerived = planets.columns.length;
  const between = derivedOrbits.flatMap(({ headers }) => headers);
  const firstCost = firstDerived + between.length + skies.columns.length;
  const texts = [["Assumption", "Value", "Note"], ...assumptions.map(([name, value, note]) => [name, value, note])];
  const columns = [0, 1, 2].map((index) => columnOf(texts.map((row) => row[index] || null)));
  const values = bookOf([
    { name: "Survey", columns: [...planets.columns, ...between.map(() => columnOf([])), ...skies.columns] },
    { name: "Assumptions", columns },
  ]);
  const names = assumptions.flatMap(([, , , defined], row) =>
    defined === undefined ? [] : [defineName(defined, `=Assumptions!$B$${row + 2}`, 1)],
  );
  const edits = [...derivedEdits(derivedOrbits, firstDerived, rows), ...derivedEdits(derivedCosts, firstCost, rows)];
  const seen = [
    ...planets.columns.map((_, column) => typedWidths[column]),
    ...formatsOf(derivedOrbits),
    ...skies.columns.map((_, column) => skyFormats[column]),
    ...formatsOf(derivedCosts),
  ];
  return {
    title: "Demo survey",
    book: change(values, [...names, ...edits], functions),
    presentation: [
      { frozenColumns: 1, columns: seen },
      { frozenColumns: 1, columns: [{ width: 280 }, undefined, { width: 300 }] },
    ],
    marks: [],
    history: [],
  };
}

interface TypedColumns {
  readonly columns: readonly Column[];
  /** Without the headers. */
  readonly rows: number;
}

function typedColumns(text: string): TypedColumns {
  const table = readDelimitedText(text, { isUnit: () => false, unitsRow: false });
  return { columns: tableColumns(table), rows: table.rows };
}

function formatsOf(derived: readonly Derived[]): ColumnPresentation[] {
  return derived.flatMap(({ headers, format }) => headers.map(() => ({ format })));
}

function derivedEdits(derived: readonly Derived[], first: number, rows: number): Edit[] {
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
