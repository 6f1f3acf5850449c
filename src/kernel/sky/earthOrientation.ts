import { cos, sin } from "../angle.js";

/*
 * How the Earth stands in space: bias, precession (IAU 2006), the greatest terms of nutation (IAU 2000B) and rotation.
 * Polar motion is left out: it is worth less than 1 mm/s and 0.3 arcsec.
 */
const arcsec = Math.PI / 648000;
const turn = 2 * Math.PI;
const julianCentury = 36525;
/** Turns of the Earth in a day of UT1, and its rate [rad/s]; Capitaine et al. 2000, A&A 355, 398. */
const turnsPerDay = 1.0027378119113546;
export const rotationRate = (turnsPerDay * turn) / 86400;

/** Multiples of l, l', F, D and Omega, then the nutation in longitude, its rate per century, and that in obliquity [mas]. */
const nutationTerms = Float64Array.of(
  ...[0, 0, 0, 0, 1, -17206.4161, -17.4666, 9205.2331],
  ...[0, 0, 2, -2, 2, -1317.0906, -0.1675, 573.0336],
  ...[0, 0, 2, 0, 2, -227.6413, -0.0234, 97.8459],
  ...[0, 0, 0, 0, 2, 207.4554, 0.0207, -89.7492],
  ...[0, 1, 0, 0, 0, 147.5877, -0.3633, 7.3871],
  ...[0, 1, 2, -2, 2, -51.6821, 0.1226, 22.4386],
  ...[1, 0, 0, 0, 0, 71.1159, 0.0073, -0.675],
  ...[0, 0, 2, 0, 1, -38.7298, -0.0367, 20.0728],
  ...[1, 0, 2, 0, 2, -30.1461, -0.0036, 12.9025],
  ...[0, -1, 2, -2, 2, 21.5829, -0.0494, -9.5929],
  ...[-1, 0, 0, 2, 0, 15.6994, 0.001, -0.1235],
  ...[0, 0, 2, -2, 1, 12.8227, 0.0137, -6.8982],
  ...[-1, 0, 2, 0, 2, 12.3457, 0.0011, -5.3311],
);

/** Where the axes of date stand: the turn that takes them to those of the ICRS, row by row, and sidereal time. */
export interface Orientation {
  /** Greenwich apparent sidereal time [rad]. */
  sidereal: number;
  /** The axes of date (true equator and equinox), each by its ICRS components. */
  readonly axes: Float64Array;
}

export function newOrientation(): Orientation {
  return { sidereal: Number.NaN, axes: new Float64Array(9) };
}

/**
 * Orientation of the Earth.
 *
 *     ICRS -> date:  R1(-(eps + deps)) R3(-(psi + dpsi)) R1(phi) R3(gamma);  sidereal time = ERA + precession + dpsi cos eps
 *
 * Given
 *   ut1  [d from J2000.0 UT1]  scalar; UTC serves to 0.9 s
 *   tt   [d from J2000.0 TT]   scalar
 *   out                        to fill
 * Accuracy  0.05 arcsec from 1970 to 2040; test/kernel/earth.test.ts
 * Source    Hilton et al. 2006, Celest. Mech. 94, 351 (precession angles); McCarthy & Luzum 2003, Celest. Mech. 85, 37
 *           (nutation); Capitaine et al. 2003, A&A 406, 1135 (sidereal time)
 */
export function earthOrientation(ut1: number, tt: number, out: Orientation): void {
  const T = tt / julianCentury;
  const gamma = arcsec * (-0.052928 + T * (10.556378 + T * (0.4932044 - T * 0.00031238)));
  const phi = arcsec * (84381.412819 + T * (-46.811016 + T * (0.0511268 + T * 0.00053289)));
  const psi = arcsec * (-0.041775 + T * (5038.481484 + T * (1.5584175 - T * 0.00018522)));
  const eps = arcsec * (84381.406 + T * (-46.836769 + T * (-0.0001831 + T * 0.0020034)));
  const node = arcsec * (450160.398036 - 6962890.5431 * T);
  let longitude = 0;
  let obliquity = 0;
  const l = arcsec * (485868.249036 + 1717915923.2178 * T);
  const sun = arcsec * (1287104.79305 + 129596581.0481 * T);
  const F = arcsec * (335779.526232 + 1739527262.8478 * T);
  const D = arcsec * (1072260.70369 + 1602961601.209 * T);
  for (let at = 0; at < nutationTerms.length; at += 8) {
    const argument =
      nutationTerms[at]! * l +
      nutationTerms[at + 1]! * sun +
      nutationTerms[at + 2]! * F +
      nutationTerms[at + 3]! * D +
      nutationTerms[at + 4]! * node;
    longitude += (nutationTerms[at + 5]! + nutationTerms[at + 6]! * T) * sin(argument);
    obliquity += nutationTerms[at + 7]! * cos(argument);
  }
  const dpsi = longitude * 1e-3 * arcsec;
  const trueObliquity = eps + obliquity * 1e-3 * arcsec;
  const rotation = turn * (0.779057273264 + (turnsPerDay - 1) * ut1 + (ut1 - Math.floor(ut1)));
  const precession = arcsec * (0.014506 + T * (4612.156534 + T * (1.3915817 - T * 0.00000044)));
  out.sidereal = rotation + precession + dpsi * cos(eps);
  const { axes } = out;
  axes.fill(0);
  axes[0] = axes[4] = axes[8] = 1;
  turnAbout3(axes, gamma);
  turnAbout1(axes, phi);
  turnAbout3(axes, -psi - dpsi);
  turnAbout1(axes, -trueObliquity);
}

/** The first two rows of a matrix, turned about the third axis. */
function turnAbout3(axes: Float64Array, angle: number): void {
  mix(axes, 0, 3, angle);
}

function turnAbout1(axes: Float64Array, angle: number): void {
  mix(axes, 3, 6, angle);
}

function mix(axes: Float64Array, from: number, to: number, angle: number): void {
  const c = cos(angle);
  const s = sin(angle);
  for (let column = 0; column < 3; column++) {
    const a = axes[from + column]!;
    const b = axes[to + column]!;
    axes[from + column] = c * a + s * b;
    axes[to + column] = c * b - s * a;
  }
}
