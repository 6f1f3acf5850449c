import type { FormatSpan } from "../../../sheet/display/workbook.js";
import { mostRows } from "../../../sheet/limits.js";
import type { CellStyle } from "./readStyles.js";

/** How the cells of a column show numbers, from top to bottom. */
export interface FormatsBuilder {
  put(row: number, style: CellStyle): void;
  /** `usual` is the style of the cells that the file does not list. */
  finish(usual: CellStyle): readonly FormatSpan[];
}

interface StyleSpan {
  readonly from: number;
  to: number;
  readonly style: CellStyle;
}

export function formatsBuilder(): FormatsBuilder {
  const spans: StyleSpan[] = [];
  return {
    put(row, style) {
      const last = spans.at(-1);
      if (last !== undefined && last.to === row && last.style === style) {
        last.to++;
      } else {
        spans.push({ from: row, to: row + 1, style });
      }
    },
    finish(usual) {
      return formatSpans(spans, usual);
    },
  };
}

/** The spans with the usual style in the gaps, without those in general form. */
function formatSpans(spans: readonly StyleSpan[], usual: CellStyle): FormatSpan[] {
  const found: FormatSpan[] = [];
  const add = (from: number, to: number, { format, code }: CellStyle): void => {
    const last = found.at(-1);
    if (from >= to || (format.kind === "general" && code === undefined)) {
      return;
    }
    if (last !== undefined && last.to === from && last.format === format && last.code === code) {
      found[found.length - 1] = { ...last, to };
    } else {
      found.push({ from, to, format, code });
    }
  };
  let row = 0;
  for (const { from, to, style } of spans) {
    add(row, from, usual);
    add(from, to, style);
    row = to;
  }
  add(row, mostRows, usual);
  return found;
}
