import type { ConversionDefinition, LookupDefinition, TextDefinition } from "../functions/definition.js";
import { baseSlope, convertible, fromBase, toBase, type Unit } from "../units/unit.js";
import type { CallProblem } from "./callProblem.js";
import { CellError } from "./cell.js";
import { cellProblem } from "./cellProblem.js";
import { type Block, cellAt } from "./column.js";
import { noHeader } from "./headerUnit.js";
import type { CallInputs } from "./inputColumns.js";
import { type CellReading, readCell, valueText } from "./readCell.js";
import { readSigma } from "./readSigma.js";
import { ResultColumns } from "./resultColumns.js";
import { knownUnit } from "./resultUnit.js";

/** A quantity of any kind into the unit asked for, with its uncertainties; exact slopes, no differences. */
export function evaluateConversion(
  definition: ConversionDefinition,
  call: CallInputs,
  unit: Unit,
  header: string,
): Block {
  return eachQuantity(definition, call, (reading, row, results) => {
    if (!convertible(reading.unit, unit)) {
      return results.fail(row, cellProblem(definition, { about: "result kind", header, unit, wanted: reading.unit }));
    }
    const same = reading.unit.text === unit.text;
    const base = toBase(reading.unit, reading.value);
    const value = same ? reading.value : fromBase(unit, base);
    if (!Number.isFinite(value)) {
      const text = valueText(reading.value, reading.unit);
      const problem = { about: "beyond numbers", input: "value", value: text, asked: unit } as const;
      return results.fail(row, cellProblem(definition, problem));
    }
    results.numbers[row] = value;
    if (reading.upper === undefined || reading.lower === undefined) return;
    const sides = reading.upper === reading.lower ? 1 : 2;
    const slope = same ? 1 : baseSlope(reading.unit, base) / baseSlope(unit, base);
    const [upper, lower] = [reading.upper * slope, reading.lower * slope];
    if (!Number.isFinite(upper) || !Number.isFinite(lower)) {
      results.failSigma(row, cellProblem(definition, { about: "uncertainty beyond numbers", result: "value" }), sides);
    }
    results.setSigma(row, upper, lower, sides);
  });
}

/** A quantity of any kind as a text. */
export function evaluateText(definition: TextDefinition, call: CallInputs): Block {
  return eachQuantity(definition, call, (reading, row, results) => results.fail(row, definition.compose(reading)));
}

/** Reads each row's quantity, its uncertainties from the cells beside it in the unit of the value. */
function eachQuantity(
  definition: ConversionDefinition | TextDefinition,
  call: CallInputs,
  answer: (reading: CellReading, row: number, results: ResultColumns) => void,
): Block {
  const results = new ResultColumns(call.rows, call.filledDown);
  const { columns, headers, input } = call.inputs[0]!;
  const error = (problem: CallProblem | CellError) =>
    problem instanceof CellError ? problem : cellProblem(definition, problem);
  for (let row = 0; row < call.rows; row++) {
    const reading = readCell(input.name, cellAt(columns[0]!, row), headers[0] ?? noHeader, undefined);
    if (reading instanceof CellError || "about" in reading) {
      results.fail(row, error(reading));
      if (definition.form === "conversion" && columns.length > 1) results.spoilSigma(row, columns.length - 1);
      continue;
    }
    const sigmas =
      reading.upper !== undefined
        ? []
        : columns
            .slice(1)
            .map((column, index) => readSigma(input.name, cellAt(column, row), headers[index + 1]!, reading.unit));
    const bad = sigmas.find((sigma) => sigma instanceof CellError || "about" in sigma);
    if (bad && definition.form === "conversion")
      results.failSigma(row, error(bad as CallProblem | CellError), columns.length - 1);
    else if (bad && !("about" in bad && bad.about === "blank")) {
      // A text has no cell beside it to tell of an uncertainty that does not read; one that is not known is left out.
      results.fail(row, error(bad as CallProblem | CellError));
      continue;
    }
    const slope = baseSlope(reading.unit, toBase(reading.unit, reading.value));
    const [upper, lower = upper] = (bad ? [] : (sigmas as CellReading[])).map((sigma) =>
      sigma.unit.text === reading.unit.text
        ? Math.abs(sigma.value)
        : (Math.abs(sigma.value) * baseSlope(sigma.unit, toBase(reading.unit, reading.value))) / slope,
    );
    answer(upper === undefined ? reading : { ...reading, upper, lower }, row, results);
  }
  return results.block();
}

/** Texts looked up one by one. */
export function evaluateLookup(
  definition: LookupDefinition,
  call: CallInputs,
  unitOfResult: (own: Unit) => Unit | CallProblem,
): Block {
  const results = new ResultColumns(call.rows, call.filledDown);
  const { columns, input } = call.inputs[0]!;
  const fail = (row: number, problem: CallProblem) => results.fail(row, cellProblem(definition, problem));
  for (let row = 0; row < call.rows; row++) {
    const cell = cellAt(columns[0]!, row);
    if (cell instanceof CellError) results.fail(row, cell);
    else if (cell === null) fail(row, { about: "blank", input: input.name });
    else {
      const answer = definition.answer(String(cell));
      if ("text" in answer && !("problem" in answer)) results.fail(row, answer.text);
      else if ("value" in answer) {
        const own = knownUnit(answer.unit);
        const unit = unitOfResult(own);
        if ("about" in unit) fail(row, unit);
        else {
          const value = unit.text === own.text ? answer.value : fromBase(unit, toBase(own, answer.value));
          results.numbers[row] = value;
          if (!Number.isFinite(value)) {
            const text = valueText(answer.value, own);
            fail(row, { about: "beyond numbers", input: String(cell), value: text, asked: unit });
          }
        }
      } else if (answer.problem === "unit") {
        fail(row, { about: "unit", input: input.name, at: { place: "text", text: String(cell) }, unit: answer.unit });
      } else
        fail(
          row,
          answer.problem === "unknown name"
            ? { about: "unknown name", text: answer.text, nearest: answer.nearest }
            : { about: "no unit stated", text: answer.text },
        );
    }
  }
  return results.block();
}
