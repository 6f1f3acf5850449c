import { dateText, isoText } from "../../../../../plan/dateText.js";
import type { Axis, Tick } from "./axis.js";

const hour = 1 / 24;
const clockSteps = [hour / 4, hour / 2, hour, 2 * hour, 3 * hour, 6 * hour, 12 * hour];
const daySteps = [6 * hour, 12 * hour, 1, 2, 4, 7, 14];
const monthSteps = [1, 2, 3, 6, 12, 24, 60, 120, 240, 600];
const monthLength = 30.44;
const julianDateOfUnix = 2440587.5;
const julianDateOfEpoch = 2451545;
/** A date takes more room than a number. */
const widthOfDate = 1.25;

/** Times of the clock or dates along an axis whose values are days from J2000.0, at most so many. */
export function timeTicks({ from, to, times }: Axis, most: number): Tick[] {
  const room = Math.max(1, most / (times === "clock" ? 1 : widthOfDate));
  const steps = times === "clock" ? clockSteps : daySteps;
  const step = steps.find((each) => (to - from) / each <= room);
  if (times === "clock") return everyStep(from, to, step ?? 1, (time) => isoText(time).slice(11, 16));
  if (step === undefined) return months(from, to, room);
  const word = (time: number) =>
    step < 1 ? `${isoText(time).slice(5, 10)} ${isoText(time).slice(11, 13)} h` : dateText(time);
  return everyStep(from, to, step, word);
}

/** From the midnight before the first on. */
function everyStep(from: number, to: number, step: number, word: (time: number) => string): Tick[] {
  const midnight = Math.floor(from + 0.5) - 0.5;
  const ticks: Tick[] = [];
  for (let index = Math.ceil((from - midnight) / step - 1e-9); midnight + index * step <= to + 1e-9; index++) {
    ticks.push({ value: midnight + index * step, text: word(midnight + index * step) });
  }
  return ticks;
}

function months(from: number, to: number, room: number): Tick[] {
  const step = monthSteps.find((each) => (to - from) / (each * monthLength) <= room) ?? 1200;
  const first = new Date((from + julianDateOfEpoch - julianDateOfUnix) * 86_400_000);
  const ticks: Tick[] = [];
  for (let month = step * Math.floor((first.getUTCFullYear() * 12 + first.getUTCMonth()) / step); ; month += step) {
    const value = Date.UTC(Math.floor(month / 12), month % 12, 1) / 86_400_000 + julianDateOfUnix - julianDateOfEpoch;
    if (value > to) return ticks;
    if (value >= from) ticks.push({ value, text: dateText(value) });
  }
}
