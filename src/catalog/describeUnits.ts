import { ambiguousUnits } from "../units/ambiguousUnits.js";
import { kindOfProduct } from "../units/dimension.js";
import { kindPhrase } from "../units/kind.js";
import { type UnitRow, unitTable } from "../units/unitTable.js";

/** The unit table as lines of plain text: a kind a paragraph, then what is refused, then the instants. */
export function describeUnits(): string[] {
  const byKind = new Map<string, UnitRow[]>();
  for (const row of unitTable) {
    const kind = kindOfProduct([{ row, power: 1 }]);
    byKind.set(kind, [...(byKind.get(kind) ?? []), row]);
  }
  const width = Math.max(...unitTable.map((row) => row.symbol.length)) + 2;
  const kinds = [...byKind].flatMap(([kind, rows]) => [
    capital(kindPhrase(kind)),
    ...rows.map((row) => unitLine(row, width)),
    "",
  ]);
  const refused = Object.entries(ambiguousUnits).map(
    ([text, choices]) =>
      `  ${text.padEnd(width)}write ${choices.map((choice) => `${choice.symbol} (${choice.meaning})`).join(" or ")}`,
  );
  return [
    ...kinds,
    "Instants: JD, MJD, BJD or HJD with a time scale, less an offset if need be",
    `  ${"JD_UTC".padEnd(width)}also BJD_TDB, MJD_UTC, HJD_UTC, BJD_TDB-2450000; scales UTC UT1 TAI TT TDB TCB; ISO 8601 texts are UTC`,
    `  ${"date serial".padEnd(width)}the number behind a date of the worksheet, UTC`,
    "Angles may be written 13:08:00, 13h08m00s or -30d15m00s; h means hours of angle for a right ascension",
    "",
    "Products and powers: m.s**-1, m/s, km s-1, kg/m**3, 10**3kg; logarithms: log(cm/s**2), [cm/s2], dex, ln(m)",
    "",
    "More than one meaning, refused",
    ...refused,
    "",
    "+ takes SI prefixes",
  ];
}

function unitLine(row: UnitRow, width: number): string {
  const others = [...row.spellings, ...row.words];
  const also = others.length > 0 ? `; also ${others.join(", ")}` : "";
  return `  ${`${row.symbol}${row.prefixes ? " +" : ""}`.padEnd(width)}${row.meaning}${also} [${row.source}]`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
