import { type Column, cellAt } from "../../../../call/column.js";
import { type BookTable, tableCells } from "../../../../revision/bookTable.js";
import { type RevisionTable, revisionColumns } from "../../../../revision/pairRevision.js";
import { columnKey } from "../../../../table/columnKey.js";
import { foldName } from "../../../../table/foldName.js";
import { isMostlyText, nameOf } from "../../../../table/rowNames.js";

/**
 * Headers of columns that could name the rows, since both tables have them and no formula works them out: texts before
 * numbers, then those whose names most rows of the file share.
 */
export function keyColumns(table: BookTable, revision: RevisionTable): readonly string[] {
  const own = revisionColumns(revision).filter(({ recognised }) => !recognised.isUncertainty);
  const ranked = table.columns.flatMap(({ column, header, recognised, isDerived, sigmaOf }) => {
    const key = columnKey(recognised.name);
    const other = own.find((each) => columnKey(each.recognised.name) === key);
    if (!other || isDerived || sigmaOf !== undefined) return [];
    const cells = tableCells(table, column);
    const names = revision.columns[other.index]!;
    return [{ header, isText: isMostlyText(cells, table.rows), shared: sharedNames(cells, names) }];
  });
  ranked.sort((a, b) => Number(b.isText) - Number(a.isText) || b.shared - a.shared);
  return ranked.map(({ header }) => header);
}

function sharedNames(table: Column, revision: Column): number {
  const names = namesIn(table);
  let shared = 0;
  for (const name of namesIn(revision)) if (names.has(name)) shared++;
  return shared;
}

function namesIn(column: Column): Set<string> {
  const names = new Set<string>();
  for (let row = 0; row < column.length; row++) {
    const name = foldName(nameOf(cellAt(column, row)));
    if (name !== "") names.add(name);
  }
  return names;
}
