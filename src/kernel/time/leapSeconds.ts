/*
 * TAI - UTC [s] since the day [d from J2000.0 UTC, at 0 h] it stands beside. IERS, leap-seconds.list after Bulletin C 70
 * of July 2025; its content holds until `leapSecondsKnownUntil`, 28 June 2026. To renew: add a line, move that day.
 */
const steps: readonly (readonly [day: number, seconds: number])[] = [
  [-10227.5, 10],
  [-10045.5, 11],
  [-9861.5, 12],
  [-9496.5, 13],
  [-9131.5, 14],
  [-8766.5, 15],
  [-8400.5, 16],
  [-8035.5, 17],
  [-7670.5, 18],
  [-7305.5, 19],
  [-6758.5, 20],
  [-6393.5, 21],
  [-6028.5, 22],
  [-5297.5, 23],
  [-4383.5, 24],
  [-3652.5, 25],
  [-3287.5, 26],
  [-2740.5, 27],
  [-2375.5, 28],
  [-2010.5, 29],
  [-1461.5, 30],
  [-914.5, 31],
  [-365.5, 32],
  [2191.5, 33],
  [3287.5, 34],
  [4564.5, 35],
  [5659.5, 36],
  [6209.5, 37],
];

/** 28 June 2026 [d from J2000.0 UTC]. */
export const leapSecondsKnownUntil = 9674.5;

/** 1 January 1972, when UTC took up whole seconds [d from J2000.0 UTC]. */
export const firstLeapSecond = -10227.5;

/**
 * 1 January 2036 [d from J2000.0 UTC]. After the table the last value serves up to here: no step is announced, and by
 * 2035 UTC is to give leap seconds up (Resolution 4 of the 27th CGPM, 2022).
 */
export const leapSecondsAssumedUntil = 13148.5;

/**
 * TAI - UTC.
 *
 * Given
 *   utc  [d from J2000.0 UTC]  scalar, from 1972 up to 2036
 * Returned  [s]; NaN outside the domain
 * Accuracy  exact up to `leapSecondsKnownUntil`, then as assumed above; test/kernel/timeScales.test.ts
 * Source    IERS, leap-seconds.list
 */
export function taiMinusUtc(utc: number): number {
  if (!(utc >= firstLeapSecond && utc < leapSecondsAssumedUntil)) return Number.NaN;
  let index = steps.length - 1;
  while (steps[index]![0] > utc) index--;
  return steps[index]![1];
}
