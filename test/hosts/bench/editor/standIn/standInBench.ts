import { cellFunctionNames, findCellFunction } from "../../../../../src/call/cellFunctions.js";
import { resultText } from "../../../../../src/catalog/describeFunction.js";
import { describeInput } from "../../../../../src/catalog/describeInput.js";
import { searchFunctions } from "../../../../../src/catalog/searchFunctions.js";
import { isOptional, takesHeaders, takesResult } from "../../../../../src/functions/argumentNames.js";
import type { Definition, Input } from "../../../../../src/functions/definition.js";
import { definitions } from "../../../../../src/functions/definitions.js";
import type { FunctionEntry } from "../../../../../src/hosts/bench/protocol/answers.js";
import type { Bench } from "../../../../../src/hosts/bench/protocol/bench.js";
import { readAddress } from "../../../../../src/sheet/book/address.js";
import { checkFormula } from "../../../../../src/sheet/formula/readFormula.js";

export type AskedOfEditor =
  | "functions"
  | "searchFunctions"
  | "entryOf"
  | "checkFormula"
  | "completeHeaders"
  | "keepDraft"
  | "placeOf"
  | "edge"
  | "act";

/** What the editor asks of the worker, over two small sheets; formulas are read by the worksheet itself. */
export function standInBench(entries: Map<string, string>, asked: (what: string, given: unknown) => void) {
  const functions = { cellFunction: findCellFunction, cellFunctionNames: () => cellFunctionNames };
  const bench: Pick<Bench, AskedOfEditor> = {
    functions: () => [...definitions.map(ownEntry), ...worksheetEntries],
    searchFunctions: (words) => searchFunctions(words).map(({ name }) => `BARY.${name}`),
    entryOf: ({ sheet, row, column }) => entries.get(`${sheet},${row},${column}`) ?? "",
    checkFormula(text) {
      const problem = checkFormula(text, functions);
      if (!problem) return { diagnostics: [], preview: text.includes("REFLEX") ? "58.61 m/s" : "7" };
      const { position: from, message } = problem;
      return { diagnostics: [{ from, to: from + 1, severity: "error", message }], preview: undefined };
    },
    completeHeaders(text, caret) {
      asked("completeHeaders", { text, caret });
      const completed = `${text.replace(/,*$/, "")},,,B$1:D$1,E$1)`;
      return { text: completed, caret: completed.length, said: "The headers are B$1:D$1 and E$1." };
    },
    keepDraft: (draft) => asked("keepDraft", draft ?? null),
    placeOf(text, sheet) {
      const at = readAddress(text);
      return at && { sheet, top: at.row, left: at.column, bottom: at.row, right: at.column };
    },
    edge: (place, toward) => ({ ...place, row: toward === "down" ? 99_999 : toward === "up" ? 0 : place.row }),
    act(action) {
      asked("act", action);
      if (action.do !== "type") return { is: "done" };
      const { place, texts } = action;
      const text = texts[0]![0]!;
      if (text === "refuse me") return { is: "refused", message: "That cell is kept." };
      entries.set(`${place.sheet},${place.row},${place.column}`, text);
      return { is: "done" };
    },
  };
  return bench;
}

function ownEntry(definition: Definition): FunctionEntry {
  const inputs = (definition.inputs as readonly Input[]).map((input) => ({
    name: input.name,
    optional: isOptional(input),
    repeating: false,
    meaning: describeInput(input),
    unit: input.name === "period" ? "d" : "",
  }));
  const extra = (name: string, meaning: string) => ({ name, optional: true, repeating: false, meaning, unit: "" });
  return {
    name: `BARY.${definition.name}`,
    question: definition.question,
    own: true,
    parameters: [
      ...inputs,
      ...(takesHeaders(definition) ? [extra("headers", "the header cells of the inputs")] : []),
      ...(takesResult(definition) ? [extra("result", "the header cell of the result, or a unit")] : []),
    ],
    result: resultText(definition),
  };
}

const plain = (name: string, question: string, ...names: readonly string[]): FunctionEntry => ({
  name,
  question,
  own: false,
  parameters: names.map((each) => ({
    name: each.replace("...", ""),
    optional: false,
    repeating: each.endsWith("..."),
    meaning: "",
    unit: "",
  })),
  result: "",
});

const worksheetEntries = [
  plain("SUM", "The sum of numbers", "numbers..."),
  plain("SUMIFS", "The sum where conditions hold", "sums", "range...", "condition..."),
  plain("MAX", "The greatest number", "numbers..."),
  plain("LOG10", "The logarithm to base 10", "number"),
  plain("PI", "The ratio of a circle's circumference to its diameter"),
];
