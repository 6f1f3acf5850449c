import type { Area, Place } from "../../../../../sheet/book/book.js";
import { readReference, resolve } from "../../../../../sheet/formula/reference.js";
import { readTokens } from "./tokens.js";

/** How many colours references take turns in. */
export const referenceColours = 6;

/** A reference in the text of a formula. */
export interface TextReference {
  readonly from: number;
  readonly to: number;
  /** The same for the same cells, however they are written. */
  readonly colour: number;
  /** Undefined where it names a sheet that the book has not. */
  readonly area: Area | undefined;
}

interface Found {
  readonly text: string;
  readonly place: Place;
  readonly sheets: string;
  readonly references: readonly TextReference[];
}

let last: Found | undefined;

/**
 * The references of a formula in one place; `sheets` are the names of the book's sheets in order. Text and grid ask
 * for the same ones, so the last answer is kept.
 */
export function referencesOf(text: string, place: Place, sheets: readonly string[]): readonly TextReference[] {
  const names = sheets.join("\n");
  if (last?.text !== text || last.place !== place || last.sheets !== names) {
    last = { text, place, sheets: names, references: found(text, place, sheets) };
  }
  return last.references;
}

function found(text: string, place: Place, sheets: readonly string[]): TextReference[] {
  const colours = new Map<string, number>();
  const references: TextReference[] = [];
  for (const token of readTokens(text)) {
    if (token.kind !== "reference") continue;
    const area = areaOf(token.text, place, sheets);
    const cells = area ? Object.values(area).join() : token.text.toUpperCase();
    const colour = colours.get(cells) ?? colours.size % referenceColours;
    colours.set(cells, colour);
    references.push({ from: token.from, to: token.to, colour, area });
  }
  return references;
}

function areaOf(text: string, place: Place, sheets: readonly string[]): Area | undefined {
  const reference = readReference(text, place.row, place.column);
  if (!reference) return undefined;
  const wanted = reference.sheet?.toUpperCase();
  const sheet = wanted === undefined ? place.sheet : sheets.findIndex((name) => name.toUpperCase() === wanted);
  if (sheet < 0) return undefined;
  const { top, left, bottom, right } = resolve(reference, place.row, place.column);
  return { sheet, top, left, bottom, right };
}
