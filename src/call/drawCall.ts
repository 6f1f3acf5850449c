import type { Input, NumberDefinition } from "../functions/definition.js";
import { fromBase, toBase, type Unit } from "../units/unit.js";
import { type DrawSummary, describeDraws } from "./draw/describeDraws.js";
import { normalNumbers, splitNormal } from "./draw/normalNumbers.js";
import { type RandomNumbers, randomNumbers } from "./draw/randomNumbers.js";
import { isWithin, type OpenRange, openRange } from "./range.js";
import { knownUnit } from "./resultUnit.js";
import type { CallStory, ToldInput } from "./tellCall.js";

/** The results of a call for inputs drawn within their uncertainties. */
export interface CallDraws extends DrawSummary {
  /** In which the values are. */
  readonly unit: string;
  readonly draws: number;
  /** Draws that were made anew because an input, or the result, left what the function accepts. */
  readonly rejected: number;
}

/** Rounds of drawing anew; where most draws are rejected the inputs say more than the function can answer. */
const mostRounds = 20;

/** One input of a draw, in base units. */
interface DrawnInput {
  readonly range: OpenRange | undefined;
  draw(): number;
}

/**
 * Draws the inputs of a call independently of each other within their uncertainties (normal, or split normal where the
 * sides differ; cut off at the bounds of each quantity) and gives what the results are like. Undefined where the call
 * has no number for an answer or none of its inputs an uncertainty, or where hardly any draw is accepted.
 */
export function drawCall(story: CallStory, seed: number, draws = 10_000): CallDraws | undefined {
  const { definition, unit } = story;
  if (!canDraw(story) || definition.form !== "number" || unit === undefined) return undefined;
  const random = randomNumbers(seed);
  const normal = normalNumbers(random);
  const inputs = definition.inputs.map((input, index) => drawnInput(input, story.inputs[index]!, random, normal));
  const drawn = drawResults(definition, inputs, knownUnit(unit), draws);
  if (!drawn) return undefined;
  return { unit, draws, rejected: drawn.rejected, ...describeDraws(drawn.values) };
}

/** Whether there is anything to draw. */
export function canDraw({ definition, result, inputs }: CallStory): boolean {
  return definition.form === "number" && typeof result === "number" && inputs.some(isUncertain);
}

function isUncertain({ reading }: ToldInput): boolean {
  return (reading?.upper ?? 0) !== 0 || (reading?.lower ?? 0) !== 0;
}

function drawnInput(
  input: NumberDefinition["inputs"][number],
  told: ToldInput,
  random: RandomNumbers,
  normal: () => number,
): DrawnInput {
  const { reading } = told;
  if (input.takes !== "quantity" || reading === undefined)
    return { range: undefined, draw: constant(fixedValue(input, told)) };
  const { unit, value, upper = 0, lower = 0 } = reading;
  const base = toBase(unit, value);
  if (!isUncertain(told)) return { range: undefined, draw: constant(base) };
  // Drawn in the unit of the cell: an uncertainty of a logarithm is one of the logarithm.
  const draw = () => toBase(unit, splitNormal(random, normal, value, upper, lower));
  return { range: openRange(input.quantity), draw };
}

function constant(value: number): () => number {
  return () => value;
}

/** What stands for an input that was left out, or the place of a word in its list. */
function fixedValue(input: Input, { cell }: ToldInput): number {
  if (input.takes === "quantity") return input.fallback ?? Number.NaN;
  if (input.takes !== "word") return Number.NaN;
  const wanted = String(cell ?? "")
    .trim()
    .toLowerCase();
  return Math.max(
    0,
    input.words.findIndex(({ word }) => word.toLowerCase() === wanted),
  );
}

function drawResults(
  { compute, result }: NumberDefinition,
  inputs: readonly DrawnInput[],
  unit: Unit,
  draws: number,
): { readonly values: Float64Array; readonly rejected: number } | undefined {
  const values = new Float64Array(draws);
  const range = openRange(result.quantity);
  let [accepted, rejected] = [0, 0];
  for (let round = 0; round < mostRounds && accepted < draws; round++) {
    const rows = draws - accepted;
    const columns = inputs.map(() => new Float64Array(rows));
    const out = new Float64Array(rows);
    let whole = 0;
    for (let row = 0; row < rows; row++) {
      const drawn = inputs.map(({ draw }) => draw());
      if (inputs.every(({ range }, index) => !range || isWithin(range, drawn[index]!))) {
        for (const [index, value] of drawn.entries()) columns[index]![whole] = value;
        whole++;
      }
    }
    compute(whole, out, ...columns);
    let kept = 0;
    for (let row = 0; row < whole; row++) {
      const value = fromBase(unit, out[row]!);
      if (isWithin(range, out[row]!) && Number.isFinite(value)) values[accepted + kept++] = value;
    }
    rejected += rows - kept;
    accepted += kept;
  }
  return accepted < draws ? undefined : { values, rejected };
}
