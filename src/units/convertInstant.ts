import { tdbOfTt, ttOfTai, ttOfTdb, ttOfUtc, utcOfTt } from "../kernel/time/timeScales.js";

/** Clocks at one place, by the frame of their instants: to terrestrial time and back, in days from J2000.0. */
const clocks: Readonly<Record<string, { readonly toTt: (x: number) => number; readonly ofTt: (x: number) => number }>> =
  {
    JD_UTC: { toTt: ttOfUtc, ofTt: utcOfTt },
    JD_TAI: { toTt: ttOfTai, ofTt: (tt) => tt - (ttOfTai(tt) - tt) },
    JD_TT: { toTt: (tt) => tt, ofTt: (tt) => tt },
    JD_TDB: { toTt: ttOfTdb, ofTt: tdbOfTt },
  };

/** Whether an instant in one frame says when it is in another; a barycentric one does not without a direction. */
export function isClock(frame: string | undefined): boolean {
  return frame !== undefined && Object.hasOwn(clocks, frame);
}

/** Days from J2000.0 from one clock to another; NaN where leap seconds are not known. */
export function convertInstant(days: number, from: string, to: string): number {
  return from === to ? days : clocks[to]!.ofTt(clocks[from]!.toTt(days));
}
