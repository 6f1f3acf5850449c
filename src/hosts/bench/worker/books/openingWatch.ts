import type { Watch } from "../../../../sheet/change.js";
import type { BenchEvent } from "../../protocol/bench.js";

/** Looks at a book being opened: tells the page how far it is, and stops it when the analyst says so. */
export interface OpenedWatch extends Watch {
  readonly signal: AbortSignal;
  onProgress(done: number, total: number): void;
  isCancelled(): boolean;
  cancel(): void;
  end(): void;
}

/** What is done sooner says nothing [ms]. */
const progressAfter = 200;

/** Between two words on it [ms]. */
const progressEvery = 100;

export function createWatch(what: string, emit: (event: BenchEvent) => void): OpenedWatch {
  const stop = new AbortController();
  let next = performance.now() + progressAfter;
  let isTold = false;
  return {
    signal: stop.signal,
    onProgress(done, total) {
      const now = performance.now();
      if (now < next) return;
      next = now + progressEvery;
      isTold = true;
      emit({ is: "progress", what, done, total });
    },
    isCancelled: () => stop.signal.aborted,
    cancel: () => stop.abort(),
    end() {
      if (isTold) emit({ is: "idle" });
      isTold = false;
    },
  };
}
