import { CellError } from "../call/cell.js";
import type { Crossing, Ledger, LedgerColumn, WatchedCondition } from "./ledger.js";
import { cellOfKept, type KeptCell, type LedgerEntry, ledgerEntries } from "./ledgerEntry.js";
import type { KeptCrossing, LedgerRecord } from "./ledgerRecord.js";
import { counted, short } from "./words.js";

/**
 * A ledger as a report: what was revised, what moved, which conditions were crossed, the most important changes;
 * `matching`: sentences on how the revision was matched.
 */
export function* ledgerMarkdown(ledger: Ledger, most = 20, matching: readonly string[] = []): Generator<string> {
  const { source, sheet, columns, conditions, inputs, unshared } = ledger;
  yield "# Revision\n\n";
  yield `${code(source.file)}, ${source.date}, SHA-256 ${code(source.sha256)}, into ${code(sheet)}.\n`;
  if (matching.length > 0) yield `\n## Matching\n\n${matching.map((text) => `- ${escaped(text)}\n`).join("")}`;
  yield* section(
    "Revised",
    ["Column", "Cells"],
    inputs.map(({ name, cells }) => [name, cells.toLocaleString("en")]),
  );
  if (unshared !== undefined) yield `\nChanges are not shared out among inputs, because ${unshared}.\n`;
  const derived = columns.filter(({ role }) => role === "derived");
  yield* section(
    "Worked out anew",
    ["Column", "Changed", "Largest change", "%", "sigma", "In", "No number any more", "A number now"],
    derived.map((column) => columnLine(ledger, column)),
  );
  for (const condition of conditions) yield* conditionSection(condition, most);
  const entries = ledgerEntries(ledger, most);
  const all = derived.reduce((sum, { changed }) => sum + changed, 0);
  yield* section(
    entries.length < all ? `The ${entries.length} most important of ${counted(all, "change")}` : "Changes",
    ["Row", "Column", "Before", "After", "Change", "%", "sigma", "Moved most by", "Parts"],
    entries.map(entryLine),
  );
}

/** The same of a ledger that was kept, without what only both states of its table can tell. */
export function* recordMarkdown(
  { source, sheet, inputs, unshared, conditions, entries }: LedgerRecord,
  changes: number,
): Generator<string> {
  yield "# Revision\n\n";
  yield `${code(source.file)}, ${source.date}, SHA-256 ${code(source.sha256)}, into ${code(sheet)}.\n`;
  yield* section(
    "Revised",
    ["Column", "Cells"],
    inputs.map(({ input, cells }) => [input, cells.toLocaleString("en")]),
  );
  if (unshared !== null) yield `\nChanges are not shared out among inputs, because ${unshared}.\n`;
  for (const { condition, before, after, gained, lost } of conditions) {
    const lines = (kind: string, crossings: readonly KeptCrossing[]) =>
      crossings.map((own) => [kind, own.key, shown(own.before), shown(own.after)]);
    const title = `${condition}: ${counted(before, "row")} before, ${after.toLocaleString("en")} now`;
    yield* section(title, ["", "Row", "Before", "After"], [...lines("gained", gained), ...lines("lost", lost)]);
  }
  yield* section(
    entries.length < changes ? `The ${entries.length} most important of ${counted(changes, "change")}` : "Changes",
    ["Row", "Column", "Before", "After", "Change", "%", "sigma", "Moved most by", "Parts"],
    entries.map(entryLine),
  );
}

function* section(title: string, head: readonly string[], lines: readonly (readonly string[])[]): Generator<string> {
  yield `\n## ${escaped(title)}\n\n`;
  if (lines.length === 0) {
    yield "None.\n";
    return;
  }
  yield `${line(head)}${line(head.map(() => "---"))}`;
  for (const cells of lines) yield line(cells.map(escaped));
}

function columnLine({ nameOfRow }: Ledger, { header, changed, ceased, began, largest }: LedgerColumn): string[] {
  return [
    header,
    changed.toLocaleString("en"),
    signed(largest?.change),
    signed(largest?.relative === undefined ? undefined : 100 * largest.relative),
    signed(largest?.sigmas),
    largest ? nameOfRow(largest.at) : "",
    ceased === 0 ? "" : ceased.toLocaleString("en"),
    began === 0 ? "" : began.toLocaleString("en"),
  ];
}

function* conditionSection({ condition, metBefore, metAfter, gained, lost }: WatchedCondition, most: number) {
  const title = `${condition.text}: ${counted(metBefore, "row")} before, ${metAfter.toLocaleString("en")} now`;
  const lines = (kind: string, crossings: readonly Crossing[]) =>
    crossings.slice(0, most).map((own) => [kind, own.key, shown(own.before), shown(own.after)]);
  yield* section(title, ["", "Row", "Before", "After"], [...lines("gained", gained), ...lines("lost", lost)]);
  const left = Math.max(0, gained.length - most) + Math.max(0, lost.length - most);
  if (left > 0) yield `\nand ${left.toLocaleString("en")} more.\n`;
}

function entryLine({
  key,
  header,
  before,
  after,
  change,
  relative,
  sigmas,
  movedBy,
  way,
  parts,
  remainder,
}: LedgerEntry): string[] {
  // One input that did it all is told beside; what did nothing is not worth the room.
  const told = parts.filter(({ part }) => part !== 0);
  const shares = (told.length > 1 ? [...told] : [])
    .sort((a, b) => Math.abs(b.part) - Math.abs(a.part))
    .map(({ input, part }) => `${input} ${signed(part)}`);
  // What is left is told where it would show in the digits of the change.
  const isSeen = remainder !== null && change !== null && Math.abs(remainder) > 5e-5 * Math.abs(change);
  return [
    key,
    header,
    shown(before),
    shown(after),
    signed(change ?? undefined),
    signed(relative === null ? undefined : 100 * relative),
    signed(sigmas ?? undefined),
    way.length > 2 ? way.join(" > ") : (movedBy ?? ""),
    [...shares, ...(isSeen ? [`remainder ${signed(remainder)}`] : [])].join("; "),
  ];
}

function shown(kept: KeptCell | Crossing["before"]): string {
  const cell = kept instanceof CellError ? kept : cellOfKept(kept);
  if (cell === null) return "blank";
  if (cell instanceof CellError) return cell.code;
  return typeof cell === "number" ? short(cell) : String(cell);
}

function signed(value: number | undefined): string {
  return value === undefined ? "" : `${value > 0 ? "+" : ""}${short(value)}`;
}

function line(cells: readonly string[]): string {
  return `| ${cells.join(" | ")} |\n`;
}

/** A text that stands for itself in a table: nothing of it is markup, and it is one line. */
function escaped(text: string): string {
  return text.replace(/\s+/g, " ").replace(/[\\`*_{}[\]<>#|!~&]/g, (character) => `\\${character}`);
}

function code(text: string): string {
  return `\`${text.replace(/[`\r\n]/g, " ")}\``;
}
