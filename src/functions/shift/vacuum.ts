import { vacuumWavelengths } from "../../kernel/vacuumWavelength.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { airFormula } from "./airFormula.js";

export const vacuum: NumberDefinition = {
  form: "number",
  name: "VACUUM",
  question: "What is this air wavelength in vacuum?",
  inputs: [required(quantity.wavelengthInAir), airFormula],
  result: { quantity: quantity.vacuumWavelength, unit: "nm" },
  compute: vacuumWavelengths,
  formula: "lambda_vac = n(lambda_vac) lambda_air, iterated; n the index of standard air (15 C, 101325 Pa, dry)",
  source: "Ciddor 1996, Appl. Opt. 35, 1566; Morton 2000, ApJS 130, 403 (coefficients from memory)",
  note: "Ciddor measured 230 to 1690 nm; beyond, the formula is extrapolated.",
  examples: [
    { cells: ["656.281 nm"], gives: "656.462297613 nm", because: "Ciddor 1996, computed with 60 digits (mpmath)" },
  ],
};
