import { basename, resolve } from "node:path";
import { FileProblem } from "../../../files/fileProblem.js";
import { isPacked, refuseOtherKinds } from "../../../files/otherKinds.js";
import { sentenceOfTableFinding } from "../../../files/table/tableFinding.js";
import { bookTable } from "../../../revision/bookTable.js";
import type { Ledger } from "../../../revision/ledger.js";
import { ledgerMarkdown } from "../../../revision/ledgerMarkdown.js";
import { ledgerOf } from "../../../revision/ledgerOf.js";
import { ledgerText } from "../../../revision/ledgerRecord.js";
import type { Alias } from "../../../revision/matchKeys.js";
import { planLines } from "../../../revision/planLines.js";
import { planRevision, type RevisionPlan } from "../../../revision/planRevision.js";
import { revisionEdits } from "../../../revision/revisionEdits.js";
import { sentenceOfRevisionFinding } from "../../../revision/revisionFinding.js";
import { RevisionRefused } from "../../../revision/revisionRefused.js";
import { sha256 } from "../../../revision/sha256.js";
import type { Book } from "../../../sheet/book/book.js";
import { changeWatched } from "../../../sheet/change.js";
import { columnRequests } from "../columnRequest.js";
import type { Command } from "../command.js";
import { type CommandLine, optionValue } from "../commandLine.js";
import { exitCode } from "../exitCode.js";
import { inputBytes } from "../inputBytes.js";
import { IoProblem } from "../ioProblem.js";
import { isSameFile } from "../isSameFile.js";
import { type Progress, progressOn } from "../progress.js";
import { readBook } from "../readBook.js";
import { readTable, tableLayout } from "../readTable.js";
import { type Revisable, revisableTable, revisableWorkbook } from "../revisable.js";
import type { Terminal } from "../terminal.js";
import { UsageProblem } from "../usageProblem.js";
import { functions } from "../worksheet.js";
import { prepareFile } from "../writeFile.js";

const help = `barycell revise TABLE --with NEW --key HEADER [--set HEADER FORMULA ...] [--out FILE]

Takes revised values over from another table and tells what they move: a ledger of every derived number, before and
after, and of the input that moved it most. Rows are matched by the column HEADER: as written, then without regard to
blanks and capitals, then by --alias. Columns are matched by name, else by the quantity both hold, and converted to
TABLE's units. TABLE is a workbook (.xlsx), whose formulas are calculated, or any table that barycell convert reads,
with columns to derive as in barycell fill. TABLE stays as it is unless FILE is TABLE.

  --with NEW             the table with the revised values, in any form that barycell convert reads
  --key HEADER           the column that names the rows in both
  --alias OLD=NEW        a row called OLD in TABLE and NEW in the revision; may be given several times
  --set HEADER FORMULA   a column to derive, as in barycell fill
  --condition TEXT       a threshold to watch, for example "K >= 1 m/s"; may be given several times
  --erase-blanks         let blanks of NEW erase what stands in TABLE; else it stays
  --out FILE             write TABLE with the revised values
  --force                let FILE be TABLE itself
  --report FILE          write the report there, in Markdown, instead of to standard output
  --show CHANGES         how many of the most important changes the report lists; 20 if not given
  --json                 print {"matched", "findings", "ledger"} with every change instead of the report; see README
  --dry-run              tell all of it and write no file
  --fail-on-crossing     exit ${exitCode.crossed} if any row crossed a condition
  --table NAME           which table or sheet of TABLE, by name or number; --with-table NAME, which of NEW
  --delimiter NAME       of TABLE, where it is delimited text: comma, semicolon, tab or bar
  --units-row yes|no     whether a row of units stands under the header of TABLE

Either table may be - for standard input. Exits ${exitCode.cellError} if no column could be taken over.
`;

export const revise: Command = {
  name: "revise",
  summary: "take over revised values and tell what they move",
  help,
  options: {
    "--with": 1,
    "--key": 1,
    "--alias": 1,
    "--set": 2,
    "--condition": 1,
    "--erase-blanks": 0,
    "--out": 1,
    "--force": 0,
    "--report": 1,
    "--show": 1,
    "--json": 0,
    "--dry-run": 0,
    "--fail-on-crossing": 0,
    "--table": 1,
    "--with-table": 1,
    "--delimiter": 1,
    "--units-row": 1,
  },
  async run(line, terminal) {
    const request = readRequest(line);
    const { out, report, isDry } = request;
    if (!isDry) await refuseInputs(request, line.options.has("--force"));
    const writeOut = out === undefined || isDry ? undefined : await prepareFile(out);
    const writeReport = report === undefined || isDry ? undefined : await prepareFile(report);
    const progress = progressOn(terminal);
    try {
      const revisable = await readRevisable(line, request, terminal, progress);
      const { plan, ledger, after } = await revised(line, request, revisable, terminal, progress);
      progress.end();
      for (const note of revisable.notes) terminal.note(`${note}\n`);
      if (writeOut) {
        const { pieces, losses } = await revisable.pieces(after, out!);
        await writeOut(pieces);
        for (const loss of losses) terminal.note(`${loss}\n`);
      }
      const text = ledgerMarkdown(ledger, request.show, planLines(plan));
      if (writeReport) await writeReport(text);
      if (request.isJson) for (const piece of jsonAnswer(plan, ledger)) await terminal.out(piece);
      else if (!writeReport) for (const piece of text) await terminal.out(piece);
      return exitCodeOf(line, plan, ledger);
    } catch (error) {
      if (error instanceof RevisionRefused) throw new UsageProblem(error.message);
      if (error instanceof FileProblem) throw new IoProblem(`${request.path}: ${error.message}`);
      throw error;
    } finally {
      progress.end();
    }
  },
};

function exitCodeOf(line: CommandLine, plan: RevisionPlan, { conditions }: Ledger): number {
  if (plan.columns.length === 0) return exitCode.cellError;
  const isCrossed = conditions.some(({ gained, lost }) => gained.length + lost.length > 0);
  return isCrossed && line.options.has("--fail-on-crossing") ? exitCode.crossed : exitCode.done;
}

interface ReviseRequest {
  readonly path: string;
  readonly from: string;
  readonly key: string;
  readonly aliases: readonly Alias[];
  readonly conditions: readonly string[];
  readonly out: string | undefined;
  readonly report: string | undefined;
  readonly show: number;
  readonly isJson: boolean;
  readonly isDry: boolean;
}

function readRequest(line: CommandLine): ReviseRequest {
  const [path, ...more] = line.operands;
  const from = optionValue(line, "--with");
  const key = optionValue(line, "--key");
  if (path === undefined || more.length > 0 || from === undefined || key === undefined) {
    throw new UsageProblem(
      'give one table, the revised one and the column that names the rows: targets.csv --with new.csv --key "Target".',
    );
  }
  if (path === "-" && from === "-") throw new UsageProblem("only one of the tables can come from standard input.");
  const shown = optionValue(line, "--show") ?? "20";
  const show = Number(shown);
  if (!(Number.isInteger(show) && show > 0)) {
    throw new UsageProblem(`--show is "${shown}"; it is a number of changes, for example 20.`);
  }
  const all = (name: string) => (line.options.get(name) ?? []).map(([value]) => value!);
  return {
    path,
    from,
    key,
    aliases: all("--alias").map(readAlias),
    conditions: all("--condition"),
    out: optionValue(line, "--out"),
    report: optionValue(line, "--report"),
    show,
    isJson: line.options.has("--json"),
    isDry: line.options.has("--dry-run"),
  };
}

function readAlias(text: string): Alias {
  const equals = text.indexOf("=");
  const [old, now] = [text.slice(0, Math.max(0, equals)).trim(), text.slice(equals + 1).trim()];
  if (equals < 0 || old === "" || now === "") {
    throw new UsageProblem(`--alias is "${text}"; write OLD=NEW, for example "HD 1=HIP 1234".`);
  }
  return { old, new: now };
}

/** No file is written over one that is read, but the table where that was asked for. */
async function refuseInputs({ path, from, out, report }: ReviseRequest, isForced: boolean): Promise<void> {
  if (out !== undefined && !isForced && (await isSameFile(path, out))) {
    throw new UsageProblem(
      `--out "${out}" is the table itself; name another file, or add --force to replace the table.`,
    );
  }
  const refused = [
    ["--out", out, [from]],
    ["--report", report, [path, from, ...(out === undefined ? [] : [out])]],
  ] as const;
  for (const [option, target, others] of refused) {
    for (const other of others) {
      if (target === undefined || !(resolve(target) === resolve(other) || (await isSameFile(other, target)))) continue;
      throw new UsageProblem(`${option} "${target}" is read or written already; name another file.`);
    }
  }
}

/** The content tells whether it is a workbook, whose formulas count, or a table. */
async function readRevisable(
  line: CommandLine,
  { path }: ReviseRequest,
  terminal: Terminal,
  progress: Progress,
): Promise<Revisable> {
  const { opening, input } = await inputBytes(path, terminal);
  const requests = columnRequests(line);
  if (isWorkbook(path, opening)) {
    if (requests.length > 0) {
      throw new UsageProblem("a workbook has its own formulas; --set goes with tables of other forms.");
    }
    return revisableWorkbook(await readBook(path, { ...terminal, input }), optionValue(line, "--table"));
  }
  const table = await readTable(path, tableLayout(line), { ...terminal, input }, progress);
  return revisableTable(table, requests, progress);
}

function isWorkbook(path: string, opening: Uint8Array): boolean {
  try {
    refuseOtherKinds(opening);
    return isPacked(opening);
  } catch (error) {
    if (error instanceof FileProblem) throw new IoProblem(`${path}: ${error.message}`);
    throw error;
  }
}

async function revised(
  line: CommandLine,
  request: ReviseRequest,
  { book, sheet }: Revisable,
  terminal: Terminal,
  progress: Progress,
): Promise<{ readonly plan: RevisionPlan; readonly ledger: Ledger; readonly after: Book }> {
  const digest = sha256();
  const table = optionValue(line, "--with-table");
  const layout = { delimiter: undefined, unitsRow: undefined, table };
  const revision = await readTable(request.from, layout, terminal, progress, digest.push);
  for (const finding of revision.findings) terminal.note(`${request.from}: ${sentenceOfTableFinding(finding)}\n`);
  const { key, aliases, conditions, from } = request;
  const plan = planRevision(bookTable(book, sheet)!, revision, { key, aliases, erases: line.options.has("--erase-blanks") }); // biome-ignore format: one call
  const watch = { onProgress: (done: number) => progress.show("calculating", done) };
  const after = changeWatched(book, revisionEdits(plan), functions, watch)!;
  const source = {
    date: new Date().toISOString(),
    file: from === "-" ? from : basename(from),
    sha256: digest.finish(),
  };
  return { plan, after, ledger: ledgerOf(book, after, sheet, conditions, source, plan.key.header) };
}

function* jsonAnswer(plan: RevisionPlan, ledger: Ledger): Generator<string> {
  const { exact, folded, aliased, onlyInTable, onlyInRevision, ambiguous } = plan.match;
  const matched = {
    exact,
    folded,
    aliased,
    onlyInTable: onlyInTable.length,
    onlyInRevision: onlyInRevision.length,
    ambiguous: ambiguous.length,
  };
  const findings = plan.findings.map((finding) => ({
    about: finding.about,
    message: sentenceOfRevisionFinding(finding),
  }));
  yield `{"matched":${JSON.stringify(matched)},\n"findings":${JSON.stringify(findings)},\n"ledger":`;
  yield* ledgerText(ledger);
  yield "}\n";
}
