import type { Page } from "../page.js";
import { keptWords, wordsFor } from "../panels/plan/planWords.js";
import { rowsChosen } from "../panels/plan/rowsChosen.js";
import { hoursFigure } from "./figures/hoursFigure.js";
import { mostLines } from "./figures/lineStyles.js";
import { nightFigure } from "./figures/nightFigure.js";
import { visibilityFigure } from "./figures/visibilityFigure.js";
import type { Made } from "./made.js";
import type { PlotSettings } from "./plotSettings.js";

/** A figure about the plan of the sheet in view: its site, dates and limits. */
export async function makePlanFigure(
  page: Page,
  kind: "hours" | "visibility" | "night",
  { night, yLog }: PlotSettings,
): Promise<Made> {
  const sheet = page.sheet();
  const words = wordsFor(page, await page.bench.planStart(sheet));
  if (kind === "hours") {
    const answer = await page.bench.planHours(sheet, words);
    if (answer.is === "missing") return { missing: answer.message };
    const { leftOut } = answer;
    const note = `${leftOut} ${leftOut === 1 ? "row" : "rows"} cannot be planned and ${leftOut === 1 ? "is" : "are"} not counted.`;
    return { figure: hoursFigure(answer, yLog), note: leftOut === 0 ? "" : note };
  }
  const { rows, count, are } = await rowsChosen(page, mostLines);
  const answer =
    kind === "visibility"
      ? await page.bench.planVisibility(sheet, rows, words)
      : await page.bench.planNight(sheet, rows, words, night);
  if (answer.is === "missing") return { missing: answer.message };
  const notes = [...answer.problems];
  if (count > mostLines) notes.unshift(`The first ${mostLines} of the ${count} ${are} rows are shown.`);
  const figure = answer.is === "night" ? nightFigure(answer) : visibilityFigure(answer);
  return { figure, note: notes.join(" ") };
}

const unixEpoch = 10957.5;

/** Of the plan [d from J2000.0]; today where what was typed is no date. */
export function firstNight(page: Page): number {
  const typed = keptWords(page.state().id).from?.trim() ?? "";
  const time = /^\d{4}-\d\d-\d\d$/.test(typed) ? Date.parse(typed) : Number.NaN;
  const midnight = Math.floor(Date.now() / 86_400_000);
  return (Number.isFinite(time) ? time / 86_400_000 : midnight) - unixEpoch;
}
