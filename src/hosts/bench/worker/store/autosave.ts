import type { SavedState } from "../../protocol/bookState.js";
import { storageProblem } from "./storageProblem.js";

export interface Autosave {
  /** Something changed: it is saved soon. */
  changed(): void;
  /** Resolves when all that changed so far is saved, or could not be. */
  settled(): Promise<void>;
  state(): SavedState;
}

/** From a change to its save, so that the page is answered first [ms]. */
const delay = 30;

/** From one save to the next; what changes meanwhile goes with that [ms]. */
const rest = 250;

/** Saves after changes, one save after the other; `tell` hears how it stands. */
export function createAutosave(
  save: () => Promise<void>,
  tell: () => void,
  now: () => number,
  initial: SavedState,
): Autosave {
  let state = initial;
  let isDirty = false;
  let rested = 0;
  let running: Promise<void> | undefined;

  const become = (next: SavedState): void => {
    state = next;
    tell();
  };

  async function run(): Promise<void> {
    while (isDirty) {
      const pause = Math.max(delay, rested - performance.now());
      await new Promise((resolve) => setTimeout(resolve, pause));
      isDirty = false;
      try {
        await save();
        if (!isDirty) become({ is: "saved", at: now() });
      } catch (error) {
        become({ is: "not saved", message: storageProblem(error) });
      }
      rested = performance.now() + rest;
    }
    running = undefined;
  }

  return {
    changed() {
      isDirty = true;
      if (state.is === "saved") state = { is: "saving" };
      running ??= run();
    },
    settled: async () => running,
    state: () => state,
  };
}
