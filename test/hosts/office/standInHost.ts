import { afterAll, beforeAll } from "vitest";

/** The host's error class as far as ours needs it. */
export class HostError extends Error {
  constructor(
    readonly code: string,
    message?: string,
  ) {
    super(message);
  }
}

/** Lets the tests of a file see a host's global name, and takes it away again. */
export function standInHost(): void {
  const world = globalThis as { CustomFunctions?: unknown };
  beforeAll(() => {
    world.CustomFunctions = { Error: HostError };
  });
  afterAll(() => {
    delete world.CustomFunctions;
  });
}

/** What a host would show wrongly of a result: it makes 0 of whatever it does not know. */
export function misshown(result: unknown): string[] {
  if (!Array.isArray(result) || result.length === 0) return ["not a matrix"];
  const width = Array.isArray(result[0]) ? result[0].length : -1;
  return result.flatMap((row: unknown, index) => {
    if (!Array.isArray(row) || row.length !== width || width === 0) return [`row ${index} is ragged`];
    return row.flatMap((cell: unknown) => {
      const kept =
        cell instanceof HostError ||
        typeof cell === "string" ||
        typeof cell === "boolean" ||
        (typeof cell === "number" && Number.isFinite(cell));
      return kept ? [] : [`row ${index} holds ${cell}`];
    });
  });
}
