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

/** The same for workbooks and plans. */
const planning = `
import { bookOf, cellOf, columnOf, planSteps, planTable, readSite, readWorkbook, runAll, type TableColumn, visitTable, writeWorkbook } from "barycell";

const book = bookOf([{ name: "Targets", columns: [columnOf(["P [d]", 0.1 + 0.2])] }]);
const again = await readWorkbook(await writeWorkbook({ book, sheets: [], notes: [] }));

const column = (header: string, ...cells: (string | number)[]): TableColumn => ({ header, column: columnOf(cells) });
const columns = [
  column("Target", "A", "B"), column("RA [deg]", 150, 150), column("Dec [deg]", -29, -29), column("Period [d]", 3, 3),
  column("T0 [BJD_TDB]", 2460310, 2460310), column("Visits", 1, 1), column("Exposure [s]", 3600, 3600), column("Overhead [s]", 0, 0),
  column("Priority", 1, 2),
];
const table = planTable(columns, { value: "Priority", named: new Map(), phases: [0.5], efficiency: 1 });
if ("problem" in table) throw new Error(table.problem);
const site = readSite("-70.7345 deg, -29.2584 deg, 2400 m", columns);
if ("problem" in site) throw new Error(site.problem);
const limits = { airmass: 2, sunBelow: -0.3, phaseWidth: 0.2, moonDistance: 0, perNight: 1, gap: 0 };
const plan = runAll(planSteps({ table, budget: 1, must: [], excluded: [], site, from: 9892.5, to: 9922.5, limits }));
if ("problem" in plan) throw new Error(plan.problem);
console.log(JSON.stringify([
  cellOf(again.book, { sheet: 0, row: 1, column: 0 }), plan.chosen.map(({ name }) => name), plan.schedule.visits.length, visitTable(plan).columns[0]?.length,
]));
`;

describe("the library", () => {
  let folder: string;

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), "barycell-library-"));
    await writeFile(join(folder, "package.json"), '{ "type": "module" }');
    await writeFile(join(folder, "program.ts"), program);
    await writeFile(join(folder, "planning.ts"), planning);
    await run("mkdir", ["node_modules"], { cwd: folder });
    await symlink(root, join(folder, "node_modules/barycell"));
    await symlink(join(root, "node_modules/@types"), join(folder, "node_modules/@types"));
  });

  afterAll(() => rm(folder, { recursive: true }));

  it("compiles against its types and runs", async () => {
    await run(join(root, "node_modules/.bin/tsc"), ["-p", join(root, "src/tsconfig.json")]);
    const options = [
      "--strict",
      "--target",
      "es2022",
      "--module",
      "nodenext",
      "--skipLibCheck",
      "program.ts",
      "planning.ts",
    ];
    await run(join(root, "node_modules/.bin/tsc"), options, { cwd: folder });
    const { stdout } = await run(process.execPath, ["program.js"], { cwd: folder });
    const [[[speed]], message, unit] = JSON.parse(stdout) as [[[number]], string, string];
    // Jupiter's pull on the Sun: 12.459080 m/s, computed with 60 digits (mpmath) from IAU 2015 B3.
    expect(speed).toBeCloseTo(12.45908, 6);
    expect(message).toContain("period is 4332.589 with no unit");
    expect(unit).toBe("km/s");

    const planned = await run(process.execPath, ["planning.js"], { cwd: folder });
    // The double 0.1 + 0.2 by its shortest decimal (IEEE 754); of two targets of an hour each, one hour holds the one worth more.
    expect(JSON.parse(planned.stdout)).toEqual([0.30000000000000004, ["B"], 1, 1]);
  });
});
