import { numberFromText } from "../../values/numberFromText.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { text, value } from "../define/parameters.js";
import { formatWithCode } from "./formatCode/formatWithCode.js";

/** Section 6.20.23. */
export const textFormat = define("TEXT", [value("value"), text("format")] as const, (cell, code) => {
  if (typeof cell === "boolean") {
    return cell ? "TRUE" : "FALSE";
  }
  const read = typeof cell === "string" ? (numberFromText(cell) ?? cell) : (cell ?? 0);
  return (
    formatWithCode(read, code) ??
    outside(
      "TEXT: value",
      cell,
      "outside the calendar",
      "a serial from 0 to 2958465 is needed for a date, for example 45000",
    )
  );
});
