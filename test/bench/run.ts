import { benchFill } from "./fill.js";
import { benchFormats } from "./formats.js";
import { benchReflex } from "./reflex.js";
import { benchRevise } from "./revise.js";
import { benchSheet } from "./sheet.js";
import { benchXlsx } from "./xlsx.js";

/** `npm run bench [part]`: timings that compare two things in one run; they never decide a test. */
const parts: Readonly<Record<string, () => void | Promise<void>>> = {
  reflex: benchReflex,
  fill: benchFill,
  xlsx: () => benchXlsx((line) => void process.stdout.write(`${line}\n`)),
  formats: benchFormats,
  revise: benchRevise,
  sheet: () => benchSheet((line) => void process.stdout.write(`${line}\n`)),
};

const asked = process.argv.slice(2);
for (const [name, bench] of Object.entries(parts)) {
  if (asked.length > 0 && !asked.includes(name)) continue;
  process.stdout.write(`\n${name}\n`);
  await bench();
}
