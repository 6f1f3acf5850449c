import type { Bench, BenchEvent } from "../protocol/bench.js";
import type { CallMessage, WorkerMessage } from "../protocol/message.js";
import type { Service } from "./service.js";

/** The worker's side of the line to the page. */
export interface Line {
  postMessage(message: WorkerMessage, transfer: Transferable[]): void;
}

/** Answers the page's calls, each by its number; what goes wrong in one is told to whoever called. */
export function answerCalls(line: Line, methods: Service<Bench>): (message: CallMessage) => Promise<void> {
  return async ({ id, method, given }) => {
    try {
      const answer: unknown = await (methods[method] as (...given: readonly unknown[]) => unknown)(...given);
      line.postMessage({ id, answer }, bytesOf(answer));
    } catch (error) {
      line.postMessage({ id, fault: error instanceof Error ? error.message : String(error) }, []);
    }
  };
}

/** A file goes over whole instead of being copied; nobody else holds its bytes. */
function bytesOf(answer: unknown): Transferable[] {
  const bytes = (answer as { bytes?: unknown } | undefined)?.bytes;
  return bytes instanceof Uint8Array ? [bytes.buffer as ArrayBuffer] : [];
}

export function tellEvents(line: Line): (event: BenchEvent) => void {
  return (event) => line.postMessage({ event }, []);
}
