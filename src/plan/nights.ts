import { darkness, noonBefore, type Span } from "../kernel/night/darkness.js";
import { newOrientation, orientationAt } from "../kernel/night/starOfDate.js";
import { earthState } from "../kernel/sky/earthState.js";
import { tdbOfTt, ttOfUtc } from "../kernel/time/timeScales.js";
import type { Site } from "./site.js";

/** One night at a site, with all that is the same for every target. */
export interface Night {
  /** The date on whose evening it begins, 0 h [d from J2000.0]. */
  readonly date: number;
  /** The mean midnight at the site [d from J2000.0 UTC]. */
  readonly midnight: number;
  readonly dark: readonly Span[];
  /** Local sidereal time at midnight [rad]. */
  readonly sidereal: number;
  /** Rows of the turn from the axes of the ICRS to those of date. */
  readonly axes: Float64Array;
  /** The Earth about the barycentre at midnight [m]: light takes 2 s less or more at the ends of a night. */
  readonly earth: Float64Array;
  /** TDB less UTC [d]. */
  readonly tdbLessUtc: number;
}

const orientation = newOrientation();

/** `date`: any time of it [d from J2000.0]; `sunBelow` [rad]. */
export function nightOf(date: number, site: Site, sunBelow: number): Night {
  const { longitude, latitude } = site;
  const noon = noonBefore(date, longitude);
  const midnight = noon + 0.5;
  orientationAt(midnight, orientation);
  const tdb = tdbOfTt(ttOfUtc(midnight));
  const state = new Float64Array(6);
  earthState(tdb, state);
  return {
    date: Math.floor(date + 0.5) - 0.5,
    midnight,
    dark: darkness(noon, longitude, latitude, sunBelow),
    sidereal: orientation.sidereal + longitude,
    axes: Float64Array.from(orientation.axes),
    earth: state.slice(0, 3),
    tdbLessUtc: tdb - midnight,
  };
}

/** Every night from that of one date to that of another. */
export function nightsBetween(from: number, to: number, site: Site, sunBelow: number): Night[] {
  const first = Math.floor(from + 0.5) - 0.5;
  const count = Math.floor(to + 0.5) - 0.5 - first + 1;
  return Array.from({ length: Math.max(0, count) }, (_, index) => nightOf(first + index, site, sunBelow));
}
