import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";

/** A folder for the files of one test file. */
export interface WorkFolder {
  readonly path: string;
  write(name: string, text: string | Uint8Array): void;
  read(name: string): string;
  names(): string[];
  remove(): void;
}

export function workFolder(): WorkFolder {
  const path = mkdtempSync(join(tmpdir(), "barycell-"));
  return {
    path,
    write: (name, text) => writeFileSync(join(path, name), text),
    read: (name) => readFileSync(join(path, name), "utf8"),
    names: () => readdirSync(path).sort(),
    remove: () => rmSync(path, { recursive: true }),
  };
}
