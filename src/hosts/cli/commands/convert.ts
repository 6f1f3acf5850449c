import { sentenceOfTableFinding } from "../../../files/table/tableFinding.js";
import type { Command } from "../command.js";
import { type CommandLine, optionValue } from "../commandLine.js";
import { exitCode } from "../exitCode.js";
import { isSameFile } from "../isSameFile.js";
import { progressOn } from "../progress.js";
import { readTable, tableLayout } from "../readTable.js";
import { formNamed, formOfPath, type TableForm, tableForms } from "../tableForm.js";
import { tablePieces } from "../tablePieces.js";
import { UsageProblem } from "../usageProblem.js";
import { prepareFile } from "../writeFile.js";

const help = `barycell convert IN OUT [--to FORM] [--units row|header|ecsv]

Reads a table and writes it in another form, units, descriptions and UCDs with it. What IN is, its content tells, not
its name: CSV, TSV and other delimited text, ECSV, VOTable (TABLEDATA, BINARY, BINARY2), machine-readable tables with
a byte-by-byte description, IPAC tables, fixed-width tables with a rule or bars, workbooks (.xlsx). What OUT is, its
name tells: .csv, .tsv, .ecsv, .xml or .vot, .xlsx. Either may be - for standard input or output.

  --to FORM              ${tableForms.join(", ")}; needed where OUT's name does not tell
  --units row            in delimited text, units in a row under the header
  --units header         in delimited text, units in the headers: "Period [d]"
  --units ecsv           the same as --to ecsv: units in a described header above the rows
  --table NAME           which table of a file of several, by name or number
  --delimiter NAME       of IN, where it is delimited text: comma, semicolon, tab or bar
  --units-row yes|no     whether a row of units stands under the header of IN
  --force                let OUT be IN itself

On standard error: what to know of IN, and what OUT cannot hold. A text that begins with = + - or @ has an apostrophe
before it in delimited text, so that no program takes it for a formula; reading takes it away again.
`;

export const convert: Command = {
  name: "convert",
  summary: "write a table in another form",
  help,
  options: {
    "--to": 1,
    "--units": 1,
    "--table": 1,
    "--delimiter": 1,
    "--units-row": 1,
    "--force": 0,
  },
  async run(line, terminal) {
    const { path, out, form, units } = readRequest(line);
    const layout = tableLayout(line);
    if (!line.options.has("--force") && out !== "-" && (await isSameFile(path, out))) {
      throw new UsageProblem(
        `OUT "${out}" is the input itself; name another file, or add --force to replace the input.`,
      );
    }
    const write = out === "-" ? undefined : await prepareFile(out);
    const progress = progressOn(terminal);
    const table = await readTable(path, layout, terminal, progress).finally(() => progress.end());
    const { pieces, losses } = await tablePieces(table, form, units);
    if (write) await write(pieces);
    else for (const piece of pieces) await terminal.out(piece as string);
    for (const finding of table.findings) terminal.note(`${sentenceOfTableFinding(finding)}\n`);
    for (const loss of losses) terminal.note(`${loss}\n`);
    return exitCode.done;
  },
};

interface ConvertRequest {
  readonly path: string;
  readonly out: string;
  readonly form: TableForm;
  readonly units: "row" | "header" | undefined;
}

function readRequest(line: CommandLine): ConvertRequest {
  const [path, out] = line.operands;
  if (path === undefined || out === undefined || line.operands.length > 2) {
    throw new UsageProblem("give the table and where to write it, for example planets.xml planets.csv.");
  }
  const to = optionValue(line, "--to");
  const units = optionValue(line, "--units");
  if (units !== undefined && units !== "row" && units !== "header" && units !== "ecsv") {
    throw new UsageProblem(`--units is "${units}"; it is row, header or ecsv.`);
  }
  const asked = to === undefined ? (units === "ecsv" ? "ecsv" : formOfPath(out)) : formNamed(to);
  if (asked === undefined) {
    throw new UsageProblem(
      `"${out}" does not tell which form to write; add --to with one of ${tableForms.join(", ")}.`,
    );
  }
  const isDelimited = asked === "csv" || asked === "tsv";
  if (units !== undefined && (units === "ecsv" ? asked !== "ecsv" : !isDelimited)) {
    throw new UsageProblem(
      `--units ${units} does not go with ${asked}, which has a place of its own for units; leave it out.`,
    );
  }
  return { path, out, form: asked, units: units === "ecsv" ? undefined : units };
}
