import { checkTable } from "../../../../table/checkTable.js";
import { type ColumnFinding, sentenceOfColumnFinding } from "../../../../table/columnFinding.js";
import { areaText } from "../areaText.js";
import { latest } from "../latest.js";
import type { Part, Surroundings } from "../part.js";
import { dataCell, headerArea, readSheetTable, type SheetTable } from "../sheetTable.js";
import type { CheckActions, CheckedColumn, CheckedFinding, CheckState } from "./checkState.js";
import { checkView } from "./checkView.js";

export function checkPart({ worksheet, redraw, attempt }: Surroundings): Part {
  let state: CheckState = { is: "reading" };
  const last = latest();

  function again(): void {
    attempt(() =>
      last(readSheetTable(worksheet), (table) => {
        state = table ? checked(table) : { is: "no table" };
        redraw();
      }),
    );
  }

  const actions: CheckActions = { again, goTo: (cell) => attempt(() => worksheet.goTo(cell)) };
  return { id: "check", title: "Check", view: () => checkView(state, actions), shown: again, selected: () => {} };
}

export function checked(table: SheetTable): Extract<CheckState, { is: "checked" }> {
  const { plan, used } = table;
  const columns = checkTable(plan.columns).map((check, index): CheckedColumn => {
    const column = plan.columns[index]!;
    const header = headerArea(table, column);
    const findings = check.findings.map((finding): CheckedFinding => {
      const row = rowOf(finding);
      const sentence = sentenceOfColumnFinding(finding, check.header, (at) => areaText(dataCell(table, column, at)));
      return { sentence, cell: row === undefined ? header : dataCell(table, column, row) };
    });
    return { check, address: areaText(header), findings };
  });
  return { is: "checked", area: areaText(used.area), rows: plan.rows, columns };
}

function rowOf(finding: ColumnFinding): number | undefined {
  return "row" in finding ? finding.row : undefined;
}
