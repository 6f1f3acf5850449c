import { type Cell, CellError } from "../../../call/cell.js";
import { writeWorkbook } from "../../../files/xlsx/writeWorkbook.js";
import { addressText } from "../../../sheet/book/address.js";
import type { Book } from "../../../sheet/book/book.js";
import { changeWatched } from "../../../sheet/change.js";
import { recalculate } from "../../../sheet/edit/recalculate.js";
import { type ChangedCell, changedCells } from "../changedCells.js";
import { changeLines, counted } from "../changeLines.js";
import type { Command } from "../command.js";
import { type CommandLine, optionValue } from "../commandLine.js";
import { exitCode } from "../exitCode.js";
import { isSameFile } from "../isSameFile.js";
import { progressOn } from "../progress.js";
import { readBook } from "../readBook.js";
import type { Terminal } from "../terminal.js";
import { UsageProblem } from "../usageProblem.js";
import { functions } from "../worksheet.js";
import { prepareFile } from "../writeFile.js";

/** Programs that store 15 digits are off by up to 5e-15; a few steps of rounding in a formula are far below this. */
const usualTolerance = 1e-12;

const help = `barycell recalc BOOK.xlsx [--out FILE] [--json]

Calculates every formula of a workbook anew and prints which values in it changed: sheet and cell, the value that the
file holds, the value now, in brackets the change over the larger of both, and the formula. Cells of one column that
one formula was filled to share a line. A change is more than rounding where that ratio is above ${usualTolerance}, or where
either value is no number. A dash reads the workbook from standard input.

  --out FILE         write the workbook with the new values
  --force            let FILE be the workbook itself
  --tolerance RATIO  another limit, for example 1e-9
  --json             {"formulas", "tolerance", "changed", "changes": [{"sheet", "cell", "formula", "before", "now",
                     "relative"}], "kept", "notes"} with every digit and every cell

Exits ${exitCode.changed} if anything changed, 0 if nothing did. Formulas that cannot be calculated here (of functions that are not
known, of other files) keep their values and are counted on standard error.
`;

export const recalc: Command = {
  name: "recalc",
  summary: "calculate a workbook (.xlsx) anew and tell what changed",
  help,
  options: { "--out": 1, "--force": 0, "--tolerance": 1, "--json": 0 },
  async run(line, terminal) {
    const { path, out, tolerance } = readRequest(line);
    if (out !== undefined && !line.options.has("--force") && (await isSameFile(path, out))) {
      throw new UsageProblem(
        `--out "${out}" is the workbook itself; name another file, or add --force to replace the workbook.`,
      );
    }
    const write = out === undefined ? undefined : await prepareFile(out);
    const workbook = await readBook(path, terminal);
    const book = calculated(workbook.book, terminal);
    const summary = { tolerance, notes: workbook.notes, ...countFormulas(workbook.book) };
    const changes = changedCells(workbook.book, book, tolerance);
    const count = line.options.has("--json")
      ? await printJson(book, changes, summary, terminal)
      : await printLines(book, changes, summary, terminal);
    if (write) {
      await write([await writeWorkbook({ ...workbook, book })]);
      for (const note of workbook.notes) terminal.note(`${note}\n`);
    }
    return count > 0 ? exitCode.changed : exitCode.done;
  },
};

function readRequest(line: CommandLine) {
  const [path, ...more] = line.operands;
  if (path === undefined || more.length > 0) {
    throw new UsageProblem("give one workbook, for example targets.xlsx, or - for standard input.");
  }
  const text = optionValue(line, "--tolerance");
  const tolerance = text === undefined ? usualTolerance : Number(text);
  if (!(tolerance >= 0 && tolerance < 1) || text?.trim() === "") {
    throw new UsageProblem(`--tolerance is "${text}"; it is a ratio from 0 to below 1, for example 1e-9.`);
  }
  return { path, out: optionValue(line, "--out"), tolerance };
}

function calculated(book: Book, terminal: Terminal): Book {
  const progress = progressOn(terminal);
  const edit = recalculate(({ problem }) => problem === undefined);
  try {
    return changeWatched(book, [edit], functions, { onProgress: (done) => progress.show("calculating", done) }) ?? book;
  } finally {
    progress.end();
  }
}

interface Summary {
  readonly tolerance: number;
  readonly notes: readonly string[];
  readonly formulas: number;
  /** Formulas that cannot be calculated here. */
  readonly kept: number;
  readonly firstKept: string | undefined;
}

function countFormulas(book: Book): Pick<Summary, "formulas" | "kept" | "firstKept"> {
  let formulas = 0;
  let kept = 0;
  let firstKept: string | undefined;
  for (const { name, columns } of book.sheets) {
    for (const [column, { runs }] of columns.entries()) {
      for (const { from, to, formula } of runs) {
        formulas += to - from;
        kept += formula.problem === undefined ? 0 : to - from;
        firstKept ??= formula.problem && `${addressText(from, column, name)}: ${formula.problem.message}`;
      }
    }
  }
  return { formulas, kept, firstKept };
}

async function printLines(book: Book, changes: Iterable<ChangedCell>, summary: Summary, terminal: Terminal) {
  const { lines, count } = changeLines(book, changes);
  for (const line of lines) await terminal.out(`${line}\n`);
  const { formulas, tolerance, kept, firstKept } = summary;
  const what = count === 0 ? "no value changed" : `${counted(count, "value")} changed`;
  terminal.note(`${counted(formulas, "formula")} calculated; ${what} by more than rounding (${tolerance}).\n`);
  if (kept > 0) {
    terminal.note(`${counted(kept, "formula")} cannot be calculated here; the values are kept. ${firstKept}\n`);
  }
  return count;
}

async function printJson(book: Book, changes: Iterable<ChangedCell>, summary: Summary, terminal: Terminal) {
  const { formulas, tolerance, kept, notes } = summary;
  let count = 0;
  await terminal.out(
    `{"formulas":${formulas},"tolerance":${tolerance},"kept":${kept},"notes":${JSON.stringify(notes)},"changes":[`,
  );
  for (const change of changes) {
    await terminal.out(`${count++ === 0 ? "" : ","}\n${JSON.stringify(jsonChange(book, change))}`);
  }
  await terminal.out(`],"changed":${count}}\n`);
  return count;
}

function jsonChange(book: Book, { sheet, row, column, before, now, relative, formula }: ChangedCell): object {
  return {
    sheet: book.sheets[sheet]?.name,
    cell: addressText(row, column),
    formula,
    before: jsonCell(before),
    now: jsonCell(now),
    relative: relative ?? null,
  };
}

function jsonCell(cell: Cell): unknown {
  return cell instanceof CellError ? { error: { code: cell.code, message: cell.message } } : cell;
}
