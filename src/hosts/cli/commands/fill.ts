import { sentenceOfTableFinding } from "../../../files/table/tableFinding.js";
import { type ColumnRequest, columnRequests } from "../columnRequest.js";
import type { Command } from "../command.js";
import { type CommandLine, optionValue } from "../commandLine.js";
import { exitCode } from "../exitCode.js";
import { filledPieces } from "../filledPieces.js";
import { fillSummary } from "../fillSummary.js";
import { fillTable } from "../fillTable.js";
import { isSameFile } from "../isSameFile.js";
import { previewTable } from "../previewTable.js";
import { progressOn } from "../progress.js";
import { readTable, type TableLayout, tableLayout } from "../readTable.js";
import type { Terminal } from "../terminal.js";
import { UsageProblem } from "../usageProblem.js";
import { prepareFile } from "../writeFile.js";

const help = `barycell fill IN --set HEADER FORMULA [--set HEADER FORMULA ...] [--out OUT]

Adds a column for each --set to the right of a table. The formula is that of the first data row (row 2; row 3 when a
row of units stands under the header) and is filled down; $ keeps a row or column in place. A result with
uncertainties takes the columns beside it too. IN is any file that barycell convert reads, or - for standard input.
Delimited text stays as it is to the character, with the columns added; of it the delimiter (comma, semicolon, tab,
bar), quotes, comment lines (#) and a row of units are recognised. Another form comes out where OUT's name ends in it
(.ecsv, .xml, .xlsx ...); a table that came in another form is written in its own where that can be, or as CSV.

  --set HEADER FORMULA   a column to add, for example --set "K [m/s]" "=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,E$1)"
  --out OUT              write there instead of to standard output
  --force                let OUT be the input itself
  --show ROWS            print the first rows as an aligned table instead of the file
  --strict               exit 1 if any cell has an error
  --delimiter NAME       comma, semicolon, tab or bar
  --units-row yes|no     whether a row of units stands under the header
  --table NAME           which table of a file of several, by name or number

On standard error: progress of long files, then rows, columns added, cells that need attention, and each distinct
problem once with its first cell and its count.
`;

export const fill: Command = {
  name: "fill",
  summary: "add derived columns to a table",
  help,
  options: {
    "--set": 2,
    "--out": 1,
    "--force": 0,
    "--show": 1,
    "--strict": 0,
    "--delimiter": 1,
    "--units-row": 1,
    "--table": 1,
  },
  async run(line, terminal) {
    const { path, out, show, requests } = readRequest(line);
    const layout = tableLayout(line);
    if (out !== undefined && !line.options.has("--force") && (await isSameFile(path, out))) {
      throw new UsageProblem(
        `--out "${out}" is the input itself; name another file, or add --force to replace the input.`,
      );
    }
    const write = out === undefined ? undefined : await prepareFile(out);
    const { table, filled } = await derive(path, layout, requests, terminal);
    const { pieces, losses } =
      show === undefined
        ? await filledPieces(table, filled.added, out)
        : { pieces: previewTable(table, filled.added, show), losses: [] };
    if (write) await write(pieces);
    else for (const piece of pieces) await terminal.out(piece);
    for (const loss of losses) terminal.note(`${loss}\n`);
    for (const finding of table.findings) terminal.note(`${sentenceOfTableFinding(finding)}\n`);
    terminal.note(fillSummary(table, filled));
    const failed = filled.problems.length > 0 && line.options.has("--strict");
    return failed ? exitCode.cellError : exitCode.done;
  },
};

async function derive(path: string, layout: TableLayout, requests: readonly ColumnRequest[], terminal: Terminal) {
  const progress = progressOn(terminal);
  try {
    const table = await readTable(path, layout, terminal, progress);
    return { table, filled: fillTable(table, requests, progress) };
  } finally {
    progress.end();
  }
}

interface FillRequest {
  readonly path: string;
  readonly out: string | undefined;
  readonly show: number | undefined;
  readonly requests: readonly ColumnRequest[];
}

function readRequest(line: CommandLine): FillRequest {
  const [path, ...more] = line.operands;
  if (path === undefined) throw new UsageProblem("give one table, for example targets.csv, or - for standard input.");
  if (more.length > 0)
    throw new UsageProblem(
      `give one table; ${line.operands.map((operand) => `"${operand}"`).join(", ")} came. Texts with spaces or $ need quotes.`,
    );
  const requests = columnRequests(line);
  if (requests.length === 0) throw new UsageProblem('say which column to add: --set "K [m/s]" "=BARY.REFLEX(...)".');
  const out = optionValue(line, "--out");
  const shown = optionValue(line, "--show");
  const show = shown === undefined ? undefined : Number(shown);
  if (show !== undefined && !(Number.isInteger(show) && show > 0))
    throw new UsageProblem(`--show is "${shown}"; it is a number of rows, for example 20.`);
  return { path, out: out === "-" ? undefined : out, show, requests };
}
