import type { ConversionDefinition } from "../definition.js";

export const into: ConversionDefinition = {
  form: "conversion",
  name: "INTO",
  question: "What is this in another unit?",
  inputs: [{ takes: "any quantity", name: "value" }],
  formula: "the same quantity, in the unit of the result header",
  source: "IVOA VOUnits 1.1; IAU 2012 B2 and 2015 B3 nominal units; SI brochure",
  note: "A mass in kilograms uses the CODATA value of G, which is known to 2.2e-5; between solMass, jupiterMass and earthMass no G enters.",
  examples: [
    {
      cells: ["1 jupiterMass"],
      result: "earthMass",
      gives: "317.82840659 earthMass",
      because: "ratio of the nominal mass parameters of IAU 2015 B3",
    },
    { cells: ["1 AU"], result: "km", gives: "149597870.7 km", because: "IAU 2012 B2" },
  ],
};
