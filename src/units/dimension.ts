import { create, createUnitDependencies, unitDependencies } from "mathjs";
import { type Kind, kinds } from "./kind.js";
import type { UnitRow } from "./unitTable.js";
import { unitTable } from "./unitTable.js";

/** One factor of a compound unit: a row of the table to a power. */
export interface DimensionFactor {
  readonly row: UnitRow;
  readonly power: number;
}

const algebra = create({ unitDependencies, createUnitDependencies });

// The algebra knows seven SI dimensions and the angle. What the trade counts besides has no SI dimension and must
// nevertheless never be added to anything else, so each gets a base of its own.
const ownBases = new Set(unitTable.flatMap((row) => row.dimension.split(" ").filter((word) => word.endsWith("Base"))));
for (const base of ownBases) algebra.createUnit(base);

const names = new Map<UnitRow, string>();
unitTable.forEach((row, index) => {
  if (row.dimension === "") return;
  const name = `tableUnit${index}`;
  algebra.createUnit(name, `1 ${row.dimension}`);
  names.set(row, name);
});

const baseSymbols = [
  "kg",
  "m",
  "s",
  "A",
  "K",
  "cd",
  "mol",
  "rad",
  "bit",
  ...[...ownBases].map((base) => base.slice(0, -4)),
];

/** The dimension of a product, written as a unit of base units: "kg.m**-3"; empty where everything cancels. */
function dimensionOf(expression: string): string {
  const { dimensions } = algebra.unit(expression) as unknown as { dimensions: readonly number[] };
  return dimensions
    .map((power, index) => (power === 0 ? "" : power === 1 ? baseSymbols[index] : `${baseSymbols[index]}**${power}`))
    .filter((factor) => factor !== "")
    .join(".");
}

const kindOfDimension = new Map(
  Object.entries(kinds).flatMap(([kind, { dimension }]) => (dimension ? [[dimensionOf(dimension), kind]] : [])),
);

/** The kind of a product of units. */
export function kindOfProduct(factors: readonly DimensionFactor[]): Kind {
  const named = factors.filter(({ row, power }) => names.has(row) && power !== 0);
  if (named.length === 0) return "ratio";
  const dimension = dimensionOf(named.map(({ row, power }) => `${names.get(row)}^${power}`).join(" "));
  return dimension === "" ? "ratio" : (kindOfDimension.get(dimension) ?? dimension);
}
