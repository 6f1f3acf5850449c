import { planLines } from "../../../../revision/planLines.js";
import type { RevisedColumn, RevisionPlan, RowChange } from "../../../../revision/planRevision.js";
import { sentenceOfRevisionFinding } from "../../../../revision/revisionFinding.js";
import type { PreviewChange, PreviewColumn, RevisionChoices, RevisionPreview } from "../../protocol/revise.js";

/** A plan of a revision as the panel tells it. */
export function revisionPreview(
  plan: RevisionPlan,
  file: { readonly name: string; readonly table: string; readonly findings: readonly string[] },
  choices: RevisionChoices,
): RevisionPreview {
  const { match, table } = plan;
  const [matched = ""] = planLines(plan);
  const columns = plan.columns.map((column) => previewColumn(plan, column));
  return {
    ...choices,
    file: file.name,
    sheet: table.sheet,
    sheetName: table.book.sheets[table.sheet]!.name,
    key: plan.key.header,
    table: file.table,
    matched,
    rows: {
      matched: match.exact + match.folded + match.aliased,
      onlyInTable: match.onlyInTable.length,
      onlyInFile: match.onlyInRevision.length,
      ambiguous: match.ambiguous.length,
    },
    columns,
    findings: [...plan.findings.map(sentenceOfRevisionFinding), ...file.findings],
    cells: columns.reduce((sum, { values, uncertainties }) => sum + values + uncertainties, 0),
  };
}

function previewColumn(plan: RevisionPlan, { column, from, values, sigmas, largest }: RevisedColumn): PreviewColumn {
  const { header } = column;
  const converted = plan.findings.find((each) => each.about === "converted" && each.header === header);
  const shown = (change: RowChange | undefined): PreviewChange | undefined =>
    change && {
      place: { sheet: plan.table.sheet, row: plan.table.firstRow + change.row, column: column.column },
      key: plan.nameOfRow(change.row),
      before: change.before,
      after: change.after,
      sigmas: change.sigmas,
      relative: change.relative,
    };
  return {
    header,
    from: from === header ? undefined : from,
    convertedFrom: converted?.about === "converted" ? converted.fromUnit.text : undefined,
    values: values.changed,
    uncertainties: sigmas.reduce((sum, { changed }) => sum + changed, 0),
    bySigma: shown(largest.bySigma),
    byPart: shown(largest.byPart),
  };
}
