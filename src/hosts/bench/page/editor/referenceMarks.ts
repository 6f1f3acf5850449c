import type { Place } from "../../../../sheet/book/book.js";
import type { Grid, ReferenceMark } from "../grid/grid.js";
import type { Page } from "../page.js";
import type { TextReference } from "./text/references.js";
import { referencesOf } from "./text/references.js";
import { sheetNames } from "./typing.js";

/** The references of the formula being typed, outlined in the grid where they lie on the sheet in view. */
export interface ReferenceMarks {
  show(text: string, caret: number, place: Place): readonly TextReference[];
  clear(): void;
}

/** More outlines than this tell nobody anything, and cost time at every key; those next to the caret are drawn. */
const mostOutlines = 60;

export function createReferenceMarks(page: Page, grid: Grid): ReferenceMarks {
  let outlined = "";

  function outline(marks: readonly ReferenceMark[]): void {
    const key = JSON.stringify(marks);
    if (key === outlined) return;
    outlined = key;
    grid.showReferences(marks);
  }

  return {
    show(text, caret, place) {
      const references = referencesOf(text, place, sheetNames(page));
      const marks = new Map<string, ReferenceMark>();
      for (const { area, colour } of nearest(references, caret)) {
        if (area?.sheet === page.sheet()) marks.set(Object.values(area).join(), { area, colour });
      }
      outline([...marks.values()]);
      return references;
    },
    clear: () => outline([]),
  };
}

function nearest(references: readonly TextReference[], caret: number): readonly TextReference[] {
  const next = references.filter(({ to }) => to < caret).length;
  const first = Math.max(0, Math.min(next - mostOutlines / 2, references.length - mostOutlines));
  return references.slice(first, first + mostOutlines);
}
