import type { Progress } from "../../sheet/calculate/calculate.js";
import type { Watch } from "../../sheet/change.js";

/** Long work in small steps; what it yields says how far it has come. */
export type Steps<T> = Generator<Progress, T>;

/** Time between two moments in which others may run: with somebody who may cancel, and without [ms]. */
const watchedSlice = 24;
const unwatchedSlice = 200;

/** Does the work in slices, between which other work runs; undefined where it was cancelled. */
export async function inSlices<T>(steps: Steps<T>, watch?: Watch): Promise<T | undefined> {
  const longestSlice = watch === undefined ? unwatchedSlice : watchedSlice;
  let since = performance.now();
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done) {
      return step.value;
    }
    if (performance.now() - since > longestSlice) {
      watch?.onProgress?.(step.value.done, step.value.total);
      await new Promise((resume) => setTimeout(resume, 0));
      since = performance.now();
    }
    if (watch?.isCancelled?.()) {
      return undefined;
    }
  }
}
