import type { Unit } from "./unit.js";

/** Julian date of J2000.0, from which instants are counted [d]. */
export const julianDateOfEpoch = 2451545;
const julianDateOfModifiedZero = 2400000.5;

const references: Readonly<Record<string, string>> = { "": "", B: "barycentric ", H: "heliocentric " };
const form = /^([BH]?)(M?)JD[_ ]?(UTC|UT1|TAI|TT|TDB|TCB)(?:\s*[-\u2212\u2013]\s*(\d+(?:\.\d+)?))?$/;

/** Midnight before the first day of 1900 as worksheets count, 1899-12-30, which is right from 1 March 1900 on. */
const julianDateOfSerialZero = 2415018.5;
const serial = /^date[ _-]?serial(?:[ _,]*UTC)?$/i;

/**
 * `JD_UTC`, `BJD_TDB`, `MJD_TT`, `BJD_TDB-2450000`: a date whose scale, reference position and zero are stated; and `date
 * serial`, the number behind a date of the worksheet, taken as UTC.
 */
export function readInstantUnit(text: string): Unit | undefined {
  if (serial.test(text)) {
    const plus = julianDateOfSerialZero - julianDateOfEpoch;
    const meaning = "date of the worksheet, days from 1899-12-30, UTC";
    return { text: "date serial", meaning, kind: "instant", times: 1, over: 1, plus, frame: "JD_UTC" };
  }
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
