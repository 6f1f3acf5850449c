/*
 * Sine, cosine and arc tangent of any angle by the basic arithmetic that IEEE 754 fixes to the last bit, so that they are
 * the same in every engine; engines differ in the last bit of theirs.
 *
 *     angle = k pi/2 + r, |r| <= pi/4, pi/2 in three parts, so that k times the first two is exact; Taylor's series in r
 *
 * Given
 *   angle  [rad]  scalar, |angle| <= 1e6
 * Returned  [1]; not defined outside the domain, which callers keep
 * Accuracy  error <= 1.5e-16, and <= 2.5e-16 of the result while |angle| <= pi/2; test/kernel/elementary.test.ts
 * Source    Taylor's series; Cody & Waite 1980, Software Manual for the Elementary Functions, for the reduction
 */
const quarterTurn = Math.PI / 2;
const first = 1.5707963267341256;
const second = 6.077100506303966e-11;
const third = 2.0222662487959506e-21;
const perQuarter = 2 / Math.PI;

const s3 = 1 / 6;
const s5 = 1 / 120;
const s7 = 1 / 5040;
const s9 = 1 / 362880;
const s11 = 1 / 39916800;
const s13 = 1 / 6227020800;
const s15 = 1 / 1307674368000;
const s17 = 1 / 355687428096000;

const c4 = 1 / 24;
const c6 = 1 / 720;
const c8 = 1 / 40320;
const c10 = 1 / 3628800;
const c12 = 1 / 479001600;
const c14 = 1 / 87178291200;
const c16 = 1 / 20922789888000;

export function sin(angle: number): number {
  const k = Math.round(angle * perQuarter);
  const r = angle - k * first - k * second - k * third;
  const value = k & 1 ? cosineNear0(r * r) : sineNear0(r, r * r);
  return k & 2 ? -value : value;
}

export function cos(angle: number): number {
  const k = Math.round(angle * perQuarter);
  const r = angle - k * first - k * second - k * third;
  const value = k & 1 ? sineNear0(r, r * r) : cosineNear0(r * r);
  return (k + 1) & 2 ? -value : value;
}

function sineNear0(r: number, z: number): number {
  return r - r * z * (s3 - z * (s5 - z * (s7 - z * (s9 - z * (s11 - z * (s13 - z * (s15 - z * s17)))))));
}

function cosineNear0(z: number): number {
  return 1 - z * (0.5 - z * (c4 - z * (c6 - z * (c8 - z * (c10 - z * (c12 - z * (c14 - z * c16)))))));
}

const t3 = 1 / 3;
const t5 = 1 / 5;
const t7 = 1 / 7;
const t9 = 1 / 9;
const t11 = 1 / 11;
const t13 = 1 / 13;

/** Arc tangents of k/8. */
const eighths = Float64Array.of(
  0,
  0.12435499454676144,
  0.24497866312686414,
  0.35877067027057225,
  0.4636476090008061,
  0.5585993153435624,
  0.6435011087932844,
  0.7188299996216245,
  0.7853981633974483,
);

/**
 * The angle of the direction (x, y), from -pi to pi.
 *
 *     arctan q = arctan(k/8) + arctan((q - k/8) / (1 + q k/8)), q <= 1 the smaller over the larger, k/8 nearest to it
 *
 * Given
 *   y, x  [any]  scalars, not both 0
 * Returned  [rad]; 0 where both are 0
 * Accuracy  error <= 4e-16, and <= 4e-16 of the result near 0; test/kernel/elementary.test.ts
 * Source    Taylor's series and the addition theorem
 */
export function atan2(y: number, x: number): number {
  const tall = Math.abs(y);
  const wide = Math.abs(x);
  const steep = tall > wide;
  const small = steep ? wide : tall;
  const large = steep ? tall : wide;
  if (large === 0) return 0;
  const k = Math.round((small / large) * 8);
  const c = k / 8;
  const u = (small - large * c) / (large + small * c);
  const z = u * u;
  const rest = u - u * z * (t3 - z * (t5 - z * (t7 - z * (t9 - z * (t11 - z * t13)))));
  const octant = eighths[k]! + rest;
  const quadrant = steep ? quarterTurn - octant : octant;
  const half = x < 0 ? Math.PI - quadrant : quadrant;
  return y < 0 ? -half : half;
}
