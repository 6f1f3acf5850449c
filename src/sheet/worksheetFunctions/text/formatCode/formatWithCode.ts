import { formatDate, isDateSection } from "./dateSection.js";
import { formatNumber, generalText } from "./numberSection.js";
import type { Token } from "./tokens.js";
import { sectionsOf } from "./tokens.js";

/**
 * A value in the form that a worksheet format code describes: up to four sections for numbers above 0, below 0, zero
 * and for text. Undefined where a date code meets a number outside the calendar. (ISO/IEC 26300-3 section 6.20.23
 * leaves the codes to the evaluator; these are the ones that worksheet files hold.)
 */
export function formatWithCode(value: number | string, code: string): string | undefined {
  const sections = sectionsOf(code);
  if (typeof value === "string") {
    return textWith(sections, value);
  }
  const { tokens, signed } = sectionFor(sections, value);
  if (isDateSection(tokens)) {
    return formatDate(tokens, value);
  }
  if (tokens.some((token) => token.kind === "general")) {
    const size = generalText(Math.abs(value));
    const shown = tokens
      .map((token) => (token.kind === "general" ? size : token.kind === "literal" ? token.text : ""))
      .join("");
    return signed && value < 0 ? `-${shown}` : shown;
  }
  const shown = formatNumber(tokens, Math.abs(value));
  return signed && value < 0 && /[1-9]/.test(shown) ? `-${shown}` : shown;
}

function sectionFor(sections: readonly Token[][], value: number): { tokens: Token[]; signed: boolean } {
  const first = sections[0] as Token[];
  const negative = sections[1];
  const zero = sections[2];
  if (value < 0 && negative) {
    return { tokens: negative, signed: false };
  }
  return { tokens: value === 0 && zero ? zero : first, signed: true };
}

function textWith(sections: readonly Token[][], value: string): string {
  const tokens = sections[3] ?? sections.find((section) => section.some((token) => token.kind === "text"));
  if (!tokens) {
    return value;
  }
  return tokens.map((token) => (token.kind === "text" ? value : token.kind === "literal" ? token.text : "")).join("");
}
