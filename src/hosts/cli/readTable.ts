import { createReadStream } from "node:fs";
import { type Delimiter, delimiters } from "../../files/delimited/dialect.js";
import { FileProblem } from "../../files/fileProblem.js";
import { readTableFile } from "../../files/table/readTableFile.js";
import type { TableFile } from "../../files/table/tableFile.js";
import { type CommandLine, optionValue } from "./commandLine.js";
import { IoProblem, ioProblem } from "./ioProblem.js";
import type { Progress } from "./progress.js";
import type { Terminal } from "./terminal.js";
import { UsageProblem } from "./usageProblem.js";

/** How a table stands in its file, where the analyst says so; left out, it is found from the content. */
export interface TableLayout {
  readonly delimiter: Delimiter | undefined;
  readonly unitsRow: boolean | undefined;
  /** Which table of several: its name, or its number from 1. */
  readonly table: string | undefined;
}

const delimiterNames: Readonly<Record<string, Delimiter>> = { comma: ",", tab: "\t", semicolon: ";", bar: "|" };

export function tableLayout(line: CommandLine): TableLayout {
  const delimiter = optionValue(line, "--delimiter");
  const unitsRow = optionValue(line, "--units-row");
  const known =
    delimiter === undefined ? undefined : (delimiterNames[delimiter] ?? delimiters.find((own) => own === delimiter));
  if (delimiter !== undefined && known === undefined) {
    throw new UsageProblem(`--delimiter is "${delimiter}"; it is one of ${Object.keys(delimiterNames).join(", ")}.`);
  }
  if (unitsRow !== undefined && unitsRow !== "yes" && unitsRow !== "no") {
    throw new UsageProblem(`--units-row is "${unitsRow}"; it is yes or no.`);
  }
  return {
    delimiter: known,
    unitsRow: unitsRow === undefined ? undefined : unitsRow === "yes",
    table: optionValue(line, "--table"),
  };
}

/** Reads a table from a file, or from standard input for "-". */
export async function readTable(
  path: string,
  layout: TableLayout,
  terminal: Terminal,
  progress: Progress,
  /** Given every piece of the file as it is read. */
  watch?: (piece: Uint8Array) => void,
): Promise<TableFile> {
  const bytes: AsyncIterable<Uint8Array> =
    path === "-" ? terminal.input : createReadStream(path, { highWaterMark: 1 << 20 });
  const source = watch ? watched(bytes, watch) : bytes;
  try {
    return await readTableFile(source, {
      ...(layout.delimiter === undefined ? {} : { delimiter: layout.delimiter }),
      ...(layout.unitsRow === undefined ? {} : { unitsRow: layout.unitsRow }),
      ...(layout.table === undefined ? {} : { table: layout.table }),
      progress: ({ rows }) => progress.show(`reading ${path}`, rows),
    });
  } catch (error) {
    if (error instanceof FileProblem) throw new IoProblem(`${path}: ${error.message}`);
    if ((error as { syscall?: string }).syscall !== undefined) throw ioProblem("read", path, error);
    throw error;
  }
}

async function* watched(bytes: AsyncIterable<Uint8Array>, watch: (piece: Uint8Array) => void) {
  for await (const piece of bytes) {
    watch(piece);
    yield piece;
  }
}
