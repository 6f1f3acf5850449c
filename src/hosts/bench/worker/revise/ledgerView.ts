import { CellError } from "../../../../call/cell.js";
import { cellOfKept, type KeptCell, type LedgerEntry } from "../../../../revision/ledgerEntry.js";
import type { KeptCondition, KeptCrossing } from "../../../../revision/ledgerRecord.js";
import type { Book } from "../../../../sheet/book/book.js";
import { displayCell } from "../../../../sheet/display/displayCell.js";
import { displayNumber } from "../../../../sheet/display/displayNumber.js";
import { withUnitText } from "../../../../sheet/display/measuredText.js";
import { readHeader } from "../../../../units/readHeader.js";
import type { LedgerCondition, LedgerCrossing, LedgerLine, LedgerSummary, LedgerView } from "../../protocol/revise.js";
import { type BookLedger, bookOfSession, type Session } from "../session.js";
import { ledgerId, versionOfLedger } from "./keptRevisions.js";
import { type FindPlace, placesOf } from "./placesOf.js";

export function ledgerSummary(session: Session, ledger: BookLedger): LedgerSummary {
  const { source, sheet, changes, entries, inputs, unshared } = ledger;
  return {
    id: ledgerId(ledger),
    ...source,
    sheet,
    changes,
    entries: entries.length,
    inputs,
    unshared: unshared ?? undefined,
    isWhole: versionOfLedger(session, ledger) !== undefined,
  };
}

/** A ledger as the panel tells it, its cells where they stand in the book as it is. */
export function ledgerView(session: Session, ledger: BookLedger, most: number): LedgerView {
  const book: Book = bookOfSession(session);
  const derived = ledger.entries.filter(({ role }) => role === "derived");
  const find = placesOf(book, ledger.sheet);
  return {
    ...ledgerSummary(session, ledger),
    moved: derived.slice(0, most).map((entry) => ledgerLine(entry, find)),
    derived: derived.length,
    axes: axesOf(ledger),
    conditions: ledger.conditions.map((condition) => ledgerCondition(ledger, condition, find, most)),
  };
}

function axesOf({ entries }: BookLedger): LedgerView["axes"] {
  const first = (role: LedgerEntry["role"]) => entries.find((entry) => entry.role === role)?.header ?? "";
  const [x, y] = [first("revised"), first("derived")];
  return { x, y: y === "" ? x : y };
}

function ledgerLine(entry: LedgerEntry, find: FindPlace): LedgerLine {
  const { key, header, before, after, change, sigmas, relative, movedBy, parts, remainder } = entry;
  const { name, unit } = readHeader(header);
  const digits = digitsFor(relative);
  const told = parts.filter(({ part }) => part !== 0).sort((a, b) => Math.abs(b.part) - Math.abs(a.part));
  const isSeen = remainder !== null && change !== null && Math.abs(remainder) > 5e-4 * Math.abs(change);
  const shares = told.length > 1 ? told.map(({ input, part }) => `${nameOf(input)} ${signed(part)}`) : [];
  return {
    place: find(entry),
    key,
    header: name || header,
    before: cellText(before, digits, unit?.text),
    after: cellText(after, digits, unit?.text),
    change: change === null ? kindOf(before, after) : signed(change),
    sigmas: sigmas ?? undefined,
    relative: relative ?? undefined,
    movedBy: movedBy === null ? undefined : nameOf(movedBy),
    parts: isSeen ? [...shares, `remainder ${signed(remainder)}`] : shares,
  };
}

function ledgerCondition(
  ledger: BookLedger,
  { condition, header, before, after, gained, lost }: KeptCondition,
  find: FindPlace,
  most: number,
): LedgerCondition {
  const unit = readHeader(header).unit?.text;
  const own = new Map(ledger.entries.filter((entry) => entry.header === header).map((entry) => [entry.key, entry]));
  const crossing = ({ key, ...cells }: KeptCrossing): LedgerCrossing => {
    const entry = own.get(key);
    const digits = digitsFor(entry?.relative ?? null);
    return {
      place: entry && find(entry),
      key,
      before: cellText(cells.before, digits, unit),
      after: cellText(cells.after, digits, unit),
    };
  };
  const told = (crossings: readonly KeptCrossing[]) => crossings.slice(0, most).map(crossing);
  return { condition, before, after, gained: told(gained), lost: told(lost) };
}

function nameOf(header: string): string {
  return readHeader(header).name || header;
}

/** Digits enough to tell two numbers apart. */
function digitsFor(relative: number | null): number {
  if (relative === null || relative === 0) return 6;
  return Math.min(17, Math.max(5, Math.ceil(-Math.log10(Math.abs(relative))) + 2));
}

function cellText(kept: KeptCell, digits: number, unit: string | undefined): string {
  const cell = cellOfKept(kept);
  if (typeof cell === "number") return withUnitText(displayNumber(cell, { kind: "significant", digits }), unit);
  if (cell instanceof CellError) return cell.code;
  return cell === null ? "blank" : displayCell(cell, { kind: "general" });
}

function kindOf(before: KeptCell, after: KeptCell): string {
  if (typeof before === "number") return "no number any more";
  return typeof after === "number" ? "a number now" : "another text";
}

function signed(value: number): string {
  return `${value < 0 ? "\u2212" : "+"}${displayNumber(Math.abs(value), { kind: "significant", digits: 4 })}`;
}
