import { cos, sin } from "../angle.js";
import { day } from "../constants.js";
import { drift, firstDay, lastDay, movingTerms, steadyTerms } from "./earthSeries.js";

const unit = 10000;
const perUnit = 1 / unit;

// A circle in steps: the sine and cosine of an angle are those of the nearest step, turned by the little that remains.
const steps = 1024;
const perRadian = steps / (2 * Math.PI);
const step = (2 * Math.PI) / steps;
const sixth = 1 / 6;
const twentyFourth = 1 / 24;
const hundredTwentieth = 1 / 120;
const sines = Float64Array.from({ length: steps }, (_, k) => sin(k * step));
const cosines = Float64Array.from({ length: steps }, (_, k) => cos(k * step));

/**
 * Position and velocity of the Earth about the barycentre of the solar system, on the axes of the ICRS.
 *
 * Given
 *   tdb  [d from J2000.0 TDB]  scalar, from 1971-10-01 to 2036-06-20
 *   out                        six numbers to fill
 * Returned  out = x, y, z [m], then their rates [m/s]; NaN outside the domain
 * Accuracy  1.4 mm/s and 1.4 km against the series it is fitted to, which itself is 5 mm/s and 13 km from a numerical
 *           ephemeris at most; test/kernel/earth.test.ts
 * Source    a fit of our own to epv00 of ERFA (Bretagnon & Francou, VSOP2000), made by earthSeries.py
 */
export function earthState(tdb: number, out: Float64Array): void {
  if (!(tdb >= firstDay && tdb <= lastDay)) {
    out.fill(Number.NaN);
    return;
  }
  const T = tdb / unit;
  for (let axis = 0; axis < 3; axis++) {
    let value = 0;
    let rate = 0;
    for (let power = 5; power >= 0; power--) {
      rate = rate * T + value;
      value = value * T + drift[6 * axis + power]!;
    }
    out[axis] = value;
    out[axis + 3] = rate / unit;
  }
  addMoving(tdb, T, out);
  addSteady(tdb, out);
  for (let axis = 3; axis < 6; axis++) out[axis]! /= day;
}

// The three axes are written out: this loop is most of a barycentric correction.
function addMoving(tdb: number, T: number, out: Float64Array): void {
  let x = 0;
  let y = 0;
  let z = 0;
  let vx = 0;
  let vy = 0;
  let vz = 0;
  const moving = movingTerms;
  for (let at = 0; at < moving.length; at += 13) {
    const w = moving[at]!;
    const place = w * tdb * perRadian;
    const k = Math.floor(place + 0.5);
    const r = (place - k) * step;
    const r2 = r * r;
    const sr = r - r * r2 * (sixth - r2 * hundredTwentieth);
    const cr = 1 - r2 * (0.5 - r2 * twentyFourth);
    const s0 = sines[k & (steps - 1)]!;
    const c0 = cosines[k & (steps - 1)]!;
    const s = s0 * cr + c0 * sr;
    const c = c0 * cr - s0 * sr;
    const ax = moving[at + 1]! + moving[at + 3]! * T;
    const bx = moving[at + 2]! + moving[at + 4]! * T;
    const ay = moving[at + 5]! + moving[at + 7]! * T;
    const by = moving[at + 6]! + moving[at + 8]! * T;
    const az = moving[at + 9]! + moving[at + 11]! * T;
    const bz = moving[at + 10]! + moving[at + 12]! * T;
    x += ax * c + bx * s;
    y += ay * c + by * s;
    z += az * c + bz * s;
    vx += w * (bx * c - ax * s) + perUnit * (moving[at + 3]! * c + moving[at + 4]! * s);
    vy += w * (by * c - ay * s) + perUnit * (moving[at + 7]! * c + moving[at + 8]! * s);
    vz += w * (bz * c - az * s) + perUnit * (moving[at + 11]! * c + moving[at + 12]! * s);
  }
  addTo(out, x, y, z, vx, vy, vz);
}

function addSteady(tdb: number, out: Float64Array): void {
  let x = 0;
  let y = 0;
  let z = 0;
  let vx = 0;
  let vy = 0;
  let vz = 0;
  const steady = steadyTerms;
  for (let at = 0; at < steady.length; at += 7) {
    const w = steady[at]!;
    const place = w * tdb * perRadian;
    const k = Math.floor(place + 0.5);
    const r = (place - k) * step;
    const r2 = r * r;
    const sr = r - r * r2 * (sixth - r2 * hundredTwentieth);
    const cr = 1 - r2 * (0.5 - r2 * twentyFourth);
    const s0 = sines[k & (steps - 1)]!;
    const c0 = cosines[k & (steps - 1)]!;
    const s = s0 * cr + c0 * sr;
    const c = c0 * cr - s0 * sr;
    x += steady[at + 1]! * c + steady[at + 2]! * s;
    y += steady[at + 3]! * c + steady[at + 4]! * s;
    z += steady[at + 5]! * c + steady[at + 6]! * s;
    vx += w * (steady[at + 2]! * c - steady[at + 1]! * s);
    vy += w * (steady[at + 4]! * c - steady[at + 3]! * s);
    vz += w * (steady[at + 6]! * c - steady[at + 5]! * s);
  }
  addTo(out, x, y, z, vx, vy, vz);
}

function addTo(out: Float64Array, x: number, y: number, z: number, vx: number, vy: number, vz: number): void {
  out[0]! += x;
  out[1]! += y;
  out[2]! += z;
  out[3]! += vx;
  out[4]! += vy;
  out[5]! += vz;
}
