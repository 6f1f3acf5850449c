import { phases, wholePeriodsOf } from "../../kernel/time/phase.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const phase: NumberDefinition = {
  form: "number",
  name: "PHASE",
  question: "At which phase of its orbit is the planet at this time?",
  inputs: [required(quantity.time), required(quantity.period), required(quantity.referenceTime)],
  result: { quantity: quantity.phase, unit: "1" },
  compute: phases,
  settle: wholePeriodsOf,
  formula: "(t - t_0) / P, less the whole periods; t time, t_0 reference time, P period",
  source: "definition",
  note: "All times of a call are in one scale. The uncertainty grows with the periods that have passed; above 0.1 or so the phase is lost.",
  examples: [
    {
      cells: ["2459001.5 BJD_TDB", "4 d", "2459000.5 BJD_TDB"],
      gives: "0.25",
      because: "one day of four",
    },
  ],
};
