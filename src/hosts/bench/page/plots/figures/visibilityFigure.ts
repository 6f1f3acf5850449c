import type { PlanVisibility } from "../../../protocol/plan.js";
import { axisOver } from "../draw/axis.js";
import type { Figure } from "../draw/figure.js";
import { namedLines } from "./lineStyles.js";

type Visibility = Extract<PlanVisibility, { is: "visibility" }>;

/** Hours in the dark within the airmass limit, night by night. */
export function visibilityFigure({ airmass, nights, targets }: Visibility): Figure {
  const { layers, legend } = namedLines(targets.map(({ name, hours }) => ({ name, x: nights, y: hours })));
  return {
    description: `Hours a night in the dark within airmass ${airmass}, over ${nights.length} nights: ${targets
      .map(({ name, hours }) => `${name} at most ${most(hours).toFixed(1)} h`)
      .join(", ")}`,
    x: { ...axisOver(`Night; hours within airmass ${airmass}`, "", false, nights), times: "dates" },
    y: axisOver("Dark hours a night", "h", false, [0, ...targets.map(({ hours }) => most(hours))]),
    layers,
    legend,
    brush: undefined,
  };
}

function most(values: Float64Array): number {
  return values.reduce((a, b) => Math.max(a, b), 0);
}
