import { tdbOfTt, ttOfUtc } from "../time/timeScales.js";
import { earthOrientation, newOrientation, type Orientation } from "./earthOrientation.js";
import { earthState } from "./earthState.js";
import { siteState } from "./siteState.js";

/** Who looks, when and from where, seen from the barycentre of the solar system on the axes of the ICRS. */
export interface Observer {
  /** [d from J2000.0]; NaN outside the table of leap seconds. */
  tt: number;
  tdb: number;
  /** Position [m], then velocity [m/s]; NaN outside the ephemeris. */
  readonly state: Float64Array;
  readonly orientation: Orientation;
  /** The site about the geocentre, likewise. */
  readonly site: Float64Array;
}

export function newObserver(): Observer {
  return {
    tt: Number.NaN,
    tdb: Number.NaN,
    state: new Float64Array(6),
    orientation: newOrientation(),
    site: new Float64Array(6),
  };
}

/**
 * Fills in an observer.
 *
 * Given
 *   utc                  [d from J2000.0 UTC]  scalar; UT1 is taken to be UTC, which is worth up to 0.03 m/s
 *   longitude, latitude  [rad]                 scalars, geodetic (WGS 84), east and north positive
 *   height               [m]                   scalar
 * Accuracy  that of `earthState` and `siteState`
 */
export function observe(utc: number, longitude: number, latitude: number, height: number, out: Observer): void {
  out.tt = ttOfUtc(utc);
  out.tdb = tdbOfTt(out.tt);
  earthState(out.tdb, out.state);
  earthOrientation(utc, out.tt, out.orientation);
  siteState(longitude, latitude, height, out.orientation, out.site);
  for (let axis = 0; axis < 6; axis++) out.state[axis]! += out.site[axis]!;
}
