import type { Bench, BenchEvent } from "./bench.js";

/** A method asked for by the page; the worker answers with the same number. */
export interface CallMessage {
  readonly id: number;
  readonly method: keyof Bench;
  readonly given: readonly unknown[];
}

/** What the worker sends: the answer to a call, the fault that kept it from answering, or news of its own. */
export type WorkerMessage =
  | { readonly id: number; readonly answer: unknown }
  | { readonly id: number; readonly fault: string }
  | { readonly event: BenchEvent };
