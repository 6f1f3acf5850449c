/**
 * Exact logarithmic derivatives of the laws behind the functions, (1/y) dy/dx for each input x, by hand from the formulas
 * that each definition states (first-order propagation: JCGM 100:2008, 5.1.2). Inputs are in the units of the headers.
 * x is the mass ratio m/M throughout.
 */
export interface Law {
  readonly function: string;
  readonly headers: readonly string[];
  /** Inputs of a system. */
  readonly inputs: (system: System) => readonly number[];
  readonly derivatives: (system: System) => readonly number[];
  /** The unit the result is asked for in, where that matters for a derivative. */
  readonly result?: string;
}

export interface System {
  /** [d] */
  readonly period: number;
  /** [solMass] */
  readonly star: number;
  /** m/M */
  readonly ratio: number;
  readonly eccentricity: number;
  /** [rad] */
  readonly inclination: number;
}

// SI (2019); IAU 2015 Resolution B3, nominal; IAU 2012 Resolution B2.
export const c = 299792458;
export const GMsun = 1.3271244e20;
export const au = 149597870700;

/** Semi-amplitude [m/s], Lovis & Fischer 2010, eq. 14. */
export function amplitude({ period, star, ratio, eccentricity: e, inclination }: System): number {
  const n = (2 * Math.PI) / (period * 86400);
  const mass = GMsun * star;
  return (
    (Math.cbrt(n * mass) * ratio * Math.sin(inclination)) / (Math.cbrt((1 + ratio) ** 2) * Math.sqrt((1 - e) * (1 + e)))
  );
}

const axisOf = ({ period, star, ratio }: System) =>
  Math.cbrt(GMsun * star * (1 + ratio) * ((period * 86400) / (2 * Math.PI)) ** 2) / au;
const ofE = (e: number) => e / ((1 - e) * (1 + e));
const cot = (i: number) => Math.cos(i) / Math.sin(i);

/** How the mass answers to the amplitude: the inverse of dlnK/dlnm = (M + m/3) / (M + m). */
const B = (x: number) => (1 + x) / (1 + x / 3);
const shiftOf = (beta: number) => Math.expm1(Math.atanh(beta));
/** dz/dbeta of 1 + z = ((1 + beta) / (1 - beta))^(1/2). */
const slopeOfShift = (beta: number) => (1 + shiftOf(beta)) / ((1 - beta) * (1 + beta));

const massInputs = ({ period, star }: System) => [period, star];

export const orbitalLaws: readonly Law[] = [
  {
    function: "AXIS",
    headers: ["d", "solMass", "solMass"],
    inputs: (s) => [...massInputs(s), s.ratio * s.star],
    derivatives: ({ period, star, ratio: x }) => [2 / 3 / period, 1 / 3 / (star * (1 + x)), 1 / 3 / (star * (1 + x))],
  },
  {
    function: "PERIOD",
    headers: ["AU", "solMass", "solMass"],
    inputs: (s) => [axisOf(s), s.star, s.ratio * s.star],
    derivatives: (s) => {
      const perMass = -1 / 2 / (s.star * (1 + s.ratio));
      return [3 / 2 / axisOf(s), perMass, perMass];
    },
  },
  {
    function: "TOTALMASS",
    headers: ["AU", "d"],
    inputs: (s) => [axisOf(s), s.period],
    derivatives: (s) => [3 / axisOf(s), -2 / s.period],
  },
  {
    function: "STARAXIS",
    headers: ["d", "solMass", "solMass"],
    inputs: (s) => [...massInputs(s), s.ratio * s.star],
    derivatives: ({ period, star, ratio: x }) => [
      2 / 3 / period,
      -2 / 3 / (star * (1 + x)),
      (1 + x / 3) / (1 + x) / (x * star),
    ],
  },
  {
    function: "PLANETSPEED",
    headers: ["d", "solMass", "solMass"],
    inputs: (s) => [...massInputs(s), s.ratio * s.star],
    derivatives: ({ period, star, ratio: x }) => [
      -1 / 3 / period,
      (1 / 3 + x) / (1 + x) / star,
      -2 / 3 / (star * (1 + x)),
    ],
  },
  {
    function: "STARSPEED",
    headers: ["d", "solMass", "solMass"],
    inputs: (s) => [...massInputs(s), s.ratio * s.star],
    derivatives: ({ period, star, ratio: x }) => [
      -1 / 3 / period,
      -2 / 3 / (star * (1 + x)),
      (1 + x / 3) / (1 + x) / (x * star),
    ],
  },
  {
    function: "REFLEX",
    headers: ["d", "solMass", "solMass", "1", "rad"],
    inputs: (s) => [...massInputs(s), s.ratio * s.star, s.eccentricity, s.inclination],
    derivatives: reflexDerivatives,
  },
  {
    function: "MINMASS",
    headers: ["m/s", "d", "solMass", "1"],
    inputs: (s) => {
      const edgeOn = { ...s, inclination: Math.PI / 2 };
      return [amplitude(edgeOn), ...massInputs(s), s.eccentricity];
    },
    derivatives: (s) => {
      const { period, star, ratio: x, eccentricity: e } = s;
      const K = amplitude({ ...s, inclination: Math.PI / 2 });
      return [B(x) / K, B(x) / 3 / period, (B(x) * 2) / 3 / (star * (1 + x)), -B(x) * ofE(e)];
    },
  },
  {
    function: "PLANETMASS",
    headers: ["m/s", "d", "solMass", "rad", "1"],
    inputs: (s) => [amplitude(s), ...massInputs(s), s.inclination, s.eccentricity],
    derivatives: (s) => {
      const { period, star, ratio: x, eccentricity: e, inclination: i } = s;
      const ofMass = (B(x) * 2) / 3 / (star * (1 + x));
      return [B(x) / amplitude(s), B(x) / 3 / period, ofMass, -B(x) * cot(i), -B(x) * ofE(e)];
    },
  },
  {
    function: "MASSFUNCTION",
    headers: ["m/s", "d", "1"],
    inputs: (s) => [amplitude(s), s.period, s.eccentricity],
    derivatives: (s) => [3 / amplitude(s), 1 / s.period, -3 * ofE(s.eccentricity)],
  },
  {
    function: "PLANETSHIFT",
    headers: ["d", "solMass", "solMass", "1", "rad"],
    inputs: (s) => [...massInputs(s), s.ratio * s.star, s.eccentricity, s.inclination],
    derivatives: (s) => {
      const beta = amplitude(s) / c;
      const ofAmplitude = (slopeOfShift(beta) * beta) / shiftOf(beta);
      return reflexDerivatives(s).map((derivative) => derivative * ofAmplitude);
    },
  },
  {
    function: "SHIFTMASS",
    headers: ["1", "d", "solMass", "1", "rad"],
    inputs: (s) => [shiftOf(amplitude(s) / c), ...massInputs(s), s.eccentricity, s.inclination],
    derivatives: (s) => {
      const { period, star, ratio: x, eccentricity: e, inclination: i } = s;
      const beta = amplitude(s) / c;
      const ofMass = (B(x) * 2) / 3 / (star * (1 + x));
      return [B(x) / (slopeOfShift(beta) * beta), B(x) / 3 / period, ofMass, -B(x) * ofE(e), -B(x) * cot(i)];
    },
  },
];

function reflexDerivatives({ period, star, ratio: x, eccentricity: e, inclination: i }: System): number[] {
  return [-1 / 3 / period, -2 / 3 / (star * (1 + x)), (1 + x / 3) / (1 + x) / (x * star), ofE(e), cot(i)];
}

/** A light shift. */
export interface Light {
  /** v/c */
  readonly beta: number;
  /** [nm] */
  readonly wavelength: number;
  readonly resolvingPower: number;
  readonly sampling: number;
}

export interface LightLaw {
  readonly function: string;
  readonly headers: readonly string[];
  readonly inputs: (light: Light) => readonly number[];
  /** dy/dx, the result in `result`. */
  readonly slopes: (light: Light) => readonly number[];
  readonly result: string;
}

export const lightLaws: readonly LightLaw[] = [
  {
    function: "SHIFT",
    headers: ["m/s"],
    inputs: ({ beta }) => [beta * c],
    slopes: ({ beta }) => [slopeOfShift(beta) / c],
    result: "1",
  },
  {
    function: "SHIFTSPEED",
    headers: ["1"],
    inputs: ({ beta }) => [shiftOf(beta)],
    slopes: ({ beta }) => [c / slopeOfShift(beta)],
    result: "m/s",
  },
  {
    function: "LINESHIFT",
    headers: ["nm", "m/s"],
    inputs: ({ beta, wavelength }) => [wavelength, beta * c],
    slopes: ({ beta, wavelength }) => [shiftOf(beta), (wavelength * slopeOfShift(beta)) / c],
    result: "nm",
  },
  {
    function: "PIXELSHIFT",
    headers: ["m/s", "1", "pixel"],
    inputs: ({ beta, resolvingPower, sampling }) => [beta * c, resolvingPower, sampling],
    slopes: ({ beta, resolvingPower, sampling }) => [
      (resolvingPower * sampling) / c,
      beta * sampling,
      beta * resolvingPower,
    ],
    result: "pixel",
  },
  {
    function: "PIXELSPEED",
    headers: ["pixel", "1", "pixel"],
    inputs: ({ beta, resolvingPower, sampling }) => [beta * resolvingPower * sampling, resolvingPower, sampling],
    slopes: ({ beta, resolvingPower, sampling }) => [
      c / (resolvingPower * sampling),
      (-beta * c) / resolvingPower,
      (-beta * c) / sampling,
    ],
    result: "m/s",
  },
  {
    function: "AIR",
    headers: ["nm"],
    inputs: ({ wavelength }) => [wavelength],
    slopes: ({ wavelength }) => [slopeOfAir(wavelength)],
    result: "nm",
  },
  {
    function: "VACUUM",
    headers: ["nm"],
    inputs: ({ wavelength }) => [airOf(wavelength)],
    slopes: ({ wavelength }) => [1 / slopeOfAir(wavelength)],
    result: "nm",
  },
];

/** Ciddor 1996, Appl. Opt. 35, 1566, standard air (coefficients from memory); s [um-1]. */
const refractivity = (s: number) => 0.05792105 / (238.0185 - s * s) + 0.00167917 / (57.362 - s * s);
const slopeOfRefractivity = (s: number) =>
  (2 * s * 0.05792105) / (238.0185 - s * s) ** 2 + (2 * s * 0.00167917) / (57.362 - s * s) ** 2;

export function airOf(vacuum: number): number {
  return vacuum / (1 + refractivity(1000 / vacuum));
}

/** dlambda_air/dlambda_vac = (1/n)(1 + (s/n) dn/ds), as s = 1/lambda. */
function slopeOfAir(vacuum: number): number {
  const s = 1000 / vacuum;
  const n = 1 + refractivity(s);
  return (1 + (s * slopeOfRefractivity(s)) / n) / n;
}
