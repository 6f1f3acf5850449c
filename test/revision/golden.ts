import { readFileSync, writeFileSync } from "node:fs";
import { expect } from "vitest";

/**
 * Compares a text with the one that was read and approved in golden/. BARYCELL_WRITE_GOLDEN=1 writes the file anew;
 * its difference is to be read before it is committed.
 */
export function expectGolden(name: string, text: string): void {
  const path = new URL(`golden/${name}.txt`, import.meta.url);
  if (process.env.BARYCELL_WRITE_GOLDEN === "1") writeFileSync(path, text);
  expect(text).toBe(readFileSync(path, "utf8"));
}
