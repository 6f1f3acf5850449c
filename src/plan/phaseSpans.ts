import type { Span } from "../kernel/night/darkness.js";

/** An orbit whose times are known so well. */
export interface Ephemeris {
  /** [d] */
  readonly period: number;
  /** Its standard uncertainty [d]. */
  readonly periodError: number;
  /** [d from J2000.0 TDB] at the barycentre: an instant of phase 0. */
  readonly reference: number;
  /** Its standard uncertainty [d]. */
  readonly referenceError: number;
}

/** Phase at an instant [d from J2000.0 TDB], 0 <= phase < 1. */
export function phaseAt({ period, reference }: Ephemeris, time: number): number {
  const turns = (time - reference) / period;
  const phase = turns - Math.floor(turns);
  return phase < 1 ? phase : 0;
}

/**
 * Standard uncertainty of the phase at an instant, as it has grown since the reference.
 *
 *     sigma = (sigma_T0^2 + (n sigma_P)^2)^(1/2) / P,  n the periods passed; period and reference independent
 */
export function phaseError({ period, periodError, reference, referenceError }: Ephemeris, time: number): number {
  const grown = ((time - reference) / period) * periodError;
  return Math.sqrt(referenceError * referenceError + grown * grown) / period;
}

/** How far two phases are apart, at most 1/2. */
export function phaseDistance(a: number, b: number): number {
  const apart = Math.abs(a - b) % 1;
  return Math.min(apart, 1 - apart);
}

/**
 * When the phase is within a distance of the one wanted, in a stretch of time; `lead` is what the barycentre's clock shows
 * more than the stretch's own [d].
 */
export function phaseSpans(
  { period, reference }: Ephemeris,
  wanted: number,
  distance: number,
  within: Span,
  lead: number,
): Span[] {
  if (!(distance > 0)) return [];
  if (distance >= 0.5) return [within];
  const reach = distance * period;
  const zero = reference + wanted * period - lead;
  const spans: Span[] = [];
  for (let turn = Math.ceil((within.from - reach - zero) / period); ; turn++) {
    const middle = zero + turn * period;
    if (!(middle - reach < within.to)) return spans;
    spans.push({ from: Math.max(middle - reach, within.from), to: Math.min(middle + reach, within.to) });
  }
}
