import { type Plan, planSteps } from "../../../../plan/plan.js";
import { inputColumns } from "../../../../plan/planColumns.js";
import { planTable } from "../../../../plan/planTable.js";
import { targetName } from "../../../../plan/skyTargets.js";
import { runInSlices, type Watch } from "../../../../plan/watch.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import type { Bench } from "../../protocol/bench.js";
import type { PlanAnswer, PlanProblem, PlanWord, PlanWords } from "../../protocol/plan.js";
import type { ActionQueue } from "../actions/queue.js";
import type { Service } from "../service.js";
import { bookOfSession } from "../session.js";
import type { SessionHolder } from "../sessionHolder.js";
import { tableOfSheet } from "../tables/tableOfSheet.js";
import { hoursAnswer, nightAnswer, visibilityAnswer } from "./planPlots.js";
import { planReport } from "./planReport.js";
import { planSheets } from "./planSheets.js";
import { planStart } from "./planStart.js";
import { readWords } from "./readWords.js";

export type PlanMethods = Service<
  Pick<
    Bench,
    "planStart" | "targetNames" | "plan" | "writePlan" | "planHours" | "planVisibility" | "planNight" | "cancel"
  >
>;

/** Choosing targets and laying their visits. The last plan is kept, to be written. */
export function planMethods(holder: SessionHolder, { run }: ActionQueue): PlanMethods {
  const book = () => bookOfSession(holder.session());
  let last: { readonly plan: Plan; readonly words: PlanWords; readonly book: string } | undefined;
  let running = 0;

  /** A plan that is asked for later takes the place of one that goes on. */
  function watched(): Watch & { end(): void } {
    running += 1;
    const mine = running;
    let told = false;
    return {
      isCancelled: () => running !== mine,
      onProgress(done, total) {
        told = true;
        holder.emit({ is: "progress", what: "planning", done, total });
      },
      end() {
        if (told) holder.emit({ is: "idle" });
      },
    };
  }

  async function plan(sheet: number, words: PlanWords): Promise<PlanAnswer> {
    const session = holder.session();
    const { columns, firstRow } = tableOfSheet(bookOfSession(session), sheet);
    const read = readWords(words, columns);
    if ("problems" in read) return { is: "problems", problems: read.problems };
    const table = planTable(columns, read.wish);
    if ("problem" in table) return problem(undefined, table.problem);
    const watch = watched();
    try {
      const found = await runInSlices(planSteps({ ...read, table }), watch);
      if (found === undefined) return { is: "cancelled" };
      if ("problem" in found) {
        if (found.about === "hours") return { is: "infeasible", message: found.problem };
        return problem(/" has to be in/.test(found.problem) ? "must" : "excluded", found.problem);
      }
      last = { plan: found, words, book: session.id };
      const { version } = session;
      return { is: "plan", plan: planReport(found, read.excluded, { sheet, version, firstRow }) };
    } finally {
      watch.end();
    }
  }

  return {
    plan,
    cancel() {
      running += 1;
    },
    writePlan: () =>
      run((session) => {
        if (last?.book !== session.id) throw new EditRefused("plan: there is no plan of this book yet; make one first");
        return planSheets(session, last.plan, last.words);
      }),
    planStart: (sheet) => planStart(book(), sheet),
    targetNames(sheet, rows) {
      const { columns, firstRow, rows: count } = tableOfSheet(book(), sheet);
      const found = inputColumns(columns, { named: new Map() });
      const name = "problem" in found ? undefined : found.name;
      return rows
        .map((row) => row - firstRow)
        .filter((row) => row >= 0 && row < count)
        .map((row) => targetName(columns, name, row));
    },
    planHours: (sheet, words) => hoursAnswer(book(), sheet, words),
    planVisibility: (sheet, rows, words) => visibilityAnswer(book(), sheet, rows, words),
    planNight: (sheet, rows, words, date) => nightAnswer(book(), sheet, rows, words, date),
  };
}

function problem(word: PlanWord | undefined, message: string): PlanAnswer {
  const one: PlanProblem = { word, message };
  return { is: "problems", problems: [one] };
}
