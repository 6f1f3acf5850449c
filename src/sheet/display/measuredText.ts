import type { Cell } from "../../call/cell.js";
import { displayMeasured } from "./displayMeasured.js";
import { displayNumber } from "./displayNumber.js";

/** A number with as many digits as its uncertainty allows, or six. */
export function measuredText(value: number, upper: Cell = null, lower: Cell = null): string {
  if (typeof upper !== "number" || upper === 0) return displayNumber(value, { kind: "significant", digits: 6 });
  const below = typeof lower === "number" && lower !== upper ? lower : undefined;
  return displayMeasured(value, upper, below, { kind: "plus-minus", digits: 2 });
}

/** The same with its unit behind it. */
export function withUnitText(text: string, unit: string | undefined): string {
  return unit === undefined || unit === "" || unit === "1" ? text : `${text} ${unit}`;
}
