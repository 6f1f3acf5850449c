import { execFileSync, spawnSync } from "node:child_process";
import { mkdtempSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { randomNumbers, report } from "./timing.js";

const rows = 1_000_000;
const root = fileURLToPath(new URL("../..", import.meta.url));
const hook = 'process.on("exit",()=>process.stderr.write("\npeak "+process.resourceUsage().maxRSS))';
const atExit = `data:text/javascript,${hook}`;

/** `barycell fill` of three columns against a program that only parses and writes the same file, and papaparse alone. */
export function benchFill(): void {
  const folder = mkdtempSync(join(tmpdir(), "barycell-bench-"));
  try {
    const table = join(folder, "targets.csv");
    writeFileSync(table, tableText());
    execFileSync("npx", ["webpack", "--mode", "production"], { cwd: root, stdio: "ignore" });
    const sets = [
      ["Axis [AU]", "=BARY.AXIS(B2,C2,D2,B$1:D$1,G$1)"],
      ["K [m/s]", "=BARY.REFLEX(B2,C2,D2,E2,F2,B$1:F$1,H$1)"],
      ["Shift", "=BARY.SHIFT(H2,,H$1)"],
    ].flatMap(([header, formula]) => ["--set", header!, formula!]);
    const ours = measure(["dist/cli.js", "fill", table, ...sets, "--out", join(folder, "out.csv")]);
    const bare = measure(["--import", "tsx", "test/bench/parseAndWrite.ts", table, join(folder, "bare.csv")]);
    const papa = measure(["test/bench/papaParseAndWrite.js", table, join(folder, "papa.csv")]);
    const megabytes = (statSync(table).size / 1e6).toFixed(0);
    const text = ({ seconds, peak }: Measured) => `${seconds.toFixed(2)} s ${peak.toFixed(0)} MB`;
    const what = `fill ${megabytes} MB, 1,000,000 rows x 3 columns`;
    report(what, text(ours), `${text(bare)} parse+write`, ours.seconds / bare.seconds, "aim <= 2, <= 600 MB");
    report(what, text(ours), `${text(papa)} papaparse`, ours.seconds / papa.seconds, "");
  } finally {
    rmSync(folder, { recursive: true });
  }
}

interface Measured {
  readonly seconds: number;
  /** Resident memory at its largest [MB]. */
  readonly peak: number;
}

function measure(words: readonly string[]): Measured {
  const runs = [0, 1, 2].map(() => {
    const start = performance.now();
    const { stderr, status } = spawnSync(process.execPath, ["--import", atExit, ...words], {
      cwd: root,
      encoding: "utf8",
    });
    if (status !== 0) throw new Error(stderr);
    return { seconds: (performance.now() - start) / 1000, peak: Number(/peak (\d+)/.exec(stderr)![1]) / 1024 };
  });
  return runs.reduce((best, run) => (run.seconds < best.seconds ? run : best));
}

function tableText(): string {
  const random = randomNumbers(2);
  const lines = ["Target,Period [d],Star mass [solMass],Planet mass [jupiterMass],Eccentricity,Inclination [deg]"];
  for (let row = 0; row < rows; row++) {
    const numbers = [1 + 999 * random(), 0.1 + random(), 0.01 + 5 * random(), 0.9 * random(), 30 + 60 * random()];
    lines.push([`T${row}`, ...numbers.map((number) => number.toPrecision(7))].join(","));
  }
  return `${lines.join("\n")}\n`;
}
