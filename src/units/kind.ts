/**
 * What a quantity is, which is more than its dimension: an angle is not a number, an instant is not a duration,
 * a magnitude is not a ratio. A compound dimension without a name of its own is its own kind, "kg.m**-2".
 */
export type Kind = string;

interface KindEntry {
  readonly phrase: string;
  /** A unit of this dimension as the dimensional algebra spells it; none where the dimension alone does not decide. */
  readonly dimension?: string;
  /** The spelling of its base unit. */
  readonly base: string;
}

export const kinds: Readonly<Record<string, KindEntry>> = {
  ratio: { phrase: "a plain number", base: "1" },
  duration: { phrase: "a duration", dimension: "s", base: "s" },
  instant: { phrase: "an instant", base: "JD" },
  length: { phrase: "a length", dimension: "m", base: "m" },
  mass: { phrase: "a mass", dimension: "kg", base: "kg" },
  angle: { phrase: "an angle", dimension: "rad", base: "rad" },
  "solid angle": { phrase: "a solid angle", dimension: "rad^2", base: "sr" },
  speed: { phrase: "a speed", dimension: "m s^-1", base: "m/s" },
  acceleration: { phrase: "an acceleration", dimension: "m s^-2", base: "m/s**2" },
  "angular speed": { phrase: "an angular speed", dimension: "rad s^-1", base: "rad/s" },
  frequency: { phrase: "a frequency", dimension: "s^-1", base: "Hz" },
  area: { phrase: "an area", dimension: "m^2", base: "m**2" },
  volume: { phrase: "a volume", dimension: "m^3", base: "m**3" },
  wavenumber: { phrase: "a wavenumber", dimension: "m^-1", base: "m**-1" },
  density: { phrase: "a density", dimension: "kg m^-3", base: "kg/m**3" },
  "gravitational parameter": { phrase: "a gravitational parameter (GM)", dimension: "m^3 s^-2", base: "m**3/s**2" },
  temperature: { phrase: "a temperature", dimension: "K", base: "K" },
  energy: { phrase: "an energy", dimension: "kg m^2 s^-2", base: "J" },
  power: { phrase: "a power", dimension: "kg m^2 s^-3", base: "W" },
  irradiance: { phrase: "an irradiance", dimension: "kg s^-3", base: "W/m**2" },
  force: { phrase: "a force", dimension: "kg m s^-2", base: "N" },
  pressure: { phrase: "a pressure", dimension: "kg m^-1 s^-2", base: "Pa" },
  "spectral flux density": { phrase: "a spectral flux density", dimension: "kg s^-2", base: "W.m**-2.Hz**-1" },
  "electric current": { phrase: "an electric current", dimension: "A", base: "A" },
  amount: { phrase: "an amount of substance", dimension: "mol", base: "mol" },
  magnitude: { phrase: "a magnitude", dimension: "magnitudeBase", base: "mag" },
  pixel: { phrase: "a number of detector pixels", dimension: "pixelBase", base: "pixel" },
  count: { phrase: "a count", dimension: "countBase", base: "count" },
};

/** "a mass", or "a quantity in kg.m**-2" for a kind that has no word. */
export function kindPhrase(kind: Kind): string {
  return kinds[kind]?.phrase ?? `a quantity in ${kind}`;
}

/** Kinds for which a number needs no unit: it is already the whole statement. */
export function isPlainNumberKind(kind: Kind): boolean {
  return kind === "ratio" || kind === "count" || kind === "pixel";
}
