import { cos, sin } from "../kernel/angle.js";
import type { Span } from "../kernel/night/darkness.js";
import { upSpans } from "../kernel/night/upSpans.js";
import type { Night } from "./nights.js";
import type { Site } from "./site.js";

/** A place in the sky [rad], ICRS at the time of the plan. */
export interface SkyTarget {
  readonly name: string;
  readonly rightAscension: number;
  readonly declination: number;
}

/** Its unit vector on the axes of the ICRS. */
export function skyVector({ rightAscension, declination }: SkyTarget): Float64Array {
  const wide = cos(declination);
  return Float64Array.of(wide * cos(rightAscension), wide * sin(rightAscension), sin(declination));
}

/** The same vector on the axes of a night's date. */
export function vectorOfDate(vector: Float64Array, { axes }: Night): Float64Array {
  return Float64Array.from({ length: 3 }, (_, row) => dot(axes.subarray(3 * row, 3 * row + 3), vector));
}

/** When it stands above an altitude [rad] in the dark. */
export function spansUp(vector: Float64Array, night: Night, site: Site, lowest: number): Span[] {
  if (night.dark.length === 0) return [];
  const star = vectorOfDate(vector, night);
  return night.dark.flatMap((dark) => upSpans(star, night.sidereal, night.midnight, site.latitude, lowest, dark));
}

export function dot(a: Float64Array, b: Float64Array): number {
  return a[0]! * b[0]! + a[1]! * b[1]! + a[2]! * b[2]!;
}
