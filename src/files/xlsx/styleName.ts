import { printFormat } from "../../sheet/display/formatText.js";
import type { NumberFormat } from "../../sheet/display/numberFormat.js";
import { codeOf, formatOfCode } from "./formatCode.js";

export const stylePrefix = "Barycell ";

/** The name of the style that stands for a format which no format code can say; undefined where one can. */
export function styleName(format: NumberFormat): string | undefined {
  const text = printFormat(format);
  return printFormat(formatOfCode(codeOf(format))) === text ? undefined : stylePrefix + text;
}
