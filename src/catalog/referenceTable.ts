import { definitions } from "../functions/definitions.js";
import { resultText } from "./describeFunction.js";
import { signature } from "./signature.js";

/** The functions as a Markdown table: how each is called, what it answers, what comes out. */
export function referenceTable(): string {
  const rows = definitions.map((definition) => [
    `\`${signature(definition)}\``,
    definition.question,
    capital(resultText(definition)),
  ]);
  return table([["Call", "Answers", "Result"], ["---", "---", "---"], ...rows]);
}

function table(rows: readonly (readonly string[])[]): string {
  return rows.map((row) => `| ${row.map((cell) => cell.replaceAll("|", "\\|")).join(" | ")} |`).join("\n");
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
