import type { Cell } from "../call/cell.js";
import { changeCells, changeHeaders } from "../table/changeCells.js";
import type { Ledger, RevisionSource } from "./ledger.js";
import { cellOfKept, type LedgerEntry, ledgerEntries } from "./ledgerEntry.js";

/** A ledger as the cells of a sheet, numbers in full: headers, then the most important changes first. */
export function ledgerCells(ledger: Ledger, most = Number.POSITIVE_INFINITY): readonly (readonly Cell[])[] {
  const names = ledger.inputs.map(({ name }) => name);
  return entryCells(names, ledger.source, ledgerEntries(ledger, most));
}

/** The same of entries that were kept; `names` are those of the inputs. */
export function entryCells(
  names: readonly string[],
  { date, file, sha256 }: RevisionSource,
  entries: readonly LedgerEntry[],
): readonly (readonly Cell[])[] {
  const head = [
    ...changeHeaders,
    "Moved most by",
    ...names.map((name) => `By ${name}`),
    "Remainder",
    "Revision",
    "Date",
    "SHA-256",
  ];
  const rows = entries.map((entry): Cell[] => [
    ...changeCells({
      key: entry.key,
      header: entry.header,
      before: cellOfKept(entry.before),
      after: cellOfKept(entry.after),
      change: entry.change ?? undefined,
      relative: entry.relative ?? undefined,
      sigmas: entry.sigmas ?? undefined,
    }),
    entry.movedBy,
    ...names.map((name) => entry.parts.find(({ input }) => input === name)?.part ?? null),
    entry.remainder,
    file,
    date,
    sha256,
  ]);
  return [head, ...rows];
}
