import type { CellError } from "../../call/cell.js";
import type { Node } from "../formula/node.js";
import type { Rows } from "./rows.js";
import type { Scene } from "./scene.js";

/** A scene over rows `from` up to `to`. */
export interface Stretch extends Scene {
  readonly from: number;
  readonly to: number;
  readonly shared: Map<Node, Rows>;
  /** Sums that grow from row to row, as far as earlier stretches of the run have come. */
  readonly running: Map<Node, RunningTotal>;
}

/** The sum of the cells of a column before row `next`. */
export interface RunningTotal {
  next: number;
  total: number;
  carry: number;
  error: CellError | undefined;
}
