import { spawnSync } from "node:child_process";
import { mkdtempSync, openSync, rmSync, statSync, writeSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { columnOf } from "../../src/call/column.js";
import { writeDelimited } from "../../src/files/delimited/writeDelimited.js";
import { writeEcsv } from "../../src/files/ecsv/writeEcsv.js";
import { writeVotable } from "../../src/files/votable/writeVotable.js";
import { randomNumbers, report } from "./timing.js";

const rows = 1_000_000;
const root = fileURLToPath(new URL("../..", import.meta.url));

/** Reading 1,000,000 rows x 5 columns of each form, each in a process of its own, against the bare parser of CSV. */
export function benchFormats(): void {
  const folder = mkdtempSync(join(tmpdir(), "barycell-bench-"));
  try {
    const table = inventedTable();
    const files = {
      CSV: write(folder, "t.csv", writeDelimited(table)),
      ECSV: write(folder, "t.ecsv", writeEcsv(table)),
      "VOTable TABLEDATA": write(folder, "t.xml", writeVotable(table)),
      "VOTable BINARY2": write(folder, "t2.xml", writeVotable(table, "BINARY2")),
    };
    const parser = measure("parser", files.CSV);
    const csv = measure("ours", files.CSV);
    const splitter = measure("splitter", files.CSV);
    report("CSV, against papaparse with numbers", text(csv), text(parser), csv.seconds / parser.seconds, "aim <= 1.5");
    report(
      "CSV, against papaparse, texts only",
      text(csv),
      text(splitter),
      csv.seconds / splitter.seconds,
      "aim <= 1.5",
    );
    for (const [name, path] of Object.entries(files).slice(1)) {
      const one = measure("ours", path);
      const size = `${(statSync(path).size / 1e6).toFixed(0)} MB`;
      report(`${name}, ${size}`, text(one), `${text(csv)} our CSV`, one.seconds / csv.seconds, "");
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
}

interface Measured {
  readonly seconds: number;
  /** Resident memory at its largest [MB]. */
  readonly peak: number;
}

function text({ seconds, peak }: Measured): string {
  return `${seconds.toFixed(2)} s ${peak.toFixed(0)} MB`;
}

/** The best of three: time within the process, so that starting it does not count. */
function measure(how: "ours" | "parser" | "splitter", path: string): Measured {
  const runs = [0, 1, 2].map(() => {
    const words = ["--import", "tsx", "test/bench/readForm.ts", how, path];
    const { stdout, stderr, status } = spawnSync(process.execPath, words, { cwd: root, encoding: "utf8" });
    if (status !== 0) throw new Error(stderr);
    return JSON.parse(stdout) as Measured;
  });
  return runs.reduce((best, run) => (run.seconds < best.seconds ? run : best));
}

function inventedTable() {
  const random = randomNumbers(3);
  const numbers = (from: number, range: number) => {
    const cells = Array.from({ length: rows }, () => Number((from + range * random()).toPrecision(7)));
    return columnOf(cells);
  };
  return {
    header: ["Target", "Period [d]", "Star mass [solMass]", "Planet mass [jupiterMass]", "Eccentricity"],
    columns: [
      columnOf(Array.from({ length: rows }, (_, row) => `T${row}`)),
      numbers(1, 999),
      numbers(0.1, 1),
      numbers(0.01, 5),
      numbers(0, 0.9),
    ],
  };
}

function write(folder: string, name: string, pieces: Iterable<string>): string {
  const path = join(folder, name);
  const file = openSync(path, "w");
  for (const piece of pieces) writeSync(file, piece);
  return path;
}
