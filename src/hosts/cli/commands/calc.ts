import { type Cell, CellError } from "../../../call/cell.js";
import type { Argument } from "../../../call/cellFunction.js";
import { type Block, blockOf, cellAt, cellsOf } from "../../../call/column.js";
import { calc as calculate } from "../../../sheet/calc.js";
import type { Functions } from "../../../sheet/formula/functions.js";
import { readFormula } from "../../../sheet/formula/readFormula.js";
import { referenceText } from "../../../sheet/formula/reference.js";
import { cellText, quantityText } from "../cellText.js";
import type { Command } from "../command.js";
import { exitCode } from "../exitCode.js";
import { formulaComplaint } from "../formulaComplaint.js";
import type { Terminal } from "../terminal.js";
import { UsageProblem } from "../usageProblem.js";
import { functions } from "../worksheet.js";

const help = `barycell calc "FORMULA" [--json]

Calculates one formula and prints its value and unit, with \u00b1 where there are uncertainties.
A dash reads the formula from standard input. There is no table here, so values are typed, not referred to.

  --json   {"formula", "value", "unit", "sigma"} with every digit; sigma is a number, or
           [upper, lower]; a block of cells comes as nested arrays; an error as
           {"formula", "error": {"code", "message"}}

  barycell calc '=BARY.REFLEX("4.23 d", "1.1 solMass", "0.47 \u00b1 0.02 jupiterMass")'
  barycell calc '=BARY.INTO("1 jupiterMass",, "earthMass")'
`;

export const calc: Command = {
  name: "calc",
  summary: "calculate one formula",
  help,
  options: { "--json": 0 },
  async run(line, terminal) {
    if (line.operands.length !== 1) throw new UsageProblem("give one formula, in quotes.");
    const formula = line.operands[0] === "-" ? (await readText(terminal)).trim() : line.operands[0]!;
    const { block, unit, complaint } = answer(formula);
    const errors = errorsIn(block);
    if (line.options.has("--json")) await terminal.out(`${JSON.stringify(jsonAnswer(formula, block, unit))}\n`);
    else {
      if (!isError(block)) await terminal.out(`${textAnswer(block, unit)}\n`);
      terminal.note(complaint ? `${complaint}\n` : errors.map((text) => `${text}\n`).join(""));
    }
    return errors.length > 0 ? exitCode.cellError : exitCode.done;
  },
};

interface Answer {
  readonly block: Block;
  /** Known where the formula is one call of ours. */
  readonly unit: string | undefined;
  readonly complaint: string | undefined;
}

function answer(formula: string): Answer {
  const text = formula.startsWith("=") ? formula : `=${formula}`;
  const { tree, problem, references } = readFormula(text, 0, 0, functions);
  const refused = references[0] && cellsRefused(referenceText(references[0], 0, 0));
  if (!problem && refused) return { block: blockOf([[refused]]), unit: undefined, complaint: undefined };
  const complaint = problem && `${problem.code} in the formula\n${formulaComplaint(text, problem)}`;
  let last: readonly Argument[] = [];
  const watched: Functions = {
    ...functions,
    cellFunction(name) {
      const called = functions.cellFunction(name);
      const once = (parameters: readonly Argument[]) => {
        last = parameters;
        return called!.once(parameters);
      };
      return called && { ...called, once };
    },
  };
  const block = calculate(text, watched);
  return { block, unit: tree.kind === "own" ? tree.called.unitOf?.(last) : undefined, complaint };
}

/** There is no table here, and a blank cell would count as 0. */
function cellsRefused(reference: string): CellError {
  return new CellError(
    "#REF!",
    "a cell where there is no table",
    `${reference}: calc has no table to take cells from; type the value, for example "4.23 d", or use barycell fill over a table`,
  );
}

function isError(block: Block): boolean {
  return block.rows === 1 && block.columns.length === 1 && cellAt(block.columns[0]!, 0) instanceof CellError;
}

/** Each distinct error once. */
function errorsIn(block: Block): string[] {
  const errors = cellsOf(block)
    .flat()
    .filter((cell) => cell instanceof CellError);
  return [...new Set(errors.map(({ code, message }) => `${code} ${message}`))];
}

function jsonAnswer(formula: string, block: Block, unit: string | undefined): object {
  const [row] = cellsOf(block);
  const first = row![0]!;
  if (isError(block)) return { formula, error: errorObject(first as CellError) };
  const isQuantity = unit !== undefined && block.rows === 1;
  if (!isQuantity && (block.rows > 1 || block.columns.length > 1)) {
    return { formula, value: cellsOf(block).map((cells) => cells.map(jsonCell)), unit: unit ?? null };
  }
  const sigmas = row!.slice(1).map(jsonCell);
  const sigma = sigmas.length === 0 ? {} : { sigma: sigmas.length === 1 ? sigmas[0] : sigmas };
  return { formula, value: jsonCell(first), unit: unit ?? null, ...sigma };
}

function jsonCell(cell: Cell): unknown {
  return cell instanceof CellError ? { error: errorObject(cell) } : cell;
}

function errorObject(error: CellError): object {
  return { code: error.code, message: error.message };
}

function textAnswer(block: Block, unit: string | undefined): string {
  return cellsOf(block)
    .map((row) =>
      unit === undefined || row[0] instanceof CellError
        ? row.map(cellText).join("\t").trimEnd()
        : quantityText(row, unit),
    )
    .join("\n");
}

async function readText(terminal: Terminal): Promise<string> {
  const decoder = new TextDecoder();
  let text = "";
  for await (const chunk of terminal.input) text += decoder.decode(chunk, { stream: true });
  return text + decoder.decode();
}
