/** Who looks at a long piece of planning. */
export interface Watch {
  /** What is done of what there is to do. */
  onProgress?(done: number, total: number): void;
  /** Asked between steps. */
  isCancelled?(): boolean;
}

/** A long piece of work, step by step. */
export type Steps<Result> = Generator<{ readonly done: number; readonly total: number }, Result>;

/** All of it at once. */
export function runAll<Result>(steps: Steps<Result>): Result {
  for (let step = steps.next(); ; step = steps.next()) if (step.done) return step.value;
}

/** The same under watch: undefined where it was cancelled. */
export function runWatched<Result>(steps: Steps<Result>, watch: Watch): Result | undefined {
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done) return step.value;
    watch.onProgress?.(step.value.done, step.value.total);
    if (watch.isCancelled?.()) return undefined;
  }
}

/** Time between two moments in which others may run, so that a wish to cancel can arrive [ms]. */
const longestSlice = 12;

/** The same in slices, between which other work runs: for a page or a worker. */
export async function runInSlices<Result>(steps: Steps<Result>, watch: Watch): Promise<Result | undefined> {
  let since = Number.NEGATIVE_INFINITY;
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done) return step.value;
    if (performance.now() - since > longestSlice) {
      watch.onProgress?.(step.value.done, step.value.total);
      await new Promise((resume) => setTimeout(resume, 0));
      since = performance.now();
    }
    if (watch.isCancelled?.()) return undefined;
  }
}
