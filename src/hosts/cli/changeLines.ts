import { addressText } from "../../sheet/book/address.js";
import type { Book } from "../../sheet/book/book.js";
import { cellText } from "./cellText.js";
import type { ChangedCell } from "./changedCells.js";

/** Changed cells of one column that one formula was filled to. */
interface Group {
  readonly first: ChangedCell;
  last: ChangedCell;
  count: number;
  largest: ChangedCell;
}

/** More groups than this are counted and not listed. */
const mostGroups = 40;
const longestValue = 40;

/** A line a column and formula with its largest change, so that a filled column of changes is one line. */
export function changeLines(book: Book, changes: Iterable<ChangedCell>): { lines: string[]; count: number } {
  const groups: Group[] = [];
  let count = 0;
  let hidden = 0;
  let hiddenCells = 0;
  let current: Group | undefined;
  for (const change of changes) {
    count++;
    const before = current?.first;
    if (
      current !== undefined &&
      before?.sheet === change.sheet &&
      before.column === change.column &&
      before.key === change.key
    ) {
      current.last = change;
      current.count++;
      current.largest = weightOf(change) > weightOf(current.largest) ? change : current.largest;
    } else {
      current = { first: change, last: change, count: 1, largest: change };
      if (groups.length < mostGroups) {
        groups.push(current);
      } else {
        hidden++;
      }
    }
    hiddenCells += groups.includes(current) ? 0 : 1;
  }
  const lines = groups.map((group) => groupLine(book, group));
  if (hidden > 0) {
    lines.push(
      `... and ${counted(hiddenCells, "cell")} in ${counted(hidden, "place")} more; --json lists all of them.`,
    );
  }
  return { lines, count };
}

/** A change from or to something that is no number counts as the largest. */
function weightOf({ relative }: ChangedCell): number {
  return relative === undefined ? Number.POSITIVE_INFINITY : Math.abs(relative);
}

function groupLine(book: Book, { first, last, count, largest }: Group): string {
  const at = (change: ChangedCell, sheet?: string) => addressText(change.row, change.column, sheet);
  const where = at(first, book.sheets[first.sheet]?.name);
  if (count === 1) {
    return `${where}: ${changeText(first)}  ${first.formula}`;
  }
  const most = `most in ${at(largest)}: ${changeText(largest)}`;
  return `${where}:${at(last)}: ${counted(count, "cell")}, ${most}  ${first.formula}`;
}

function changeText({ before, now, relative }: ChangedCell): string {
  const change = relative === undefined ? "" : ` (${relative > 0 ? "+" : ""}${relative.toPrecision(2)})`;
  return `${shown(before)} -> ${shown(now)}${change}`;
}

function shown(cell: ChangedCell["before"]): string {
  const text = cell === null ? "blank" : typeof cell === "string" ? JSON.stringify(cell) : cellText(cell);
  return text.length > longestValue ? `${text.slice(0, longestValue - 3)}...` : text;
}

export function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}
