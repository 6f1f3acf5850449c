import type { Bench, BenchEvent } from "../protocol/bench.js";
import type { CallMessage, WorkerMessage } from "../protocol/message.js";
import type { Remote } from "./page.js";

export interface BenchClient {
  readonly bench: Remote<Bench>;
  /** Ends the worker and starts another one; calls that were waiting fail. */
  restart(): void;
  /** Ends the worker for good. */
  end(): void;
}

interface Waiting {
  readonly resolve: (answer: unknown) => void;
  readonly reject: (fault: Error) => void;
}

/** The worker's methods as promises. `onFault` is told once when the worker itself broke down. */
export function createBenchClient(
  startWorker: () => Worker,
  onEvent: (event: BenchEvent) => void,
  onFault: (message: string) => void,
): BenchClient {
  const waiting = new Map<number, Waiting>();
  let last = 0;
  let hasEnded = false;
  let worker = start();

  function start(): Worker {
    const started = startWorker();
    started.onmessage = ({ data }: MessageEvent<WorkerMessage>) => receive(data);
    started.onerror = (event) => {
      event.preventDefault();
      // Workers that were ended already may still report.
      if (started === worker) onFault(event.message || "The worker could not be loaded.");
    };
    return started;
  }

  function receive(message: WorkerMessage): void {
    if ("event" in message) {
      onEvent(message.event);
      return;
    }
    const call = waiting.get(message.id);
    waiting.delete(message.id);
    if ("fault" in message) call?.reject(new Error(message.fault));
    else call?.resolve(message.answer);
  }

  function call(method: keyof Bench, given: readonly unknown[]): Promise<unknown> {
    if (hasEnded) return Promise.reject(new Error("The calculation was stopped."));
    last += 1;
    const message: CallMessage = { id: last, method, given };
    return new Promise((resolve, reject) => {
      waiting.set(message.id, { resolve, reject });
      worker.postMessage(message);
    });
  }

  const bench = new Proxy({} as Remote<Bench>, {
    get: (_, method) =>
      // A promise would be taken for one by await if it had a method `then`.
      method === "then" ? undefined : (...given: unknown[]) => call(method as keyof Bench, given),
  });

  function stop(): void {
    worker.terminate();
    for (const { reject } of waiting.values()) reject(new Error("The calculation broke down meanwhile."));
    waiting.clear();
  }

  return {
    bench,
    restart() {
      stop();
      worker = start();
    },
    end() {
      hasEnded = true;
      stop();
    },
  };
}
