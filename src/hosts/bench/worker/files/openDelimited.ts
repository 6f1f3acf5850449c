import { readDelimited } from "../../../../files/delimited/readDelimited.js";
import { sentenceOfFinding } from "../../../../files/delimited/sentenceOfFinding.js";
import { FileProblem } from "../../../../files/fileProblem.js";
import type { TextChunk } from "../../../../files/text/textSource.js";
import { bookOf } from "../../../../sheet/book/bookOf.js";
import { mostRows } from "../../../../sheet/limits.js";
import { isProblem } from "../../../../units/problem.js";
import { readUnit } from "../../../../units/readUnit.js";
import { refuseOtherKinds } from "./fileKinds.js";
import type { Opener } from "./opener.js";
import { tableColumns } from "./tableColumns.js";
import { titleOf } from "./titleOf.js";

/** Comma, semicolon, tab or bar separated text: what every other kind of file is not. */
export const openDelimited: Opener = {
  isFor: () => true,
  longest: 400_000_000,
  async read({ name, start, content }, { signal, progress }) {
    refuseOtherKinds(start);
    const table = await readDelimited(chunksOf(content), {
      isUnit: (text) => !isProblem(readUnit(text)),
      signal,
      progress({ rows, taken }) {
        if (rows >= mostRows) {
          throw new FileProblem(
            "too-large",
            `It has more than the ${(mostRows - 1).toLocaleString("en")} rows that a sheet holds below its headers; cut it into parts and open each.`,
          );
        }
        progress(taken);
      },
    });
    const { preamble, rows, columns } = table;
    const book = bookOf([{ name: "Table", columns: tableColumns(table) }]);
    const findings = table.findings.map(sentenceOfFinding);
    if (preamble.length > 0) findings.push(asideSentence(preamble));
    const history = [`opened ${name}: ${rows.toLocaleString("en")} rows, ${columns.length} columns`];
    return { document: { title: titleOf(name), book, presentation: [], marks: [], history }, findings };
  },
};

function asideSentence(preamble: readonly string[]): string {
  const [first = ""] = preamble;
  const quoted = first.length > 60 ? `${first.slice(0, 59)}…` : first;
  const lines = preamble.length === 1 ? "A line" : `${preamble.length} lines`;
  return `${lines} of comment above the header ${preamble.length === 1 ? "was" : "were"} left aside: "${quoted}".`;
}

async function* chunksOf(content: Blob): AsyncGenerator<TextChunk> {
  const reader = content.stream().getReader();
  try {
    for (let read = await reader.read(); !read.done; read = await reader.read()) yield read.value;
  } finally {
    await reader.cancel();
  }
}
