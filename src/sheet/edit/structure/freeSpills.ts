import type { Spill } from "../../book/book.js";
import { releaseSpills } from "../../calculate/placeSpill.js";
import type { Draft } from "../draft.js";

/** Takes back the spills of a sheet that a restructuring would tear apart, and has their formulas calculated again. */
export function freeSpills(draft: Draft, sheet: number, torn: (spill: Spill, column: number) => boolean): void {
  const { columns } = draft.session.snapshot().sheets[sheet] ?? { columns: [] };
  for (const [column, { spills }] of columns.entries()) {
    for (const spill of spills) {
      if (spill.blocked || torn(spill, column)) {
        releaseSpills(draft.session, { sheet, column }, spill.from, spill.to);
        draft.stale.push({ sheet, column, from: spill.from, to: spill.to });
      }
    }
  }
}
