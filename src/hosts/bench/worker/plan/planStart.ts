import { cellAt } from "../../../../call/column.js";
import { inputColumns } from "../../../../plan/planColumns.js";
import { type PlanInput, planInputs } from "../../../../plan/planQuantities.js";
import type { Book } from "../../../../sheet/book/book.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import { isMostlyText } from "../../../../table/rowNames.js";
import type { PlannedColumn } from "../../../../table/tableOf.js";
import type { PlanColumn, PlanStart } from "../../protocol/plan.js";
import { tableOfSheet } from "../tables/tableOfSheet.js";
import { siteOfBook } from "./siteOfBook.js";

const worthWords = /(?<!\p{L})(?:priority|value|merit|score|worth|weight|importance)(?!\p{L})/iu;
const always: readonly PlanInput[] = ["rightAscension", "declination", "visits", "exposure"];
const forPhases: readonly PlanInput[] = ["period", "referenceTime"];

const known = new WeakMap<Book, Map<number, PlanStart>>();

/** What the columns of a sheet were understood to be, and a site the book states; looked for once in each book. */
export function planStart(book: Book, sheet: number): PlanStart {
  const starts = known.get(book) ?? new Map<number, PlanStart>();
  known.set(book, starts);
  const start = starts.get(sheet) ?? lookThrough(book, sheet);
  starts.set(sheet, start);
  return start;
}

function lookThrough(book: Book, sheet: number): PlanStart {
  const { columns, rows } = tableOfSheet(book, sheet);
  const found = inputColumns(columns, { named: new Map() });
  const values = columns.filter((column) => isOfNumbers(column, rows)).map(({ header }) => header);
  return {
    columns: Object.entries(planInputs).map(([key, { quantity }]): PlanColumn => {
      const input = key as PlanInput;
      const place = "problem" in found ? undefined : found.inputs.get(input)?.[0];
      const isNeeded = always.includes(input) ? "always" : forPhases.includes(input) ? "for phases" : "no";
      return { quantity: quantity.name, header: place === undefined ? undefined : columns[place]!.header, isNeeded };
    }),
    headers: columns.map(({ header }) => header),
    values,
    value: values.find((header) => worthWords.test(header)),
    site: siteOfBook(book, sheet),
  };
}

/** Numbers stand in it, and they are not the uncertainties of others. */
function isOfNumbers({ header, column }: PlannedColumn, rows: number): boolean {
  if (recogniseColumn(header).isUncertainty || isMostlyText(column, rows)) return false;
  for (let row = 0; row < rows; row++) if (typeof cellAt(column, row) === "number") return true;
  return false;
}
