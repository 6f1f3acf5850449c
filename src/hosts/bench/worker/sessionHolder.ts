import type { BenchEvent } from "../protocol/bench.js";
import type { Session } from "./session.js";

/** Where the open session lives: the service reads it, and puts the next one in its place. */
export interface SessionHolder {
  session(): Session;
  /** Takes the next session; whoever holds it sends the state to the page and saves the book. */
  replace(session: Session): void;
  emit(event: BenchEvent): void;
}
