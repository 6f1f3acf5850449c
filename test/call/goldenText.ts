import type { Cell } from "../../src/call/cell.js";
import { CellError } from "../../src/call/cell.js";
import { cellsOf } from "../../src/call/column.js";
import { argumentOf, call, functionNamed, type Given, isPlaced } from "./door.js";
import type { MessageCall } from "./messageCalls.js";

/** Calls as an analyst types them, each with the code and the message it gives. */
export function goldenText(calls: readonly MessageCall[]): string {
  const topics = [...new Set(calls.map(({ about }) => about))];
  return `${topics
    .map((topic) => [`## ${topic}`, ...calls.filter(({ about }) => about === topic).map(entry)].join("\n\n"))
    .join("\n\n")}\n`;
}

function entry({ function: name, given, filledDown }: MessageCall): string {
  const answers = filledDown === undefined ? call(name, ...given).flat() : cellsFilledDown(name, filledDown, given);
  const note = filledDown === undefined ? "" : `, filled down`;
  return [`${name}(${given.map(typed).join(", ")})${note}`, ...answers.map((cell) => `    ${shown(cell)}`)].join("\n");
}

function cellsFilledDown(name: string, rows: number, given: readonly Given[]): Cell[] {
  const fixed = given.map((one) => ({ fixed: argumentOf(one) }));
  return cellsOf(functionNamed(name).eachRow(rows, fixed)).flat();
}

function shown(cell: Cell): string {
  // Numbers beside an error are none of this file's business.
  return cell instanceof CellError ? `${cell.code} ${cell.message}` : "<a number>";
}

function typed(given: Given): string {
  if (given === undefined) return "";
  if (given === null) return "<blank>";
  if (given instanceof CellError) return given.code;
  if (typeof given === "boolean") return given ? "TRUE" : "FALSE";
  if (typeof given === "number") return String(given);
  if (typeof given === "string") return `"${given}"`;
  const rows = (isPlaced(given) ? given.cells : given).map((row) => row.map(typed).join(", ")).join("; ");
  return isPlaced(given) ? `${given.address}...{${rows}}` : `{${rows}}`;
}
