import { isProblem } from "../../units/problem.js";
import { readUnit } from "../../units/readUnit.js";

/** Spellings of the catalogue standard that our unit table has no other use for (CDS, Units in Catalogues). */
const spellings: Readonly<Record<string, string>> = {
  "[-]": "dex",
  "[Sun]": "dex",
  al: "lyr",
  arcs: "arcsec",
  arcm: "arcmin",
};

/** Texts that tell how a value is written and are no unit: sexagesimal angles and times, calendar dates. */
const layouts = new Set(['"h:m:s"', '"d:m:s"', '"datime"', '"month"', "date", '"Y:M:D"', '"D/M/Y"', '"h:m"', '"d:m"']);

/**
 * A unit of a machine-readable table in a spelling that our table reads. In a/b/c each stroke divides by the one unit
 * after it (same standard), where other writers mean different things. What is not known stays as it is written.
 */
export function catalogueUnit(text: string | undefined): string | undefined {
  if (text === undefined || layouts.has(text)) return undefined;
  if (Object.hasOwn(spellings, text)) return spellings[text];
  const unit = readUnit(text);
  if (!isProblem(unit)) return unit.text;
  const [above, ...below] = text.split("/");
  const product = `${above || "1"}/(${below.join(".")})`;
  const again = below.length > 1 ? readUnit(product) : unit;
  return isProblem(again) ? text : again.text;
}
