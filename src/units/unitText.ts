import type { UnitSymbol } from "./findUnitSymbol.js";

/** A symbol of a compound unit to its power. */
export interface UnitFactor {
  readonly symbol: UnitSymbol;
  readonly power: number;
}

/** The IVOA VOUnits 1.1 spelling of a product: `km/s`, `kg/m**3`, `W.m**-2.um**-1`. */
export function unitText(factors: readonly UnitFactor[], scale: string): string {
  const above = factors.filter(({ power }) => power > 0);
  const below = factors.filter(({ power }) => power < 0);
  const single = below.length === 1 && above.length > 0;
  const product = (single ? above : [...above, ...below])
    .map(({ symbol, power }) => factorText(symbol, power))
    .join(".");
  const quotient = single ? `/${factorText(below[0]!.symbol, -below[0]!.power)}` : "";
  return `${scale}${product || (scale ? "" : "1")}${quotient}`;
}

function factorText(symbol: UnitSymbol, power: number): string {
  const name = `${symbol.prefix}${symbol.row.symbol}`;
  if (power === 1) return name;
  return Number.isInteger(power) ? `${name}**${power}` : `${name}**(${power})`;
}
