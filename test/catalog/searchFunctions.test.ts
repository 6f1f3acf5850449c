import { describe, expect, test } from "vitest";
import { searchFunctions } from "../../src/catalog/searchFunctions.js";
import { definitions } from "../../src/functions/definitions.js";

const names = (text: string) => searchFunctions(text).map(({ name }) => name);

describe("a function is found by the question it answers", () => {
  // Questions as analysts put them (common practice, no source), and the function that answers.
  test.each([
    ["semi-amplitude", "REFLEX"],
    ["wobble", "REFLEX"],
    ["RV amplitude", "REFLEX"],
    ["minimum mass", "MINMASS"],
    ["smallest planet", "MINMASS"],
    ["m sin i", "MINMASS"],
    ["msini", "MINMASS"],
    ["planet mass from K", "PLANETMASS"],
    ["convert units", "INTO"],
    ["which unit", "UNITOF"],
    ["total mass", "TOTALMASS"],
    ["barycenter orbit star", "STARAXIS"],
    ["redshift", "SHIFT"],
    ["detector pixels", "PIXELSHIFT"],
    ["vacuum", "VACUUM"],
    ["wavelength in air", "AIR"],
    ["wavelenght in air", "AIR"],
    ["how far does this planet orbit", "AXIS"],
    ["how long is an orbit", "PERIOD"],
    ["constant", "CONSTANT"],
    ["planet speed", "PLANETSPEED"],
    ["mass function", "MASSFUNCTION"],
  ])("%s: %s", (question, expected) => {
    expect(names(question)[0]).toBe(expected);
  });

  test.each(definitions.map(({ name, question }) => [name, question] as const))(
    "%s is first for its own name and its own question",
    (name, question) => {
      expect(names(name)[0]).toBe(name);
      expect(names(name.toLowerCase())[0]).toBe(name);
      expect(names(question)[0]).toBe(name);
    },
  );

  test("while the word is being typed", () => {
    expect(names("refl")).toContain("REFLEX");
    expect(names("incl")).toContain("PLANETMASS");
  });

  test("without words, all in their own order", () => {
    for (const text of ["", "  ", "how is the"]) expect(searchFunctions(text)).toEqual(definitions);
  });

  test("nothing for words that no function knows", () => {
    expect(names("xylophone")).toEqual([]);
  });
});
