import { sliceColumn } from "../call/column.js";
import type { Edit } from "../sheet/edit/draft.js";
import { setColumn } from "../sheet/edit/setColumn.js";
import type { RevisionPlan } from "./planRevision.js";

/** What a plan would do, as edits of the sheet: to be given to `change` at once and kept as one step. */
export function revisionEdits({ table, columns }: RevisionPlan): readonly Edit[] {
  const { sheet, firstRow } = table;
  return columns.flatMap(({ values, sigmas }) =>
    [values, ...sigmas].flatMap(({ column, values: cells, spans }) =>
      spans.map(({ from, to }) =>
        setColumn({ sheet, column: column.column, row: firstRow + from }, sliceColumn(cells, from, to)),
      ),
    ),
  );
}
