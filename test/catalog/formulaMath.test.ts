import { describe, expect, test } from "vitest";
import { formulaMath } from "../../src/catalog/formulaMath.js";
import { definitions } from "../../src/functions/definitions.js";

const open = '<math xmlns="http://www.w3.org/1998/Math/MathML" display="block"><mrow>';
const close = "</mrow></math>";
const times = "<mo>\u2062</mo>";

describe("formulas as MathML", () => {
  // Elements and operator characters by MathML Core and the invisible operators of Unicode, U+2061 and U+2062.
  test.each([
    ["a = b c", `<mi>a</mi><mo>=</mo><mi>b</mi>${times}<mi>c</mi>`],
    [
      "v = 2 x / (y z); x something",
      `<mi>v</mi><mo>=</mo><mfrac><mrow><mn>2</mn>${times}<mi>x</mi></mrow><mrow><mi>y</mi>${times}<mi>z</mi></mrow></mfrac>`,
    ],
    ["y = x^(1/3)", "<mi>y</mi><mo>=</mo><mroot><mrow><mi>x</mi></mrow><mn>3</mn></mroot>"],
    [
      "y = (1 - e^2)^(1/2)",
      "<mi>y</mi><mo>=</mo><msqrt><mn>1</mn><mo>\u2212</mo><msup><mi>e</mi><mrow><mn>2</mn></mrow></msup></msqrt>",
    ],
    [
      "m^3 = 4 pi, solved for m",
      `<msup><mi>m</mi><mrow><mn>3</mn></mrow></msup><mo>=</mo><mn>4</mn>${times}<mi>\u03c0</mi>`,
    ],
    [
      "h = s_1 sin^2 omega + e^(-x)",
      `<mi>h</mi><mo>=</mo><msub><mi>s</mi><mn>1</mn></msub>${times}<mrow><msup><mi>sin</mi><mrow><mn>2</mn></mrow></msup><mo>\u2061</mo><mi>\u03c9</mi></mrow><mo>+</mo><msup><mi>e</mi><mrow><mo>\u2212</mo><mi>x</mi></mrow></msup>`,
    ],
    ["y = sin i", "<mi>y</mi><mo>=</mo><mrow><mi>sin</mi><mo>\u2061</mo><mi>i</mi></mrow>"],
    [
      "z = (a) (b)",
      "<mi>z</mi><mo>=</mo><mrow><mo>(</mo><mi>a</mi><mo>)</mo></mrow>" +
        times +
        "<mrow><mo>(</mo><mi>b</mi><mo>)</mo></mrow>",
    ],
    [
      "q = (a)(b) / c",
      "<mi>q</mi><mo>=</mo><mfrac><mrow><mrow><mo>(</mo><mi>a</mi><mo>)</mo></mrow>" +
        times +
        "<mrow><mo>(</mo><mi>b</mi><mo>)</mo></mrow></mrow><mrow><mi>c</mi></mrow></mfrac>",
    ],
  ])("%s", (formula, math) => {
    expect(formulaMath(formula)).toBe(`${open}${math}${close}`);
  });

  test.each(["the value of the constant", "a = ", "a = (b", "a = b)", "a = b ^", "speed = 3", "a b c"])(
    "%s is told in words",
    (formula) => {
      expect(formulaMath(formula)).toBeUndefined();
    },
  );

  test("every definition's formula is typeset whole, or told in words", () => {
    const told = definitions.filter(({ formula }) => formulaMath(formula) === undefined).map(({ name }) => name);
    expect(told.sort().join(" ")).toBe(
      "BARYSPEED BARYTIME CONSTANT HOURSUP INTO MOONSEP NOISESUM PHASE PLANETSHIFT TAG UNITOF",
    );
    for (const { formula } of definitions) {
      const math = formulaMath(formula) ?? "";
      const tags = [...math.matchAll(/<(\/?)([a-z]+)[^>]*?(\/?)>/g)];
      const depth: string[] = [];
      for (const [, end, name, empty] of tags) {
        if (end) expect(depth.pop()).toBe(name);
        else if (!empty) depth.push(name!);
      }
      expect(depth).toEqual([]);
    }
  });
});
