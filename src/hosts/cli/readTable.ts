import { createReadStream } from "node:fs";
import type { DelimitedTable } from "../../files/delimited/delimitedTable.js";
import { type Delimiter, delimiters } from "../../files/delimited/dialect.js";
import { readDelimited } from "../../files/delimited/readDelimited.js";
import { FileProblem } from "../../files/fileProblem.js";
import { isProblem } from "../../units/problem.js";
import { readUnit } from "../../units/readUnit.js";
import { IoProblem, ioProblem } from "./ioProblem.js";
import type { Progress } from "./progress.js";
import type { Terminal } from "./terminal.js";
import { UsageProblem } from "./usageProblem.js";

/** How a table's text is laid out, where the analyst says so; left out, it is found from the text. */
export interface TableLayout {
  readonly delimiter: Delimiter | undefined;
  readonly unitsRow: boolean | undefined;
}

const delimiterNames: Readonly<Record<string, Delimiter>> = { comma: ",", tab: "\t", semicolon: ";", bar: "|" };

export function tableLayout(delimiter: string | undefined, unitsRow: string | undefined): TableLayout {
  const known =
    delimiter === undefined ? undefined : (delimiterNames[delimiter] ?? delimiters.find((own) => own === delimiter));
  if (delimiter !== undefined && known === undefined) {
    throw new UsageProblem(`--delimiter is "${delimiter}"; it is one of ${Object.keys(delimiterNames).join(", ")}.`);
  }
  if (unitsRow !== undefined && unitsRow !== "yes" && unitsRow !== "no") {
    throw new UsageProblem(`--units-row is "${unitsRow}"; it is yes or no.`);
  }
  return { delimiter: known, unitsRow: unitsRow === undefined ? undefined : unitsRow === "yes" };
}

/** Reads a table from a file, or from standard input for "-". */
export async function readTable(
  path: string,
  layout: TableLayout,
  terminal: Terminal,
  progress: Progress,
): Promise<DelimitedTable> {
  const source = path === "-" ? terminal.input : createReadStream(path, { highWaterMark: 1 << 20 });
  try {
    return await readDelimited(source, {
      isUnit: (text) => !isProblem(readUnit(text)),
      ...(layout.delimiter === undefined ? {} : { delimiter: layout.delimiter }),
      ...(layout.unitsRow === undefined ? {} : { unitsRow: layout.unitsRow }),
      progress: ({ rows }) => progress.show(`reading ${path}`, rows),
    });
  } catch (error) {
    if (error instanceof FileProblem) throw new IoProblem(`${path}: ${error.message}`);
    if ((error as { syscall?: string }).syscall !== undefined) throw ioProblem("read", path, error);
    throw error;
  }
}
