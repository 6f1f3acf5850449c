import { gravitationalConstant } from "../kernel/constants.js";
import { kindOfProduct } from "./dimension.js";
import { findUnitSymbol } from "./findUnitSymbol.js";
import { isProblem, type UnitProblem } from "./problem.js";
import { readInstantUnit } from "./readInstantUnit.js";
import { readUnitProduct, type UnitProduct } from "./readUnitProduct.js";
import { one, type Unit } from "./unit.js";
import { unitText } from "./unitText.js";

const remembered = new Map<string, Unit | UnitProblem>();
const mostRemembered = 4096;
/** Longer texts are prose; reading goes as deep as a text has brackets. */
const longestUnit = 200;

/**
 * Reads a unit: IVOA VOUnits 1.1 and what catalogues write instead of it (`km s-1`, `m/s^2`, `[cm/s2]`, `Mjup`, `days`).
 * What could mean two things is refused with the choices. The empty text is the plain number, as VOUnits has it.
 */
export function readUnit(text: string): Unit | UnitProblem {
  const known = remembered.get(text);
  if (known) return known;
  if (text.length > longestUnit) return { problem: "unknown unit", text, nearest: undefined };
  if (remembered.size >= mostRemembered) remembered.clear();
  const unit = read(plain(text));
  remembered.set(text, unit);
  return unit;
}

const superscripts = "\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079";

/** One way to write minus, powers and spaces; quotes around a unit that VOUnits does not list are dropped. */
function plain(text: string): string {
  return text
    .replace(/[\u207b\u2212\u2010\u2011]/g, "-")
    .replace(/[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]/g, (digit) => String(superscripts.indexOf(digit)))
    .replace(/'([A-Za-z]+)'/g, "$1")
    .replace(/\s+/g, " ")
    .trim();
}

function read(text: string): Unit | UnitProblem {
  if (text === "") return one;
  const instant = readInstantUnit(text);
  if (instant) return instant;
  const logarithm = readLogarithm(text);
  if (logarithm) return logarithm;
  const whole = findUnitSymbol(text);
  if (!isProblem(whole)) return unitOf({ scale: 1, scaleText: "", factors: [{ symbol: whole, power: 1 }] });
  if (whole.problem === "ambiguous unit") return whole;
  const product = readUnitProduct(text);
  return isProblem(product) ? product : unitOf(product);
}

const logarithmForm = /^(log10|log|lg|dex|ln)\s?\((.*)\)$/;

/** `log(cm/s**2)`, `dex(cm/s2)`, `[cm/s2]` (the convention of machine-readable tables) and `dex` alone. */
function readLogarithm(text: string): Unit | UnitProblem | undefined {
  if (text === "dex") return { ...one, text, meaning: "decimal logarithm", logarithm: "log10" };
  const bracket = /^\[(.+)\]$/.exec(text);
  const [, name, inside] = bracket ? ["", "log", bracket[1]!] : (logarithmForm.exec(text) ?? []);
  if (name === undefined || inside === undefined) return undefined;
  const unit = read(inside.trim());
  if (isProblem(unit)) return unit;
  if (unit.logarithm || unit.plus !== 0 || unit.frame) return { problem: "unknown unit", text, nearest: undefined };
  const natural = name === "ln";
  return {
    ...unit,
    text: `${natural ? "ln" : "log"}(${unit.text})`,
    meaning: `${natural ? "natural" : "decimal"} logarithm of the value in ${unit.text}`,
    logarithm: natural ? "ln" : "log10",
  };
}

function unitOf(product: UnitProduct): Unit | UnitProblem {
  const { scale, scaleText } = product;
  // In the order of the spelling, so that the spelling reads back to the same bits.
  const factors = [
    ...product.factors.filter(({ power }) => power > 0),
    ...product.factors.filter(({ power }) => power < 0),
  ];
  const text = unitText(factors, scaleText);
  const single = factors.length === 1 && factors[0]!.power === 1 ? factors[0]! : undefined;
  const kind = kindOfProduct(factors.map(({ symbol, power }) => ({ row: symbol.row, power })));
  let times = scale;
  let over = 1;
  for (const { symbol, power } of factors) {
    const { row, exponent } = symbol;
    // A mass alone is carried as G times the mass; inside a product (a density) it counts in kilograms.
    const mass = !single && row.dimension === "kg" ? gravitationalConstant : 1;
    const above = (row.times / mass) * 10 ** Math.max(exponent, 0);
    const below = row.over * 10 ** Math.max(-exponent, 0);
    times *= power > 0 ? above ** power : below ** -power;
    over *= power > 0 ? below ** power : above ** -power;
  }
  if (!single && kind === "mass") times *= gravitationalConstant;
  if (!(times > 0 && over > 0 && Number.isFinite(times / over) && times / over > 0)) {
    return { problem: "unknown unit", text, nearest: undefined };
  }
  if (single?.symbol.row.symbol === "1" && !scaleText) return one;
  const meaning = single && !scaleText && !single.symbol.prefix ? single.symbol.row.meaning : text;
  return { text, meaning, kind, times, over, plus: single && scale === 1 ? single.symbol.row.plus : 0 };
}
