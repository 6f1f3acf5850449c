import type { Definition } from "../functions/definition.js";
import type { Unit } from "../units/unit.js";
import type { CallProblem } from "./callProblem.js";
import type { CellError } from "./cell.js";
import type { Argument, CellFunction, RowArgument } from "./cellFunction.js";
import { cellProblem } from "./cellProblem.js";
import { type Block, type Column, cellAt, columnOf, sliceColumn } from "./column.js";
import { evaluateConversion, evaluateLookup, evaluateText } from "./evaluateEachCell.js";
import { evaluateNumber } from "./evaluateNumber.js";
import { headerCells } from "./headerCells.js";
import { type CallInputs, callInputs, type GivenCells } from "./inputColumns.js";
import { askedUnit, knownUnit, resultUnit } from "./resultUnit.js";

/** All our functions stand in this namespace. */
export const namespace = "BARY";

/** The one door from cells to a definition and back, for every host. */
export function cellFunctionOf(definition: Definition): CellFunction {
  const inputs = definition.inputs.length;
  const extra = definition.form === "lookup" ? 0 : 1;
  const most = inputs + extra + (takesResult(definition) ? 1 : 0);
  const least = definition.inputs.filter(
    (input) => input.takes !== "word" && !("fallback" in input && input.fallback !== undefined),
  ).length;

  function once(parameters: readonly Argument[]): Block {
    const given = parameters.slice(0, inputs).map((parameter) => parameter?.block);
    return answer(given, parameters);
  }

  function eachRow(rows: number, parameters: readonly RowArgument[]): Block {
    const tail = parameters.slice(inputs);
    const fixedTail = tail.every((parameter) => "fixed" in parameter);
    const oneRowEach = parameters
      .slice(0, inputs)
      .every((parameter) => !("fixed" in parameter) || (parameter.fixed?.block.rows ?? 1) === 1);
    if (!fixedTail || !oneRowEach) return rowByRow(rows, parameters);
    const given = parameters
      .slice(0, inputs)
      .map((parameter): GivenCells | undefined =>
        "fixed" in parameter ? parameter.fixed?.block : { rows, columns: parameter.perRow },
      );
    const all = parameters.map((parameter) => ("fixed" in parameter ? parameter.fixed : undefined));
    return widened(answer(given, all), rows);
  }

  function answer(given: readonly (GivenCells | undefined)[], parameters: readonly Argument[]): Block {
    const problem = parameters.slice(most).some(Boolean) && {
      about: "too many arguments" as const,
      given: parameters.length,
      most,
    };
    if (problem) return single(cellProblem(definition, problem));
    const headers = definition.form === "lookup" ? [] : headerCells(parameters[inputs]);
    const call = callInputs(definition, given, headers);
    if ("about" in call) return single(cellProblem(definition, call));
    const evaluated = evaluate(definition, call, parameters[inputs + extra]);
    return "about" in evaluated ? single(cellProblem(definition, evaluated)) : evaluated;
  }

  function rowByRow(rows: number, parameters: readonly RowArgument[]): Block {
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

  return { name: `${namespace}.${definition.name}`, leastArguments: least, mostArguments: most, once, eachRow };
}

function takesResult(definition: Definition): boolean {
  return (
    definition.form === "number" ||
    definition.form === "conversion" ||
    (definition.form === "lookup" && definition.takesResult)
  );
}

function evaluate(definition: Definition, call: CallInputs, result: Argument): Block | CallProblem {
  switch (definition.form) {
    case "number": {
      const unit = resultUnit(result, knownUnit(definition.result.unit));
      return "about" in unit ? unit : evaluateNumber(definition, call, unit);
    }
    case "conversion": {
      const unit = askedUnit(result, undefined);
      if (!unit) return { about: "result unit missing", header: undefined };
      return "about" in unit ? unit : evaluateConversion(definition, call, unit);
    }
    case "text":
      return evaluateText(definition, call);
    case "lookup":
      return evaluateLookup(definition, call, (own: Unit) => resultUnit(result, own));
  }
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
