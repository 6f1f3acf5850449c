import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { CellError } from "../../../src/call/cell.js";
import { cellsOf } from "../../../src/call/column.js";
import { calc } from "../../../src/sheet/calc.js";
import { formulaText } from "../../../src/sheet/formula/formula.js";
import { noFunctions } from "../../../src/sheet/formula/functions.js";
import { checkFormula, readFormula } from "../../../src/sheet/formula/readFormula.js";
import { pairFunctions } from "../model/pairFunction.js";

const read = (text: string) => readFormula(text, 1, 4, noFunctions);

describe("a formula as its cell sees it", () => {
  test("shows its text as typed in its own cell", () => {
    for (const text of [
      "=B2*2",
      "= b2 + $C$1 ",
      "=SUM(A$1:A1)",
      "='My sheet'!B2+Sheet2!$A:$C",
      '=IF(B2>1,"A1 stays ""A1""",A2#)',
      "=LET(x,B2,x*x)",
      "={1,2;3,4}*B2",
      "=1.5E+3",
    ]) {
      expect(formulaText(read(text), 1, 4)).toBe(text.replace("b2", "B2"));
    }
  });

  test("moves relative references and keeps fixed ones", () => {
    expect(formulaText(read("=B2+$B2+B$2+$B$2+SUM(B:B,2:2)"), 3, 5)).toBe("=C4+$B4+C$2+$B$2+SUM(C:C,4:4)");
  });

  test("is the same wherever it was filled to", () => {
    expect(readFormula("=B7*$C$1", 6, 4, noFunctions).key).toBe(read("=B2*$C$1").key);
    expect(readFormula("=B7*$C$1", 7, 4, noFunctions).key).not.toBe(read("=B2*$C$1").key);
  });

  test("reads every reference over the edge of the sheet as gone", () => {
    expect(formulaText(read("=A1+B2"), 0, 4)).toBe("=#REF!+B1");
  });
});

/** Text, position of the problem, code, and words of the sentence. */
const problems: readonly (readonly [string, number, string, string])[] = [
  ["=1+", 3, "#NAME?", 'nothing follows "+"'],
  ["=", 1, "#NAME?", "nothing follows; a number, cell or function is needed"],
  ["=(1+2", 1, "#NAME?", 'this "(" is never closed; add ")"'],
  ["=1)", 2, "#NAME?", 'nothing opens this ")"'],
  ["=SUM(1;2)", 6, "#NAME?", 'separated by ","'],
  ['="abc', 1, "#NAME?", "a text has no end"],
  ["=2 3", 3, "#NAME?", '"3" does not belong here'],
  ["=1+?", 3, "#NAME?", '"?" is no number'],
  ["={1,2;3}", 1, "#VALUE!", "rows differ in length"],
  ["=SUMM(1)", 1, "#NAME?", "did you mean SUM?"],
  ["=1+TEST.PAR(1)", 3, "#NAME?", "did you mean TEST.PAIR?"],
  ["=XQZWV(1)", 1, "#NAME?", "no function has this name"],
  ["=ABS()", 1, "#VALUE!", "ABS: 0 arguments came; 1 argument is needed"],
  ["=TEST.PAIR(1,2,3)", 1, "#VALUE!", "TEST.PAIR: 3 arguments came; 1 to 2 are needed"],
  ["=1E999", 1, "#NUM!", "beyond 1.79E+308"],
  ["=A1:INDEX(B:B,2)", 1, "#VALUE!", "not supported"],
  [`=${"-".repeat(3000)}A1`, 0, "#NAME?", "nested too deeply"],
  [`="${"x".repeat(9000)}"`, 8192, "#NAME?", "9003 characters; 8192 are the most"],
];

describe("any text at all", () => {
  const piece = fc.constantFrom(
    "=",
    "(",
    ")",
    "{",
    "}",
    ",",
    ";",
    ":",
    "#",
    "@",
    "%",
    "-",
    "^",
    "&",
    '"',
    "'",
    "!",
    " ",
    "A1",
    "$B$2",
    "A:A",
    "1:2",
    "1.5E",
    "SUM",
    "LET(",
    "x",
    "Sheet2",
    "#REF!",
    "[",
    "]",
    "TRUE",
    "é",
  );
  const text = fc.oneof(
    fc.string({ maxLength: 30 }),
    fc.array(piece, { maxLength: 14 }).map((pieces) => `=${pieces.join("")}`),
  );

  test("is read without an exception, and what is wrong is said in 250 characters", () => {
    fc.assert(
      fc.property(text, (typed) => {
        const problem = checkFormula(typed, noFunctions);
        expect(problem?.message.length ?? 0).toBeLessThanOrEqual(250);
        expect(problem?.position ?? 0).toBeLessThanOrEqual(typed.length);
        expect(
          cellsOf(calc(typed, noFunctions))
            .flat()
            .every((cell) => cell !== undefined),
        ).toBe(true);
      }),
      { numRuns: 1500 },
    );
  });

  test("reads the same again from the text it shows", () => {
    fc.assert(
      fc.property(text, (typed) => {
        const formula = readFormula(typed, 3, 3, noFunctions);
        const again = readFormula(formulaText(formula, 3, 3), 3, 3, noFunctions);
        expect(again.key).toBe(formula.key);
      }),
      { numRuns: 800 },
    );
  });
});

describe("a text that is no formula", () => {
  test.each(problems)("%.30s says where and what to type", (text, position, code, words) => {
    const problem = checkFormula(text, pairFunctions);
    expect(problem).toMatchObject({ position, code, message: expect.stringContaining(words) });
    expect(problem?.message.length).toBeLessThanOrEqual(250);
    expect(problem?.message).not.toMatch(/invalid|please|undefined/i);
    const [[cell] = []] = cellsOf(calc(text, pairFunctions));
    expect(cell).toBeInstanceOf(CellError);
    expect(formulaText(readFormula(text, 3, 3, pairFunctions), 3, 3)).toBe(text);
  });

  test("an unknown function only spoils its own place", () => {
    expect(cellsOf(calc("=IFERROR(NOSUCH(1),5)", noFunctions))).toEqual([[5]]);
  });
});
