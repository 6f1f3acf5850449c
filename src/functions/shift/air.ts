import { airWavelengths } from "../../kernel/airWavelength.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { airFormula } from "./airFormula.js";

export const air: NumberDefinition = {
  form: "number",
  name: "AIR",
  question: "What is this vacuum wavelength in air?",
  inputs: [required(quantity.wavelengthInVacuum), airFormula],
  result: { quantity: quantity.airWavelength, unit: "nm" },
  compute: airWavelengths,
  formula: "lambda_air = lambda_vac / n(lambda_vac); n the index of standard air (15 C, 101325 Pa, dry)",
  source: "Ciddor 1996, Appl. Opt. 35, 1566; Morton 2000, ApJS 130, 403 (coefficients from memory)",
  note: "Ciddor measured 230 to 1690 nm; beyond, the formula is extrapolated.",
  examples: [
    { cells: ["500 nm"], gives: "499.860551997 nm", because: "Ciddor 1996, computed with 60 digits (mpmath)" },
    {
      cells: ["500 nm", "Morton2000"],
      gives: "499.860552201 nm",
      because: "Morton 2000, computed with 60 digits (mpmath)",
    },
  ],
};
