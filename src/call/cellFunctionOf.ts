import { argumentNames, isOptional, isRepeating, takesHeaders, takesResult } from "../functions/argumentNames.js";
import type { Definition, Input, NumberDefinition } from "../functions/definition.js";
import type { Unit } from "../units/unit.js";
import type { CallProblem } from "./callProblem.js";
import { CellError } from "./cell.js";
import type { Argument, CellFunction, RowArgument } from "./cellFunction.js";
import { cellProblem } from "./cellProblem.js";
import { type Block, type Column, cellAt, columnOf, sliceColumn } from "./column.js";
import { evaluateConversion, evaluateLookup, evaluateText } from "./evaluateEachCell.js";
import { evaluateNumber } from "./evaluateNumber.js";
import { headerCells } from "./headerCells.js";
import { type CallInputs, callInputs, type GivenCells } from "./inputColumns.js";
import { ownUnit } from "./ownUnit.js";
import { mayStateUnits, orderedCall } from "./repeatedCall.js";
import { askedUnit, knownUnit, resultUnit } from "./resultUnit.js";

/** All our functions stand in this namespace. */
export const namespace = "BARY";

/** The one door from cells to a definition and back, for every host. */
export function cellFunctionOf(definition: Definition): CellFunction {
  const inputs: readonly Input[] = definition.inputs;
  const fixed = fixedCalls(definition);
  const name = `${namespace}.${definition.name}`;
  const common = {
    name,
    argumentNames: argumentNames(definition),
    leastArguments: inputs.filter((input) => !isOptional(input)).length,
  };
  if (!isRepeating(inputs.at(-1))) return { ...common, ...fixed };

  /** A call of some inputs is one of a function that has as many. */
  function ordered<Parameter extends Argument | RowArgument>(parameters: readonly Parameter[]) {
    const call = orderedCall(definition, parameters);
    return { parameters: call.parameters, calls: fixedCalls(call.definition) };
  }

  function once(parameters: readonly Argument[]): Block {
    const { calls, parameters: given } = ordered(parameters);
    return calls.once(given);
  }

  function eachRow(rows: number, parameters: readonly RowArgument[]): Block {
    if (parameters.some((parameter) => "perRow" in parameter && mayStateUnits(parameter.perRow))) {
      return rowByRow(definition, once, rows, parameters);
    }
    const { calls, parameters: given } = ordered(parameters);
    return calls.eachRow(rows, given);
  }

  function unitOf(parameters: readonly Argument[]): string | undefined {
    const { calls, parameters: given } = ordered(parameters);
    return calls.unitOf(given);
  }

  return { ...common, mostArguments: Number.POSITIVE_INFINITY, once, eachRow, unitOf };
}

/** The calls of a definition whose every argument has its place. */
function fixedCalls(definition: Definition) {
  const inputs = definition.inputs.length;
  const extra = takesHeaders(definition) ? 1 : 0;
  const most = inputs + extra + (takesResult(definition) ? 1 : 0);

  function once(parameters: readonly Argument[]): Block {
    const given = parameters.slice(0, inputs).map(givenCells);
    return answer(given, parameters, false);
  }

  function eachRow(rows: number, parameters: readonly RowArgument[]): Block {
    const tail = parameters.slice(inputs);
    const fixedTail = tail.every((parameter) => "fixed" in parameter);
    const oneRowEach = parameters
      .slice(0, inputs)
      .every((parameter, index) =>
        "fixed" in parameter
          ? (parameter.fixed?.block.rows ?? 1) === 1
          : (definition.inputs[index] as Input).takes !== "count",
      );
    if (!fixedTail || !oneRowEach) return rowByRow(definition, once, rows, parameters);
    const given = parameters
      .slice(0, inputs)
      .map((parameter): GivenCells | undefined =>
        "fixed" in parameter
          ? givenCells(parameter.fixed)
          : { rows, columns: parameter.perRow, address: parameter.address },
      );
    const all = parameters.map((parameter) => ("fixed" in parameter ? parameter.fixed : undefined));
    return widened(answer(given, all, true), rows);
  }

  function answer(
    given: readonly (GivenCells | undefined)[],
    parameters: readonly Argument[],
    filledDown: boolean,
  ): Block {
    const problem = parameters.slice(most).some(Boolean) && {
      about: "too many arguments" as const,
      given: parameters.length,
      most,
    };
    if (problem) return single(cellProblem(definition, problem));
    const headers = definition.form === "lookup" ? [] : headerCells(parameters[inputs]);
    const call = callInputs(definition, given, headers, filledDown);
    if (call instanceof CellError) return single(call);
    if ("about" in call) return single(cellProblem(definition, call));
    const evaluated = evaluate(definition, call, parameters[inputs + extra]);
    return "about" in evaluated ? single(cellProblem(definition, evaluated)) : evaluated;
  }

  function unitOf(parameters: readonly Argument[]): string | undefined {
    const unit =
      definition.form === "number"
        ? unitOfNumbers(definition, parameters)
        : numberUnit(definition, parameters, inputs + extra);
    return unit && !("about" in unit) ? unit.text : undefined;
  }

  return { mostArguments: most, once, eachRow, unitOf };
}

function givenCells(argument: Argument): GivenCells | undefined {
  return argument && { rows: argument.block.rows, columns: argument.block.columns, address: argument.address };
}

function evaluate(definition: Definition, call: CallInputs, result: Argument): Block | CallProblem {
  switch (definition.form) {
    case "number": {
      const unit = resultUnit(result, ownUnit(definition, call));
      return "about" in unit ? unit : evaluateNumber(definition, call, unit);
    }
    case "conversion": {
      const unit = askedUnit(result, undefined);
      if (!unit) return { about: "result unit missing", header: undefined };
      const [header] = headerCells(result);
      return "about" in unit ? unit : evaluateConversion(definition, call, unit, header?.text ?? unit.text);
    }
    case "text":
      return evaluateText(definition, call);
    case "lookup":
      return evaluateLookup(definition, call, (own: Unit) => resultUnit(result, own));
  }
}

function unitOfNumbers(definition: NumberDefinition, parameters: readonly Argument[]): Unit | CallProblem {
  const inputs = definition.inputs.length;
  const own = () => {
    const call = callInputs(
      definition,
      parameters.slice(0, inputs).map(givenCells),
      headerCells(parameters[inputs]),
      false,
    );
    return call instanceof CellError || "about" in call ? undefined : call;
  };
  return resultUnit(
    parameters[inputs + 1],
    ownUnit(definition, definition.result.as === undefined ? undefined : own()),
  );
}

/** The unit of the numbers a call gives; undefined where it gives texts. */
function numberUnit(
  definition: Exclude<Definition, NumberDefinition>,
  parameters: readonly Argument[],
  at: number,
): Unit | CallProblem | undefined {
  if (definition.form === "conversion") return askedUnit(parameters[at], undefined);
  if (definition.form === "text" || !parameters[0]) return undefined;
  const answer = definition.answer(String(cellAt(parameters[0].block.columns[0]!, 0)));
  return "value" in answer ? resultUnit(parameters[at], knownUnit(answer.unit)) : undefined;
}

function single(error: CellError): Block {
  return { rows: 1, columns: [columnOf([error])] };
}

/** A call whose inputs were all the same in every row was answered once; the answer serves every row. */
function widened(block: Block, rows: number): Block {
  if (block.rows === rows) return block;
  return { rows, columns: block.columns.map((column) => repeated(column, rows)) };
}

function repeated(column: Column, rows: number): Column {
  const other = column.others?.[0];
  return {
    length: rows,
    numbers: new Float64Array(rows).fill(column.numbers[0]!),
    others: other === undefined ? undefined : new Array(rows).fill(other),
  };
}

function rowOf(columns: readonly Column[], row: number): Block {
  return { rows: 1, columns: columns.map((column) => sliceColumn(column, row, row + 1)) };
}

/** Call by call, for what may differ from row to row. */
function rowByRow(
  definition: Definition,
  once: CellFunction["once"],
  rows: number,
  parameters: readonly RowArgument[],
): Block {
  const blocks = Array.from({ length: rows }, (_, row) =>
    once(
      parameters.map(
        (parameter): Argument => ("fixed" in parameter ? parameter.fixed : { block: rowOf(parameter.perRow, row) }),
      ),
    ),
  ).map((block) =>
    block.rows === 1 ? block : single(cellProblem(definition, { about: "several rows", rows: block.rows })),
  );
  const width = Math.max(1, ...blocks.map((block) => block.columns.length));
  const columns = Array.from({ length: width }, (_, index) =>
    columnOf(blocks.map((block) => (block.columns[index] ? cellAt(block.columns[index], 0) : null))),
  );
  return { rows, columns };
}
