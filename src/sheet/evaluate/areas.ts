import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Node } from "../formula/node.js";
import { resolveBound } from "../formula/reference.js";
import { mostColumns, mostRows } from "../limits.js";
import type { Operand } from "../values/operand.js";
import { buildMatrix } from "../values/operand.js";
import type { Target } from "./lookOut.js";
import { matrixOf, spillTarget, targetOf } from "./lookOut.js";
import type { Scene } from "./scene.js";

/** The cells a part of a formula means, where it means cells and not values. */
export function areaOf(node: Node, scene: Scene, row: number): Target | CellError {
  const { world, formula, sheet, column } = scene;
  switch (node.kind) {
    case "reference":
      return targetOf(world, formula.references[node.index], sheet, row, column);
    case "spill": {
      const target = targetOf(world, formula.references[node.index], sheet, row, column);
      return target instanceof CellError ? target : spillTarget(world, target);
    }
    case "shared":
      return areaOf(node.value, scene, row);
    case "intersection": {
      const left = areaOf(node.left, scene, row);
      const right = areaOf(node.right, scene, row);
      return left instanceof CellError ? left : right instanceof CellError ? right : common(left, right);
    }
    default:
      return new CellError("#VALUE!", "a value where cells are needed", noCellsMessage);
  }
}

const noCellsMessage = "a value stands where cells are needed; a cell or a range is needed, for example B2:B9";

function common(left: Target, right: Target): Target | CellError {
  const area = {
    sheet: left.sheet,
    top: Math.max(left.top, right.top),
    left: Math.max(left.left, right.left),
    bottom: Math.min(left.bottom, right.bottom),
    right: Math.min(left.right, right.right),
  };
  const apart = left.sheet !== right.sheet || area.top > area.bottom || area.left > area.right;
  return apart
    ? new CellError(
        "#NULL!",
        "ranges without a common cell",
        "the two ranges have no cell in common; ranges that cross are needed, for example B1:B9 A3:C3",
      )
    : area;
}

/** The cells themselves. */
export function cellsOf(node: Node, scene: Scene, row: number): Operand {
  const target = areaOf(node, scene, row);
  return target instanceof CellError ? target : matrixOf(scene.world, target);
}

/** The short way to the most common of all parts: a reference to one cell of the same sheet. */
export function readSingle(node: Extract<Node, { kind: "reference" }>, scene: Scene, home: number): Cell | undefined {
  const reference = scene.formula.references[node.index];
  if (reference === undefined || reference.sheet !== undefined) {
    return undefined;
  }
  const { top, bottom, left, right } = reference;
  if (top.at !== bottom.at || top.fixed !== bottom.fixed || left.at !== right.at || left.fixed !== right.fixed) {
    return undefined;
  }
  const row = resolveBound(top, home);
  const column = resolveBound(left, scene.column);
  return row < 0 || column < 0 || row >= mostRows || column >= mostColumns
    ? undefined
    : scene.world.read(scene.sheet, row, column);
}

/** ROW and COLUMN. */
export function positionOf(node: Extract<Node, { kind: "position" }>, scene: Scene, row: number): Operand {
  const inRows = node.axis === "row";
  if (node.of === undefined) {
    return (inRows ? row : scene.column) + 1;
  }
  const area = areaOf(node.of, scene, row);
  if (area instanceof CellError) {
    return area;
  }
  const first = inRows ? area.top : area.left;
  const count = inRows ? area.bottom - area.top + 1 : area.right - area.left + 1;
  if (count === 1) {
    return first + 1;
  }
  return buildMatrix(inRows ? count : 1, inRows ? 1 : count, (down, right) => first + 1 + (inRows ? down : right));
}
