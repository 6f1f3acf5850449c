import type { CalendarDate } from "../../values/calendar.js";
import { dateFromSerial, daysInMonth, isLeapYear, serialFromDate } from "../../values/calendar.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { logical, number, optional, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { outsideCalendar } from "./dates.js";

/** How days between two dates, the first the earlier, are counted on a basis (ISO/IEC 26300-3 section 4.11.7). */
interface Basis {
  days(from: CalendarDate, to: CalendarDate): number;
  yearLength(from: CalendarDate, to: CalendarDate): number;
}

const in360 = (from: CalendarDate, to: CalendarDate) =>
  (to.year - from.year) * 360 + (to.month - from.month) * 30 + to.day - from.day;

const isLastOfFebruary = (date: CalendarDate) => date.month === 2 && date.day === daysInMonth(date.year, 2);

/** Procedure A, section 4.11.7.3. */
function days360American(from: CalendarDate, to: CalendarDate): number {
  const start = from.day === 31 ? { ...from, day: 30 } : from;
  const end = start.day === 30 && to.day === 31 ? { ...to, day: 30 } : to;
  const lastDays = isLastOfFebruary(start) && isLastOfFebruary(end);
  return in360(isLastOfFebruary(start) ? { ...start, day: 30 } : start, lastDays ? { ...end, day: 30 } : end);
}

/** Procedure C, section 4.11.7.5. */
function days360European(from: CalendarDate, to: CalendarDate): number {
  return in360({ ...from, day: Math.min(from.day, 30) }, { ...to, day: Math.min(to.day, 30) });
}

const serialOf = (date: CalendarDate) => serialFromDate(date.year, date.month, date.day) as number;

/** Procedure B, section 4.11.7.4. */
const actualDays = (from: CalendarDate, to: CalendarDate) => serialOf(to) - serialOf(from);

const daysOfYear = (year: number) => (isLeapYear(year) ? 366 : 365);

/** Procedure E, section 4.11.7.7. */
function actualYear(from: CalendarDate, to: CalendarDate): number {
  const isLonger = to.month > from.month || (to.month === from.month && to.day > from.day);
  if (from.year !== to.year && (to.year !== from.year + 1 || isLonger)) {
    let days = 0;
    for (let year = from.year; year <= to.year; year++) {
      days += daysOfYear(year);
    }
    return days / (to.year - from.year + 1);
  }
  if (from.year !== to.year && isLeapYear(from.year)) {
    return 366;
  }
  return holdsLeapDay(from, to) ? 366 : 365;
}

function holdsLeapDay(from: CalendarDate, to: CalendarDate): boolean {
  return [from.year, to.year].some((year) => {
    const leapDay = isLeapYear(year) ? serialOf({ year, month: 2, day: 29 }) : -1;
    return leapDay >= serialOf(from) && leapDay <= serialOf(to);
  });
}

const length360 = () => 360;

/** Table of section 4.11.7.1. */
const bases: readonly Basis[] = [
  { days: days360American, yearLength: length360 },
  { days: actualDays, yearLength: actualYear },
  { days: actualDays, yearLength: length360 },
  { days: actualDays, yearLength: () => 365 },
  { days: days360European, yearLength: length360 },
];

function inOrder(start: number, end: number): [CalendarDate, CalendarDate] | undefined {
  const first = dateFromSerial(Math.min(start, end));
  const last = dateFromSerial(Math.max(start, end));
  return first && last && [first, last];
}

const yearFraction = define(
  "YEARFRAC",
  [number("start"), number("end"), optional(whole("basis"), 0)] as const,
  (start, end, basisNumber) => {
    const basis = bases[basisNumber];
    if (!basis) {
      return outside("YEARFRAC: basis", basisNumber, "outside 0 to 4", "0 for 30/360, 1 for actual days is needed");
    }
    const ordered = inOrder(start, end);
    return ordered
      ? basis.days(...ordered) / basis.yearLength(...ordered)
      : outsideCalendar("YEARFRAC", "start or end", Math.min(start, end));
  },
);

/** Section 6.10.7; a start after the end gives a negative count. */
const days360 = define(
  "DAYS360",
  [number("start"), number("end"), optional(logical("European"), false)] as const,
  (start, end, european) => {
    const from = dateFromSerial(start);
    const to = dateFromSerial(end);
    if (!from || !to) {
      return outsideCalendar("DAYS360", from ? "end" : "start", from ? end : start);
    }
    if (european) {
      return days360European(from, to);
    }
    // A 31st at the end after an earlier day than the 30th is the first of the next month.
    const startDay = from.day === 31 || isLastOfFebruary(from) ? 30 : from.day;
    const movesOn = to.day === 31 && startDay < 30;
    const last = movesOn ? { year: to.year, month: to.month + 1, day: 1 } : { ...to, day: Math.min(to.day, 30) };
    return in360({ ...from, day: startDay }, last);
  },
);

export const dayCounts: readonly WorksheetFunction[] = [yearFraction, days360];
