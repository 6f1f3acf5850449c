import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";
import { expect, test } from "vitest";
import { library } from "../../../src/sheet/worksheetFunctions/library/fromLibrary.js";

type Computing = (...values: number[]) => unknown;

// The bundles leave out what the library stands on (webpack.config.js); what is taken from it must not need that.
test("the functions taken from the library give the same without its own dependencies", async () => {
  const source = readFileSync(fileURLToPath(import.meta.resolve("@formulajs/formulajs")), "utf8");
  const bare = source.replace(/^import (\w+) from '(?:jstat|bessel)';$/gm, "const $1 = undefined;");
  expect(bare.match(/^import /gm)).toBeNull();
  expect(bare).not.toBe(source);
  const folder = mkdtempSync(join(tmpdir(), "barycell-formulajs-"));
  try {
    writeFileSync(join(folder, "bare.mjs"), bare);
    const without: Record<string, Computing> = await import(pathToFileURL(join(folder, "bare.mjs")).href);
    expect(() => without.NORMSDIST?.(1)).toThrow(TypeError);
    for (const [name, compute] of Object.entries(library)) {
      for (const values of [[0.1, 12, 100, 1, 6, 0], [1000, 100, 6, 2, 12], [4, 3, 2], [0.5, 4], [9]]) {
        const result = (of: Computing) => {
          try {
            return String(of(...values));
          } catch (error) {
            return `thrown ${(error as Error).message}`;
          }
        };
        expect(result(without[name]!), name).toBe(result(compute as Computing));
      }
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
});
