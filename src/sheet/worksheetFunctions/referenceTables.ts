import { choices } from "./choices.js";
import { deviations } from "./deviations.js";
import { families } from "./findWorksheetFunction.js";
import { leftOut } from "./leftOut.js";

/** The worksheet functions by family, as a Markdown table. */
export function familyTable(): string {
  const rows = families.map(({ heading, functions }) => {
    const names = functions.map(({ name }) => `\`${name}\``).sort();
    return [heading, String(names.length), names.join(" ")];
  });
  return table([["Family", "Functions", "Names"], ["---", "---:", "---"], ...rows]);
}

/** What is done where the standard leaves it to the evaluator. */
export function choiceTable(): string {
  return table([
    ["Section", "Topic", "Here"],
    ["---", "---", "---"],
    ...choices.map(({ section, topic, here }) => [section, topic, here]),
  ]);
}

/** Where the library behind the functions departs from the standard, and what is given instead. */
export function deviationTable(): string {
  const rows = deviations.map(({ call, library, here, because, section }) => [
    `\`${call}\``,
    library,
    here,
    because,
    section,
  ]);
  return table([
    ["Call", "The library gives", "Here", "The library", "Section"],
    ["---", "---", "---", "---", "---"],
    ...rows,
  ]);
}

export function leftOutTable(): string {
  const reasons = [...new Set(leftOut.map(({ reason }) => reason))];
  const rows = reasons.map((reason) => {
    const names = leftOut.filter((each) => each.reason === reason).map(({ name }) => `\`${name}\``);
    return [names.join(" "), reason];
  });
  return table([["Names", "Why"], ["---", "---"], ...rows]);
}

function table(rows: readonly (readonly string[])[]): string {
  return rows.map((row) => `| ${row.map((cell) => cell.replaceAll("|", "\\|")).join(" | ")} |`).join("\n");
}
