import type { Draft } from "../draft.js";

/** The index of the sheet that a reference names, or of the formula's own. */
export function sheetIndexIn(draft: Draft): (name: string | undefined, home: number) => number {
  const { world } = draft.session;
  return (name, home) => (name === undefined ? home : world.sheetIndex(name));
}
