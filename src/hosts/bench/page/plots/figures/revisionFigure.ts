import type { RevisionMoves } from "../../../protocol/revise.js";
import { axisOver } from "../draw/axis.js";
import type { Figure, PointLayer } from "../draw/figure.js";

type Moves = Extract<RevisionMoves, { is: "moves" }>;

/** Arrows from old to new; their heads can be brushed where the revised sheet is in view. */
export function revisionFigure({ x, y, rows, file }: Moves, xLog: boolean, yLog: boolean, isInView: boolean): Figure {
  const heads: PointLayer = {
    draw: "points",
    x: x.after,
    y: y.after,
    rows,
    paint: undefined,
    paints: [{ colour: "ref-1", shape: "circle" }],
  };
  const moved = `${rows.length.toLocaleString("en")} ${rows.length === 1 ? "row" : "rows"}`;
  return {
    description: `${y.name} against ${x.name} before and after ${file}, ${moved} that moved`,
    x: axisOver(x.name, x.unit, xLog, both(x)),
    y: axisOver(y.name, y.unit, yLog, both(y)),
    layers: [
      { draw: "arrows", from: { x: x.before, y: y.before }, to: { x: x.after, y: y.after }, rows },
      ...(isInView ? [heads] : []),
    ],
    legend: [],
    brush: isInView ? heads : undefined,
  };
}

function* both({ before, after }: Moves["x"]): Generator<number> {
  yield* before;
  yield* after;
}
