import type { NumberFormat } from "../../sheet/display/numberFormat.js";
import { general } from "../../sheet/display/numberFormat.js";

/** The codes that files name by number (ECMA-376 part 1, section 18.8.30). */
const builtIn: ReadonlyMap<number, string> = new Map([
  [0, "General"],
  [1, "0"],
  [2, "0.00"],
  [3, "#,##0"],
  [4, "#,##0.00"],
  [9, "0%"],
  [10, "0.00%"],
  [11, "0.00E+00"],
  [12, "# ?/?"],
  [13, "# ??/??"],
  [14, "mm-dd-yy"],
  [15, "d-mmm-yy"],
  [16, "d-mmm"],
  [17, "mmm-yy"],
  [18, "h:mm AM/PM"],
  [19, "h:mm:ss AM/PM"],
  [20, "h:mm"],
  [21, "h:mm:ss"],
  [22, "m/d/yy h:mm"],
  [37, "#,##0 ;(#,##0)"],
  [38, "#,##0 ;[Red](#,##0)"],
  [39, "#,##0.00;(#,##0.00)"],
  [40, "#,##0.00;[Red](#,##0.00)"],
  [45, "mm:ss"],
  [46, "[h]:mm:ss"],
  [47, "mmss.0"],
  [48, "##0.0E+0"],
  [49, "@"],
]);

export const firstOwnCode = 164;

export function builtInCode(id: number): string {
  // 27 to 36 and 50 to 58 are dates and times whose code depends on the language; the date is what is common to them.
  const isForeignDate = (id >= 27 && id <= 36) || (id >= 50 && id <= 58);
  return builtIn.get(id) ?? (isForeignDate ? "yyyy-mm-dd" : "General");
}

export function builtInId(code: string): number | undefined {
  for (const [id, known] of builtIn) {
    if (known === code) {
      return id;
    }
  }
  return undefined;
}

/** Codes hold no more decimals of a second (common practice, no source). */
const mostSecondDecimals = 3;

/** The code that shows a number as the format does, or as near to it as a code can. */
export function codeOf(format: NumberFormat): string {
  switch (format.kind) {
    case "fixed":
      return (format.grouped ? "#,##0" : "0") + decimals(format.decimals);
    case "percent":
      return `0${decimals(format.decimals)}%`;
    case "scientific":
      return `0${decimals(format.digits - 1)}E+00`;
    case "date":
      return "yyyy-mm-dd";
    case "time":
      return `hh:mm:ss${decimals(Math.min(format.decimals, mostSecondDecimals))}`;
    case "date-time":
      return `yyyy-mm-dd hh:mm:ss${decimals(Math.min(format.decimals, mostSecondDecimals))}`;
    default:
      return "General";
  }
}

function decimals(count: number): string {
  return count === 0 ? "" : `.${"0".repeat(count)}`;
}

/** The format that comes nearest to a code: of its first section, without colours, conditions and literal texts. */
export function formatOfCode(code: string): NumberFormat {
  const plain = code
    .replace(/"[^"]*"|\\.|_.|\*./gs, "")
    .split(";")[0]
    ?.replace(/\[(?!h+\]|m+\]|s+\])[^\]]*\]/gi, "")
    .trim();
  if (
    plain === undefined ||
    plain === "" ||
    /^general$/i.test(plain) ||
    /[@?/]/.test(plain.replace(/[dmy]+\/|AM\/PM|A\/P/gi, ""))
  ) {
    return general;
  }
  const places = /\.(0+)/.exec(plain)?.[1]?.length ?? 0;
  if (/[ymdhs]/i.test(plain)) {
    return timeFormat(plain, places);
  }
  if (/E[+-]/i.test(plain)) {
    return { kind: "scientific", digits: Math.min(places + 1, 17) };
  }
  if (!/^[#0,.% ()-]+$/.test(plain) || !plain.includes("0")) {
    return general;
  }
  return plain.includes("%")
    ? { kind: "percent", decimals: Math.min(places, 30) }
    : { kind: "fixed", decimals: Math.min(places, 30), grouped: /[#0],[#0]/.test(plain) };
}

function timeFormat(code: string, places: number): NumberFormat {
  const isElapsed = /\[[hms]+\]/i.test(code);
  const letters = code.replace(/AM\/PM|A\/P/gi, "");
  const isTime = /[hs]/i.test(letters);
  const isDate = /[yd]/i.test(letters) || (/m/i.test(letters) && !isTime);
  return isElapsed
    ? general
    : isDate && isTime
      ? { kind: "date-time", decimals: Math.min(places, 9) }
      : isTime
        ? { kind: "time", decimals: Math.min(places, 9) }
        : { kind: "date" };
}
