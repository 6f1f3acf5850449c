import type { Unit } from "../../units/unit.js";

/** A TIMESYS of VOTable 1.4 (section 3.5): the time scale, the place and the zero of dates. */
export interface TimeSystem {
  readonly timescale: string;
  readonly refposition: string;
  /** A Julian date, or a word for one; undefined for calendar dates. */
  readonly timeorigin: string | undefined;
}

const references: Readonly<Record<string, string>> = { BARYCENTER: "B", HELIOCENTER: "H" };

/** The unit of a column of days in a time system, as headers write it: `BJD_TDB`; undefined where there is no word for it. */
export function instantUnitText({ timescale, refposition, timeorigin }: TimeSystem): string | undefined {
  const scale = timescale.toUpperCase();
  if (timeorigin === undefined || !/^(?:UTC|UT1|TAI|TT|TDB|TCB)$/.test(scale)) return undefined;
  const reference = references[refposition.toUpperCase()] ?? "";
  if (timeorigin === "MJD-origin" || Number(timeorigin) === 2400000.5) return `${reference}MJD_${scale}`;
  if (timeorigin === "JD-origin" || Number(timeorigin) === 0) return `${reference}JD_${scale}`;
  return /^\d+(?:\.\d+)?$/.test(timeorigin) ? `${reference}JD_${scale}-${timeorigin}` : undefined;
}

/** The time system that the unit of instants states. */
export function timeSystemOf(unit: Unit): TimeSystem | undefined {
  const [, reference, modified, scale, offset] = /^([BH]?)(M?)JD_(\w+?)(?:-([\d.]+))?$/.exec(unit.text) ?? [];
  if (scale === undefined) return undefined;
  const zero = (modified ? 2400000.5 : 0) + Number(offset ?? 0);
  return {
    timescale: scale,
    refposition: reference === "B" ? "BARYCENTER" : reference === "H" ? "HELIOCENTER" : "UNKNOWN",
    timeorigin: offset === undefined ? (modified ? "MJD-origin" : "JD-origin") : String(zero),
  };
}
