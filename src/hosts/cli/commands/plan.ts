import { writeDelimited } from "../../../files/delimited/writeDelimited.js";
import type { TableFile } from "../../../files/table/tableFile.js";
import { sentenceOfTableFinding } from "../../../files/table/tableFinding.js";
import { type Plan, planSteps } from "../../../plan/plan.js";
import { planTable } from "../../../plan/planTable.js";
import { readSite } from "../../../plan/readSite.js";
import { tellPlan } from "../../../plan/tellPlan.js";
import { visitTable } from "../../../plan/visitTable.js";
import { runWatched } from "../../../plan/watch.js";
import type { TableColumn } from "../../../table/checkTable.js";
import type { Command } from "../command.js";
import { optionValue } from "../commandLine.js";
import { exitCode } from "../exitCode.js";
import { isSameFile } from "../isSameFile.js";
import { planJson } from "../planJson.js";
import { planOptions } from "../planOptions.js";
import { type Progress, progressOn } from "../progress.js";
import { readTable, tableLayout } from "../readTable.js";
import { UsageProblem } from "../usageProblem.js";
import { prepareFile } from "../writeFile.js";

const help = `barycell plan TABLE --hours HOURS --from DATE --to DATE --site SITE --value HEADER [...]

Chooses the targets whose values sum to the most within a number of hours, and lays their visits on dates: in the
dark, within the airmass limit, near the phases wanted. The choice is exact, of targets whose visits fit into the dates;
the schedule keeps every limit, and is no optimum.
Columns are recognised by their headers and units: RA, dec, period and reference time (BJD_TDB) with uncertainties,
visits, exposure, overhead, hours, eccentricity, omega. TABLE may be - for standard input.

  --hours HOURS          telescope time there is
  --from DATE --to DATE  evenings of the first and of the last night, 2027-02-01
  --site SITE            longitude (east positive), latitude and height, "-70.7345 deg, -29.2584 deg, 2400 m", or the
                         headers of three columns
  --value HEADER         column of what a target is worth
  --name HEADER          column of the targets' names
  --column NAME=HEADER   column of a quantity that is not recognised, --column "period=P orb [d]"; may be repeated
  --must NAME            a target that has to be in; may be repeated
  --exclude NAME         a target that must not be in; may be repeated
  --airmass LIMIT        2
  --sun ALTITUDE         it is dark with the Sun below it, -18 deg
  --moon DISTANCE        least distance from the Moon while it is up, 0 deg
  --phases PHASES        quadrature, any, or phases after the reference time, 0.25,0.75
  --width PART           how far from a phase a visit and the error of its phase may lie together, 0.1
  --per-night VISITS     visits to one target in a night, 1
  --gap TIME             least time between two visits to one target, 0 s
  --efficiency PART      part of the telescope time that can be used, 1; for targets without a column of hours
  --out OUT.csv          write the visits there instead of to standard output
  --summary FILE         write the summary there instead of to standard error
  --json                 write choice, visits and what was left out as JSON
  --strict               exit 1 if a chosen target lacks visits or a row cannot be planned
  --force, --delimiter NAME, --units-row yes|no, --table NAME   as for barycell fill

Exit code 1 also where the targets that have to be in need more hours than there are.
`;

export const plan: Command = {
  name: "plan",
  summary: "choose targets within a number of hours and lay their visits on dates",
  help,
  options: {
    ...Object.fromEntries(
      "hours from to site value name column must exclude airmass sun moon phases width per-night gap efficiency out summary delimiter units-row table"
        .split(" ")
        .map((name) => [`--${name}`, 1]),
    ),
    "--json": 0,
    "--strict": 0,
    "--force": 0,
  },
  async run(line, terminal) {
    const [path, ...more] = line.operands;
    if (path === undefined || more.length > 0) {
      throw new UsageProblem("give one table, for example targets.csv, or - for standard input.");
    }
    const options = planOptions(line);
    const layout = tableLayout(line);
    const [out, summary] = [optionValue(line, "--out"), optionValue(line, "--summary")];
    for (const [name, file] of [
      ["--out", out],
      ["--summary", summary],
    ] as const) {
      if (file !== undefined && file !== "-" && !line.options.has("--force") && (await isSameFile(path, file))) {
        throw new UsageProblem(
          `${name} "${file}" is the input itself; name another file, or add --force to replace it.`,
        );
      }
    }
    const write = out === undefined || out === "-" ? undefined : await prepareFile(out);
    const tell = summary === undefined || summary === "-" ? undefined : await prepareFile(summary);
    const progress = progressOn(terminal);
    const { table, found } = await (async () => {
      try {
        const table = await readTable(path, layout, terminal, progress);
        return { table, found: planned(table, options, progress) };
      } finally {
        progress.end();
      }
    })();
    if ("problem" in found) {
      terminal.note(`barycell plan: ${found.problem}\n`);
      if (line.options.has("--json")) await terminal.out(`${JSON.stringify({ error: { message: found.problem } })}\n`);
      return exitCode.cellError;
    }
    const pieces = line.options.has("--json")
      ? [`${JSON.stringify(planJson(found), null, 1)}\n`]
      : writeDelimited(visitTable(found));
    if (write) await write(pieces);
    else for (const piece of pieces) await terminal.out(piece);
    for (const finding of table.findings) terminal.note(`${sentenceOfTableFinding(finding)}\n`);
    const lines = tellPlan(found).map((text) => `${text}\n`);
    if (tell) await tell(lines);
    else terminal.note(lines.join(""));
    const isWhole = found.schedule.shortfalls.length === 0 && found.table.leftOut.length === 0;
    return line.options.has("--strict") && !isWhole ? exitCode.cellError : exitCode.done;
  },
};

/** The plan, or why the hours are too few; anything else that is wrong is a matter of the command line. */
function planned(
  table: TableFile,
  { wish, budget, must, excluded, site: siteText, from, to, limits }: ReturnType<typeof planOptions>,
  progress: Progress,
): Plan | { readonly problem: string } {
  const columns = table.header.map((header, index): TableColumn => {
    const unitCell = table.unitsRow?.[index];
    return { header, column: table.columns[index]!, ...(unitCell ? { unitCell } : {}) };
  });
  const read = planTable(columns, wish);
  if ("problem" in read) throw new UsageProblem(read.problem);
  const site = readSite(siteText, columns);
  if ("problem" in site) throw new UsageProblem(site.problem);
  const watch = { onProgress: (done: number) => progress.show("planning", done, "steps") };
  const found = runWatched(planSteps({ table: read, budget, must, excluded, site, from, to, limits }), watch)!;
  if ("problem" in found && found.about === "names") throw new UsageProblem(found.problem);
  return found;
}
