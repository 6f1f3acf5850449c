import type { RevisedColumn, RevisionPlan, RowChange } from "./planRevision.js";
import { sentenceOfRevisionFinding } from "./revisionFinding.js";
import { counted, quoted, short } from "./words.js";

/** What a revision would do, a line each: how rows were matched, each column, then what to look at. */
export function planLines({ match, columns, findings, nameOfRow, table }: RevisionPlan): readonly string[] {
  const { exact, folded, aliased } = match;
  const how = [
    folded > 0 && `${folded.toLocaleString("en")} of them without regard to blanks and capitals`,
    aliased > 0 && `${aliased.toLocaleString("en")} of them by alias`,
  ].filter(Boolean);
  const matched = `${(exact + folded + aliased).toLocaleString("en")} of ${counted(table.rows, "row")} matched${how.length > 0 ? `, ${how.join(", ")}` : ""}.`;
  return [
    matched,
    ...columns.map((column) => columnLine(column, nameOfRow)),
    ...(columns.length === 0 ? ["No column of the revision goes with one of the table."] : []),
    ...findings.map(sentenceOfRevisionFinding),
  ];
}

function columnLine(
  { column, from, by, values, sigmas, largest }: RevisedColumn,
  nameOfRow: (row: number) => string,
): string {
  const source = from === column.header ? "" : ` from ${quoted(from)}${by === "quantity" ? ", the same quantity" : ""}`;
  const isChanged = sigmas.some(({ changed }) => changed > 0);
  const beside = isChanged
    ? `, ${counted(
        sigmas.reduce((sum, { changed }) => sum + changed, 0),
        "uncertainty",
      ).replace(/ys$/, "ies")}`
    : "";
  const { bySigma, byPart } = largest;
  const most = [
    bySigma && `${signed(bySigma.sigmas)} sigma${place(bySigma, nameOfRow)}`,
    byPart &&
      `${signed(byPart.relative === undefined ? undefined : 100 * byPart.relative)} %${place(byPart, nameOfRow)}`,
  ].filter(Boolean);
  const text = `${quoted(column.header)}${source}: ${counted(values.changed, "value")} ${values.changed === 1 ? "changes" : "change"}${beside}`;
  return `${text}${most.length > 0 ? `; at most ${most.join(", ")}` : ""}.`;
}

function place({ row }: RowChange, nameOfRow: (row: number) => string): string {
  return ` (${quoted(nameOfRow(row), 24)})`;
}

function signed(value: number | undefined): string {
  return value === undefined ? "" : `${value > 0 ? "+" : ""}${short(value)}`;
}
