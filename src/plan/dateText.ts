const unixEpoch = 2440587.5;
const epoch = 2451545;

/** [d from J2000.0 UTC] as "2027-02-01". */
export function dateText(time: number): string {
  return isoText(time).slice(0, 10);
}

/** [d from J2000.0 UTC] as "2027-02-01T04:12:00", to the second. */
export function isoText(time: number): string {
  const milliseconds = Math.round((time + epoch - unixEpoch) * 86400) * 1000;
  return new Date(milliseconds).toISOString().slice(0, 19);
}
