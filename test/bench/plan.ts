import { choose } from "../../src/plan/choose.js";
import { planSteps } from "../../src/plan/plan.js";
import type { PlanRow } from "../../src/plan/planTable.js";
import { runAll, runWatched } from "../../src/plan/watch.js";
import { randomNumbers, report, shortest } from "./timing.js";

const targets = 500;
const nights = 180;
const degree = Math.PI / 180;
const second = 1 / 86400;

/** A semester of 500 targets: choice and schedule, and the longest time between two moments to cancel in. */
export function benchPlan(): void {
  const rows = survey();
  const limits = {
    airmass: 2,
    sunBelow: -18 * degree,
    phaseWidth: 0.1,
    moonDistance: 30 * degree,
    perNight: 1,
    gap: 0,
  };
  const site = { longitude: -70.7345 * degree, latitude: -29.2584 * degree, height: 2400 };
  const table = { rows, leftOut: [], notes: [] };
  const request = { table, budget: 900, must: [], excluded: [], site, from: 9892.5, to: 9892.5 + nights - 1, limits };
  const wish = { candidates: rows, budget: 900, must: new Set<number>(), excluded: new Set<number>() };
  const ofChoice = shortest(() => choose(wish), 5, 2);
  const whole = shortest(() => runAll(planSteps(request)), 3, 1);
  const found = runAll(planSteps(request));
  const visits = "schedule" in found ? found.schedule.visits.length : 0;
  const text = `${whole.toFixed(0)} ms`;
  report(`plan ${targets} targets, ${nights} nights, ${visits} visits`, text, "2000 ms", whole / 2000, "aim <= 1");
  report(`choose of ${targets} within 54,000 min`, `${ofChoice.toFixed(0)} ms`, `${text} plan`, ofChoice / whole, "");
  const slice = longestStep(request);
  report("longest step of a plan", `${slice.toFixed(1)} ms`, "100 ms to cancel", slice / 100, "aim <= 1");
}

function longestStep(request: Parameters<typeof planSteps>[0]): number {
  let [last, longest] = [performance.now(), 0];
  const onProgress = () => {
    const now = performance.now();
    longest = Math.max(longest, now - last);
    last = now;
  };
  runWatched(planSteps(request), { onProgress });
  return longest;
}

function survey(): PlanRow[] {
  const random = randomNumbers(9);
  return Array.from({ length: targets }, (_, row) => {
    const visits = 5 + Math.floor(30 * random());
    const exposure = (300 + 1500 * random()) * second;
    const overhead = 300 * second;
    const value = Math.round(1000 * random()) / 100;
    const planned = {
      name: `T${row}`,
      rightAscension: 2 * Math.PI * random(),
      declination: Math.asin(1 - 1.5 * random()),
      period: 10 ** (3 * random()),
      periodError: 1e-4 * random(),
      reference: 8000 + 1500 * random(),
      referenceError: 0.01 * random(),
      phases: [0.25, 0.75],
      visits,
      exposure,
      overhead,
      value,
    };
    return { row, name: planned.name, value, hours: visits * (exposure + overhead) * 24, planned };
  });
}
