import type { Unit } from "./unit.js";

/** Julian date of J2000.0, from which instants are counted [d]. */
export const julianDateOfEpoch = 2451545;
const julianDateOfModifiedZero = 2400000.5;

const references: Readonly<Record<string, string>> = { "": "", B: "barycentric ", H: "heliocentric " };
const form = /^([BH]?)(M?)JD[_ ]?(UTC|UT1|TAI|TT|TDB|TCB)(?:\s*[-\u2212\u2013]\s*(\d+(?:\.\d+)?))?$/;

/** `JD_UTC`, `BJD_TDB`, `MJD_TT`, `BJD_TDB-2450000`: a date whose scale, reference position and zero are stated. */
export function readInstantUnit(text: string): Unit | undefined {
  const match = form.exec(text);
  if (!match) return undefined;
  const [, reference = "", modified = "", scale = "", offset] = match;
  const zero = (modified ? julianDateOfModifiedZero : 0) + (offset ? Number(offset) : 0) - julianDateOfEpoch;
  return {
    text: `${reference}${modified}JD_${scale}${offset ? `-${offset}` : ""}`,
    meaning: `${references[reference]}${modified ? "modified " : ""}Julian date, ${scale}${offset ? `, less ${offset} d` : ""}`,
    kind: "instant",
    times: 1,
    over: 1,
    plus: zero,
    frame: `${reference}JD_${scale}`,
  };
}
