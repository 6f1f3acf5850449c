import type { Ledger } from "../../../../revision/ledger.js";
import { ledgerEntries } from "../../../../revision/ledgerEntry.js";
import { type KeptCondition, ledgerRecord } from "../../../../revision/ledgerRecord.js";
import type { BookLedger } from "../session.js";

/** A ledger that is kept has so many entries at most, and so many crossings of each condition. */
export const mostEntries = 2000;

/** A ledger to be kept: whole where it is short, else what formulas work out before what the revision held. */
export function boundedLedger(ledger: Ledger, key: string): BookLedger {
  const changes = ledger.columns.reduce((sum, { changed }) => sum + changed, 0);
  const record = changes <= mostEntries ? ledgerRecord(ledger) : ledgerRecord(ledger, mostImportant(ledger));
  return { ...record, changes, key, conditions: record.conditions.map(shortened) };
}

function mostImportant(ledger: Ledger) {
  const derived = ledgerEntries(ledger, mostEntries, ["derived"]);
  return [...derived, ...ledgerEntries(ledger, mostEntries - derived.length, ["revised"])];
}

function shortened(condition: KeptCondition): KeptCondition {
  const { gained, lost } = condition;
  return { ...condition, gained: gained.slice(0, mostEntries), lost: lost.slice(0, mostEntries) };
}
