import { createReadStream, openSync, writeSync } from "node:fs";
import { appendColumns } from "../../src/files/delimited/appendColumns.js";
import { readDelimited } from "../../src/files/delimited/readDelimited.js";

const [input, output] = process.argv.slice(2) as [string, string];
const table = await readDelimited(createReadStream(input, { highWaterMark: 1 << 20 }), { isUnit: () => false });
const file = openSync(output, "w");
for (const piece of appendColumns(table, [])) writeSync(file, piece);
