import { daysInMonth, serialFromDate } from "./calendar.js";

const dateForm = /^(\d{4})-(\d{1,2})-(\d{1,2})(?:[T ]+(\d.*))?$/;
const timeForm = /^(\d{1,5}):(\d{1,2})(?::(\d{1,2}(?:\.\d+)?))?(?:\s*([AP])M)?$/i;

/** A time of day or a number of hours, minutes and seconds, as a fraction of a day [d]. */
export function dayFractionFromText(text: string): number | undefined {
  const parts = timeForm.exec(text.trim());
  if (!parts) {
    return undefined;
  }
  const [, hourText, minuteText, secondText = "0", half] = parts;
  let hour = Number(hourText);
  const minute = Number(minuteText);
  const second = Number(secondText);
  if (minute > 59 || second >= 60 || (half !== undefined && (hour < 1 || hour > 12))) {
    return undefined;
  }
  if (half !== undefined) {
    hour = (hour % 12) + (half.toUpperCase() === "P" ? 12 : 0);
  }
  return (hour * 3600 + minute * 60 + second) / 86_400;
}

/**
 * The serial of a date, a time or both, written as ISO 8601 has them (2024-05-01, 12:30, 2024-05-01T12:30:15.5).
 * Forms that differ between countries are not read: 5/1/2024 is a day in May or in January.
 */
export function serialFromText(text: string): number | undefined {
  const trimmed = text.trim();
  const parts = dateForm.exec(trimmed);
  if (!parts) {
    return dayFractionFromText(trimmed);
  }
  const [year, month, day] = [Number(parts[1]), Number(parts[2]), Number(parts[3])];
  if (month < 1 || month > 12 || day < 1 || day > daysInMonth(year, month)) {
    return undefined;
  }
  const serial = serialFromDate(year, month, day);
  const fraction = parts[4] === undefined ? 0 : dayFractionFromText(parts[4]);
  return serial === undefined || fraction === undefined || fraction >= 1 ? undefined : serial + fraction;
}
