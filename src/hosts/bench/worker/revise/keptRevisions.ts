import type { KeptRevisions } from "../../../../files/bookFile/bookDocument.js";
import type { BookLedger, Session } from "../session.js";
import { soundLedger } from "./soundLedger.js";

/** Older ledgers are let go. */
export const mostLedgers = 20;

/** What is kept with the book of its revisions; undefined where there is nothing. Those undone have no ledger. */
export function keptRevisions(session: Session): KeptRevisions | undefined {
  const { aliases, conditions, ledgers: earlier } = session.revisions;
  const ledgers = [...appliedLedgers(session), ...earlier].slice(0, mostLedgers);
  return ledgers.length === 0 && aliases === "" && conditions === "" ? undefined : { aliases, conditions, ledgers };
}

/** The same that can be read, the latest first. */
export function ledgersOf(session: Session): readonly BookLedger[] {
  return (keptRevisions(session)?.ledgers ?? []).flatMap((kept) => soundLedger(kept) ?? []);
}

function appliedLedgers({ history: { versions, present } }: Session): BookLedger[] {
  const done = versions.slice(0, present + 1);
  return done.flatMap(({ ledger }) => ledger ?? []).reverse();
}

/** The version that a ledger of this visit made. */
export function versionOfLedger({ history }: Session, ledger: BookLedger): number | undefined {
  const at = history.versions.findIndex((version) => version.ledger === ledger);
  return at > 0 ? at : undefined;
}

/** No two revisions of one book are taken over in the same millisecond. */
export function ledgerId({ source }: BookLedger): string {
  return `${source.date} ${source.sha256.slice(0, 8)}`;
}
