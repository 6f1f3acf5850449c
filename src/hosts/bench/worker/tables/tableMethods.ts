import { EditRefused } from "../../../../sheet/edit/refused.js";
import { setCells } from "../../../../sheet/edit/setCells.js";
import { addSheet } from "../../../../sheet/edit/sheets.js";
import { comparisonSheet } from "../../../../table/comparisonSheet.js";
import type { Bench } from "../../protocol/bench.js";
import type { Plan } from "../actions/plan.js";
import type { ActionQueue } from "../actions/queue.js";
import type { Service } from "../service.js";
import { bookOfSession, type Session, type SessionMark } from "../session.js";
import type { SessionHolder } from "../sessionHolder.js";
import { headerReport, tableReport } from "./columnReports.js";
import { columnsOf } from "./columnsOf.js";
import { curveOfRow } from "./curveOfRow.js";
import { compareWithNow, comparisonReport, markState, takeMark } from "./marks.js";
import { plotColumn } from "./plotColumn.js";

export type TableMethods = Service<
  Pick<
    Bench,
    | "checkTable"
    | "checkUnit"
    | "marks"
    | "mark"
    | "forget"
    | "compare"
    | "writeComparison"
    | "plotColumn"
    | "columnsOf"
    | "curve"
  >
>;

/** What looks at whole tables: checks, marks and what moved since, columns for plots. */
export function tableMethods(holder: SessionHolder, { run }: ActionQueue): TableMethods {
  const book = () => bookOfSession(holder.session());
  return {
    checkTable: (sheet) => tableReport(book(), sheet),
    checkUnit: (text, place) => headerReport(book(), text, place),
    marks: () => holder.session().marks.map(markState),
    mark(sheet) {
      const session = holder.session();
      const at = Date.now();
      const mark = takeMark(bookOfSession(session), sheet, `${at}-${session.version}`, at);
      holder.replace(withMarks(session, [mark, ...session.marks]));
      return markState(mark);
    },
    forget(id) {
      const session = holder.session();
      holder.replace(
        withMarks(
          session,
          session.marks.filter((mark) => mark.id !== id),
        ),
      );
    },
    compare: (id) => comparisonReport(book(), markOf(holder.session(), id)),
    writeComparison: (id) => run((session) => comparisonPlan(session, markOf(session, id))),
    columnsOf: (sheet) => columnsOf(book(), sheet),
    curve: (sheet, row) => curveOfRow(book(), sheet, row),
    plotColumn: (sheet, column) => plotColumn(holder.session(), sheet, column),
  };
}

function withMarks(session: Session, marks: readonly SessionMark[]): Session {
  return { ...session, version: session.version + 1, marks };
}

function markOf({ marks }: Session, id: string): SessionMark {
  const mark = marks.find((each) => each.id === id);
  if (!mark) throw new EditRefused("compare: this mark was forgotten; choose another one");
  return mark;
}

/** All that moved, on a sheet of its own. */
function comparisonPlan(session: Session, mark: SessionMark): Plan {
  const book = bookOfSession(session);
  const cells = comparisonSheet(compareWithNow(book, mark).comparison);
  const taken = new Set(book.sheets.map(({ name }) => name.toUpperCase()));
  let name = "Comparison";
  for (let number = 2; taken.has(name.toUpperCase()); number++) name = `Comparison ${number}`;
  const sheet = book.sheets.length;
  return {
    name: `wrote what moved since the mark to the sheet ${name}`,
    edits: [addSheet(name), setCells({ sheet, row: 0, column: 0 }, cells)],
    edited: [],
    moved: true,
    select: { sheet, top: 0, left: 0, bottom: 0, right: 0 },
    said: `What moved is in the sheet "${name}".`,
  };
}
