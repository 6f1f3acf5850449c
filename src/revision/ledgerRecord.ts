import type { Crossing, Ledger, RevisionSource, WatchedCondition } from "./ledger.js";
import { eachLedgerEntry, type KeptCell, keptCell, type LedgerEntry } from "./ledgerEntry.js";

/** A ledger in plain JSON, whole: to be kept with a book, and to answer which revision last moved a number. */
export interface LedgerRecord {
  readonly kind: "barycell-ledger";
  readonly version: 1;
  readonly source: RevisionSource;
  readonly sheet: string;
  /** What was typed anew: columns of values with their uncertainties. */
  readonly inputs: readonly { readonly input: string; readonly cells: number }[];
  /** Why changes have no parts; null where they have. */
  readonly unshared: string | null;
  readonly conditions: readonly KeptCondition[];
  /** The most important first; what the revision held, and what formulas work out. */
  readonly entries: readonly LedgerEntry[];
}

export interface KeptCondition {
  readonly condition: string;
  readonly header: string;
  /** Rows that met it. */
  readonly before: number;
  readonly after: number;
  readonly gained: readonly KeptCrossing[];
  readonly lost: readonly KeptCrossing[];
}

export interface KeptCrossing {
  readonly key: string;
  readonly before: KeptCell;
  readonly after: KeptCell;
}

/** With all entries, or with those given. */
export function ledgerRecord(ledger: Ledger, entries: readonly LedgerEntry[] = [...allEntries(ledger)]): LedgerRecord {
  return { ...headOf(ledger), entries };
}

/** The text of a ledger's record in pieces, an entry a line, so that a large one is never held whole. */
export function* ledgerText(ledger: Ledger): Generator<string> {
  yield `${JSON.stringify(headOf(ledger)).slice(0, -1)},"entries":[`;
  let separator = "";
  for (const entry of allEntries(ledger)) {
    yield `${separator}\n${JSON.stringify(entry)}`;
    separator = ",";
  }
  yield "]}\n";
}

function headOf(ledger: Ledger): Omit<LedgerRecord, "entries"> {
  return {
    kind: "barycell-ledger",
    version: 1,
    source: ledger.source,
    sheet: ledger.sheet,
    inputs: ledger.inputs.map(({ name, cells }) => ({ input: name, cells })),
    unshared: ledger.unshared ?? null,
    conditions: ledger.conditions.map(keptCondition),
  };
}

function allEntries(ledger: Ledger): Generator<LedgerEntry> {
  return eachLedgerEntry(ledger, Number.POSITIVE_INFINITY, ["revised", "derived"]);
}

function keptCondition({ condition, metBefore, metAfter, gained, lost }: WatchedCondition): KeptCondition {
  const kept = ({ key, before, after }: Crossing): KeptCrossing => {
    return { key, before: keptCell(before), after: keptCell(after) };
  };
  const { text, header } = condition;
  return {
    condition: text,
    header,
    before: metBefore,
    after: metAfter,
    gained: gained.map(kept),
    lost: lost.map(kept),
  };
}

/** Undefined where the text is no ledger, or of a version that is not known here: it is to be left as it is. */
export function readLedgerRecord(text: string): LedgerRecord | undefined {
  try {
    const kept = JSON.parse(text) as Partial<LedgerRecord> | null;
    const isOurs = kept?.kind === "barycell-ledger" && kept.version === 1 && Array.isArray(kept.entries);
    return isOurs ? (kept as LedgerRecord) : undefined;
  } catch {
    return undefined;
  }
}
