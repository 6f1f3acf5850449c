import { execFile } from "node:child_process";
import { fileURLToPath } from "node:url";

const command = fileURLToPath(new URL("../../../dist/cli.js", import.meta.url));

export interface Ended {
  readonly code: number;
  readonly out: string;
  readonly note: string;
}

export interface Surroundings {
  readonly folder?: string;
  readonly input?: string | Uint8Array;
}

/** Runs the built command as a process of its own: how it ended, and what it wrote to standard output and error. */
export function barycell(words: readonly string[], { folder, input = "" }: Surroundings = {}): Promise<Ended> {
  return new Promise((resolve, reject) => {
    const child = execFile(
      process.execPath,
      [command, ...words],
      { cwd: folder, maxBuffer: 1 << 26 },
      (error, out, note) => {
        if (error && typeof error.code !== "number") reject(error);
        else resolve({ code: error ? Number(error.code) : 0, out, note });
      },
    );
    child.stdin?.on("error", () => undefined);
    child.stdin?.end(input);
  });
}
