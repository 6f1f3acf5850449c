import { type Cell, CellError } from "../call/cell.js";
import { findCellFunction } from "../call/cellFunctions.js";
import { blockOf, cellAt } from "../call/column.js";
import { isWithin, openRange } from "../call/range.js";
import { readCell } from "../call/readCell.js";
import * as quantities from "../functions/quantities.js";
import type { Quantity } from "../functions/quantity.js";
import { periastron, radialVelocity, transit } from "../kernel/orbit/radialVelocity.js";
import { fromBase, toBase, type Unit } from "../units/unit.js";
import { recogniseColumn } from "./recogniseColumn.js";

/** One cell of a row under its header. */
export interface RowCell {
  readonly header: string;
  readonly cell: Cell;
}

/** Radial velocity of a star over one orbit. */
export type OrbitCurve =
  | {
      readonly is: "curve";
      readonly unit: string;
      readonly amplitude: number;
      /** From the reference time: 0 to 1. */
      readonly phases: Float64Array;
      readonly velocities: Float64Array;
      /** [d] */
      readonly period: number | undefined;
      /** Julian date, and its frame. */
      readonly reference: { readonly day: number; readonly frame: string } | undefined;
      readonly assumed: readonly string[];
    }
  | { readonly is: "missing"; readonly message: string };

const points = 400;
const julianDateOfJ2000 = 2451545;
const day = 86400;

/** What the row of a planet says of its star's velocity; K itself, or the period and the masses, must be there. */
export function orbitCurve(row: readonly RowCell[]): OrbitCurve {
  const assumed: string[] = [];
  const found = amplitudeOf(row, assumed);
  if ("message" in found) return { is: "missing", message: found.message };
  const eccentricity = valueOfQuantity(row, quantities.eccentricity) ?? fallback(0, "a circular orbit", assumed);
  const argument =
    valueOfQuantity(row, quantities.omega) ?? fallback(Math.PI / 2, "argument of periastron 90 deg", assumed);
  const reference = referenceOf(row);
  if (!reference) assumed.push("phases from the passage in front of the star");
  const event = reference?.isPeriastron ? periastron : transit;
  const phases = Float64Array.from({ length: points + 1 }, (_, index) => index / points);
  // A period of a day, so that a phase is a time; the velocity is in the unit of the amplitude.
  const velocities = phases.map((phase) =>
    radialVelocity(phase, day, found.amplitude, 0, eccentricity, argument, 0, event),
  );
  const period = valueOfQuantity(row, quantities.period);
  return {
    is: "curve",
    unit: found.unit,
    amplitude: found.amplitude,
    phases,
    velocities,
    period: period === undefined ? undefined : period / day,
    reference: reference && { day: reference.day, frame: reference.frame },
    assumed,
  };
}

function fallback(value: number, words: string, assumed: string[]): number {
  assumed.push(words);
  return value;
}

type Amplitude = { readonly amplitude: number; readonly unit: string } | { readonly message: string };

function amplitudeOf(row: readonly RowCell[], assumed: string[]): Amplitude {
  const own = reading(row, quantities.semiAmplitude);
  if (own) return { amplitude: fromBase(own.unit, own.base), unit: own.unit.text };
  const inputs = [quantities.period, quantities.starMass, quantities.planetMass].map((quantity) =>
    reading(row, quantity),
  );
  const lacking = [quantities.period, quantities.starMass, quantities.planetMass].filter((_, index) => !inputs[index]);
  if (lacking.length > 0) {
    const names = lacking.map(({ name }) => name).join(", ");
    return {
      message: `This curve needs K, for example in a column "K [m/s]", or what K follows from; there is no ${names} in this row.`,
    };
  }
  const optional = [quantities.eccentricity, quantities.inclination].map((quantity) => reading(row, quantity));
  const given = [...inputs, ...optional].map((each) => each && { block: blockOf([[each.text]]) });
  const result = cellAt(findCellFunction("BARY.REFLEX")!.once(given).columns[0]!, 0);
  if (typeof result !== "number") return { message: result instanceof CellError ? result.message : "no K follows" };
  assumed.push("K as REFLEX gives it");
  return { amplitude: result, unit: "m/s" };
}

interface BaseReading {
  readonly base: number;
  readonly unit: Unit;
  /** As a quantity text. */
  readonly text: string;
}

/** The value of the first column of a quantity, in base units; undefined where there is none that can be read. */
function reading(row: readonly RowCell[], quantity: Quantity): BaseReading | undefined {
  for (const { header, cell } of row) {
    const recognised = recogniseColumn(header);
    if (recognised.quantity !== quantity || recognised.isUncertainty) continue;
    const read = readCell(
      quantity.name,
      cell,
      { header: undefined, unit: recognised.unit, problem: undefined },
      quantity,
    );
    if (read instanceof CellError || "about" in read) continue;
    const base = toBase(read.unit, read.value);
    if (!isWithin(openRange(quantity), base)) continue;
    return {
      base,
      unit: read.unit,
      text: read.unit.text === "1" ? String(read.value) : `${read.value} ${read.unit.text}`,
    };
  }
  return undefined;
}

function valueOfQuantity(row: readonly RowCell[], quantity: Quantity): number | undefined {
  return reading(row, quantity)?.base;
}

function referenceOf(row: readonly RowCell[]) {
  const transit = reading(row, quantities.referenceTime);
  const found = transit ?? reading(row, quantities.periastronTime);
  return found && { day: found.base + julianDateOfJ2000, frame: found.unit.frame ?? "", isPeriastron: !transit };
}
