import { compareTables, type Movement } from "../../../../table/compareTables.js";
import { comparisonSheet } from "../../../../table/comparisonSheet.js";
import { columnsText, type Mark, marksText, readMarks } from "../../../../table/mark.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import { latest } from "../latest.js";
import type { Part, Surroundings } from "../part.js";
import { dataCell, readSheetTable, type SheetTable } from "../sheetTable.js";
import type { CompareActions, CompareState } from "./compareState.js";
import { compareView } from "./compareView.js";
import { derivedTable } from "./derivedTable.js";

const keptName = "barycell.marks";

export function comparePart(surroundings: Surroundings): Part {
  const { worksheet, redraw, announce, attempt } = surroundings;
  let state: CompareState = {
    marks: undefined,
    chosen: undefined,
    comparison: undefined,
    problem: undefined,
    forgetting: false,
  };
  let table: SheetTable | undefined;
  const last = latest();

  function update(change: Partial<CompareState>): void {
    state = { ...state, forgetting: false, ...change };
    redraw();
  }

  /** What others may have kept meanwhile is read first, so that no mark is written over. */
  async function keptMarks(): Promise<readonly Mark[]> {
    const text = await worksheet.kept(keptName);
    if (text === undefined) return [];
    const marks = readMarks(text);
    if (!marks) throw new Error("The marks in this workbook were kept by a newer version; they are left as they are.");
    return marks;
  }

  async function keep(marks: readonly Mark[]): Promise<void> {
    await worksheet.keep(keptName, marksText(marks));
  }

  async function mark(): Promise<void> {
    const now = await readSheetTable(worksheet);
    const derived = now && derivedTable(now);
    if (!now || !derived || derived.columns.length === 0) {
      return update({ problem: "No column of this sheet is worked out by formulas, so there is nothing to mark." });
    }
    const taken: Mark = { sheet: now.used.area.sheet, taken: new Date().toISOString(), table: derived };
    const marks = [taken, ...(await keptMarks())];
    await keep(marks);
    update({ marks, chosen: taken, comparison: undefined, problem: undefined });
    announce(`${columnsText(taken)} marked. Change what you like, then compare.`);
  }

  async function compare(): Promise<void> {
    const { chosen } = state;
    if (!chosen) return;
    await last(readSheetTable(worksheet, chosen.sheet), (now) => {
      table = now;
      if (!now) {
        return update({
          comparison: undefined,
          problem: `The sheet "${chosen.sheet}" of this mark is not there, or holds no table.`,
        });
      }
      update({ comparison: compareTables(chosen.table, derivedTable(now)), problem: undefined });
    });
  }

  async function forget(): Promise<void> {
    const { chosen, forgetting } = state;
    if (!chosen) return;
    if (!forgetting) return update({ forgetting: true });
    const marks = (await keptMarks()).filter(({ taken }) => taken !== chosen.taken);
    await keep(marks);
    update({ marks, chosen: marks[0], comparison: undefined });
  }

  async function show(): Promise<void> {
    const marks = await keptMarks();
    const chosen = marks.find(({ taken }) => taken === state.chosen?.taken) ?? marks[0];
    update({ marks, chosen });
    await compare();
  }

  async function writeSheet(): Promise<void> {
    if (!state.comparison) return;
    const name = await worksheet.addSheet("Comparison", comparisonSheet(state.comparison));
    announce(`The comparison is in the sheet "${name}".`);
  }

  async function goTo({ header, rowAfter }: Movement): Promise<void> {
    const { name } = recogniseColumn(header);
    const column = table?.plan.columns.find(
      (candidate) => candidate.header === header || recogniseColumn(candidate.header).name === name,
    );
    if (table && column && rowAfter !== undefined) await worksheet.goTo(dataCell(table, column, rowAfter));
  }

  const actions: CompareActions = {
    mark: () => attempt(mark),
    choose: (chosen) => {
      update({ chosen, comparison: undefined });
      attempt(compare);
    },
    compare: () => attempt(compare),
    forget: () => attempt(forget),
    writeSheet: () => attempt(writeSheet),
    goTo: (movement) => attempt(() => goTo(movement)),
  };
  return {
    id: "compare",
    title: "Compare",
    view: () => compareView(state, actions),
    shown: () => attempt(show),
    selected: () => {},
  };
}
