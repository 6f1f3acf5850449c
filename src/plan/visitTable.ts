import { type Column, columnOf } from "../call/column.js";
import { dateText, isoText } from "./dateText.js";
import type { Plan } from "./plan.js";
import type { Visit } from "./visit.js";

const degree = Math.PI / 180;

/** The visits as a table whose headers state the units, in the order of time; what is not known is blank. */
export function visitTable({ chosen, schedule }: Plan): { header: string[]; columns: Column[] } {
  const { visits } = schedule;
  const columns: readonly (readonly [string, (visit: Visit) => number | string])[] = [
    ["Target", ({ target }) => chosen[target]!.name],
    ["Night", ({ night }) => dateText(night)],
    ["Start", ({ from }) => isoText(from)],
    ["Exposure [s]", ({ target }) => Number((chosen[target]!.planned.exposure * 86400).toFixed(6))],
    ["Phase", ({ phase }) => phase],
    ["Phase error", ({ phaseError }) => phaseError],
    ["Airmass", ({ airmass }) => airmass],
    ["Moon distance [deg]", ({ moonDistance }) => moonDistance / degree],
    ["Barycentric correction [m/s]", ({ barycentricSpeed }) => barycentricSpeed],
  ];
  return {
    header: columns.map(([header]) => header),
    columns: columns.map(([, of]) =>
      columnOf(
        visits.map((visit) => {
          const cell = of(visit);
          return typeof cell === "number" && !Number.isFinite(cell) ? null : cell;
        }),
      ),
    ),
  };
}
