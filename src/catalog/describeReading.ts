import { CellError } from "../call/cell.js";
import { cellFunctionOf } from "../call/cellFunctionOf.js";
import { blockOf, cellAt } from "../call/column.js";
import { unitOf } from "../functions/units/unitOf.js";
import { kindPhrase, kinds } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readHeader } from "../units/readHeader.js";
import { readQuantity } from "../units/readQuantity.js";
import { one, toBase, type Unit } from "../units/unit.js";

/** How a unit, a header or a quantity text is read, as lines of plain text. */
export function describeReading(text: string): { readonly lines: readonly string[]; readonly understood: boolean } {
  const header = readHeader(text);
  const name = header.unit && header.name ? [`column    ${header.name}`] : [];
  const quantity = readQuantity(text);
  // "4.23 d" is a unit too, one of 4.23 days, but nobody means it.
  const isQuantity = !isProblem(quantity) && (!header.unit || (quantity.unit !== undefined && header.name === ""));
  if (header.unit && !isQuantity) return { lines: [...name, ...unitLines(header.unit)], understood: true };
  if (!header.problem && isQuantity) {
    const { value, upper, lower, unit } = quantity;
    const sigma = upper === undefined ? [] : [`sigma     ${upper === lower ? upper : `+${upper} -${lower}`}`];
    const base = unit ? [`in SI     ${siText(unit, value)}`] : [];
    // An ISO 8601 text is its own best account; the number behind it counts from J2000.0.
    const read = unit?.kind === "instant" && unit.plus === 0 ? text.trim() : value;
    return { lines: [`value     ${read}`, ...sigma, ...unitLines(unit ?? one), ...base], understood: true };
  }
  return { lines: [complaint(text)], understood: false };
}

/** The sentence that the worksheet function UNITOF has for it. */
function complaint(text: string): string {
  const cell = cellAt(cellFunctionOf(unitOf).once([{ block: blockOf([[text]]) }]).columns[0]!, 0);
  return cell instanceof CellError ? cell.message.replace(/^UNITOF: (text is "[^"]*"; )?/, "") : String(cell);
}

function unitLines(unit: Unit): string[] {
  const isScaled = !unit.logarithm && unit.plus === 0 && unit.kind !== "instant" && unit.text !== "1";
  const scale = isScaled ? [`1 is      ${siText(unit, 1)}`] : [];
  return [`unit      ${unit.text}`, `meaning   ${unit.meaning}`, `kind      ${kindPhrase(unit.kind)}`, ...scale];
}

function siText(unit: Unit, value: number): string {
  if (unit.kind === "mass") return `${toBase(unit, value)} m**3/s**2 (G times the mass)`;
  if (unit.kind === "instant") return `${toBase(unit, value)} d from J2000.0 (JD 2451545.0), ${unit.frame}`;
  const base = kinds[unit.kind]?.base ?? unit.kind;
  return `${toBase(unit, value)}${base === "1" ? "" : ` ${base}`}`;
}
