/**
 * The 1900 date system: serial 1 is 1 January 1900 and, by convention, serial 60 is 29 February 1900, a day that
 * never was. From serial 61 (1 March 1900) on, serials count real days. The last is 31 December 9999.
 */
const firstRealSerial = 61;
export const lastSerial = 2_958_465;
const millisecondsOfDay = 86_400_000;
/** Serial of 1 January 1970 [d]. */
const serialOfUnixEpoch = 25_569;

export interface CalendarDate {
  readonly year: number;
  /** 1 to 12. */
  readonly month: number;
  readonly day: number;
}

/** Days since 1970-01-01 of a Gregorian date [d]; months and days beyond their range carry over. */
function unixDay(year: number, month: number, day: number): number {
  const instant = new Date(0);
  instant.setUTCFullYear(year, month - 1, day);
  return Math.round(instant.getTime() / millisecondsOfDay);
}

/**
 * The serial of a date; months and days beyond their range carry over, as in month 14 or day 0.
 * Undefined outside 1900 to 9999.
 */
export function serialFromDate(year: number, month: number, day: number): number | undefined {
  const whole = year * 12 + month - 1;
  const startYear = Math.floor(whole / 12);
  const startMonth = whole - startYear * 12 + 1;
  const start = unixDay(startYear, startMonth, 1) + serialOfUnixEpoch;
  // The first day of January and February 1900 is one serial lower than counted days would have it.
  const serial = start < firstRealSerial ? start - 1 + day - 1 : start + day - 1;
  // Counting back from March 1900 over the extra day needs no correction: serial 60 is a day of this calendar.
  return serial >= 0 && serial <= lastSerial ? serial : undefined;
}

/** The date of a serial, whose fraction is ignored; undefined outside 0 to 2958465. Serial 0 is "0 January 1900". */
export function dateFromSerial(serial: number): CalendarDate | undefined {
  const day = Math.floor(serial);
  if (!(day >= 0 && day <= lastSerial)) {
    return undefined;
  }
  if (day < firstRealSerial) {
    return day <= 31 ? { year: 1900, month: 1, day } : { year: 1900, month: 2, day: day - 31 };
  }
  const instant = new Date((day - serialOfUnixEpoch) * millisecondsOfDay);
  return { year: instant.getUTCFullYear(), month: instant.getUTCMonth() + 1, day: instant.getUTCDate() };
}

export function isLeapYear(year: number): boolean {
  return year === 1900 || (year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0));
}

/** Days of a month in the 1900 date system, where February 1900 has 29 [d]. */
export function daysInMonth(year: number, month: number): number {
  if (month === 2) {
    return isLeapYear(year) ? 29 : 28;
  }
  return [4, 6, 9, 11].includes(month) ? 30 : 31;
}
