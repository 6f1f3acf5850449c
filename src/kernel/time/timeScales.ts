import { sin } from "../angle.js";
import { day } from "../constants.js";
import { taiMinusUtc } from "./leapSeconds.js";

/** TT - TAI [s], exact: IAU 1991 Resolution A4. */
const ttMinusTai = 32.184;
const julianCentury = 36525;

/**
 * Terrestrial time of a coordinated universal time; both [d from J2000.0 in their own scale]. NaN outside the table of
 * leap seconds. A day of 86401 s has no Julian date of its own: what falls into the leap second is read as the second
 * that follows.
 */
export function ttOfUtc(utc: number): number {
  return utc + (taiMinusUtc(utc) + ttMinusTai) / day;
}

/** The inverse of `ttOfUtc`. */
export function utcOfTt(tt: number): number {
  // A guess from the wrong side of a step is put right by the second look.
  const guess = tt - (taiMinusUtc(tt - 1e-3) + ttMinusTai) / day;
  return tt - (taiMinusUtc(guess) + ttMinusTai) / day;
}

export function ttOfTai(tai: number): number {
  return tai + ttMinusTai / day;
}

/**
 * TDB - TT at the geocentre; at a site on the ground 2e-6 s different at most.
 *
 *     1657 sin(628.3076 T + 6.2401) + 22 sin(575.3385 T + 4.2970) + 14 sin(1256.6152 T + 6.1969) + ... [1e-6 s]
 *
 * Given
 *   tt  [d from J2000.0 TT]  scalar; TDB serves as well
 * Returned  [s]
 * Accuracy  1e-5 s from 1970 to 2040; test/kernel/timeScales.test.ts
 * Source    Kaplan 2005, USNO Circular 179, eq. 2.6 (from memory; the test decides)
 */
export function tdbMinusTt(tt: number): number {
  const T = tt / julianCentury;
  return (
    1e-6 *
    (1657 * sin(628.3076 * T + 6.2401) +
      22 * sin(575.3385 * T + 4.297) +
      14 * sin(1256.6152 * T + 6.1969) +
      5 * sin(606.9777 * T + 4.0212) +
      5 * sin(52.9691 * T + 0.4444) +
      2 * sin(21.3299 * T + 5.5431) +
      10 * T * sin(628.3076 * T + 4.249))
  );
}

export function tdbOfTt(tt: number): number {
  return tt + tdbMinusTt(tt) / day;
}

export function ttOfTdb(tdb: number): number {
  return tdb - tdbMinusTt(tdb) / day;
}
