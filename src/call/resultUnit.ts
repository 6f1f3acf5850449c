import { isPlainNumberKind, type Kind } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readHeader } from "../units/readHeader.js";
import { readUnit } from "../units/readUnit.js";
import { convertible, one, type Unit } from "../units/unit.js";
import type { CallProblem } from "./callProblem.js";
import type { Argument } from "./cellFunction.js";
import { headerCells } from "./headerCells.js";
import { fits } from "./readCell.js";

/** A unit of our own tables; that it reads is tested. */
export function knownUnit(text: string): Unit {
  const unit = readUnit(text);
  if (isProblem(unit)) throw new Error(`the unit "${text}" of a definition does not read`);
  return unit;
}

/** The unit the result is asked for in, or undefined where no result header was given. */
export function askedUnit(argument: Argument, kind: Kind | undefined): Unit | CallProblem | undefined {
  if (!argument) return undefined;
  const [header] = headerCells(argument);
  const text = header?.isNumber ? "" : (header?.text ?? "");
  const reading = readHeader(text);
  if (reading.problem) return { about: "result unit", header: text, unit: reading.problem };
  if (reading.unit) return reading.unit;
  if (kind !== undefined && isPlainNumberKind(kind)) return undefined;
  return bareUnitProblem(text.trim(), kind) ?? { about: "result unit missing", header };
}

/** A single word may be a column's name or a unit with a slip in it: it is a unit if one of the right kind is near. */
function bareUnitProblem(text: string, kind: Kind | undefined): CallProblem | undefined {
  if (text === "" || /\s/.test(text)) return undefined;
  const unit = readUnit(text);
  if (!isProblem(unit) || unit.problem === "unit grammar") return undefined;
  const meant =
    unit.problem === "ambiguous unit" ? unit.choices.map((choice) => choice.symbol) : [unit.nearest?.symbol];
  const near = meant.some((symbol) => symbol !== undefined && (kind === undefined || knownUnit(symbol).kind === kind));
  return near ? { about: "result unit", header: text, unit } : undefined;
}

/** The unit of the result: the one asked for if the result can be given in it, else the definition's own. */
export function resultUnit(argument: Argument, own: Unit): Unit | CallProblem {
  const asked = askedUnit(argument, own.kind);
  if (asked === undefined) return own;
  if ("about" in asked) return asked;
  if (!fits(asked, own.kind) || (asked.text !== one.text && !convertible(asked, own))) {
    return { about: "result kind", header: headerCells(argument)[0]?.text ?? "", unit: asked, wanted: own };
  }
  return asked;
}
