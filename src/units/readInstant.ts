import type { QuantityReading } from "./quantityReading.js";
import { julianDateOfEpoch } from "./readInstantUnit.js";
import type { Unit } from "./unit.js";

/** ISO 8601 texts are UTC unless they state an offset; read as days from J2000.0 UTC. */
export const isoInstant: Unit = {
  text: "JD_UTC",
  meaning: "ISO 8601 date and time, UTC",
  kind: "instant",
  times: 1,
  over: 1,
  plus: 0,
  frame: "JD_UTC",
};

const form = /^(\d{4})-(\d\d)-(\d\d)(?:[T ](\d\d):(\d\d)(?::(\d\d(?:\.\d+)?))?\s*(?:Z|UTC|([+-])(\d\d):?(\d\d))?)?$/;
const unixEpochJulianDate = 2440587.5;

export function readInstant(text: string): QuantityReading | undefined {
  const match = form.exec(text);
  if (!match) return undefined;
  const [year, month, day, hour, minute] = match.slice(1, 6).map((field) => Number(field ?? 0)) as [
    number,
    number,
    number,
    number,
    number,
  ];
  const second = Number(match[6] ?? 0);
  // Not Date.UTC, which takes the years 0 to 99 for those of the twentieth century.
  const date = new Date(0);
  date.setUTCFullYear(year, month - 1, day);
  const midnight = date.getTime();
  const exists = date.getUTCMonth() === month - 1 && date.getUTCDate() === day;
  const endOfDay = hour === 24 && minute === 0 && second === 0;
  if (!exists || (hour > 23 && !endOfDay) || minute > 59 || second >= 61) return undefined;
  if (Number(match[8] ?? 0) > 14 || Number(match[9] ?? 0) > 59) return undefined;
  const offset = match[7] ? (match[7] === "-" ? 1 : -1) * (Number(match[8]) * 60 + Number(match[9])) : 0;
  const days = midnight / 86400000 + unixEpochJulianDate - julianDateOfEpoch;
  const value = days + ((hour * 60 + minute + offset) * 60 + second) / 86400;
  return { value, upper: undefined, lower: undefined, unit: isoInstant };
}
