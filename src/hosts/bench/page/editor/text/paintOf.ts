import type { TextReference } from "./references.js";
import { referenceColours } from "./references.js";
import type { TokenKind } from "./tokens.js";
import { readTokens } from "./tokens.js";

/** A stretch of a formula and the class it is painted with. */
export interface Painted {
  readonly from: number;
  readonly to: number;
  readonly paint: string;
}

const ofKinds: Partial<Record<TokenKind, string>> = {
  function: "editor-function",
  text: "editor-text",
  unknown: "editor-unknown",
};

const ofReference = (colour: number) => `editor-reference editor-reference-${colour}`;

export const paints: readonly string[] = [
  ...Object.values(ofKinds),
  ...Array.from({ length: referenceColours }, (_, colour) => ofReference(colour)),
];

export function paintOf(text: string, references: readonly TextReference[]): Painted[] {
  const colours = new Map(references.map(({ from, colour }) => [from, colour]));
  return readTokens(text).flatMap(({ kind, from, to }) => {
    const colour = colours.get(from);
    const paint = colour === undefined ? ofKinds[kind] : ofReference(colour);
    return paint === undefined ? [] : [{ from, to, paint }];
  });
}
