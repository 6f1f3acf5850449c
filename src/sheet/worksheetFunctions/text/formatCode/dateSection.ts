import type { SerialTime } from "../../../values/timeOfSerial.js";
import { timeOfSerial } from "../../../values/timeOfSerial.js";
import type { Token } from "./tokens.js";

const months = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
];
const days = ["Sunday", "Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday"];

export function isDateSection(tokens: readonly Token[]): boolean {
  return tokens.some((token) => token.kind === "date" || token.kind === "half day");
}

/** A serial in one section of a format code; undefined outside the calendar. */
export function formatDate(tokens: readonly Token[], serial: number): string | undefined {
  const decimals = secondDecimals(tokens);
  const time = timeOfSerial(serial, decimals);
  if (!time) {
    return undefined;
  }
  const halfDay = tokens.some((token) => token.kind === "half day");
  let result = "";
  for (let index = 0; index < tokens.length; index++) {
    const token = tokens[index] as Token;
    if (token.kind === "date") {
      result += token.elapsed
        ? elapsedText(token.letters, serial)
        : dateText(token.letters, isMinute(tokens, index), time, serial, halfDay);
    } else if (token.kind === "half day") {
      result += (time.hour < 12 ? "AM" : "PM").slice(0, token.short ? 1 : 2);
    } else if (token.kind === "point" && tokens[index + 1]?.kind === "digit") {
      result += (time.second % 1).toFixed(decimals).slice(1);
      index += decimals;
    } else if (token.kind === "literal") {
      result += token.text;
    } else if (token.kind === "group" || token.kind === "point") {
      result += token.kind === "group" ? "," : ".";
    }
  }
  return result;
}

function secondDecimals(tokens: readonly Token[]): number {
  const point = tokens.findIndex((token) => token.kind === "point");
  let count = 0;
  while (point >= 0 && tokens[point + 1 + count]?.kind === "digit") {
    count += 1;
  }
  return Math.min(count, 9);
}

/** Whether the letter m stands for minutes: after hours, or before seconds. */
function isMinute(tokens: readonly Token[], index: number): boolean {
  const dates = tokens.flatMap((token, at) => (token.kind === "date" ? [{ first: token.letters[0], at }] : []));
  const own = dates.findIndex((each) => each.at === index);
  return dates[own - 1]?.first === "h" || dates[own + 1]?.first === "s";
}

const padded = (value: number, letters: string) => String(value).padStart(Math.min(letters.length, 2), "0");

function dateText(letters: string, minute: boolean, time: SerialTime, serial: number, halfDay: boolean): string {
  switch (letters[0]) {
    case "y":
      return letters.length <= 2 ? String(time.year % 100).padStart(2, "0") : String(time.year).padStart(4, "0");
    case "m":
      return minute ? padded(time.minute, letters) : monthText(letters, time.month);
    case "d":
      return letters.length <= 2 ? padded(time.day, letters) : dayName(letters, serial);
    case "h":
      return padded(halfDay ? ((time.hour + 11) % 12) + 1 : time.hour, letters);
    default:
      return padded(Math.floor(time.second), letters);
  }
}

function monthText(letters: string, month: number): string {
  const name = months[month - 1] as string;
  return letters.length <= 2
    ? padded(month, letters)
    : name.slice(0, letters.length === 3 ? 3 : letters.length === 5 ? 1 : name.length);
}

function dayName(letters: string, serial: number): string {
  const name = days[(Math.floor(serial) + 6) % 7] as string;
  return letters.length === 3 ? name.slice(0, 3) : name;
}

function elapsedText(letters: string, serial: number): string {
  const seconds = Math.round(serial * 86_400);
  const unit = { h: 3600, m: 60 }[letters[0] as string] ?? 1;
  return String(Math.floor(seconds / unit)).padStart(letters.length, "0");
}
