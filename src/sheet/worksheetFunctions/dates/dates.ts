import type { Cell } from "../../../call/cell.js";

import type { CalendarDate } from "../../values/calendar.js";
import { dateFromSerial, daysInMonth, serialFromDate } from "../../values/calendar.js";
import { dayFractionFromText, serialFromText } from "../../values/serialFromText.js";
import type { SerialTime } from "../../values/timeOfSerial.js";
import { timeOfSerial } from "../../values/timeOfSerial.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { number, optional, text, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

export const calendarNeeded = "a serial from 0 to 2958465 is needed, for example 45000";

export const outsideCalendar = (name: string, input: string, serial: number) =>
  outside(`${name}: ${input}`, serial, "outside the calendar of 1900 to 9999", calendarNeeded);

/** A function of the calendar date of a serial. */
export const ofDate = (name: string, compute: (date: CalendarDate, serial: number) => Cell) =>
  define(name, [number("date")] as const, (serial) => {
    const date = dateFromSerial(serial);
    return date ? compute(date, Math.floor(serial)) : outsideCalendar(name, "date", serial);
  });

const ofTime = (name: string, pick: (time: SerialTime) => number) =>
  define(name, [number("time")] as const, (serial) => {
    const time = timeOfSerial(serial);
    return time ? pick(time) : outsideCalendar(name, "time", serial);
  });

/** Years below 1900 count from 1900, as worksheets have it: DATE(124,1,1) is in 2024. */
const date = define("DATE", [whole("year"), whole("month"), whole("day")] as const, (year, month, day) => {
  const full = year >= 0 && year < 1900 ? year + 1900 : year;
  return (
    serialFromDate(full, month, day) ??
    outside(
      "DATE: year",
      year,
      "with this month and day outside the calendar of 1900 to 9999",
      "a date within it is needed, for example 2024, 5, 1",
    )
  );
});

const time = define("TIME", [whole("hour"), whole("minute"), whole("second")] as const, (hour, minute, second) => {
  const seconds = hour * 3600 + minute * 60 + second;
  return seconds < 0
    ? outside(
        "TIME: hour",
        hour,
        "with this minute and second below zero",
        "a time of 0 or more is needed, for example 12, 30, 0",
      )
    : (seconds % 86_400) / 86_400;
});

const reader = (name: string, what: string, example: string, read: (text: string) => number | undefined) =>
  define(
    name,
    [text("text")] as const,
    (within) =>
      read(within) ??
      outside(
        `${name}: text`,
        within,
        `no ${what} of the form ${example}`,
        `such a ${what} is needed, for example "${example}"`,
        "#VALUE!",
      ),
  );

/** The date some months on, in its month at the latest on its last day. */
export function monthsLater(from: CalendarDate, months: number): CalendarDate {
  const count = from.year * 12 + from.month - 1 + months;
  const year = Math.floor(count / 12);
  const month = count - year * 12 + 1;
  return { year, month, day: Math.min(from.day, daysInMonth(year, month)) };
}

const byMonths = (name: string, lastDay: boolean) =>
  define(name, [number("date"), whole("months")] as const, (serial, months) => {
    const from = dateFromSerial(serial);
    if (!from) {
      return outsideCalendar(name, "date", serial);
    }
    const to = monthsLater(from, months);
    const day = lastDay ? daysInMonth(to.year, to.month) : to.day;
    return (
      serialFromDate(to.year, to.month, day) ??
      outside(`${name}: months`, months, "so many that the date leaves the calendar", "fewer months are needed")
    );
  });

/** Section 6.10.20: the type tells the day that is 1 (0 in type 3); 11 to 17 begin with Monday to Sunday. */
const firstDays: Readonly<Record<number, number>> = {
  1: 0,
  2: 1,
  3: 1,
  11: 1,
  12: 2,
  13: 3,
  14: 4,
  15: 5,
  16: 6,
  17: 0,
};

/** Day of the week of a serial, Sunday 0. The convention of 29 February 1900 shifts the days before it. */
export const dayOfWeek = (serial: number) => (Math.floor(serial) + 6) % 7;

const weekday = define("WEEKDAY", [number("date"), optional(whole("type"), 1)] as const, (serial, type) => {
  const first = firstDays[type];
  if (first === undefined) {
    return outside(
      "WEEKDAY: type",
      type,
      "none of 1, 2, 3 and 11 to 17",
      "1 for weeks from Sunday, 2 for weeks from Monday is needed",
    );
  }
  return dateFromSerial(serial)
    ? ((dayOfWeek(serial) - first + 7) % 7) + (type === 3 ? 0 : 1)
    : outsideCalendar("WEEKDAY", "date", serial);
});

/** Week of the year of ISO 8601: weeks begin on Monday, the first holds 4 January. */
function isoWeek(serial: number): number {
  const thursday = serial - ((dayOfWeek(serial) + 6) % 7) + 3;
  const year = dateFromSerial(Math.max(thursday, 0))?.year ?? 1900;
  return Math.floor((thursday - (serialFromDate(year, 1, 1) ?? 0)) / 7) + 1;
}

const weekNumber = define("WEEKNUM", [number("date"), optional(whole("type"), 1)] as const, (serial, type) => {
  const day = dateFromSerial(serial);
  if (!day) {
    return outsideCalendar("WEEKNUM", "date", serial);
  }
  if (type === 21) {
    return isoWeek(Math.floor(serial));
  }
  const first = type === 3 ? undefined : firstDays[type];
  if (first === undefined) {
    return outside(
      "WEEKNUM: type",
      type,
      "none of 1, 2, 11 to 17 and 21",
      "1 for weeks from Sunday, 2 from Monday, 21 for ISO 8601 is needed",
    );
  }
  const newYear = serialFromDate(day.year, 1, 1) as number;
  return Math.floor((Math.floor(serial) - newYear + ((dayOfWeek(newYear) - first + 7) % 7)) / 7) + 1;
});

const difference = define(
  "DAYS",
  [number("end"), number("start")] as const,
  (end, start) => Math.floor(end) - Math.floor(start),
);

function wholeMonths(from: CalendarDate, to: CalendarDate): number {
  return (to.year - from.year) * 12 + to.month - from.month - (to.day < from.day ? 1 : 0);
}

/** Days from the last of whole months to the end. */
function daysBeyond(from: CalendarDate, to: CalendarDate, months: number): number {
  const reached = monthsLater({ ...from }, months);
  return (
    (serialFromDate(to.year, to.month, to.day) ?? 0) - (serialFromDate(reached.year, reached.month, reached.day) ?? 0)
  );
}

/** Section 6.10.3. */
const dateDifference = define(
  "DATEDIF",
  [number("start"), number("end"), text("unit")] as const,
  (start, end, unit) => {
    const from = dateFromSerial(start);
    const to = dateFromSerial(end);
    if (!from || !to) {
      return outsideCalendar("DATEDIF", from ? "end" : "start", from ? end : start);
    }
    if (start > end) {
      return outside("DATEDIF: start", start, `after the end ${end}`, "a start before the end is needed");
    }
    const months = wholeMonths(from, to);
    switch (unit.toLowerCase()) {
      case "y":
        return Math.floor(months / 12);
      case "m":
        return months;
      case "d":
        return Math.floor(end) - Math.floor(start);
      case "ym":
        return months % 12;
      case "md":
        return daysBeyond(from, to, months);
      case "yd":
        return daysBeyond(from, to, months - (months % 12));
      default:
        return outside("DATEDIF: unit", unit, "none of y, m, d, ym, md, yd", 'one of these is needed, for example "d"');
    }
  },
);

/** Section 6.10. */
export const dates: readonly WorksheetFunction[] = [
  date,
  time,
  dateDifference,
  difference,
  reader("DATEVALUE", "date", "2024-05-01", (within) => {
    const serial = /^\s*\d{4}-/.test(within) ? serialFromText(within) : undefined;
    return serial === undefined ? undefined : Math.floor(serial);
  }),
  reader("TIMEVALUE", "time", "12:30:00", (within) => {
    const serial = /^\s*\d{4}-/.test(within) ? serialFromText(within) : dayFractionFromText(within);
    return serial === undefined ? undefined : serial - Math.floor(serial);
  }),
  ofDate("YEAR", (each) => each.year),
  ofDate("MONTH", (each) => each.month),
  ofDate("DAY", (each) => each.day),
  ofTime("HOUR", (each) => each.hour),
  ofTime("MINUTE", (each) => each.minute),
  ofTime("SECOND", (each) => each.second),
  byMonths("EDATE", false),
  byMonths("EOMONTH", true),
  weekday,
  weekNumber,
  ofDate("ISOWEEKNUM", (_, serial) => isoWeek(serial)),
];
