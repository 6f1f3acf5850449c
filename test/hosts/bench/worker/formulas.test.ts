import { describe, expect, test } from "vitest";
import { at, openTable } from "./openTable.js";

// A target   B period  C star mass  D planet mass  E eccentricity  F inclination  K of planet in G
const headers = ["Target", "Period [d]", "Mstar [solMass]", "m [jupiterMass]", "e", "i [deg]", "K [m/s]"];
const row = ["HD 1", 4332.589, 1, 1, 0, 90, null];

describe("completing headers", () => {
  const complete = (text: string, place = "G2", table = [headers, row]) =>
    openTable(table).service.completeHeaders(
      text.replace("|", ""),
      text.includes("|") ? text.indexOf("|") : text.length,
      at(place),
    );

  test.each<[string, string, string, string]>([
    [
      "=BARY.REFLEX(B2,C2,D2",
      "G2",
      "=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,G$1)",
      "Completed: headers B$1:D$1 and result header G$1.",
    ],
    [
      "=BARY.REFLEX(B2,C2,D2)",
      "G2",
      "=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,G$1)",
      "Completed: headers B$1:D$1 and result header G$1.",
    ],
    [
      "=BARY.REFLEX(B2, C2, D2, ",
      "G2",
      "=BARY.REFLEX(B2, C2, D2,,, B$1:D$1, G$1)",
      "Completed: headers B$1:D$1 and result header G$1.",
    ],
    [
      "=BARY.REFLEX(B2,C2,D2,E2,F2",
      "G2",
      "=BARY.REFLEX(B2,C2,D2,E2,F2,B$1:F$1,G$1)",
      "Completed: headers B$1:F$1 and result header G$1.",
    ],
    [
      "=BARY.REFLEX(B2,C2,D2,,F2",
      "G2",
      "=BARY.REFLEX(B2,C2,D2,,F2,B$1:F$1,G$1)",
      "Completed: headers B$1:F$1 and result header G$1.",
    ],
    [
      "=BARY.REFLEX(B2,C2,D2,F2",
      "G2",
      '=BARY.REFLEX(B2,C2,D2,F2,,B$1&";"&C$1&";"&D$1&";"&F$1,G$1)',
      'Completed: headers B$1&";"&C$1&";"&D$1&";"&F$1 and result header G$1; the header of eccentricity "i [deg]" states no unit of eccentricity.',
    ],
    [
      "=BARY.AXIS(B2,C2",
      "H2",
      "=BARY.AXIS(B2,C2,,B$1:C$1)",
      "Completed: headers B$1:C$1; the result is in AU, since the header of this column states no unit that fits.",
    ],
    [
      "=BARY.AXIS(B2,C2",
      "G2",
      "=BARY.AXIS(B2,C2,,B$1:C$1)",
      "Completed: headers B$1:C$1; the result is in AU, since the header of this column states no unit that fits.",
    ],
    [
      "=BARY.REFLEX($B2,$C2,D2",
      "G2",
      "=BARY.REFLEX($B2,$C2,D2,,,$B$1:D$1,G$1)",
      "Completed: headers $B$1:D$1 and result header G$1.",
    ],
    [
      '=BARY.AXIS(B2,"1.1 solMass"',
      "H2",
      '=BARY.AXIS(B2,"1.1 solMass",,B$1&";")',
      'Completed: headers B$1&";"; the result is in AU, since the header of this column states no unit that fits.',
    ],
    [
      "=2*BARY.REFLEX(B2,C2,D2|)+1",
      "G2",
      "=2*BARY.REFLEX(B2,C2,D2,,,B$1:D$1,G$1)+1",
      "Completed: headers B$1:D$1 and result header G$1.",
    ],
    [
      "=BARY.REFLEX(B2:B9,C2:C9,D2:D9",
      "G2",
      "=BARY.REFLEX(B2:B9,C2:C9,D2:D9,,,B$1:D$1,G$1)",
      "Completed: headers B$1:D$1 and result header G$1.",
    ],
    ["=BARY.REFLEX(B2,C2,D2,,,B$1:D$1", "G2", "=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,G$1)", "Completed: result header G$1."],
    ["=BARY.INTO(D2", "G2", "=BARY.INTO(D2,D$1,G$1)", "Completed: headers D$1 and result header G$1."],
    ["=BARY.SHIFT(G2", "H2", "=BARY.SHIFT(G2,,G$1)", "Completed: headers G$1."],
  ])("%s in %s", (text, place, completed, said) => {
    const answer = complete(text, place);
    expect(answer).toMatchObject({ text: completed, said });
    const end = completed.lastIndexOf(")") + 1;
    expect(answer.caret).toBe(completed.endsWith("+1") ? completed.length - 2 : end);
  });

  test.each<[string, string]>([
    ["=BARY.REFLEX(B2,C2", "REFLEX: planet mass is still missing; give the inputs first."],
    ["=SUM(B2,C2", "Headers belong to the functions of BARY; put the caret into the call of one."],
    ["=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,G$1)", "The headers are there already."],
    ['=BARY.AXIS("1 yr","1 solMass"', "The inputs carry their units; no headers are needed."],
    [
      "=BARY.AXIS(4.2,1.1",
      "period is 4.2, which has no header to state its unit; put it into a column, or write the unit with it as a text.",
    ],
  ])("%s is left as it is", (text, said) => {
    expect(complete(text, "H2")).toEqual({ text, caret: text.length, said });
  });

  test("columns with uncertainties between them", () => {
    const table = [
      ["P [d]", "P err", "M [solMass]", "m [jupiterMass]", "m err", "K [m/s]"],
      [10, 0.1, 1, 1, 0.1, null],
    ];
    expect(complete("=BARY.REFLEX(A2:B2,C2,D2:E2", "F2", table).text).toBe(
      "=BARY.REFLEX(A2:B2,C2,D2:E2,,,A$1:E$1,F$1)",
    );
    expect(complete("=BARY.REFLEX(A2,C2,D2:E2", "F2", table).text).toBe(
      '=BARY.REFLEX(A2,C2,D2:E2,,,A$1&";"&C$1&";"&D$1&";"&E$1,F$1)',
    );
  });

  test("every completed call works out what the same call with quantities does", async () => {
    const open = openTable([headers, row]);
    for (const text of ["=BARY.REFLEX(B2,C2,D2", "=BARY.REFLEX(B2,C2,D2,,F2", "=BARY.REFLEX(B2,C2,D2,E2,F2"]) {
      await open.type("G2", [[open.service.completeHeaders(text, text.length, at("G2")).text]]);
      const k = open.cell("G2");
      await open.type("G2", [['=BARY.REFLEX("4332.589 d","1 solMass","1 jupiterMass")']]);
      expect(k).toBe(open.cell("G2"));
    }
  });
});

describe("checking a formula while it is typed", () => {
  const check = (text: string, place = "G2") =>
    openTable([headers, row, ["HD 2", null, 1, 1, 0, 90, null]]).service.checkFormula(text, at(place));

  test.each<[string, string, string, string]>([
    [
      "=BARY.REFLEX(B2,C2,D2",
      "(",
      "error",
      'formula: =BARY.REFLEX(B2,C2,D2 cannot be read at character 13: this "(" is never closed; add ")"',
    ],
    ["=BARY.REFLX(B2)", "BARY.REFLX", "error", "BARY.REFLX: no function has this name; did you mean BARY.REFLEX?"],
    [
      "=BARY.REFLEX(B2)",
      "BARY.REFLEX",
      "error",
      "BARY.REFLEX: 1 argument came; 3 to 7 are needed: period, star mass, planet mass, [eccentricity], [inclination], [headers], [result]",
    ],
    [
      "=BARY.REFLEX(B2,C2,D2)",
      "B2",
      "error",
      'REFLEX: period is 4332.589 with no unit; give its header (for example "Period [d]") or type "4332.589 d".',
    ],
    [
      '=BARY.REFLEX(B2,C2,D2,,,C$1&";"&C$1&";"&D$1)',
      "B2",
      "error",
      'REFLEX: period is 4332.589 solMass by its header "Mstar [solMass]", a mass; a duration is needed, for example with the header "Mstar [d]".',
    ],
    ['=BARY.REFLEX(B2, "1.1 Mjupp" ,D2,,,B$1:D$1)', '"1.1 Mjupp"', "error", ""],
    [
      "=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,B$1)",
      "B$1",
      "error",
      'REFLEX: the result is a speed, but its header "Period [d]" asks for d, a duration; write for example "Period [m/s]".',
    ],
    [
      "=BARY.REFLEX(B2,C2,D2,2,,B$1:E$1)",
      "2",
      "error",
      "REFLEX: eccentricity is 2; it must be below 1, because only bound orbits repeat; for example 0.05.",
    ],
    [
      "=2*starmass",
      "starmass",
      "error",
      'starmass: nothing has this name; a cell, a defined name or a text in quotes is needed, for example "starmass"',
    ],
    ["=G2+1", "G2", "error", "formula: G2 would read itself; a reference that leaves G2 out is needed"],
    ["=SUM(G1:G9)", "G1:G9", "error", "formula: G2 would read itself; a reference that leaves G2 out is needed"],
    ["=B2/E2", "B2/E2", "error", '"/": right side of 4332.589 / 0 is zero or blank; a number other than 0 is needed'],
  ])("%s", (text, part, severity, message) => {
    const { diagnostics, preview } = check(text);
    expect(preview).toBeUndefined();
    expect(diagnostics).toHaveLength(1);
    const [{ from, to, ...told }] = diagnostics as [(typeof diagnostics)[number]];
    expect(text.slice(from, to)).toBe(part);
    expect(told.severity).toBe(severity);
    if (message !== "") expect(told.message).toBe(message);
    expect(told.message.length).toBeLessThanOrEqual(250);
  });

  test("a blank input is a hint: the formula is right, a value is missing", () => {
    const text = "=BARY.REFLEX(B3,C3,D3,,,B$1:D$1)";
    expect(check(text, "G3").diagnostics).toEqual([
      {
        from: 13,
        to: 15,
        severity: "hint",
        message: "REFLEX: period is blank; a duration is needed, for example 4.23 d.",
      },
    ]);
  });

  test("an error of a cell is told at its reference", async () => {
    const open = openTable([headers, row]);
    await open.type("H2", [["=1/0"]]);
    const { diagnostics } = open.service.checkFormula("=2*H2", at("I2"));
    expect(diagnostics).toMatchObject([{ from: 3, to: 5 }]);
  });

  test.each<[string, string | undefined]>([
    // 12.459080091688...: the formula of the definition with 40 decimal digits, nominal GM of IAU 2015 B3.
    ["=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,G$1)", "12.4591 m/s"],
    ["=B2*2", "8665.178"],
    ['="a"&"b"', "ab"],
    ["=B2>1", "TRUE"],
    ["plain text", undefined],
    ["=", undefined],
  ])("%s gives %s", (text, preview) => {
    expect(check(text)).toEqual({ diagnostics: [], preview });
  });

  test("a column of results, some without an answer", () => {
    const { diagnostics, preview } = check("=BARY.REFLEX(B2:B3,C2:C3,D2:D3,,,B$1:D$1,G$1)", "H2");
    expect(preview).toMatch(/ m\/s and 1 more row$/);
    expect(diagnostics).toMatchObject([
      {
        severity: "hint",
        message: expect.stringMatching(/^1 row of 2 would have no answer; the first: REFLEX: period is /),
      },
    ]);
  });
});

describe("functions", () => {
  const { service } = openTable([headers, row]);
  test("ours first, with their inputs; then those of worksheets", () => {
    const all = service.functions();
    expect(all.findIndex(({ own }) => !own)).toBeGreaterThan(10);
    expect(all.find(({ name }) => name === "BARY.REFLEX")).toMatchObject({
      question: "How fast does this planet make its star move along the line of sight?",
      parameters: [
        { name: "period", optional: false, unit: "d", meaning: "orbital period; a duration above 0" },
        { name: "star mass", unit: "solMass" },
        { name: "planet mass", unit: "jupiterMass" },
        { name: "eccentricity", optional: true, unit: "" },
        { name: "inclination", optional: true, unit: "deg" },
        { name: "headers", optional: true },
        { name: "result", optional: true },
      ],
    });
    // ISO/IEC 26300-3, 6.17.5: ROUND( Number X [ ; Integer Digits ] )
    expect(all.find(({ name }) => name === "ROUND")?.parameters).toHaveLength(2);
    expect(all.find(({ name }) => name === "SUM")?.parameters.at(-1)?.repeating).toBe(true);
  });
  test.each([
    ["how fast does the planet move its star", "BARY.REFLEX"],
    ["convert unit", "BARY.INTO"],
    ["round", "ROUND"],
    ["axis", "BARY.AXIS"],
  ])("%s finds %s", (words, name) => {
    expect(service.searchFunctions(words).slice(0, 4)).toContain(name);
  });
});
