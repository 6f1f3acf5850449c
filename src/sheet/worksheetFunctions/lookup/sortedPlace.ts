import type { Cell } from "../../../call/cell.js";
import type { PlainCell } from "../../values/compareCells.js";
import { compareCells, isPlain } from "../../values/compareCells.js";
import type { Vector } from "./vector.js";

type Wanted = Exclude<PlainCell, null>;

/** Cells that no order knows, blanks and errors, lie behind all others. */
function isBehind(cell: Cell): boolean {
  return cell === null || !isPlain(cell);
}

/**
 * The last place with a value up to the one wanted, in cells that ascend (section 6.14.9, type 1), or in cells that
 * descend the last place with a value from the one wanted up (type -1). -1 where there is none, or where the cell
 * there is of another kind.
 */
export function sortedPlace(vector: Vector, wanted: Wanted, direction: "ascending" | "descending"): number {
  const sign = direction === "ascending" ? 1 : -1;
  let low = 0;
  let high = vector.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    const cell = vector.at(middle);
    const within = !isBehind(cell) && sign * compareCells(cell as Wanted, wanted) <= 0;
    if (within) {
      low = middle + 1;
    } else {
      high = middle;
    }
  }
  const place = low - 1;
  return place >= 0 && typeof vector.at(place) === typeof wanted ? place : -1;
}

/** The place of the nearest value of the same kind not above (-1) or not below (1) the one wanted, in any order. */
export function nearestPlace(vector: Vector, wanted: Wanted, side: 1 | -1, step: 1 | -1): number {
  let best = -1;
  let bestCell: Wanted | undefined;
  for (let index = step === 1 ? 0 : vector.length - 1; index >= 0 && index < vector.length; index += step) {
    const cell = vector.at(index);
    if (cell === null || !isPlain(cell) || typeof cell !== typeof wanted || side * compareCells(cell, wanted) < 0) {
      continue;
    }
    if (bestCell === undefined || side * compareCells(cell, bestCell) < 0) {
      best = index;
      bestCell = cell;
    }
  }
  return best;
}
