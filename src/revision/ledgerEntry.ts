import { type Cell, CellError, type ErrorCode } from "../call/cell.js";
import { addressText } from "../sheet/book/address.js";
import type { Ledger, LedgerColumn, RevisionSource } from "./ledger.js";
import { type RankedChange, rankedChanges } from "./rankedChanges.js";
import { type SharedChange, sharedChanges } from "./sharedChanges.js";

/** A cell in plain JSON; null is a blank. */
export type KeptCell = number | string | boolean | null | { readonly error: ErrorCode; readonly message: string };

/** One number that moved, in plain JSON: it says alone which revision moved it. */
export interface LedgerEntry {
  readonly source: RevisionSource;
  readonly sheet: string;
  /** What names the row. */
  readonly key: string;
  /** The header of its column, with the unit. */
  readonly header: string;
  /** Where it stood afterwards, "H2"; null where it is gone. */
  readonly cell: string | null;
  /** Whether the revision held it, or formulas work it out. */
  readonly role: LedgerColumn["role"];
  readonly before: KeptCell;
  /** In the unit that the column had before. */
  readonly after: KeptCell;
  /** Null where either is no number. */
  readonly change: number | null;
  /** Change over the value before. */
  readonly relative: number | null;
  /** Change in units of its own uncertainty before, or else after. */
  readonly sigmas: number | null;
  /** The input that moved it most. */
  readonly movedBy: string | null;
  /** The headers from that input to this column. */
  readonly way: readonly string[];
  /** What each input did to it; these and the remainder add up to the change. */
  readonly parts: readonly { readonly input: string; readonly part: number }[];
  readonly remainder: number | null;
}

/** The most important entries of a ledger, the first first. */
export function ledgerEntries(
  ledger: Ledger,
  most = Number.POSITIVE_INFINITY,
  roles: readonly LedgerColumn["role"][] = ["derived"],
): readonly LedgerEntry[] {
  return [...eachLedgerEntry(ledger, most, roles)];
}

/** The same one by one, for ledgers that are better not held whole. */
export function* eachLedgerEntry(
  ledger: Ledger,
  most: number,
  roles: readonly LedgerColumn["role"][],
): Generator<LedgerEntry> {
  const changes = rankedChanges(ledger, most, roles);
  const shareOf = sharedChanges(
    ledger,
    changes.filter(({ column }) => column.role === "derived"),
  );
  let derived = 0;
  for (const change of changes) {
    yield entryOf(ledger, change, change.column.role === "derived" ? shareOf(derived++) : undefined);
  }
}

function entryOf(ledger: Ledger, change: RankedChange, share: SharedChange | undefined): LedgerEntry {
  const { column, at, before, after } = change;
  const { pair, role, header } = column;
  const row = ledger.rows ? ledger.rows[at]!.to : at;
  const input = share?.movedBy && ledger.inputs.indexOf(share.movedBy);
  return {
    source: ledger.source,
    sheet: ledger.sheet,
    key: ledger.nameOfRow(at),
    header,
    cell: row === undefined ? null : addressText(ledger.after.firstRow + row, pair.to.column),
    role,
    before: keptCell(before),
    after: keptCell(after),
    change: change.change ?? null,
    relative: change.relative ?? null,
    sigmas: change.sigmas ?? null,
    movedBy: role === "revised" ? header : (share?.movedBy?.name ?? null),
    way: input === undefined ? [] : (column.ways[input] ?? []),
    parts: (share?.parts ?? []).flatMap((part, index) =>
      part === undefined ? [] : [{ input: ledger.inputs[index]!.name, part }],
    ),
    remainder: share?.remainder ?? null,
  };
}

export function keptCell(cell: Cell): KeptCell {
  return cell instanceof CellError ? { error: cell.code, message: cell.message } : cell;
}

/** A kept cell as a cell of a sheet. */
export function cellOfKept(cell: KeptCell): Cell {
  return typeof cell === "object" && cell !== null ? new CellError(cell.error, "in a ledger", cell.message) : cell;
}
