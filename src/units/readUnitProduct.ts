import { findUnitSymbol } from "./findUnitSymbol.js";
import { isProblem, type UnitProblem } from "./problem.js";
import type { UnitFactor } from "./unitText.js";

/** A product of symbols with an optional number in front. */
export interface UnitProduct {
  readonly scale: number;
  readonly scaleText: string;
  readonly factors: readonly UnitFactor[];
}

const powerOfTen = /^10\s?(?:\*\*|\^)\s?\(?([+-]?\d+)\)?|^10([+-]\d+)/;
const float = /^\d+(?:\.\d+)?(?:[eE][+-]?\d+)?(?![\d(])/;
const symbol =
  /^(?:e-|[A-Za-z%\u00b0\u00b5\u03bc\u00c5\u212b\u03a9\u2126_][A-Za-z%\u00b0_\u2609\u2299\u2643\u2295\u00c5\u212b\u03a9\u2126]*|['"\u2032\u2033])/;
const power = /^ ?(?:\*\*|\^) ?(?:\(([^()]+)\)|\{([^{}]+)\}|([+-]?\d+(?:\.\d+)?))|^([+-]?\d+)/;
const product = /^(?: ?[.*\u00b7\u22c5\u00d7] ?| )/;
const division = /^ ?\/ ?|^ per /;

/**
 * Products as VOUnits writes them (`W.m**-2`, `kg/(m.s)`) and as tables write them (`km s-1`, `m s^-1`, `kg m-3`).
 * Two divisions, or a product after a division, are refused: readers differ on what they divide.
 */
export function readUnitProduct(text: string): UnitProduct | UnitProblem {
  const reading = new ProductReading(text);
  const scale = reading.scale();
  const factors = reading.quotient();
  if (isProblem(factors)) return factors;
  return reading.rest === "" ? { ...scale, factors } : reading.unreadable();
}

class ProductReading {
  rest: string;

  constructor(private readonly text: string) {
    this.rest = text;
  }

  scale(): { scale: number; scaleText: string } {
    const ten = this.take(powerOfTen);
    if (ten) {
      const exponent = Number(ten[1] ?? ten[2]);
      this.take(product);
      return { scale: 10 ** exponent, scaleText: `10**${exponent}` };
    }
    const number = this.take(float);
    if (!number) return { scale: 1, scaleText: "" };
    if (!division.test(this.rest)) this.take(product);
    const scale = Number(number[0]);
    return { scale, scaleText: scale === 1 ? "" : number[0].toUpperCase() };
  }

  /** A product, then at most one division by one expression. */
  quotient(): readonly UnitFactor[] | UnitProblem {
    const above = division.test(this.rest) ? [] : this.product();
    if (isProblem(above) || !this.take(division)) return above;
    const start = this.rest;
    const below = this.expression();
    if (isProblem(below)) return below;
    if (this.rest !== "" && !this.rest.startsWith(")")) return this.secondDivision(start);
    return [...above, ...below.map((factor) => ({ ...factor, power: -factor.power }))];
  }

  private secondDivision(divisor: string): UnitProblem {
    const before = this.text.slice(0, this.text.length - divisor.length).replace(/ ?\/ ?$| per $/, "");
    const below = divisor.replace(/ ?\/ ?| per /g, ".").replace(/ /g, ".");
    return { problem: "unit grammar", text: this.text, write: `${before}/(${below})` };
  }

  private product(): readonly UnitFactor[] | UnitProblem {
    const factors: UnitFactor[] = [];
    do {
      const expression = this.expression();
      if (isProblem(expression)) return expression;
      factors.push(...expression);
    } while (!division.test(this.rest) && this.take(product));
    return factors;
  }

  private expression(): readonly UnitFactor[] | UnitProblem {
    if (this.take(/^sqrt ?\(/)) return this.closed(0.5);
    if (this.take(/^\( ?/)) return this.closed(1);
    const name = this.take(symbol)?.[0];
    if (name === undefined) return this.unreadable();
    const found = findUnitSymbol(name);
    if (isProblem(found)) return found;
    const exponent = this.power();
    return exponent === undefined ? this.unreadable() : [{ symbol: found, power: exponent }];
  }

  /** What stands in brackets, to the power that follows them. */
  private closed(outer: number): readonly UnitFactor[] | UnitProblem {
    const inside = this.quotient();
    if (isProblem(inside)) return inside;
    if (!this.take(/^ ?\)/)) return this.unreadable();
    const exponent = this.power();
    if (exponent === undefined) return this.unreadable();
    return inside.map((factor) => ({ ...factor, power: factor.power * exponent * outer }));
  }

  private power(): number | undefined {
    const match = this.take(power);
    if (!match) return 1;
    const [, bracket, brace, written, bare] = match;
    const [above, below = "1"] = (bracket ?? brace ?? written ?? bare)!.split("/");
    const value = Number(above) / Number(below);
    return Number.isFinite(value) && value !== 0 ? value : undefined;
  }

  unreadable(): UnitProblem {
    return { problem: "unknown unit", text: this.text, nearest: undefined };
  }

  private take(pattern: RegExp): RegExpExecArray | undefined {
    const match = pattern.exec(this.rest);
    if (!match) return undefined;
    this.rest = this.rest.slice(match[0].length);
    return match;
  }
}
