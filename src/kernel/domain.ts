import { speedOfLight } from "./constants.js";

/*
 * Where the kernels are defined. Physical bounds stand in each kernel's header; to them comes one bound of arithmetic:
 * a quantity that is not 0 has a magnitude from 1e-40 to 1e40 in SI units. Within it no intermediate of a kernel comes
 * near the ends of a double, so a number that comes out is never 0 or wrong because something under- or overflowed.
 * Masses from 1e-14 to 1e6 solMass and periods from 1 s to 1e9 yr lie deep inside.
 */
const smallest = 1e-40;
const greatest = 1e40;

export function isMagnitude(value: number): boolean {
  return value >= smallest && value <= greatest;
}

export function isMagnitudeOrZero(value: number): boolean {
  return value === 0 || isMagnitude(value);
}

/** A bound orbit: 0 (circle) up to but not including 1 (parabola). */
export function isEccentricity(value: number): boolean {
  return value >= 0 && value < 1;
}

/** [rad] An orbit that moves its star along the line of sight: not face-on, so neither 0 nor pi. */
export function isInclination(value: number): boolean {
  return value >= smallest && value < Math.PI;
}

/** [m/s] A velocity of either sign, slower than light. */
export function isVelocity(value: number): boolean {
  const speed = Math.abs(value);
  return speed < speedOfLight && isMagnitudeOrZero(speed);
}

/** [mag] An apparent magnitude that a star can have: the Sun's is -26.7. */
export function isApparentMagnitude(value: number): boolean {
  return value >= -30 && value <= 40;
}

/** [1] A part of a whole that is not nothing. */
export function isPart(value: number): boolean {
  return isMagnitude(value) && value <= 1;
}
