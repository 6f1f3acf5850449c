import { execFile } from "node:child_process";
import { fileURLToPath } from "node:url";
import { describe, expect, it } from "vitest";

const root = fileURLToPath(new URL("../..", import.meta.url));

interface Violation {
  readonly from: string;
  readonly rule: { readonly name: string };
}

/** The layer check run over the sources in a folder. */
function violationsIn(folder: string): Promise<readonly Violation[]> {
  const words = [
    `${root}/node_modules/.bin/depcruise`,
    "--config",
    `${root}/.dependency-cruiser.cjs`,
    "--output-type",
    "json",
    "src",
  ];
  return new Promise((resolve) => {
    execFile(process.execPath, words, { cwd: folder, maxBuffer: 1 << 28 }, (_, stdout) => {
      resolve((JSON.parse(stdout) as { summary: { violations: Violation[] } }).summary.violations);
    });
  });
}

describe("the layer check", () => {
  it("fires on each planted violation", async () => {
    const found = (await violationsIn(`${root}/test/layers/planted`)).map(({ from, rule }) => `${from}: ${rule.name}`);
    expect([...new Set(found)].sort()).toEqual([
      "src/call/answer.ts: only-hosts-know-the-machine",
      "src/hosts/one/one.ts: hosts-stay-apart",
      "src/kernel/importsUnits.ts: kernel-imports-nothing",
      "src/kernel/importsUnits.ts: kernel-imports-only-downwards",
      "src/sheet/first.ts: no-circles",
      "src/units/importsCall.ts: units-imports-only-downwards",
    ]);
  });

  it("finds none in the sources", async () => {
    expect(await violationsIn(root)).toEqual([]);
  });
});
