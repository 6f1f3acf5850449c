import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { callAt } from "../../../../../src/hosts/bench/page/editor/text/callAt.js";
import { readTokens } from "../../../../../src/hosts/bench/page/editor/text/tokens.js";
import { questionIn, wordsBefore } from "../../../../../src/hosts/bench/page/editor/text/wordsBefore.js";

const kindsOf = (text: string) => readTokens(text).map(({ kind, text }) => `${kind} ${text}`);

describe("tokens", () => {
  test("of every kind", () => {
    expect(kindsOf("=BARY.REFLEX($C$2:D2, 'My stars'!B2:C3)%+star_mass&\"d\"")).toEqual([
      "prefix =",
      "function BARY.REFLEX",
      "open (",
      "reference $C$2:D2",
      "separator ,",
      "space  ",
      "reference 'My stars'!B2:C3",
      "close )",
      "postfix %",
      "operator +",
      "name star_mass",
      "operator &",
      'text "d"',
    ]);
  });

  test("while a reference or a text is on its way", () => {
    expect(kindsOf("=c")).toEqual(["prefix =", "name c"]);
    expect(kindsOf("=B2:")).toEqual(["prefix =", "reference B2", "operator :"]);
    expect(kindsOf('="d')).toEqual(["prefix =", 'text "d']);
  });

  test("none in what is no formula", () => {
    expect(readTokens("B2*2")).toEqual([]);
    expect(readTokens("")).toEqual([]);
  });

  test("leave nothing out, whatever is typed", () => {
    const pieces = fc.constantFrom(
      "B2",
      "$C$3",
      "(",
      ")",
      ",",
      "SUM(",
      '"',
      "'",
      "!",
      "{",
      "1E+3",
      " ",
      "π",
      "#",
      ":",
      "x",
    );
    fc.assert(
      fc.property(fc.array(pieces, { maxLength: 20 }), (parts) => {
        const text = `=${parts.join("")}`;
        expect(
          readTokens(text)
            .map((token) => text.slice(token.from, token.to))
            .join(""),
        ).toBe(text);
      }),
    );
  });
});

describe("the call at the caret", () => {
  // "|" is the caret.
  const rows: readonly (readonly [string, string | undefined])[] = [
    ["=SUM(|", "SUM 0"],
    ["=SUM|(", undefined],
    ["=SUM(B2,|", "SUM 1"],
    ["=SUM(B2,C2)|", undefined],
    ["=BARY.REFLEX(B2,MAX(C2,D2),|", "BARY.REFLEX 2"],
    ["=BARY.REFLEX(B2,MAX(C2,D|2),E2)", "MAX 1"],
    ["=SUM((B2,C2),|)", "SUM 1"],
    ["=SUM(1*(B2+|", "SUM 0"],
    ["=SUM({1,2;3,4},|", "SUM 1"],
    ['=SUM("a,b(",|', "SUM 1"],
    ["=(B2,|", undefined],
    ["SUM(B2,|", undefined],
  ];
  test.each(rows)("%s", (marked, expected) => {
    const caret = marked.indexOf("|");
    const call = callAt(marked.replace("|", ""), caret);
    expect(call && `${call.name} ${call.argument}`).toBe(expected);
  });
});

describe("words in front of the caret", () => {
  test("the last one, and the question they form", () => {
    expect(wordsBefore("=B2+how fast", 12)).toEqual({
      word: "fast",
      from: 8,
      phrase: "how fast",
      phraseFrom: 4,
      isReference: false,
    });
    expect(wordsBefore("=how fast ", 10)).toMatchObject({ word: "", phrase: "how fast", phraseFrom: 1 });
  });

  test("a cell that may become a function", () => {
    expect(wordsBefore("=log10", 6)).toMatchObject({ word: "log10", from: 1, isReference: true });
    expect(wordsBefore("=B2", 3)).toBeUndefined();
  });

  test.each(['="how fast', "=12", "=SUM(", "=how fast+", "how fast"])("none in %s", (text) => {
    expect(wordsBefore(text, text.length)).toBeUndefined();
  });

  test("a question without an equals sign is words alone", () => {
    expect(questionIn("How fast?")).toBe("How fast?");
    expect(questionIn("51 Peg b")).toBeUndefined();
    expect(questionIn("HD 209458")).toBeUndefined();
    expect(questionIn("=how fast")).toBeUndefined();
    expect(questionIn("ok")).toBeUndefined();
  });
});
