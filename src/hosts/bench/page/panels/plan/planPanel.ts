import { html, nothing } from "lit-html";
import type { PlanProblem, PlanReport, PlanStart, PlanWord, PlanWords } from "../../../protocol/plan.js";
import { faultText } from "../../createPage.js";
import type { Page } from "../../page.js";
import type { Panel } from "../../panel.js";
import { goTo } from "../goTo.js";
import { type FormPart, lacksColumns, limitWords, type NameList, planForm } from "./planForm.js";
import { planResult } from "./planResult.js";
import { forgetWords, keepWords, onWords, wordsFor } from "./planWords.js";
import { rowsChosen } from "./rowsChosen.js";

/** As many rows as can be put into a list of names at once. */
const mostNames = 200;

/** [ms] */
const restAfterEdit = 200;

/** Which targets, within how many hours, and when. */
export function planPanel(page: Page, redraw: () => void): Panel {
  let start: PlanStart | undefined;
  let problems: readonly PlanProblem[] = [];
  let said = "";
  let infeasible = "";
  let found: PlanReport | undefined;
  let foundIn = "";
  let written: { readonly said: string; readonly sheet: string } | undefined;
  const unfolded = new Set<FormPart>();
  let isRunning = false;
  let isShown = false;
  let asked = 0;
  let waiting: ReturnType<typeof setTimeout> | undefined;

  const attempt = (work: () => Promise<void>) => {
    work().catch((fault: unknown) => page.trouble(faultText(fault)));
  };

  async function load(): Promise<void> {
    if (!isShown) return;
    asked += 1;
    const mine = asked;
    const answer = await page.bench.planStart(page.sheet());
    if (mine !== asked) return;
    start = answer;
    if (lacksColumns(wordsFor(page, start), start)) unfolded.add("columns");
    redraw();
  }

  /** After the cells that changed were sent, which come first. */
  function loadSoon(): void {
    clearTimeout(waiting);
    waiting = setTimeout(() => attempt(load), restAfterEdit);
  }

  function set(change: Partial<PlanWords>): void {
    const names = Object.keys(change);
    problems = problems.filter(({ word }) => word !== undefined && !names.includes(word));
    keepWords(page, change);
  }

  async function take(list: NameList): Promise<void> {
    if (!start) return;
    const { rows, count, are } = await rowsChosen(page, mostNames);
    const names = await page.bench.targetNames(page.sheet(), rows);
    if (names.length === 0) {
      page.announce("Select cells in the rows of targets first.");
      return;
    }
    const words = wordsFor(page, start);
    const other: NameList = list === "must" ? "excluded" : "must";
    // A name is in one of the two lists.
    set({
      [list]: [...new Set([...words[list], ...names])],
      [other]: words[other].filter((name) => !names.includes(name)),
    });
    if (count > mostNames) page.announce(`The first ${mostNames} of the ${count} ${are} rows were added.`);
  }

  async function run(): Promise<void> {
    if (!start || isRunning) return;
    isRunning = true;
    said = "Planning; how far it is stands below the table.";
    [problems, infeasible] = [[], ""];
    redraw();
    try {
      const answer = await page.bench.plan(page.sheet(), wordsFor(page, start));
      said = "";
      if (answer.is === "plan") {
        found = answer.plan;
        foundIn = page.state().id;
        written = undefined;
        said = found.sentences[0] ?? "";
      } else if (answer.is === "problems") {
        problems = answer.problems;
        unfoldProblems();
        said = `There is no plan: ${problems.length === 1 ? "one entry needs" : `${problems.length} entries need`} attention.`;
      } else if (answer.is === "infeasible") {
        infeasible = `${answer.message[0]?.toUpperCase()}${answer.message.slice(1)}`;
        said = "There is no plan.";
      } else said = "Stopped; no plan was made.";
    } finally {
      isRunning = false;
      redraw();
    }
    const word = problems.find((problem) => problem.word !== undefined)?.word;
    if (word) document.getElementById(`plan-${word}`)?.focus();
    else document.querySelector(".plan-result, .plan-advice")?.scrollIntoView({ block: "start" });
  }

  async function write(): Promise<void> {
    const outcome = await page.bench.writePlan();
    if (outcome.is === "refused") page.trouble(outcome.message);
    if (outcome.is !== "done" || !found) return;
    const sheet = page.state().sheets[outcome.select?.sheet ?? -1]?.name ?? "";
    written = { said: outcome.said ?? "", sheet };
    found = { ...found, version: page.state().version };
    page.announce(written.said);
    redraw();
  }

  function showWritten(): void {
    const sheet = page.state().sheets.findIndex(({ name }) => name === written?.sheet);
    if (sheet >= 0) page.showSheet(sheet);
  }

  /** Opens what holds an entry that needs attention. */
  function unfoldProblems(): void {
    if (problems.some(({ word }) => word !== undefined && limitWords.includes(word))) unfolded.add("limits");
    if (problems.some(({ word }) => word === undefined || word === "columns")) unfolded.add("columns");
  }

  const actions = {
    set,
    mend(word: PlanWord) {
      problems = problems.filter((problem) => problem.word !== word);
      redraw();
    },
    unfold(part: FormPart, isOpen: boolean) {
      if (isOpen) unfolded.add(part);
      else unfolded.delete(part);
    },
    take: (list: NameList) => attempt(() => take(list)),
    takeSite: () => forgetWords(page, ["longitude", "latitude", "height"]),
    run: () => attempt(run),
    stop: () => attempt(() => page.bench.cancel()),
  };
  onWords(() => isShown && redraw());

  return {
    id: "plan",
    title: "Plan",
    keys: "Alt+L",
    view() {
      if (!start) return html`<p role="status">Looking at the table…</p>`;
      const rows = page.marked().size > 0 ? "marked" : "selected";
      const shown = found && foundIn === page.state().id ? found : undefined;
      return html`<p class="soft">Chooses the targets that are worth most within some hours, and lays their visits on nights.</p>
        ${planForm({ words: wordsFor(page, start), start, problems, isRunning, unfolded, rows }, actions)}
        ${infeasible ? html`<p class="panel-fault plan-advice">${infeasible}</p>` : nothing}
        <p role="status" class=${shown ? "unseen" : ""}>${said}</p>
        ${
          shown
            ? planResult(
                { plan: shown, isOld: shown.version !== page.state().version, written: written?.said ?? "" },
                {
                  goTo: (row) => goTo(page, { sheet: shown.sheet, row, column: 0 }),
                  write: () => attempt(write),
                  showWritten,
                },
              )
            : nothing
        }`;
    },
    shown() {
      isShown = true;
      attempt(load);
    },
    hidden() {
      isShown = false;
    },
    changed(change) {
      if (change === "sheet") attempt(load);
      else if (change === "state") loadSoon();
      else if (isShown && change === "marked") redraw();
    },
  };
}
