import { altitudeOf } from "../kernel/night/altitude.js";
import { type Span, siderealRate } from "../kernel/night/darkness.js";
import { moonFromSite } from "../kernel/night/moonDistance.js";
import type { Night } from "./nights.js";
import type { Site } from "./site.js";
import { type SkyTarget, skyVector, vectorOfDate } from "./skyTarget.js";

/** Altitudes through one night, from noon to noon. */
export interface NightTimeline {
  /** [d from J2000.0 UTC] */
  readonly times: Float64Array;
  readonly dark: readonly Span[];
  /** [rad], a row a target. */
  readonly altitudes: readonly Float64Array[];
  readonly moon: Float64Array;
}

/** `step` is the time between two points [d]. */
export function nightTimeline(
  targets: readonly SkyTarget[],
  night: Night,
  site: Site,
  step: number = 1 / 144,
): NightTimeline {
  const count = Math.round(1 / step) + 1;
  const times = Float64Array.from({ length: count }, (_, index) => night.midnight - 0.5 + index / (count - 1));
  const siderealAt = (time: number) => night.sidereal + siderealRate * (time - night.midnight);
  const moon = new Float64Array(3);
  return {
    times,
    dark: night.dark,
    altitudes: targets.map((target) => {
      const star = vectorOfDate(skyVector(target), night);
      return times.map((time) => altitudeOf(star, siderealAt(time), site.latitude));
    }),
    moon: times.map((time) => {
      moonFromSite(time, siderealAt(time), site.latitude, moon);
      return altitudeOf(moon, siderealAt(time), site.latitude);
    }),
  };
}
