import { airWavelength, airWavelengths } from "../../src/kernel/airWavelength.js";
import { exposureForNoise, exposuresForNoises } from "../../src/kernel/exposureForNoise.js";
import { lineShift, lineShifts } from "../../src/kernel/lineShift.js";
import { massFunction, massFunctions } from "../../src/kernel/massFunction.js";
import { massVisits, massVisitsOf } from "../../src/kernel/massVisits.js";
import { noiseSum, noiseSums } from "../../src/kernel/noiseSum.js";
import { anomalies, anomaly } from "../../src/kernel/orbit/anomaly.js";
import { eccentricAnomalies, eccentricAnomaly } from "../../src/kernel/orbit/eccentricAnomaly.js";
import { eventTime, eventTimes } from "../../src/kernel/orbit/orbitalEvent.js";
import { radialVelocities, radialVelocity } from "../../src/kernel/orbit/radialVelocity.js";
import { orbitalPeriod, orbitalPeriods } from "../../src/kernel/orbitalPeriod.js";
import { photoelectronCounts, photoelectrons } from "../../src/kernel/photoelectrons.js";
import { photonNoise, photonNoises } from "../../src/kernel/photonNoise.js";
import { pixelShift, pixelShifts } from "../../src/kernel/pixelShift.js";
import { pixelSpeed, pixelSpeeds } from "../../src/kernel/pixelSpeed.js";
import { planetMass, planetMasses } from "../../src/kernel/planetMass.js";
import { planetShift, planetShifts } from "../../src/kernel/planetShift.js";
import { planetSpeed, planetSpeeds } from "../../src/kernel/planetSpeed.js";
import { qualityNoise, qualityNoises } from "../../src/kernel/qualityNoise.js";
import { reflexAmplitude, reflexAmplitudes } from "../../src/kernel/reflexAmplitude.js";
import { semiMajorAxes, semiMajorAxis } from "../../src/kernel/semiMajorAxis.js";
import { shiftMass, shiftMasses } from "../../src/kernel/shiftMass.js";
import { shiftOfSpeed, shiftsOfSpeeds } from "../../src/kernel/shiftOfSpeed.js";
import { barycentricSpeed, barycentricSpeeds } from "../../src/kernel/sky/barycentricSpeed.js";
import { barycentricTime, barycentricTimes } from "../../src/kernel/sky/barycentricTime.js";
import { speedOfShift, speedsOfShifts } from "../../src/kernel/speedOfShift.js";
import { starAxes, starAxis } from "../../src/kernel/starAxis.js";
import { starSpeed, starSpeeds } from "../../src/kernel/starSpeed.js";
import { telescopeTime, telescopeTimes } from "../../src/kernel/telescopeTime.js";
import { phase, phases } from "../../src/kernel/time/phase.js";
import { totalMass, totalMasses } from "../../src/kernel/totalMass.js";
import { vacuumWavelength, vacuumWavelengths } from "../../src/kernel/vacuumWavelength.js";
import { visitSignificance, visitSignificances } from "../../src/kernel/visitSignificance.js";
import { visitsNeeded, visitsNeededs } from "../../src/kernel/visitsNeeded.js";

type Scalar = (...inputs: number[]) => number;
type Batch = (rows: number, out: Float64Array, ...inputs: Float64Array[]) => void;

/** One argument: values of its domain, a usual one first, and values outside it, in the order of the kernel's header. */
export interface Domain {
  readonly name: string;
  readonly inside: readonly number[];
  readonly outside: readonly number[];
}

export interface Kernel {
  readonly name: string;
  readonly scalar: Scalar;
  readonly batch: Batch;
  readonly inputs: readonly Domain[];
}

const c = 299792458;
/** The double next below c: doubles from 2^28 to 2^29 are 2^-24 apart. */
const belowLight = c - 2 ** -24;

// Magnitudes end at 1e-40 and 1e40, and 9.9e-41 and 1.1e40 lie beyond them.
const positive = (name: string, ...usual: number[]): Domain => ({
  name,
  inside: usual,
  outside: [0, -usual[0], 9.9e-41, 1.1e40, Number.MIN_VALUE, Number.MAX_VALUE],
});
const period = positive("period", 3e8, 1, 3.2e16);
const starMass = positive("starMass", 1.3e20, 1.3e6, 1.3e26);
const axis = positive("axis", 1.5e11, 1e3, 1e18);
const companion: Domain = {
  name: "planetMass",
  inside: [1.3e17, 0, -0, 1.3e6],
  outside: [-1.3e17, -Number.MIN_VALUE, 9.9e-41, 1.1e40, Number.MIN_VALUE, Number.MAX_VALUE],
};
const eccentricity: Domain = {
  name: "eccentricity",
  inside: [0.3, 0, -0, 1e-300, 0.9999, 1 - 2 ** -40],
  outside: [1, -0.1, -Number.MIN_VALUE, 1.5],
};
const inclination: Domain = {
  name: "inclination",
  inside: [1.2, Math.PI / 2, 1e-6, Math.PI - 2 ** -51],
  outside: [0, Math.PI, -1.2, 4, 9.9e-41],
};
const amplitude: Domain = {
  name: "amplitude",
  inside: [12.5, 0, -0, 1e-6, 1e5],
  outside: [-12.5, c, 9.9e-41, 1e9],
};
const amplitudeShift: Domain = {
  name: "shift",
  inside: [4e-8, 0, -0, 1e-14, 1e-3],
  outside: [-4e-8, -1, -2, 9.9e-41, 1.1e40],
};
const speed: Domain = {
  name: "speed",
  inside: [1e4, 0, -0, -1e4, 1e-6, 29979245.8, -29979245.8],
  outside: [c, -c, 9.9e-41, -9.9e-41, 1e9, -1e9],
};
const shift: Domain = {
  name: "shift",
  inside: [1e-4, 0, -0, -1e-4, 1e-14, 0.1, -0.1],
  outside: [-1, -2, 9.9e-41, -9.9e-41, 1.1e40],
};
const model: Domain = { name: "model", inside: [0, 1], outside: [-1, 0.5, 2] };
const formula: Domain = { name: "formula", inside: [0, 1], outside: [-1, 0.5, 2] };
const wavelength = positive("wavelength", 5e-7, 1e-10, 1e3);
const airRange: Domain = {
  name: "wavelength",
  // Each limit also as it comes out of another unit, a rounding to either side.
  inside: [5e-7, 200e-9, 200 * 1e-9, 200e-9 * (1 - 2 ** -52), 2500e-9, 2500 * 1e-9, 2500e-9 * (1 + 2 ** -52)],
  outside: [0, -5e-7, 199.999e-9, 2500.001e-9],
};
const resolvingPower = positive("resolvingPower", 1e5, 1, 1e7);
const pixelsPerElement = positive("pixelsPerElement", 3.2, 0.1, 100);
const pixels: Domain = { name: "pixels", inside: [1.5, 0, -0, -1.5, 1e-6], outside: [9.9e-41, 1.1e40, -1.1e40] };

const instant: Domain = { name: "time", inside: [9000.25, 0, -9000.5, 73048], outside: [4.1e6, -4.1e6] };
const reference: Domain = { ...instant, name: "reference" };
const orbitPeriod: Domain = { ...period, inside: [3e5, 100, 3.2e10] };
const omega: Domain = { name: "omega", inside: [1, 0, -6.3, 6.3], outside: [101, -101] };
const code = (name: string, most: number): Domain => ({
  name,
  inside: Array.from({ length: most + 1 }, (_, index) => index),
  outside: [-1, 0.5, most + 1],
});
const meanAnomaly: Domain = { name: "meanAnomaly", inside: [1, 0, -0, -3.1, Math.PI, 1e-300], outside: [3.2, -3.2] };
const systemic: Domain = { name: "systemic", inside: [-3e4, 0], outside: [] };
const utc: Domain = { name: "utc", inside: [3716.75, -10227.5, 13148.4], outside: [-10228, 13148.5] };
const circle = (name: string): Domain => ({ name, inside: [2, 0, 6.28], outside: [] });
const declination: Domain = { name: "declination", inside: [-0.5, 0, Math.PI / 2], outside: [] };
const longitude: Domain = { name: "longitude", inside: [-1.2, 0, 3.14, 6.28], outside: [7, -7] };
const latitude: Domain = { name: "latitude", inside: [-0.5, 0, Math.PI / 2, -Math.PI / 2], outside: [1.6, -1.6] };
const height: Domain = { name: "height", inside: [2400, 0, -100], outside: [1.1e5, -1.1e5] };
const motion: Domain = { name: "motion", inside: [1e-14, 0, -1e-13], outside: [] };
const parallax: Domain = { name: "parallax", inside: [1e-7, 0], outside: [-1e-7] };
const epoch: Domain = { name: "epoch", inside: [6.3e10], outside: [] };
const magnitude: Domain = { name: "magnitude", inside: [9, 0, -0, -30, 40], outside: [-30.1, 40.1] };
const exposure = positive("exposure", 900, 1, 1e5);
const noise = positive("noise", 1.2, 1e-3, 1e3);
const noiseOrNone: Domain = { name: "noise", inside: [1.2, 0, -0, 1e3], outside: [-1.2, 9.9e-41, 1.1e40] };
const aperture = positive("aperture", 3.6, 0.1, 100);
const part: Domain = { name: "part", inside: [0.05, 1, 1e-6], outside: [0, -0.05, 1.0001, 9.9e-41] };
const significance = positive("significance", 5, 0.1, 100);
const sampling: Domain = { name: "sampling", inside: [0, 1], outside: [-1, 0.5, 2] };
const shape: Domain = { name: "eccentricity", inside: [0.3, 0, -0, 0.9999], outside: [1, -0.1, 1.5] };
const anyOmega: Domain = {
  name: "omega",
  inside: [1, 0, -0, Math.PI, -Math.PI, 2 * Math.PI, -6, 6],
  outside: [1e4, -1e4],
};
const orbit = [sampling, shape, anyOmega] as const;
const anchor = [noise, magnitude, exposure, aperture, aperture] as const;

const kernel = (scalar: unknown, batch: unknown, ...inputs: Domain[]): Kernel => ({
  name: (scalar as Scalar).name,
  scalar: scalar as Scalar,
  batch: batch as Batch,
  inputs,
});

export const kernels: readonly Kernel[] = [
  kernel(semiMajorAxis, semiMajorAxes, period, starMass, companion),
  kernel(orbitalPeriod, orbitalPeriods, axis, starMass, companion),
  kernel(totalMass, totalMasses, axis, period),
  kernel(starAxis, starAxes, period, starMass, companion),
  kernel(
    planetSpeed,
    planetSpeeds,
    positive("period", 3e8, 1e3, 3.2e16),
    positive("starMass", 1.3e20, 1.3e6),
    companion,
  ),
  kernel(starSpeed, starSpeeds, period, starMass, companion),
  kernel(reflexAmplitude, reflexAmplitudes, period, starMass, companion, eccentricity, inclination),
  kernel(planetMass, planetMasses, amplitude, period, starMass, eccentricity, inclination),
  kernel(massFunction, massFunctions, amplitude, period, eccentricity),
  kernel(planetShift, planetShifts, period, starMass, companion, eccentricity, inclination),
  kernel(shiftMass, shiftMasses, amplitudeShift, period, starMass, eccentricity, inclination),
  kernel(shiftOfSpeed, shiftsOfSpeeds, speed, model),
  kernel(speedOfShift, speedsOfShifts, shift, model),
  kernel(lineShift, lineShifts, wavelength, speed, model),
  kernel(
    pixelShift,
    pixelShifts,
    { ...speed, inside: [...speed.inside, belowLight, -belowLight] },
    resolvingPower,
    pixelsPerElement,
  ),
  kernel(pixelSpeed, pixelSpeeds, pixels, resolvingPower, pixelsPerElement),
  kernel(vacuumWavelength, vacuumWavelengths, airRange, formula),
  kernel(airWavelength, airWavelengths, airRange, formula),
  kernel(eccentricAnomaly, eccentricAnomalies, meanAnomaly, eccentricity),
  kernel(anomaly, anomalies, instant, orbitPeriod, reference, eccentricity, code("which", 2)),
  kernel(phase, phases, instant, orbitPeriod, reference),
  kernel(
    radialVelocity,
    radialVelocities,
    instant,
    orbitPeriod,
    { ...amplitude, outside: [-12.5, 9.9e-41] },
    reference,
    eccentricity,
    omega,
    systemic,
    code("event", 1),
  ),
  kernel(eventTime, eventTimes, code("which", 5), instant, orbitPeriod, reference, eccentricity, omega, {
    name: "place",
    inside: [1, 2, 10000],
    outside: [],
  }),
  kernel(
    barycentricSpeed,
    barycentricSpeeds,
    utc,
    circle("rightAscension"),
    declination,
    longitude,
    latitude,
    height,
    motion,
    motion,
    parallax,
    epoch,
  ),
  kernel(barycentricTime, barycentricTimes, utc, circle("rightAscension"), declination, longitude, latitude, height),
  kernel(photonNoise, photonNoises, magnitude, exposure, ...anchor),
  kernel(exposureForNoise, exposuresForNoises, noise, magnitude, ...anchor),
  kernel(qualityNoise, qualityNoises, positive("quality", 1e4, 1, 1e6), positive("photoelectrons", 1e9, 1, 1e15)),
  kernel(
    photoelectrons,
    photoelectronCounts,
    magnitude,
    { name: "band", inside: [2, 0, 7], outside: [-1, 0.5, 8] },
    aperture,
    part,
    exposure,
    positive("bandWidth", 1e-7, 1e-12, 1e-5),
    { name: "obstruction", inside: [0.05, 0, -0], outside: [-0.1, 3.6, 5, 9.9e-41] },
    { name: "extinction", inside: [0.1, 0, -0, 2.5], outside: [-0.1, 40.1] },
    { name: "airmass", inside: [1.2, 1, 40], outside: [0.99, 0, -1, 40.1] },
  ),
  kernel(noiseSum, noiseSums, noiseOrNone, noiseOrNone, noiseOrNone),
  kernel(visitsNeeded, visitsNeededs, noise, noise, significance, ...orbit),
  kernel(
    massVisits,
    massVisitsOf,
    noise,
    noise,
    positive("starMass", 1.3e20, 1e20, 1e26),
    { name: "starMassError", inside: [1e18, 0, -0], outside: [-1e18, 1e20, 9.9e-41] },
    { name: "significance", inside: [5, 0.1, 100], outside: [0, -5, 1e3, 9.9e-41] },
    ...orbit,
  ),
  kernel(
    visitSignificance,
    visitSignificances,
    noise,
    noise,
    { name: "visits", inside: [24, 2, 3, 1e6], outside: [1, 0, -24, 1.1e40] },
    ...orbit,
  ),
  kernel(telescopeTime, telescopeTimes, positive("visits", 24, 1, 1e4), exposure, noiseOrNone, part),
];
