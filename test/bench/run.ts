import { benchFill } from "./fill.js";
import { benchFormats } from "./formats.js";
import { benchPage } from "./page.js";
import { benchPlan } from "./plan.js";
import { benchReflex } from "./reflex.js";
import { benchRevise } from "./revise.js";
import { benchSheet } from "./sheet.js";
import { benchTime } from "./time.js";
import { benchXlsx } from "./xlsx.js";

/** `npm run bench [part]`: timings that compare two things in one run; they never decide a test. */
const parts: Readonly<Record<string, () => void | Promise<void>>> = {
  reflex: benchReflex,
  time: benchTime,
  fill: benchFill,
  xlsx: () => benchXlsx(print),
  formats: benchFormats,
  revise: benchRevise,
  plan: benchPlan,
  sheet: () => benchSheet(print),
  page: () => benchPage(print),
};

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}

const asked = process.argv.slice(2);
for (const [name, bench] of Object.entries(parts)) {
  if (asked.length > 0 && !asked.includes(name)) continue;
  process.stdout.write(`\n${name}\n`);
  await bench();
}
