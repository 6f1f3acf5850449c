import { execFile } from "node:child_process";
import { mkdtemp, rm, symlink, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { promisify } from "node:util";
import { afterAll, beforeAll, describe, expect, it } from "vitest";

const root = fileURLToPath(new URL("..", import.meta.url));
const run = promisify(execFile);

/** A program of somebody else, with the package among its modules. */
const program = `
import { blockOf, cellsOf, type Cell, CellError, findCellFunction, isProblem, readUnit } from "barycell";

const reflex = findCellFunction("BARY.REFLEX")!;
const cell = (value: Cell) => ({ block: blockOf([[value]]) });
const result = reflex.once([cell("4332.589 d"), cell("1 solMass"), cell(1), undefined, undefined, cell("d; solMass; jupiterMass")]);
const bare = reflex.once([cell(4332.589), cell("1 solMass"), cell(1)]);
const unit = readUnit("km s-1");
const error = cellsOf(bare)[0]![0]!;
console.log(JSON.stringify([cellsOf(result), error instanceof CellError && error.message, isProblem(unit) || unit.text]));
`;

describe("the library", () => {
  let folder: string;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), "barycell-library-"));
    await writeFile(join(folder, "package.json"), '{ "type": "module" }');
    await writeFile(join(folder, "program.ts"), program);
    await run("mkdir", ["node_modules"], { cwd: folder });
    await symlink(root, join(folder, "node_modules/barycell"));
    await symlink(join(root, "node_modules/@types"), join(folder, "node_modules/@types"));
  });

  afterAll(() => rm(folder, { recursive: true }));

  it("compiles against its types and runs", async () => {
    await run(join(root, "node_modules/.bin/tsc"), ["-p", join(root, "src/tsconfig.json")]);
    const options = ["--strict", "--target", "es2022", "--module", "nodenext", "--skipLibCheck", "program.ts"];
    await run(join(root, "node_modules/.bin/tsc"), options, { cwd: folder });
    const { stdout } = await run(process.execPath, ["program.js"], { cwd: folder });
    const [[[speed]], message, unit] = JSON.parse(stdout) as [[[number]], string, string];
    // Jupiter's pull on the Sun: 12.459080 m/s, computed with 60 digits (mpmath) from IAU 2015 B3.
    expect(speed).toBeCloseTo(12.45908, 6);
    expect(message).toContain("period is 4332.589 with no unit");
    expect(unit).toBe("km/s");
  });
});
