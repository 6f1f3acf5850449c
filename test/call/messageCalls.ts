import type { CallProblem } from "../../src/call/callProblem.js";
import { CellError } from "../../src/call/cell.js";
import { type Given, headerRow } from "./door.js";

/** A call that goes wrong, and what the problem is about. */
export interface MessageCall {
  /** Filled down over as many rows, all arguments kept in place; one call where absent. */
  readonly filledDown?: number;
  readonly about: CallProblem["about"] | "passed on";
  readonly function: string;
  readonly given: readonly Given[];
}

type Name = string;
function about(topic: MessageCall["about"], ...calls: readonly (readonly [Name, ...Given[]])[]): MessageCall[] {
  return calls.map(([name, ...given]) => ({ about: topic, function: name, given }));
}

const threeHeaders = headerRow("B$1", "Period [d]", "Star mass [solMass]", "Planet mass [jupiterMass]");
const noUnits = headerRow("B$1", "Period", "Star mass [solMass]", "Planet mass [jupiterMass]");
const long =
  "a note about the star that somebody typed into the column of its masses, and which is far longer than a cell shows";

/** Every sentence of a call that has no answer, branch by branch. */
export const messageCalls: readonly MessageCall[] = [
  ...about(
    "too many arguments",
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", 0, "90 deg", undefined, "m/s", "m/s"],
    ["INTO", "1 AU", undefined, "km", "km"],
    ["TAG", 4.23, "d", "d"],
    ["UNITOF", "K [m/s]", "km/s"],
    ["CONSTANT", "c", "km/s", "m/s"],
    ["AIR", "500 nm", "Ciddor1996", undefined, "nm", "nm"],
  ),
  ...about(
    "missing",
    ["REFLEX", "4.23 d", "1.1 solMass"],
    ["PLANETMASS", "84.67 m/s", "3.52 d", "1.119 solMass", undefined, 0],
    ["INTO"],
    ["UNITOF"],
    ["CONSTANT"],
  ),
  ...about(
    "blank",
    ["REFLEX", "4.23 d", null, "0.47 jupiterMass"],
    ["PIXELSHIFT", "1 m/s", 115000, null],
    ["SHIFTSPEED", null],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", 0, null],
    ["TAG", null],
    ["INTO", null, undefined, "km"],
    ["UNITOF", null],
    ["CONSTANT", null],
    ["AXIS", [[4.23, null]], "1.1 solMass", undefined, "d; solMass"],
  ),
  ...about(
    "no unit",
    ["REFLEX", 4.23, "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, noUnits],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, headerRow("B$1", null, "solMass", "jupiterMass")],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, headerRow("B2", 4.23, 1.1, 0.47)],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, "Period; solMass; jupiterMass"],
    ["SHIFT", "12.5"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", 0, 90],
    ["INTO", 1, undefined, "km"],
    ["TAG", 4.23],
  ),
  ...about(
    "unit",
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 Mjupp"],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, headerRow("B$1", "Period [dayz]", "solMass", "jupiterMass")],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, "P [d]; Mass [M]; jupiterMass"],
    ["SHIFT", "12.5 furlong/fortnight"],
    ["SHIFT", "12.5 km/h/s"],
    ["SHIFT", "12.5 xyz"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 MJ"],
    ["AXIS", "4.23 mn", "1.1 solMass"],
    ["AXIS", "2455000 JD", "1.1 solMass"],
    ["AXIS", `4.23 '`, "1.1 solMass"],
    ["AXIS", "4.23 exp(d)", "1.1 solMass"],
    ["UNITOF", "Mass [M]"],
    ["UNITOF", "Mass [Mjupp]"],
    ["INTO", "1 Mjupp", undefined, "earthMass"],
    ["TAG", "4.23 Re"],
  ),
  ...about(
    "wrong kind",
    ["REFLEX", "4.23 d", "1.1 d", "0.47 jupiterMass"],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, "P [d]; M [solMass]; m [deg]"],
    ["MINMASS", 55.94, 4.23, 1.09, undefined, headerRow("B$1", "K", "P [d]", "Mstar [solMass]")],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", "5 deg"],
    ["AXIS", "2455000 JD_UTC", "1.1 solMass"],
    ["AXIS", "2010-03-05T06:00:00", "1.1 solMass"],
    ["SHIFT", "5 mag"],
    ["SHIFT", "5 kg/m**2"],
    ["AXIS", [[4.23, "0.01 m"]], "1.1 solMass", undefined, "d; solMass"],
  ),
  ...about(
    "disagreement",
    ["REFLEX", "4.23 d", 1.1, 0.47, undefined, undefined, headerRow("B$1", "P [m]", "M [solMass]", "m [jupiterMass]")],
    ["REFLEX", "4.23 d", 1.1, 0.47, undefined, undefined, "P [m]; solMass; jupiterMass"],
  ),
  ...about(
    "not a number",
    ["REFLEX", "4,23 d", "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", "1,234 d", "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", "4.23 d \u00b1 0.02 d", "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", "about four days", "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", "", "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", "4.23 d", true, "0.47 jupiterMass"],
    ["REFLEX", "4.23 d", long, "0.47 jupiterMass"],
    ["REFLEX", "4.23 d", "1.1 solMass", "< 0.47 jupiterMass"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", "circular"],
    ["AXIS", [[4.23, "n/a"]], "1.1 solMass", undefined, "d; solMass"],
    ["INTO", "far", undefined, "km"],
    ["TAG", "4 1/2 d"],
    ["AXIS", "4.23 0d", "1.1 solMass"],
  ),
  ...about(
    "bound",
    ["REFLEX", "-4.23 d", "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", 1],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", -0.1],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", 0, "180 deg"],
    ["SHIFT", "300000 km/s"],
    ["SHIFT", "-300000 km/s"],
    ["SHIFTSPEED", -1],
    ["AXIS", "4.23 d", "1.1 solMass", "-1 jupiterMass"],
    ["AIR", "199 nm"],
    ["VACUUM", "2.6 um"],
    ["MINMASS", "300000 km/s", "4.23 d", "1.1 solMass"],
    ["REFLEX", -4.23, 1.1, 0.47, undefined, undefined, threeHeaders],
  ),
  ...about(
    "zero or blank",
    ["REFLEX", "0 d", "1.1 solMass", "0.47 jupiterMass"],
    ["REFLEX", 4.23, 1.1, 0, undefined, undefined, threeHeaders],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", 0, "0 deg"],
    ["MINMASS", "0 m/s", "4.23 d", "1.1 solMass"],
    ["PIXELSPEED", 1, 0, 3.2],
  ),
  ...about(
    "beyond numbers",
    ["AXIS", "1e308 yr", "1.1 solMass"],
    ["INTO", "1e308 km", undefined, "nm"],
    ["INTO", "-5 m", undefined, "log(m)"],
    ["CONSTANT", "GM_sun", "10**-300m**3/s**2"],
  ),
  ...about(
    "uncertainty beyond numbers",
    ["AXIS", "4.23 \u00b1 1e307 d", "1.1 solMass"],
    ["INTO", "1 \u00b1 1e307 km", undefined, "nm"],
  ),
  ...about(
    "word",
    ["SHIFT", "1 m/s", "relativstic"],
    ["SHIFT", "1 m/s", "classical"],
    ["AIR", "500 nm", "Edlen1953"],
    ["AIR", "500 nm", "Ciddor96"],
    ["SHIFT", "1 m/s", 2],
  ),
  ...about(
    "lengths",
    ["AXIS", [["1 d"], ["2 d"]], [["1 solMass"], ["2 solMass"], ["3 solMass"]]],
    ["REFLEX", [["1 d"], ["2 d"], ["3 d"]], "1 solMass", [["1 jupiterMass"], ["2 jupiterMass"]]],
  ),
  ...about(
    "shape",
    ["AXIS", [[1, 2, 3, 4]], "1 solMass"],
    ["UNITOF", [["K [m/s]", "P [d]"]]],
    ["SHIFT", "1 m/s", [["linear", "linear"]]],
  ),
  ...about("header of another column", [
    "REFLEX",
    { cells: [[1.1]], address: "C2" },
    { cells: [[4.23]], address: "B2" },
    { cells: [[0.47]], address: "D2" },
    undefined,
    undefined,
    threeHeaders,
  ]),
  ...about(
    "header count",
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, "d; solMass"],
    ["REFLEX", 4.23, 1.1, 0.47, undefined, undefined, "d; solMass; jupiterMass; 1; deg; m"],
    ["REFLEX", [[4.23, 0.01]], 1.1, 0.47, undefined, undefined, "d; solMass"],
    ["TAG", 4.23, "d; m"],
  ),
  ...about(
    "no result",
    ["SHIFT", "40000 km/s", "linear"],
    ["SHIFT", [[100], ["4e4 km/s"]], "linear", "m/s"],
    ["SHIFTSPEED", 0.2, "linear"],
    ["REFLEX", "0.1 ms", "100 solMass", "100 solMass", null],
    ["REFLEX", 1e-10, 100, 1e5, undefined, undefined, threeHeaders],
    ["AXIS", "1e60 yr", "1.1 solMass"],
    ["PLANETMASS", "84.67 m/s", "3.52 d", "1.119 solMass", "1e-60 deg"],
  ),
  ...about(
    "result unit missing",
    ["INTO", "1 AU"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, "Semi-amplitude"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, null],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, headerRow("G2", 58.6)],
    ["INTO", "1 AU", undefined, "Distance"],
    ["INTO", "1 AU", undefined, "kilometer"],
    ["CONSTANT", "c", "Speed of light"],
  ),
  ...about(
    "result unit",
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, "K [ms/h/d]"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, "K [meter/sek]"],
    ["MINMASS", "55 m/s", "4.23 d", "1.1 solMass", undefined, undefined, "Mjupp"],
    ["MINMASS", "55 m/s", "4.23 d", "1.1 solMass", undefined, undefined, "Mass [M]"],
    ["CONSTANT", "c", "v [kmps]"],
  ),
  ...about(
    "result kind",
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, "Mass [solMass]"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, "d"],
    ["REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", undefined, undefined, undefined, "K"],
    ["SHIFT", "1 m/s", undefined, undefined, "z [deg]"],
    ["INTO", "1 AU", undefined, "Mass [kg]"],
    ["INTO", "2455000 JD_UTC", undefined, "BJD_TDB"],
    ["INTO", "2455000 JD_UTC", undefined, "d"],
    ["CONSTANT", "c", "kg"],
  ),
  {
    about: "several rows",
    function: "AXIS",
    given: [[["1 d"], ["2 d"], ["3 d"]], "1 solMass"],
    filledDown: 1,
  },
  ...about("no unit stated", ["UNITOF", "Period"], ["UNITOF", 4.23], ["UNITOF", "4.23"], ["UNITOF", ""]),
  ...about("unknown name", ["CONSTANT", "GMsun"], ["CONSTANT", "alpha"], ["CONSTANT", 3], ["CONSTANT", "C"]),
  ...about("passed on", [
    "REFLEX",
    new CellError("#REF!", "elsewhere", "The cell that was here has been deleted."),
    "1.1 solMass",
    "0.47 jupiterMass",
  ]),
];
