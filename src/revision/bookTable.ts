import type { Column } from "../call/column.js";
import { cellAt } from "../call/column.js";
import { type Book, columnAt } from "../sheet/book/book.js";
import { readColumn } from "../sheet/book/readColumn.js";
import { spanAt, spansIn } from "../sheet/book/spans.js";
import { usedRows } from "../sheet/book/usedRows.js";
import { findTable } from "../sheet/view/findTable.js";
import { headerText } from "../table/headerText.js";
import { type RecognisedColumn, recogniseColumn } from "../table/recogniseColumn.js";
import { nameColumn, rowName } from "../table/rowNames.js";
import { ownersOfSigmas } from "../table/sigmaColumns.js";
import type { PlannedColumn, TablePlan } from "../table/tableOf.js";

/** A column of a table in a sheet. */
export interface BookColumn {
  /** The column of the sheet. */
  readonly column: number;
  /** With its unit in square brackets. */
  readonly header: string;
  readonly recognised: RecognisedColumn;
  /** Formulas work out the most of it, or all. */
  readonly isDerived: boolean;
  /** The sheet's column of values whose uncertainties stand here; undefined for values. */
  readonly sigmaOf: number | undefined;
  /** The sheet's columns of its uncertainties: one, or the upper and the lower. */
  readonly sigmas: readonly number[];
}

/** The table of a sheet in one state of its book. Rows count from the first row of data. */
export interface BookTable {
  readonly book: Book;
  readonly sheet: number;
  readonly firstRow: number;
  readonly rows: number;
  readonly columns: readonly BookColumn[];
}

/** Undefined where the sheet holds no table. */
export function bookTable(book: Book, sheet: number): BookTable | undefined {
  const plan = findTable(book, sheet);
  if (!plan) return undefined;
  const { firstRow } = plan;
  const rows = Math.max(0, usedRows(book, sheet) - firstRow);
  const headed = withSpills(book, sheet, plan).map(({ index, header, unitCell }) => {
    const state = columnAt(book, sheet, index);
    const claim = spansIn(state.claims, firstRow, firstRow + rows)[0];
    const filled = countRows(spansIn(state.runs, firstRow, firstRow + rows), firstRow, firstRow + rows);
    const recognised = recogniseColumn(header, unitCell);
    // What a formula fills beside itself is its uncertainty, whatever stands above it.
    const beside = claim && index - claim.column <= 2 && index > claim.column ? claim.column : undefined;
    return {
      column: index,
      header: headerText({ header, ...(unitCell === undefined ? {} : { unitCell }) }),
      recognised: beside === undefined ? recognised : { ...recognised, isUncertainty: true },
      beside,
      isDerived: 2 * filled > rows || claim !== undefined,
    };
  });
  const owners = ownersOfSigmas(headed);
  const sigmaOf = headed.map(({ beside }, index) => {
    const owner = owners[index];
    return beside ?? (owner === undefined ? undefined : headed[owner]!.column);
  });
  const columns = headed.map(
    ({ beside, ...own }, index): BookColumn => ({
      ...own,
      sigmaOf: sigmaOf[index],
      sigmas: headed
        .filter((_, other) => sigmaOf[other] === own.column)
        .map(({ column }) => column)
        .slice(0, 2),
    }),
  );
  return { book, sheet, firstRow, rows, columns };
}

/** With the uncertainties that formulas fill beside themselves under no header. */
function withSpills(book: Book, sheet: number, { columns, firstRow }: TablePlan): readonly HeadedColumn[] {
  const headed = new Set(columns.map(({ index }) => index));
  return columns.flatMap((own): HeadedColumn[] => {
    const { name, unit } = recogniseColumn(own.header, own.unitCell);
    const spills = [1, 2].filter((beside) => {
      const [claim] = spansIn(columnAt(book, sheet, own.index + beside).claims, firstRow, usedRows(book, sheet));
      return claim?.column === own.index && !headed.has(own.index + beside);
    });
    const ofUnit = unit === undefined ? "" : ` [${unit.text}]`;
    return [
      own,
      ...spills.map((beside) => ({
        index: own.index + beside,
        header: `${name}${beside === 1 ? "" : " lower"} sigma${ofUnit}`,
      })),
    ];
  });
}

type HeadedColumn = Pick<PlannedColumn, "index" | "header" | "unitCell">;

function countRows(spans: readonly { readonly from: number; readonly to: number }[], from: number, to: number): number {
  return spans.reduce((sum, span) => sum + Math.min(to, span.to) - Math.max(from, span.from), 0);
}

/** The cells of a sheet's column in rows of the table. */
export function tableCells({ book, sheet, firstRow, rows }: BookTable, column: number, from = 0, to = rows): Column {
  return readColumn(book, { sheet, column, from: firstRow + from, to: firstRow + to });
}

/** Whether a formula stands in a cell of the table or fills it. */
export function isComputed({ book, sheet, firstRow }: BookTable, column: number, row: number): boolean {
  const { runs, claims } = columnAt(book, sheet, column);
  return spanAt(runs, firstRow + row) !== undefined || spanAt(claims, firstRow + row) !== undefined;
}

/** What names the rows: a column that was asked for, or the first that is mostly text and typed. */
export function namesOfRows(table: BookTable, asked?: number): (row: number) => string {
  const typed = table.columns.filter(({ isDerived }) => !isDerived);
  const named =
    asked === undefined
      ? nameColumn(
          typed.map(({ column }) => ({ column: tableCells(table, column) })),
          table.rows,
        )?.column
      : tableCells(table, asked);
  return (row) => rowName(named && row < named.length ? cellAt(named, row) : null, table.firstRow + row + 1);
}
