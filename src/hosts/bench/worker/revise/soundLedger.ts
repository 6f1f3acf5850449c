import type { KeptLedger } from "../../../../files/bookFile/bookDocument.js";
import type { BookLedger } from "../session.js";

const known = new WeakMap<KeptLedger, BookLedger | null>();

/** A ledger that came with a book, if it is whole and of the version known here. */
export function soundLedger(kept: KeptLedger): BookLedger | undefined {
  const seen = known.get(kept);
  if (seen !== undefined) return seen ?? undefined;
  const sound = isSound(kept) ? (kept as unknown as BookLedger) : null;
  known.set(kept, sound);
  return sound ?? undefined;
}

type Check = (value: unknown) => boolean;

const aText: Check = (value) => typeof value === "string";
const aNumber: Check = (value) => typeof value === "number" && Number.isFinite(value);
const nothing: Check = (value) => value === null;
const either =
  (...checks: readonly Check[]): Check =>
  (value) =>
    checks.some((check) => check(value));
const listOf =
  (check: Check): Check =>
  (value) =>
    Array.isArray(value) && value.every(check);
const having =
  (members: Readonly<Record<string, Check>>): Check =>
  (value) =>
    typeof value === "object" &&
    value !== null &&
    Object.entries(members).every(([name, check]) => check((value as Record<string, unknown>)[name]));

const aCell = either(
  nothing,
  aText,
  aNumber,
  (value) => typeof value === "boolean",
  having({ error: aText, message: aText }),
);
const source = having({ date: aText, file: aText, sha256: aText });
const crossings = listOf(having({ key: aText, before: aCell, after: aCell }));
const entry = having({
  source,
  sheet: aText,
  key: aText,
  header: aText,
  cell: either(nothing, aText),
  role: (value) => value === "revised" || value === "derived",
  before: aCell,
  after: aCell,
  change: either(nothing, aNumber),
  relative: either(nothing, aNumber),
  sigmas: either(nothing, aNumber),
  movedBy: either(nothing, aText),
  way: listOf(aText),
  parts: listOf(having({ input: aText, part: aNumber })),
  remainder: either(nothing, aNumber),
});

const isSound = having({
  kind: (value) => value === "barycell-ledger",
  version: (value) => value === 1,
  source,
  sheet: aText,
  inputs: listOf(having({ input: aText, cells: aNumber })),
  unshared: either(nothing, aText),
  conditions: listOf(
    having({ condition: aText, header: aText, before: aNumber, after: aNumber, gained: crossings, lost: crossings }),
  ),
  entries: listOf(entry),
  changes: aNumber,
  key: aText,
});
