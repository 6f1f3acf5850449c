import { hoursUps } from "../../kernel/night/hoursUp.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { starAtSite } from "./place.js";

const degree = Math.PI / 180;

export const hoursUp: NumberDefinition = {
  form: "number",
  name: "HOURSUP",
  question: "How long is this star up in the dark in this night?",
  inputs: [
    required(quantity.night),
    ...starAtSite,
    optional(quantity.lowestAltitude, 30 * degree, "30 deg, airmass 2"),
    optional(quantity.sunBelow, -18 * degree, "-18 deg, astronomical twilight"),
  ],
  result: { quantity: quantity.hoursUp, unit: "h" },
  compute: hoursUps,
  unanswered:
    "the Sun does not sink that deep in this night; ask for another date, or for less with Sun below, for example -12 deg",
  formula:
    "the time for which cos H < (sin h - sin phi sin delta) / (cos phi cos delta) is false while the Sun is below its limit, noon to noon",
  source: "spherical trigonometry; The Astronomical Almanac's low-precision Sun (from memory)",
  note: "0 where the star is never so high in the dark. Altitudes are true ones, without refraction; good to 10 s at middle latitudes. The date is that of the evening at the site, by its mean Sun.",
  examples: [
    {
      cells: ["2017-09-05", "0 deg", "-90 deg", "-70.7345 deg", "-29.2584 deg", "20 deg"],
      gives: "9.72 h",
      because: "the pole is always up: the dark hours of that night, 23:49:34 to 09:32:44 UTC by astropy 5.2.1",
    },
  ],
};
