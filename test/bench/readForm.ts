import { createReadStream } from "node:fs";
import Papa from "papaparse";
import { readTableFile } from "../../src/files/table/readTableFile.js";

/** Reads one file, all of it, and prints how long that took and how much memory it needed. */
const [how, path] = process.argv.slice(2) as ["ours" | "parser" | "splitter", string];
const start = performance.now();
const kept = how === "ours" ? await readTableFile(createReadStream(path, { highWaterMark: 1 << 20 })) : await parse();
const seconds = (performance.now() - start) / 1000;
process.stdout.write(JSON.stringify({ seconds, peak: process.resourceUsage().maxRSS / 1024, kept: Boolean(kept) }));

/** The parser alone, every row kept, numbers converted or left as text. */
function parse(): Promise<unknown[]> {
  return new Promise((resolve, reject) => {
    const records: unknown[] = [];
    Papa.parse(createReadStream(path, { highWaterMark: 1 << 20 }), {
      dynamicTyping: how === "parser",
      chunk: ({ data }) => {
        for (const record of data) records.push(record);
      },
      complete: () => resolve(records),
      error: reject,
    });
  });
}
