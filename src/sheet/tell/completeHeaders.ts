import { tokenize } from "@borgar/fx";
import { fits } from "../../call/readCell.js";
import { takesHeaders, takesResult } from "../../functions/argumentNames.js";
import type { Definition, Input } from "../../functions/definition.js";
import { isPlainNumberKind } from "../../units/kind.js";
import { isProblem } from "../../units/problem.js";
import { readHeader } from "../../units/readHeader.js";
import { readQuantity } from "../../units/readQuantity.js";
import { readUnit } from "../../units/readUnit.js";
import type { Reference } from "../formula/reference.js";
import { readReference, referenceText, resolve } from "../formula/reference.js";
import { type CallText, callsIn } from "./callsIn.js";
import { definitionOf } from "./ownCall.js";

/** A formula text with headers put in, and where the caret belongs afterwards. */
export interface CompletedCall {
  readonly text: string;
  readonly caret: number;
  /** What was completed, or why nothing was. */
  readonly said: string;
}

/** The sheet a formula is typed on, as far as completing needs it; headers stand in the first row. */
export interface HeaderRow {
  readonly row: number;
  readonly column: number;
  /** The header of a column; of another sheet where one is named. */
  header(column: number, sheet: string | undefined): string;
}

/**
 * Completes the call of one of our functions around the caret: the header cells of its inputs, and the header cell of
 * the formula's own column where it states a unit that the result can be given in. Inputs that were left out stay
 * empty.
 */
export function completeHeaders(text: string, caret: number, home: HeaderRow): CompletedCall {
  const unchanged = (said: string): CompletedCall => ({ text, caret, said });
  const calls = callsIn(text).flatMap((call) => {
    const definition = definitionOf(call.name);
    return definition ? [{ call, definition }] : [];
  });
  const around = calls.filter(({ call }) => call.open <= caret && caret <= (call.close ?? text.length) + 1);
  const found = around.at(-1) ?? (calls.length === 1 ? calls[0] : undefined);
  if (!found) return unchanged("Headers belong to the functions of BARY; put the caret into the call of one.");
  const { call, definition } = found;
  const parts = call.parts.map(({ from, to }) => text.slice(from, to));
  while (parts.length > 0 && parts.at(-1)!.trim() === "") parts.pop();
  const inputs = definition.inputs as readonly Input[];
  const missing = inputs.find((input, index) => isRequired(input) && (parts[index] ?? "").trim() === "");
  if (missing) return unchanged(`${definition.name}: ${missing.name} is still missing; give the inputs first.`);
  const given = inputs.map((input, index) => readInput(input, parts[index] ?? "", home));
  const known = parts.slice(inputs.length).map((part) => part.trim());
  const headersThere = takesHeaders(definition) ? (known[0] ?? "") : "";
  const headers = takesHeaders(definition) ? headersThere || headersText(given, home) : "";
  const resultThere = known[takesHeaders(definition) ? 1 : 0] ?? "";
  const result = resultThere || resultText(definition, home);
  const added = [
    headersThere === "" && headers !== "" ? `headers ${headers}` : "",
    resultThere === "" && result !== "" ? `result header ${result}` : "",
  ].filter((each) => each !== "");
  if (added.length === 0) return unchanged(nothingToDo(definition, given, known, home));
  const said = saidOf(definition, given, added, result !== "", home);
  return complete(text, call, definition, parts, headers, result, said);
}

/** One input as it was given. */
type GivenInput = { readonly input: Input } & (
  | { readonly is: "left out" | "text" | "no header" }
  /** A number, or a part that is worked out, with no header to state its unit. */
  | { readonly is: "stranger"; readonly what: string }
  | { readonly is: "cells"; readonly columns: readonly number[]; readonly reference: Reference }
);

function isRequired(input: Input): boolean {
  return input.takes === "quantity" ? input.fallback === undefined : input.takes !== "word";
}

function isHeaded({ takes }: Input): boolean {
  return takes === "quantity" || takes === "any quantity";
}

function readInput(input: Input, part: string, { row, column }: HeaderRow): GivenInput {
  if (!isHeaded(input)) return { input, is: "no header" };
  const tokens = tokenize(`=${part}`, { withLocation: true }).filter(
    ({ type }) => type !== "fx_prefix" && type !== "whitespace" && type !== "newline",
  );
  const [first, second, ...rest] = tokens;
  if (!first) return { input, is: "left out" };
  const isSpill = second?.type === "operator" && second.value === "#" && rest.length === 0;
  if ((!second || isSpill) && (first.type === "range" || first.type === "range_beam")) {
    const reference = readReference(first.value, row, column);
    if (reference) {
      const { left, right } = resolve(reference, row, column);
      return { input, is: "cells", reference, columns: Array.from({ length: right - left + 1 }, (_, at) => left + at) };
    }
  }
  if (!second && first.type === "string") {
    const read = readQuantity(first.value.replace(/^"|"$/g, ""));
    const stated = isProblem(read) || read.unit !== undefined;
    return stated ? { input, is: "text" } : strangerOf(input, first.value);
  }
  return strangerOf(input, part.trim());
}

/** A plain number is the whole statement for an eccentricity, and no statement for a period. */
function strangerOf(input: Input, what: string): GivenInput {
  const plain = input.takes === "quantity" && isPlainNumberKind(input.quantity.kind);
  return plain ? { input, is: "text" } : { input, is: "stranger", what };
}

function headersText(given: readonly GivenInput[], home: HeaderRow): string {
  const headed = given.filter(({ input }) => isHeaded(input));
  const last = headed.findLastIndex(({ is }) => is !== "left out");
  const slots = headed.slice(0, last + 1);
  const cells = slots.filter((slot) => slot.is === "cells");
  const [first] = cells;
  if (!first) return "";
  return rangeText(slots, home) ?? listText(slots, home);
}

/** The headers as one range, where the columns of the inputs lie side by side in their order. */
function rangeText(slots: readonly GivenInput[], home: HeaderRow): string | undefined {
  const [first] = slots;
  if (first?.is !== "cells") return undefined;
  const start = first.columns[0]!;
  const isUncertain = slots.some((slot) => slot.is === "cells" && slot.columns.length > 1);
  let next = start;
  let last = first.reference;
  for (const slot of slots) {
    // The header of an input that was left out is ignored, so that a column standing in between does no harm.
    if (slot.is === "left out" && !isUncertain) next++;
    else if (slot.is !== "cells" || slot.columns[0] !== next || slot.reference.sheet !== first.reference.sheet) {
      return undefined;
    } else {
      next += slot.columns.length;
      last = slot.reference;
    }
  }
  return headerReference(first.reference, last, start, next - 1, home);
}

/** The headers as a text list that the worksheet puts together, `B$1&";"&D$1`, so that a changed unit is followed. */
function listText(slots: readonly GivenInput[], home: HeaderRow): string {
  const entries = slots.flatMap((slot) =>
    slot.is === "cells"
      ? slot.columns.map((column) => headerReference(slot.reference, slot.reference, column, column, home))
      : [""],
  );
  const pieces: string[] = [];
  let between = "";
  for (const [index, entry] of entries.entries()) {
    if (index > 0) between += ";";
    if (entry !== "") {
      if (between !== "") pieces.push(`"${between}"`);
      pieces.push(entry);
      between = "";
    }
  }
  if (between !== "") pieces.push(`"${between}"`);
  return pieces.join("&");
}

/** Header cells whose columns stay in place, or move along, as those of the first and the last input do. */
function headerReference(
  first: Reference,
  last: Reference,
  left: number,
  right: number,
  { row, column }: HeaderRow,
): string {
  const top = { at: 0, fixed: true };
  const bound = (at: number, fixed: boolean) => (fixed ? { at, fixed } : { at: at - column, fixed });
  const columns = { left: bound(left, first.left.fixed), right: bound(right, last.right.fixed) };
  return referenceText({ sheet: first.sheet, top, bottom: top, ...columns, whole: undefined }, row, column);
}

/** The header cell of the formula's own column, where it states a unit of the result's kind. */
function resultText(definition: Definition, home: HeaderRow): string {
  if (!takesResult(definition) || home.row === 0) return "";
  const { unit } = readHeader(home.header(home.column, undefined));
  const wanted = definition.form === "number" ? definition.result.quantity.kind : undefined;
  if (!unit || !fits(unit, wanted)) return "";
  const top = { at: 0, fixed: true };
  const own = { at: 0, fixed: false };
  const reference = { sheet: undefined, top, bottom: top, left: own, right: own, whole: undefined };
  return referenceText(reference, home.row, home.column);
}

function complete(
  text: string,
  call: CallText,
  definition: Definition,
  parts: readonly string[],
  headers: string,
  result: string,
  said: string,
): CompletedCall {
  const { length } = definition.inputs;
  const inputs = Array.from({ length }, (_, index) => (parts[index] ?? "").trimEnd());
  const last = takesHeaders(definition) ? [headers, result] : [result];
  if (last.at(-1) === "") last.pop();
  const spaced = parts.slice(1, length).some((part) => /^\s/.test(part));
  const tail = last.map((each) => (spaced && each !== "" ? ` ${each}` : each));
  const inside = [...inputs, ...tail].join(",");
  const before = `${text.slice(0, call.open)}${inside})`;
  return { text: before + text.slice((call.close ?? text.length) + 1), caret: before.length, said };
}

function nothingToDo(
  definition: Definition,
  given: readonly GivenInput[],
  known: readonly string[],
  home: HeaderRow,
): string {
  const stranger = given.find((each) => each.is === "stranger");
  if (stranger) return `${strangerSentence(stranger)}.`;
  if (known.some((part) => part !== "")) return "The headers are there already.";
  if (definition.form === "conversion")
    return `${ownHeader(home)}, so the unit of the result cannot be completed; write it there.`;
  return "The inputs carry their units; no headers are needed.";
}

function strangerSentence({ input, what }: Extract<GivenInput, { is: "stranger" }>): string {
  return `${input.name} is ${what}, which has no header to state its unit; put it into a column, or write the unit with it as a text`;
}

function ownHeader(home: HeaderRow): string {
  const header = home.header(home.column, undefined).trim();
  return header === ""
    ? "The header of this column is blank"
    : `The header of this column, "${header}", states no unit that fits`;
}

/** What was completed, and what is still to be done. */
function saidOf(
  definition: Definition,
  given: readonly GivenInput[],
  added: readonly string[],
  hasResult: boolean,
  home: HeaderRow,
): string {
  const said = `Completed: ${added.join(" and ")}`;
  const remarks = given.flatMap((each) => {
    if (each.is === "stranger") return [strangerSentence(each)];
    if (each.is !== "cells" || each.input.takes !== "quantity") return [];
    const header = home.header(each.columns[0]!, each.reference.sheet);
    const { unit } = readHeader(header);
    const { kind } = each.input.quantity;
    if (unit ? fits(unit, kind) : isPlainNumberKind(kind)) return [];
    const came =
      header.trim() === ""
        ? "is blank"
        : `"${header.trim()}" states no ${unit ? `unit of ${each.input.name}` : "unit"}`;
    return [`the header of ${each.input.name} ${came}`];
  });
  if (!hasResult && takesResult(definition) && definition.form === "number") {
    const unit = readUnit(definition.result.unit);
    const plain = !isProblem(unit) && isPlainNumberKind(unit.kind);
    if (!plain)
      remarks.push(
        `the result is in ${definition.result.unit}, since the header of this column states no unit that fits`,
      );
  }
  return `${[said, ...remarks].join("; ")}.`;
}
