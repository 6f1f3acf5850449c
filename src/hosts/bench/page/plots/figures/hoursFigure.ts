import type { PlanHours } from "../../../protocol/plan.js";
import { axisOver } from "../draw/axis.js";
import type { Figure, PointLayer } from "../draw/figure.js";

type Hours = Extract<PlanHours, { is: "hours" }>;

/** Hours that so many targets need together, the most valuable ones first. */
export function hoursFigure({ value, rows, totals, budget }: Hours, isLog: boolean): Figure {
  const x = Float64Array.from(totals, (_, index) => index + 1);
  const points: PointLayer = {
    draw: "points",
    x,
    y: totals,
    rows,
    paint: undefined,
    paints: [{ colour: "ref-1", shape: "circle" }],
  };
  const within = totals.filter((total) => total <= budget).length;
  return {
    description: `Hours that the targets of greatest ${value} need together: ${within} of ${totals.length} within ${budget} h`,
    x: axisOver(`Targets, those of greatest ${value} first`, "", false, [0, totals.length]),
    y: axisOver("Hours together", "h", isLog, [0, budget, ...totals]),
    layers: [
      { draw: "line", x, y: totals, colour: "soft" },
      points,
      { draw: "level", along: "y", value: budget, text: `${budget} h there are` },
    ],
    legend: [],
    brush: points,
  };
}
