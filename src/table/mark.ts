import type { Cell } from "../call/cell.js";
import { CellError, type ErrorCode } from "../call/cell.js";
import { cellAt, columnOf } from "../call/column.js";
import type { ComparedTable } from "./compareTables.js";

/** The derived values of one sheet as they stood at one moment. */
export interface Mark {
  readonly sheet: string;
  /** ISO 8601, UTC. */
  readonly taken: string;
  readonly table: ComparedTable;
}

type StoredCell = number | string | boolean | null | { readonly error: ErrorCode };

interface StoredMark {
  readonly sheet: string;
  readonly taken: string;
  readonly keys: readonly string[];
  readonly columns: readonly {
    readonly header: string;
    readonly cells: readonly StoredCell[];
    readonly sigma?: readonly StoredCell[];
  }[];
}

/** The form in which marks are kept with the workbook; every double comes back as it was. */
export function marksText(marks: readonly Mark[]): string {
  const stored = marks.map(
    ({ sheet, taken, table }): StoredMark => ({
      sheet,
      taken,
      keys: table.keys,
      columns: table.columns.map(({ header, column, sigma }) => ({
        header,
        cells: storedCells(column),
        ...(sigma ? { sigma: storedCells(sigma) } : {}),
      })),
    }),
  );
  return JSON.stringify({ version: 1, marks: stored });
}

/** Undefined where the text is of a version that is not known here: it is left as it is. */
export function readMarks(text: string): readonly Mark[] | undefined {
  const kept = parsed(text);
  if (kept?.version !== 1 || !Array.isArray(kept.marks)) return undefined;
  return (kept.marks as StoredMark[]).map(({ sheet, taken, keys, columns }) => ({
    sheet,
    taken,
    table: {
      keys,
      columns: columns.map(({ header, cells, sigma }) => ({
        header,
        column: columnOf(cells.map(cellFrom)),
        ...(sigma ? { sigma: columnOf(sigma.map(cellFrom)) } : {}),
      })),
    },
  }));
}

function parsed(text: string): { version?: unknown; marks?: unknown } | undefined {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

function storedCells(column: Parameters<typeof cellAt>[0]): StoredCell[] {
  return Array.from({ length: column.length }, (_, row) => {
    const cell = cellAt(column, row);
    return cell instanceof CellError ? { error: cell.code } : cell;
  });
}

function cellFrom(cell: StoredCell): Cell {
  return typeof cell === "object" && cell !== null ? new CellError(cell.error, "in a mark", cell.error) : cell;
}

export function columnsText({ table }: Mark): string {
  const { columns, keys } = table;
  const size = columns.length === 1 ? "1 column" : `${columns.length} columns`;
  return `${size} of ${keys.length === 1 ? "1 row" : `${keys.length} rows`}`;
}
