import type { ErrorCode } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { serialFromDate } from "../../../sheet/values/calendar.js";
import { readNumber } from "../../cell/readNumber.js";

/** Errors that cells hold here; all others that worksheet programs know come as #VALUE!. */
const codes: ReadonlySet<string> = new Set<ErrorCode>([
  "#VALUE!",
  "#N/A",
  "#DIV/0!",
  "#REF!",
  "#NAME?",
  "#NUM!",
  "#NULL!",
]);

/**
 * A number of a file: the double it is written as. Digits that a double cannot hold, as those of a long identifier that
 * was stored as a number, are kept as text. Undefined where the text is no number.
 */
export function numberOfText(text: string): number | string | undefined {
  const number = readNumber(text);
  if (number !== undefined) {
    return number;
  }
  const trimmed = text.trim();
  if (trimmed !== text) {
    return numberOfText(trimmed);
  }
  if (/^-?[1-9]\d*$/.test(text) && isHeld(text)) {
    return Number(text);
  }
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(text) ? text : undefined;
}

/** Whether a long integer is a double, digit by digit or in the shortest form that programs write doubles in. */
function isHeld(text: string): boolean {
  const value = Number(text);
  return Number.isFinite(value) && (String(value) === text || BigInt(value) === BigInt(text));
}

/** An error that a file holds; `explain` finds out why, when somebody asks. */
export function errorOfText(text: string, explain: () => string | undefined): CellError {
  const code = codes.has(text) ? (text as ErrorCode) : "#VALUE!";
  return new CellError(
    code,
    `${text.slice(0, 20)} in the file`,
    () => explain() ?? `the file holds ${text.slice(0, 20)} in this cell; calculate it anew, or type what belongs here`,
  );
}

/** The serial of a date or a time in the form of ISO 8601; undefined where the text is none. */
export function serialOfIso(text: string): number | undefined {
  const match = /^(?:(\d{4})-(\d\d)-(\d\d))?T?(?:(\d\d):(\d\d)(?::(\d\d(?:\.\d+)?))?)?Z?$/.exec(text);
  if (match === null || (match[1] === undefined && match[4] === undefined)) {
    return undefined;
  }
  const [year, month, day, hour, minute, second] = match.slice(1).map((part) => Number(part ?? 0));
  const date = match[1] === undefined ? 0 : serialFromDate(year!, month!, day!);
  return date === undefined ? undefined : date + (hour! * 3600 + minute! * 60 + second!) / 86_400;
}

/** Serials of the two date systems differ by four years and a day; only what is shown as a date is one. */
export const daysFrom1900To1904 = 1462;
