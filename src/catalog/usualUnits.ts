import { definitions } from "../functions/definitions.js";
import { type Kind, kindPhrase } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readUnit } from "../units/readUnit.js";
import { unitTable } from "../units/unitTable.js";

/** A unit that columns of a kind are usually kept in. */
export interface UsualUnit {
  readonly text: string;
  readonly meaning: string;
}

/** Products and prefixed units that tables of the trade use besides the rows of the unit table. */
const besides: Readonly<Record<Kind, readonly string[]>> = {
  speed: ["cm/s"],
  length: ["km", "um", "nm"],
  instant: ["BJD_TDB-2450000", "JD_UTC", "MJD_UTC"],
};

/** Rows of the unit table that are read but not worth offering: second names, and years nobody asks for. */
const seldom: ReadonlySet<string> = new Set(["a", "ta", "Ba", "cy", "wk", "u"]);

/** The units to offer where a result of this kind is asked for: those of the definitions first, then the unit table's. */
export function usualUnits(kind: Kind): readonly UsualUnit[] {
  const own = definitions.flatMap((definition) =>
    definition.form === "number" && definition.result.quantity.kind === kind
      ? [definition.result.unit, definition.result.quantity.unit]
      : [],
  );
  const texts = [
    ...own,
    ...(besides[kind] ?? []),
    ...unitTable.map((row) => row.symbol).filter((symbol) => !seldom.has(symbol)),
  ];
  return [...new Set(texts)].flatMap((text) => {
    const unit = readUnit(text);
    if (isProblem(unit) || unit.kind !== kind) return [];
    return [{ text, meaning: unit.meaning === text ? kindPhrase(kind) : unit.meaning }];
  });
}
