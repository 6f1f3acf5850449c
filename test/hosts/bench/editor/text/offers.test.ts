import { describe, expect, test } from "vitest";
import { hintAt } from "../../../../../src/hosts/bench/page/editor/text/hintAt.js";
import {
  offersByName,
  offersByQuestion,
  offersOfFunctions,
} from "../../../../../src/hosts/bench/page/editor/text/offers.js";
import type { FunctionEntry } from "../../../../../src/hosts/bench/protocol/answers.js";
import type { ColumnState } from "../../../../../src/hosts/bench/protocol/bookState.js";

const entry = (name: string, ...parameters: readonly string[]): FunctionEntry => ({
  name,
  question: `What is ${name}?`,
  own: name.startsWith("BARY."),
  parameters: parameters.map((each) => ({
    name: each.replace("...", ""),
    optional: false,
    repeating: each.endsWith("..."),
    meaning: "",
    unit: "",
  })),
  result: "",
});
const functions = [
  entry("SUM", "numbers..."),
  entry("PI"),
  entry("STAREXAMPLE", "x"),
  entry("BARY.PERIOD", "axis", "star mass"),
  entry("BARY.STARAXIS", "axis"),
  entry("SUMIFS", "sums", "range...", "condition..."),
  entry("LOG10", "number"),
];
const column = (name: string, unit: string) => ({ name, unit }) as ColumnState;
const vocabulary = {
  functions,
  names: [{ name: "star_mass", refersTo: "=Targets!$C$2" }],
  columns: [column("Target", ""), column("Period", "d"), column("Star mass", "solMass"), column("K (fit)", "m/s")],
  place: { sheet: 0, row: 1, column: 4 },
  isArgument: false,
};
const told = (offers: ReturnType<typeof offersByName>) => offers.map(({ insert, tells }) => `${insert} ${tells}`);

describe("what is offered", () => {
  test("our functions first, then columns, names and other functions", () => {
    expect(told(offersByName("sta", "", vocabulary))).toEqual([
      "BARY.STARAXIS( What is BARY.STARAXIS?",
      "C2 Star mass [solMass]",
      "star_mass =Targets!$C$2",
      "STAREXAMPLE( What is STAREXAMPLE?",
    ]);
  });

  test("columns first where an argument is typed", () => {
    const offers = offersByName("period", "", { ...vocabulary, isArgument: true });
    expect(told(offers)).toEqual(["B2 Period [d]", "BARY.PERIOD( What is BARY.PERIOD?"]);
  });

  test("a column by any word of its header, or by several", () => {
    expect(told(offersByName("mass", "", vocabulary))).toEqual(["C2 Star mass [solMass]"]);
    expect(told(offersByName("", "star m", vocabulary))).toEqual(["C2 Star mass [solMass]"]);
    expect(told(offersByName("", "k (", vocabulary))).toEqual(["D2 K (fit) [m/s]"]);
  });

  test("no column to itself, and none in the header row", () => {
    const at = (row: number, column: number) =>
      offersByName("per", "", { ...vocabulary, place: { sheet: 0, row, column } });
    expect(told(at(1, 1))).toEqual(["BARY.PERIOD( What is BARY.PERIOD?"]);
    expect(told(at(0, 4))).toEqual(["BARY.PERIOD( What is BARY.PERIOD?"]);
    expect(told(at(99, 4))).toContain("B100 Period [d]");
  });

  test("nothing more for a name that is whole", () => {
    expect(offersByName("star_mass", "", vocabulary)).toEqual([]);
  });

  test("a function without arguments is whole at once", () => {
    expect(told(offersByName("pi", "", vocabulary))).toEqual(["PI() What is PI?"]);
  });

  test("functions by question, in the order they were found; and those that look like a cell", () => {
    expect(told(offersByQuestion(["BARY.STARAXIS", "GONE", "PI"], functions))).toEqual([
      "BARY.STARAXIS( What is BARY.STARAXIS?",
      "PI() What is PI?",
    ]);
    expect(told(offersOfFunctions("log1", functions))).toEqual(["LOG10( What is LOG10?"]);
  });
});

describe("the hint at the caret", () => {
  test.each([
    ["=bary.period(B2,", "BARY.PERIOD star mass"],
    ["=bary.period(B2,C2,", "BARY.PERIOD nothing"],
    ["=SUM(1,2,3,", "SUM numbers"],
    ["=SUMIFS(A:A,B:B,1,C:C,", "SUMIFS condition"],
    ["=SUMIFS(A:A,B:B,1,", "SUMIFS range"],
    ["=UNKNOWN(", undefined],
    ["=B2", undefined],
  ])("%s", (text, expected) => {
    const hint = hintAt(text, text.length, functions);
    const parameter = hint?.present === undefined ? undefined : hint.entry.parameters[hint.present];
    expect(hint && `${hint.entry.name} ${parameter?.name ?? "nothing"}`).toBe(expected);
  });
});
