import * as quantities from "../functions/quantities.js";
import type { Quantity } from "../functions/quantity.js";
import type { Unit } from "../units/unit.js";

interface MeantQuantity {
  readonly ucd: string;
  readonly quantity: Quantity;
}

/** Words of the UCD1+ controlled vocabulary (IVOA UCDList 1.5) that mean one of our quantities. */
const meant: readonly MeantQuantity[] = [
  { ucd: "time.period", quantity: quantities.period },
  { ucd: "phys.size.smajAxis", quantity: quantities.axis },
  { ucd: "src.orbital.eccentricity", quantity: quantities.eccentricity },
  { ucd: "src.orbital.inclination", quantity: quantities.inclination },
  { ucd: "phys.veloc.orbital", quantity: quantities.orbitalSpeed },
  { ucd: "spect.dopplerVeloc", quantity: quantities.speed },
  { ucd: "src.redshift", quantity: quantities.shift },
  { ucd: "em.wl", quantity: quantities.restWavelength },
  { ucd: "spect.resolution", quantity: quantities.resolvingPower },
];

const mass = "phys.mass";
const starName = /(?<!\p{L})(?:star|stellar|host|primary)(?!\p{L})/iu;

/** The words of a UCD, `phys.mass;stat.error` has two; capitals do not count in them. */
function wordsOf(ucd: string): readonly string[] {
  return ucd
    .toLowerCase()
    .split(";")
    .map((word) => word.trim());
}

/** The column holds uncertainties of what the rest of its UCD means. */
export function isErrorUcd(ucd: string): boolean {
  return wordsOf(ucd).some((word) => word === "stat.error" || word.startsWith("stat.error."));
}

/**
 * The quantity that a UCD means. A mass is that of star or planet as its name or its unit says; other words beside the
 * first (a ratio, a code, a maximum) make it another thing.
 */
export function quantityOfUcd(ucd: string, name: string, unit: Unit | undefined): Quantity | undefined {
  const words = wordsOf(ucd).filter(
    (word) => word !== "stat.error" && !word.startsWith("stat.error.") && word !== "meta.main",
  );
  const [word] = words;
  if (words.length !== 1) return undefined;
  const quantity =
    word === mass ? massOf(name, unit) : meant.find((candidate) => candidate.ucd.toLowerCase() === word)?.quantity;
  return quantity && (unit === undefined || unit.kind === quantity.kind) ? quantity : undefined;
}

function massOf(name: string, unit: Unit | undefined): Quantity | undefined {
  if (starName.test(name) || unit?.text === "solMass") return quantities.starMass;
  return unit?.text === "jupiterMass" || unit?.text === "earthMass" ? quantities.planetMass : undefined;
}

/** The UCD of a column of a quantity, for files that carry them; undefined where no word is exact. */
export function ucdOfQuantity({ name }: Quantity, isUncertainty: boolean): string | undefined {
  const isBody = name === quantities.starMass.name || name === quantities.planetMass.name;
  const word = isBody ? mass : meant.find(({ quantity }) => quantity.name === name)?.ucd;
  return word === undefined ? undefined : isUncertainty ? `${word};stat.error` : word;
}
