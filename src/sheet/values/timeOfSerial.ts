import type { CalendarDate } from "./calendar.js";
import { dateFromSerial } from "./calendar.js";

export interface SerialTime extends CalendarDate {
  readonly hour: number;
  readonly minute: number;
  /** With the decimals asked for. */
  readonly second: number;
}

const secondsOfDay = 86_400;

/**
 * Date and time of a serial, the time rounded to a number of decimals of a second before it is split, so that 59.9999 s
 * never shows as 60. Undefined outside the calendar.
 */
export function timeOfSerial(serial: number, decimals = 0): SerialTime | undefined {
  const scale = 10 ** decimals;
  const day = Math.floor(serial);
  const ticks = Math.round((serial - day) * secondsOfDay * scale);
  const full = secondsOfDay * scale;
  const date = dateFromSerial(ticks === full ? day + 1 : day);
  const rest = ticks === full ? 0 : ticks;
  const seconds = Math.floor(rest / scale);
  return (
    date && {
      ...date,
      hour: Math.floor(seconds / 3600),
      minute: Math.floor(seconds / 60) % 60,
      second: (seconds % 60) + (rest % scale) / scale,
    }
  );
}
