import { CellError } from "../../../call/cell.js";
import type { Operand } from "../../values/operand.js";
import { buildMatrix, isMatrix } from "../../values/operand.js";
import { elementAt } from "../../values/operateOperands.js";
import type { ParameterName, WorksheetFunction } from "../worksheetFunction.js";
import type { Parameter, Read } from "./parameters.js";

type Given = readonly (Operand | undefined)[];

/**
 * A worksheet function from its parameters and its computation on what they read. An error among the arguments is the
 * result, the first in their order; a rectangle where one value is asked for makes a rectangle of results
 * (ISO/IEC 26300-3 section 3.3); a result that is no finite number is an error.
 */
export function define<A extends readonly unknown[]>(
  name: string,
  parameters: Read<A>,
  compute: (...values: A) => Operand,
): WorksheetFunction {
  const list = parameters as readonly Parameter<unknown>[];
  const last = list.at(-1);
  const repeats = last?.repeatsAtLeast;
  const required = list.filter((each) => each.absent === undefined && each.repeatsAtLeast === undefined).length;
  const leastArguments = required + (repeats ?? 0);
  const mostArguments = repeats === undefined ? list.length : Number.POSITIVE_INFINITY;
  const fixed = repeats === undefined ? list.length : list.length - 1;
  const turn = last?.turn ?? [];
  const parameterAt = (index: number) =>
    (index < fixed ? list[index] : turn[(index - fixed) % turn.length]) as Parameter<unknown>;

  const once = (given: Given): Operand => {
    const values: unknown[] = [];
    for (let index = 0; index < Math.max(given.length, fixed); index++) {
      const read = readArgument(name, parameterAt(index), index, given);
      if (read instanceof CellError) {
        return read;
      }
      values.push(read);
    }
    const all = repeats === undefined ? values : [...values.slice(0, fixed), inTurns(values.slice(fixed), turn.length)];
    return settle(name, compute(...(all as unknown as A)));
  };

  return {
    name,
    leastArguments,
    mostArguments,
    parameterNames: list.flatMap(namesOf),
    call(given) {
      if (given.length < leastArguments || given.length > mostArguments) {
        return wrongCount(name, leastArguments, mostArguments, given.length);
      }
      if (turn.length > 1 && (given.length - fixed) % turn.length !== 0) {
        return unpaired(name, turn);
      }
      const shape = liftedShape(given, parameterAt);
      return shape ? lift(given, parameterAt, shape, once) : once(given);
    },
  };
}

function readArgument(name: string, parameter: Parameter<unknown>, index: number, given: Given): unknown {
  const operand = given[index];
  const isAbsent = index >= given.length || (operand === undefined && parameter.emptyIsAbsent === true);
  if (isAbsent && parameter.absent) {
    return parameter.absent();
  }
  return parameter.read(operand ?? null, `${name}: ${parameter.name}`);
}

function inTurns(values: unknown[], length: number): unknown[] {
  if (length === 1) {
    return values;
  }
  return Array.from({ length: values.length / length }, (_, index) =>
    values.slice(index * length, (index + 1) * length),
  );
}

function unpaired(name: string, turn: readonly Parameter<unknown>[]): CellError {
  const names = turn.map((each) => each.name).join(" and ");
  return new CellError(
    "#VALUE!",
    `${name}: arguments without their pair`,
    `${name}: the last argument stands alone; ${names} in pairs are needed`,
  );
}

function wrongCount(name: string, least: number, most: number, given: number): CellError {
  const range =
    least === most ? `${least}` : most === Number.POSITIVE_INFINITY ? `at least ${least}` : `${least} to ${most}`;
  return new CellError(
    "#VALUE!",
    `${name}: the number of arguments`,
    `${name}: ${given} ${given === 1 ? "argument was" : "arguments were"} given; ${range} ${range === "1" ? "is" : "are"} needed`,
  );
}

interface Shape {
  readonly rows: number;
  readonly columns: number;
}

function liftedShape(given: Given, parameterAt: (index: number) => Parameter<unknown>): Shape | undefined {
  let rows = 0;
  let columns = 0;
  for (let index = 0; index < given.length; index++) {
    const operand = given[index];
    if (isMatrix(operand) && !parameterAt(index).whole && (operand.rows !== 1 || operand.columns !== 1)) {
      rows = Math.max(rows, operand.rows);
      columns = Math.max(columns, operand.columns);
    }
  }
  return rows > 0 ? { rows, columns } : undefined;
}

function lift(
  given: Given,
  parameterAt: (index: number) => Parameter<unknown>,
  shape: Shape,
  once: (given: Given) => Operand,
): Operand {
  return buildMatrix(shape.rows, shape.columns, (row, column) => {
    const result = once(
      given.map((operand, index) =>
        isMatrix(operand) && !parameterAt(index).whole ? elementAt(operand, row, column) : operand,
      ),
    );
    // A function that gives a rectangle for each value contributes its first cell (section 3.3, 2.2.1).
    return isMatrix(result) ? result.at(0, 0) : result;
  });
}

function settle(name: string, result: Operand): Operand {
  if (typeof result === "number" && !Number.isFinite(result)) {
    return notFinite(name);
  }
  return result;
}

export function notFinite(name: string): CellError {
  return new CellError(
    "#NUM!",
    `${name}: no finite result`,
    `${name}: the result for these inputs is not a finite number (beyond 1.79E+308 or not defined); other inputs are needed`,
  );
}

function namesOf({ name, absent, turn, repeatsAtLeast }: Parameter<unknown>): readonly ParameterName[] {
  if (turn === undefined) return [{ name, optional: absent !== undefined, repeating: false }];
  return turn.map((each) => ({ name: each.name, optional: repeatsAtLeast === 0, repeating: true }));
}
