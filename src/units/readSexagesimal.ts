import { isProblem } from "./problem.js";
import { readUnit } from "./readUnit.js";
import type { Unit } from "./unit.js";

/** An angle written in sixtieths; `unit` is hours of right ascension or degrees. */
export interface SexagesimalReading {
  readonly value: number;
  readonly unit: Unit;
  /** Whether letters or signs said which of the two is meant. */
  readonly stated: boolean;
}

const number = "(\\d{1,2}(?:\\.\\d*)?)";
const colons = new RegExp(`^([+-]?)(\\d{1,3}):${number}(?::${number})?$`);
const spaces = new RegExp(`^([+-]?)(\\d{1,3}) ${number} ${number}$`);
const letters = new RegExp(
  `^([+-]?)(\\d{1,3}) ?(h|hr|d|deg|\u00b0) ?${number} ?(?:m|min|'|\u2032)(?: ?${number} ?(?:s|sec|"|''|\u2033)?)?$`,
  "i",
);

/**
 * `13:08:00`, `13 08 00`, `13h08m00s`, `-30:00:00`, `-30d00m00s`, `-30\u00b000'00"`; minutes and seconds below 60. Where
 * nothing says whether hours or degrees are meant, `usual` does.
 */
export function readSexagesimal(text: string, usual: "hours" | "degrees"): SexagesimalReading | undefined {
  const plain = text
    .replace(/[\u2212\u2013]/g, "-")
    .replace(/\s+/g, " ")
    .trim();
  const lettered = letters.exec(plain);
  const match = lettered
    ? [...lettered.slice(1, 3), ...lettered.slice(4)]
    : (colons.exec(plain) ?? spaces.exec(plain))?.slice(1);
  if (!match) return undefined;
  const [sign, whole, minutes, seconds] = match;
  const [m, s] = [Number(minutes), Number(seconds ?? 0)];
  if (m >= 60 || s >= 60 || (seconds !== undefined && minutes!.includes("."))) return undefined;
  const size = (Number(whole) * 3600 + m * 60 + s) / 3600;
  const hours = lettered ? lettered[3]!.toLowerCase().startsWith("h") : usual === "hours";
  return { value: sign === "-" ? -size : size, unit: hours ? hourOfAngle : degree, stated: lettered !== null };
}

function known(text: string): Unit {
  const unit = readUnit(text);
  if (isProblem(unit)) throw new Error(`the unit "${text}" of our own table does not read`);
  return unit;
}

/** An hour of right ascension, 15 deg. */
export const hourOfAngle = known("hourangle");
const degree = known("deg");
