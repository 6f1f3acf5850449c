import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { decimalOf, fixedText, roundedDecimal } from "../../values/decimal.js";
import { numberFromText } from "../../values/numberFromText.js";
import { quoteCell } from "../../values/quoteCell.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { logical, number, omittable, optional, rest, text, value, whole } from "../define/parameters.js";
import { wildcardExpression } from "../gather/wildcard.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { charactersBefore, lengthOf, middleOf, offsetOf } from "./characters.js";

const longestText = 32_767;

const countNeeded = "a whole number of 0 or more is needed, for example 3";
const negative = (name: string, input: string, count: number) =>
  count < 0 ? outside(`${name}: ${input}`, count, "below 0", countNeeded, "#VALUE!") : undefined;
const belowOne = (name: string, input: string, start: number) =>
  start < 1
    ? outside(`${name}: ${input}`, start, "below 1", "a place of 1 or more is needed, for example 1", "#VALUE!")
    : undefined;

const ofText = (name: string, compute: (text: string) => Cell) => define(name, [text("text")] as const, compute);

export function fitting(name: string, result: string): string | CellError {
  return result.length <= longestText ? result : tooLong(name, result.length);
}

function tooLong(name: string, length: number): CellError {
  return new CellError(
    "#VALUE!",
    `${name}: the text is too long`,
    `${name}: the text would have ${length > 1e9 ? "over 1E+9" : length} characters; a cell holds ${longestText}, so shorter texts are needed`,
  );
}

/** The place of a text in another, from a character on; the search expression or text finds the offset. */
function find(
  name: string,
  wanted: string,
  within: string,
  start: number,
  search: (from: number) => number,
): number | CellError {
  const from = belowOne(name, "start", start);
  if (from) {
    return from;
  }
  const offset = start - 1 > lengthOf(within) ? -1 : search(offsetOf(within, start - 1));
  return offset >= 0
    ? charactersBefore(within, offset) + 1
    : new CellError(
        "#VALUE!",
        `${name}: text not found`,
        () =>
          `${name}: ${quoteCell(wanted)} is not in ${quoteCell(within)} from place ${start} on; a text that is there is needed`,
      );
}

const searchParameters = [text("text"), text("within"), optional(whole("start"), 1)] as const;

const search = define("SEARCH", searchParameters, (wanted, within, start) =>
  find("SEARCH", wanted, within, start, (from) => {
    const found = within.slice(from).search(wildcardExpression(wanted, "anywhere"));
    return found < 0 ? -1 : found + from;
  }),
);

const exactFind = define("FIND", searchParameters, (wanted, within, start) =>
  find("FIND", wanted, within, start, (from) => within.indexOf(wanted, from)),
);

const substitute = define(
  "SUBSTITUTE",
  [text("text"), text("old"), text("new"), optional(whole("occurrence"), 0)] as const,
  (within, old, replacement, occurrence) => {
    if (old === "") {
      return within;
    }
    const pieces = within.split(old);
    if (occurrence < 0) {
      return belowOne("SUBSTITUTE", "occurrence", occurrence) as CellError;
    }
    if (occurrence === 0) {
      return fitting("SUBSTITUTE", pieces.join(replacement));
    }
    return pieces.length <= occurrence
      ? within
      : fitting("SUBSTITUTE", pieces.slice(0, occurrence).join(old) + replacement + pieces.slice(occurrence).join(old));
  },
);

const replace = define(
  "REPLACE",
  [text("text"), whole("start"), whole("count"), text("new")] as const,
  (within, start, count, replacement) =>
    belowOne("REPLACE", "start", start) ??
    negative("REPLACE", "count", count) ??
    fitting(
      "REPLACE",
      middleOf(within, 0, start - 1) + replacement + middleOf(within, start - 1 + count, lengthOf(within)),
    ),
);

/** Letters after anything that is no letter become capital, the others small. */
const proper = (within: string) =>
  within
    .toLowerCase()
    .replace(/(^|[^\p{L}\p{M}])(\p{L})/gu, (_, before: string, letter: string) => before + letter.toUpperCase());

const trim = (within: string) => within.replace(/ +/g, " ").replace(/^ | $/g, "");

// biome-ignore lint/suspicious/noControlCharactersInRegex: CLEAN is the function that takes control characters out
const clean = (within: string) => within.replace(/[\u0000-\u001f\u007f-\u009f]/g, "");

const character = (name: string, most: number) =>
  define(name, [whole("number")] as const, (code) => {
    const isCharacter = code >= 1 && code <= most && !(code >= 0xd800 && code <= 0xdfff);
    return isCharacter
      ? String.fromCodePoint(code)
      : outside(
          `${name}: number`,
          code,
          `no character number from 1 to ${most}`,
          "such a number is needed, for example 65",
          "#VALUE!",
        );
  });

const codeOf = (name: string) =>
  ofText(name, (within) =>
    within === ""
      ? outside(`${name}: text`, within, "empty", 'at least one character is needed, for example "A"', "#VALUE!")
      : (within.codePointAt(0) as number),
  );

const readNumber = (name: string) =>
  define(name, [value("text")] as const, (cell) => {
    if (typeof cell === "number") {
      return cell;
    }
    const found = typeof cell === "string" ? numberFromText(cell) : cell === null ? 0 : undefined;
    return (
      found ??
      outside(`${name}: text`, cell, "no number", 'a number written as text is needed, for example "4.2"', "#VALUE!")
    );
  });

const numberValue = define(
  "NUMBERVALUE",
  [text("text"), omittable(text("decimal sign"), "."), omittable(text("group sign"), ",")] as const,
  (within, decimalSign, groupSign) => {
    const point = decimalSign.charAt(0) || ".";
    const parts = within.replace(/\s/g, "").split(point);
    const [integer = "", fraction] = parts;
    const percents = /%*$/.exec(within.trimEnd())?.[0].length ?? 0;
    const digits = integer.replaceAll(groupSign.charAt(0) || ",", "") + (fraction === undefined ? "" : `.${fraction}`);
    const bare = percents > 0 ? digits.slice(0, -percents) : digits;
    const isNumber = parts.length <= 2 && (bare === "" || /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(bare));
    return isNumber
      ? Number(bare) / 100 ** percents
      : outside(
          "NUMBERVALUE: text",
          within,
          "no number with these signs",
          'a number is needed, for example "1,234.5"',
          "#VALUE!",
        );
  },
);

const fixed = define(
  "FIXED",
  [number("number"), optional(whole("decimals"), 2), optional(logical("no groups"), false)] as const,
  (x, decimals, noGroups) => {
    const places = Math.max(Math.min(decimals, 127), -310);
    const rounded = roundedDecimal(decimalOf(x), places);
    const plain = fixedText(rounded, Math.max(places, 0));
    const [integer = "", fraction] = plain.split(".");
    const grouped = noGroups ? integer : integer.replace(/\B(?=(\d{3})+$)/g, ",");
    return `${rounded.negative && rounded.digits !== "" ? "-" : ""}${grouped}${fraction === undefined ? "" : `.${fraction}`}`;
  },
);

/** Section 6.20, with VALUE (6.13.34) and NUMBERVALUE (6.13.28). */
export const texts: readonly WorksheetFunction[] = [
  define("CONCATENATE", [rest(text("text"))] as const, (pieces) => fitting("CONCATENATE", pieces.join(""))),
  define("EXACT", [text("text"), text("other text")] as const, (a, b) => a === b),
  exactFind,
  search,
  substitute,
  replace,
  fixed,
  define(
    "LEFT",
    [text("text"), optional(whole("count"), 1)] as const,
    (within, count) => negative("LEFT", "count", count) ?? middleOf(within, 0, count),
  ),
  define(
    "RIGHT",
    [text("text"), optional(whole("count"), 1)] as const,
    (within, count) =>
      negative("RIGHT", "count", count) ?? middleOf(within, Math.max(lengthOf(within) - count, 0), count),
  ),
  define(
    "MID",
    [text("text"), whole("start"), whole("count")] as const,
    (within, start, count) =>
      belowOne("MID", "start", start) ?? negative("MID", "count", count) ?? middleOf(within, start - 1, count),
  ),
  define("REPT", [text("text"), whole("count")] as const, (within, count) => {
    const problem = negative("REPT", "count", count);
    if (problem) {
      return problem;
    }
    return within.length * count <= longestText ? within.repeat(count) : tooLong("REPT", within.length * count);
  }),
  ofText("LEN", lengthOf),
  ofText("LOWER", (within) => within.toLowerCase()),
  ofText("UPPER", (within) => within.toUpperCase()),
  ofText("PROPER", proper),
  ofText("TRIM", trim),
  ofText("CLEAN", clean),
  character("CHAR", 255),
  character("UNICHAR", 0x10ffff),
  codeOf("CODE"),
  codeOf("UNICODE"),
  readNumber("VALUE"),
  numberValue,
  define("T", [value("value")] as const, (cell) => (typeof cell === "string" ? cell : "")),
];
