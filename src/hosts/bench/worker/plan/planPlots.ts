import { altitudeOfAirmass } from "../../../../kernel/night/airmass.js";
import { cumulativeHours } from "../../../../plan/cumulativeHours.js";
import { dateText } from "../../../../plan/dateText.js";
import { type Night, nightOf, nightsBetween } from "../../../../plan/nights.js";
import { nightTimeline } from "../../../../plan/nightTimeline.js";
import { planTable } from "../../../../plan/planTable.js";
import { readDate } from "../../../../plan/readPlanOptions.js";
import { type SkyRows, skyTargets } from "../../../../plan/skyTargets.js";
import { visibility } from "../../../../plan/visibility.js";
import type { Book } from "../../../../sheet/book/book.js";
import type { TablePlan } from "../../../../table/tableOf.js";
import type { PlanHours, PlanNight, PlanProblem, PlanVisibility, PlanWords } from "../../protocol/plan.js";
import { tableOfSheet } from "../tables/tableOfSheet.js";
import { type NightWords, namedColumns, readNightWords, readWords } from "./readWords.js";

const degree = Math.PI / 180;

export function hoursAnswer(book: Book, sheet: number, words: PlanWords): PlanHours {
  const { columns, firstRow } = tableOfSheet(book, sheet);
  const read = readWords(words, columns);
  if ("problems" in read) return missing(read.problems);
  const table = planTable(columns, read.wish);
  if ("problem" in table) return missing([{ word: undefined, message: table.problem }]);
  const steps = cumulativeHours(table.rows);
  return {
    is: "hours",
    value: words.value,
    rows: Int32Array.from(steps, ({ index }) => firstRow + table.rows[index]!.row),
    values: Float64Array.from(steps, ({ value }) => value),
    totals: Float64Array.from(steps, ({ total }) => total),
    budget: read.budget,
    leftOut: table.leftOut.length,
  };
}

export function visibilityAnswer(book: Book, sheet: number, rows: readonly number[], words: PlanWords): PlanVisibility {
  const seen = skyAnswer(book, sheet, rows, words);
  if ("is" in seen) return seen;
  const { night, sky, firstRow } = seen;
  const nights = nightsOf(night);
  const hours = visibility(sky.targets, nights, night.site, altitudeOfAirmass(night.airmass));
  return {
    is: "visibility",
    airmass: night.airmass,
    nights: Float64Array.from(nights, ({ date }) => date),
    targets: sky.targets.map(({ name, row }, index) => ({ name, row: firstRow + row, hours: hours[index]! })),
    problems: sky.problems,
  };
}

export function nightAnswer(
  book: Book,
  sheet: number,
  rows: readonly number[],
  words: PlanWords,
  date: string,
): PlanNight {
  const seen = skyAnswer(book, sheet, rows, words);
  if ("is" in seen) return seen;
  const { night, sky, firstRow } = seen;
  const wanted = date.trim() === "" ? night.from : readDate(date, "the night");
  if (typeof wanted !== "number") return missing([{ word: undefined, message: wanted.problem }]);
  const { times, dark, altitudes, moon } = nightTimeline(
    sky.targets,
    nightOf(wanted, night.site, night.sunBelow),
    night.site,
  );
  const inDegrees = (angles: Float64Array) => angles.map((angle) => angle / degree);
  return {
    is: "night",
    date: dateText(wanted),
    airmass: night.airmass,
    lowest: altitudeOfAirmass(night.airmass) / degree,
    times,
    dark: dark.map(({ from, to }) => [from, to]),
    targets: sky.targets.map(({ name, row }, index) => ({
      name,
      row: firstRow + row,
      altitudes: inDegrees(altitudes[index]!),
    })),
    moon: inDegrees(moon),
    problems: sky.problems,
  };
}

interface Missing {
  readonly is: "missing";
  readonly message: string;
}

function skyAnswer(book: Book, sheet: number, rows: readonly number[], words: PlanWords) {
  const table: TablePlan = tableOfSheet(book, sheet);
  const wanted = rows.map((row) => row - table.firstRow).filter((row) => row >= 0 && row < table.rows);
  if (wanted.length === 0) {
    return missing([{ word: undefined, message: "Select cells in the rows of targets to see them here." }]);
  }
  const night: NightWords | { readonly problems: readonly PlanProblem[] } = readNightWords(words, table.columns);
  if ("problems" in night) return missing(night.problems);
  const sky: SkyRows | { readonly problem: string } = skyTargets(table.columns, namedColumns(words), wanted);
  if ("problem" in sky) return missing([{ word: undefined, message: sky.problem }]);
  if (sky.targets.length === 0) return missing([{ word: undefined, message: sky.problems.join(" ") }]);
  return { night, sky, firstRow: table.firstRow };
}

let lastNights: { readonly key: string; readonly nights: readonly Night[] } | undefined;

/** The same nights are asked for again and again while rows are walked through. */
function nightsOf({ from, to, site, sunBelow }: NightWords): readonly Night[] {
  const key = JSON.stringify([from, to, site, sunBelow]);
  if (lastNights?.key !== key) lastNights = { key, nights: nightsBetween(from, to, site, sunBelow) };
  return lastNights.nights;
}

function missing(problems: readonly PlanProblem[]): Missing {
  const asked = problems.some(({ word }) => word !== undefined);
  const sentences = problems.map(({ message }) => `${message[0]!.toUpperCase()}${message.slice(1)}`).join(" ");
  return { is: "missing", message: asked ? `The plan beside the table lacks something: ${sentences}` : sentences };
}
