import { CellError } from "../../../call/cell.js";
import { dateFromSerial } from "../../values/calendar.js";
import type { Matrix } from "../../values/operand.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import type { Parameter } from "../define/parameters.js";
import { matrix, number, omittable, value, whole } from "../define/parameters.js";
import { numbersOf } from "../gather/numbersOf.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { dayOfWeek, outsideCalendar } from "./dates.js";

/** Which days of the week are free, Monday first. */
type Weekend = readonly boolean[];

const saturdayAndSunday: Weekend = [false, false, false, false, false, true, true];

/** 1 to 7 are two days from Saturday on, 11 to 17 one day from Sunday on; a text of seven signs says 1 for a free day. */
function weekendOf(name: string, code: number | string | boolean | null): Weekend | CellError {
  const wrong = () =>
    outside(
      `${name}: weekend`,
      code,
      "no weekend",
      '1 for Saturday and Sunday, or seven signs from Monday on with 1 for free, is needed, for example "0000011"',
      typeof code === "string" ? "#VALUE!" : "#NUM!",
    );
  if (typeof code === "string") {
    return /^[01]{7}$/.test(code) && code !== "1111111" ? [...code].map((sign) => sign === "1") : wrong();
  }
  const which = Number(code ?? 1);
  const days =
    which >= 1 && which <= 7
      ? [(which + 4) % 7, (which + 5) % 7]
      : which >= 11 && which <= 17
        ? [(which - 11 + 6) % 7]
        : undefined;
  return days && Number.isInteger(which) ? saturdayAndSunday.map((_, day) => days.includes(day)) : wrong();
}

function holidaysOf(name: string, range: Matrix | undefined): Set<number> | CellError {
  const found = range ? numbersOf([range], `${name}: holiday`) : new Float64Array();
  return found instanceof CellError ? found : new Set(Array.from(found, Math.floor));
}

type IsFree = (serial: number) => boolean;

function freeDays(name: string, weekend: Weekend | CellError, holidays: Matrix | undefined): IsFree | CellError {
  const free = holidaysOf(name, holidays);
  if (weekend instanceof CellError || free instanceof CellError) {
    return weekend instanceof CellError ? weekend : (free as CellError);
  }
  return (serial) => weekend[(dayOfWeek(serial) + 6) % 7] === true || free.has(serial);
}

function countBetween(name: string, start: number, end: number, isFree: IsFree | CellError): number | CellError {
  if (isFree instanceof CellError) {
    return isFree;
  }
  const [first, last] = [Math.floor(Math.min(start, end)), Math.floor(Math.max(start, end))];
  if (!dateFromSerial(first) || !dateFromSerial(last)) {
    return outsideCalendar(name, "start or end", dateFromSerial(first) ? last : first);
  }
  let count = 0;
  for (let day = first; day <= last; day++) {
    count += isFree(day) ? 0 : 1;
  }
  return start <= end ? count : -count;
}

function step(name: string, start: number, days: number, isFree: IsFree | CellError): number | CellError {
  if (isFree instanceof CellError) {
    return isFree;
  }
  let day = Math.floor(start);
  for (let left = Math.abs(days); left > 0; ) {
    day += Math.sign(days);
    if (!dateFromSerial(day)) {
      return outsideCalendar(name, "result", day);
    }
    left -= isFree(day) ? 0 : 1;
  }
  return dateFromSerial(day) ? day : outsideCalendar(name, "start", start);
}

const holidays = omittable<Matrix | undefined>(matrix("holidays"), undefined);
const weekend: Parameter<number | string | boolean | null> = omittable(value("weekend"), 1);

/** Sections 6.10.14 and 6.10.22, with weekends of other days. */
export const workdays: readonly WorksheetFunction[] = [
  define("NETWORKDAYS", [number("start"), number("end"), holidays] as const, (start, end, free) =>
    countBetween("NETWORKDAYS", start, end, freeDays("NETWORKDAYS", saturdayAndSunday, free)),
  ),
  define("NETWORKDAYS.INTL", [number("start"), number("end"), weekend, holidays] as const, (start, end, code, free) =>
    countBetween(
      "NETWORKDAYS.INTL",
      start,
      end,
      freeDays("NETWORKDAYS.INTL", weekendOf("NETWORKDAYS.INTL", code), free),
    ),
  ),
  define("WORKDAY", [number("start"), whole("days"), holidays] as const, (start, days, free) =>
    step("WORKDAY", start, days, freeDays("WORKDAY", saturdayAndSunday, free)),
  ),
  define("WORKDAY.INTL", [number("start"), whole("days"), weekend, holidays] as const, (start, days, code, free) =>
    step("WORKDAY.INTL", start, days, freeDays("WORKDAY.INTL", weekendOf("WORKDAY.INTL", code), free)),
  ),
];
