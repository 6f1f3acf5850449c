import { byImportance, changeOf } from "../table/changeOf.js";
import { eachChange } from "./eachChange.js";
import type { Ledger, LedgerChange, LedgerColumn } from "./ledger.js";

export interface RankedChange extends LedgerChange {
  readonly column: LedgerColumn;
}

/** The most important changes of a ledger, the first first; `roles`: of which columns. */
export function rankedChanges(
  ledger: Ledger,
  most: number,
  roles: readonly LedgerColumn["role"][] = ["derived"],
): readonly RankedChange[] {
  let kept: RankedChange[] = [];
  let least: RankedChange | undefined;
  for (const column of ledger.columns) {
    if (!roles.includes(column.role) || column.changed === 0) continue;
    eachChange(ledger, column.pair, (at, before, after, sigma) => {
      const change = changeOf(before, after, sigma);
      if (least && byImportance(change, least) >= 0) return;
      kept.push({ column, at, before, after, ...change });
      if (kept.length < 2 * most + 1000) return;
      kept = kept.sort(byImportance).slice(0, most);
      least = kept.at(-1);
    });
  }
  return kept.sort(byImportance).slice(0, most);
}
