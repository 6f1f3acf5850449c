import { atan2, cos, sin } from "../angle.js";
import { type Span, siderealDay, siderealRate } from "./darkness.js";

/** How far from its highest point a star stays above an altitude. */
export type UpFor = "never" | "always" | number;

/**
 * Hour angle at which a star of date crosses an altitude.
 *
 *     cos H0 = (sin h0 - sin phi sin delta) / (cos phi cos delta)
 *
 * Given
 *   direction  three numbers: unit vector on the axes of date
 *   latitude   [rad]  scalar
 *   lowest     [rad]  scalar: the altitude
 * Returned  [rad], 0 < H0 < pi, or in words where it never or always stands above
 * Accuracy  1e-12; test/kernel/night.test.ts
 * Source    spherical trigonometry
 */
export function upFor(direction: Float64Array, latitude: number, lowest: number): UpFor {
  const wide = cos(latitude) * Math.sqrt(direction[0]! * direction[0]! + direction[1]! * direction[1]!);
  const rest = sin(lowest) - sin(latitude) * direction[2]!;
  if (rest >= wide) return "never";
  if (rest < -wide) return "always";
  return atan2(Math.sqrt((wide - rest) * (wide + rest)), rest);
}

/**
 * When a star stands above an altitude within a stretch of time.
 *
 * Given
 *   direction  three numbers: unit vector on the axes of date
 *   sidereal   [rad]             scalar: local sidereal time
 *   at         [d from J2000.0]  scalar, when it is that
 *   latitude   [rad]             scalar
 *   lowest     [rad]             scalar: the altitude
 *   within     [d from J2000.0 UTC]
 * Returned  stretches in their order
 */
export function upSpans(
  direction: Float64Array,
  sidereal: number,
  at: number,
  latitude: number,
  lowest: number,
  within: Span,
): Span[] {
  const half = upFor(direction, latitude, lowest);
  if (half === "never") return [];
  if (half === "always") return [within];
  const highest = at + (atan2(direction[1]!, direction[0]!) - sidereal) / siderealRate;
  const reach = half / siderealRate;
  const first = Math.ceil((within.from - reach - highest) / siderealDay);
  const spans: Span[] = [];
  for (let turn = first; ; turn++) {
    const middle = highest + turn * siderealDay;
    if (!(middle - reach < within.to)) return spans;
    spans.push({ from: Math.max(middle - reach, within.from), to: Math.min(middle + reach, within.to) });
  }
}
