import type { Definition } from "./definition.js";
import { airmass } from "./night/airmass.js";
import { altitude } from "./night/altitude.js";
import { hoursUp } from "./night/hoursUp.js";
import { moonLit } from "./night/moonLit.js";
import { moonSep } from "./night/moonSep.js";
import { axis } from "./orbit/axis.js";
import { period } from "./orbit/period.js";
import { planetSpeed } from "./orbit/planetSpeed.js";
import { starAxis } from "./orbit/starAxis.js";
import { starSpeed } from "./orbit/starSpeed.js";
import { totalMass } from "./orbit/totalMass.js";
import { electrons } from "./plan/electrons.js";
import { exposure } from "./plan/exposure.js";
import { hours } from "./plan/hours.js";
import { massVisits } from "./plan/massVisits.js";
import { noiseSum } from "./plan/noiseSum.js";
import { qNoise } from "./plan/qNoise.js";
import { rvNoise } from "./plan/rvNoise.js";
import { significance } from "./plan/significance.js";
import { visits } from "./plan/visits.js";
import { massFunction } from "./reflex/massFunction.js";
import { minMass } from "./reflex/minMass.js";
import { planetMass } from "./reflex/planetMass.js";
import { planetShift } from "./reflex/planetShift.js";
import { reflex } from "./reflex/reflex.js";
import { shiftMass } from "./reflex/shiftMass.js";
import { air } from "./shift/air.js";
import { lineShift } from "./shift/lineShift.js";
import { pixelShift } from "./shift/pixelShift.js";
import { pixelSpeed } from "./shift/pixelSpeed.js";
import { shift } from "./shift/shift.js";
import { shiftSpeed } from "./shift/shiftSpeed.js";
import { vacuum } from "./shift/vacuum.js";
import { anomaly } from "./time/anomaly.js";
import { barySpeed } from "./time/barySpeed.js";
import { baryTime } from "./time/baryTime.js";
import { event } from "./time/event.js";
import { phase } from "./time/phase.js";
import { rvAt } from "./time/rvAt.js";
import { constant } from "./units/constant.js";
import { into } from "./units/into.js";
import { tag } from "./units/tag.js";
import { unitOf } from "./units/unitOf.js";

/** Every cell function, in the order of the reference table. */
export const definitions: readonly Definition[] = [
  into,
  tag,
  unitOf,
  constant,
  axis,
  period,
  totalMass,
  starAxis,
  planetSpeed,
  starSpeed,
  reflex,
  minMass,
  planetMass,
  massFunction,
  planetShift,
  shiftMass,
  shift,
  shiftSpeed,
  lineShift,
  pixelShift,
  pixelSpeed,
  vacuum,
  air,
  anomaly,
  rvAt,
  phase,
  event,
  barySpeed,
  baryTime,
  altitude,
  airmass,
  hoursUp,
  moonSep,
  moonLit,
  rvNoise,
  exposure,
  qNoise,
  electrons,
  noiseSum,
  visits,
  massVisits,
  significance,
  hours,
];
