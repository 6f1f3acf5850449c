import type { Comparison, Movement } from "../../../../table/compareTables.js";
import type { Mark } from "../../../../table/mark.js";

export interface CompareState {
  /** The latest first; undefined until they are read. */
  readonly marks: readonly Mark[] | undefined;
  readonly chosen: Mark | undefined;
  readonly comparison: Comparison | undefined;
  /** Why there is nothing to compare or to mark. */
  readonly problem: string | undefined;
  /** The mark is forgotten when the analyst says so once more. */
  readonly forgetting: boolean;
}

export interface CompareActions {
  mark(): void;
  choose(mark: Mark): void;
  compare(): void;
  forget(): void;
  writeSheet(): void;
  goTo(movement: Movement): void;
}
