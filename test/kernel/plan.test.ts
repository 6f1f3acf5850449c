import { Decimal } from "decimal.js";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { exposureForNoise } from "../../src/kernel/exposureForNoise.js";
import { massVisits, massVisitsExactly } from "../../src/kernel/massVisits.js";
import { noiseSum } from "../../src/kernel/noiseSum.js";
import { photoelectrons } from "../../src/kernel/photoelectrons.js";
import { photonNoise } from "../../src/kernel/photonNoise.js";
import { powerOfTen } from "../../src/kernel/powerOfTen.js";
import { qualityNoise } from "../../src/kernel/qualityNoise.js";
import { samplingPower } from "../../src/kernel/samplingPower.js";
import { telescopeTime } from "../../src/kernel/telescopeTime.js";
import { visitSignificance } from "../../src/kernel/visitSignificance.js";
import { visitsExactly, visitsNeeded } from "../../src/kernel/visitsNeeded.js";
import { relativeError } from "./relativeError.js";

const D = Decimal.clone({ precision: 40 });
const deg = Math.PI / 180;
const within = (found: number, wanted: number, bound = 4e-15) =>
  expect(relativeError(found, wanted)).toBeLessThanOrEqual(bound);

/** A value printed with so many digits is met to half a unit of the last. */
const printed = (found: number, text: string) => {
  const decimals = text.split(".")[1]?.length ?? 0;
  expect(Math.abs(found - Number(text))).toBeLessThanOrEqual(0.5 * 10 ** -decimals * (1 + 1e-9));
};

describe("powers of ten, against decimal arithmetic of 40 digits", () => {
  test("of any exponent", () => {
    fc.assert(
      fc.property(fc.double({ min: -100, max: 100, noNaN: true }), (x) => {
        // The digits of a double end late; those of its whole part and its rest do so sooner.
        const exact = new D(Math.trunc(x)).plus(new D(x - Math.trunc(x)));
        within(powerOfTen(x), new D(10).pow(exact).toNumber(), 2e-15);
      }),
      { numRuns: 400 },
    );
  });

  test("whole ones are exact", () => {
    for (let power = -22; power <= 22; power++) expect(powerOfTen(power)).toBe(Number(`1e${power}`));
  });
});

describe("photon noise", () => {
  // Anchor: ESO La Silla, HARPS overview page: photon-noise error about 0.90 m/s at V = 6 in 1 min. Scaled with mpmath.
  test("of a fainter star in a longer exposure", () => {
    printed(photonNoise(9, 900, 0.9, 6, 60, 0, 0), "0.925117");
    printed(photonNoise(12, 1800, 0.9, 6, 60, 8.2, 3.57), "1.133799");
  });

  test("five magnitudes are a factor 100 in light and 10 in noise (Pogson 1856)", () => {
    within(photonNoise(11, 60, 0.9, 6, 60, 0, 0), 9);
    within(photonNoise(6, 240, 0.9, 6, 60, 0, 0), 0.45);
    within(photonNoise(6, 60, 0.9, 6, 60, 7.2, 3.6), 0.45);
  });

  test("one aperture alone says nothing", () => {
    expect(photonNoise(9, 900, 0.9, 6, 60, 8.2, 0)).toBeNaN();
    expect(photonNoise(9, 900, 0.9, 6, 60, 0, 3.57)).toBeNaN();
  });

  test("the exposure for a noise gives that noise", () => {
    const positive = fc.double({ min: 0.05, max: 50, noNaN: true });
    const magnitude = fc.double({ min: 0, max: 16, noNaN: true });
    fc.assert(
      fc.property(positive, magnitude, positive, magnitude, positive, (goal, m, noise, anchor, size) => {
        const time = exposureForNoise(goal, m, noise, anchor, 60, size, 3.6);
        within(photonNoise(m, time, noise, anchor, 60, size, 3.6), goal, 1e-14);
      }),
    );
  });

  test("of a quality factor", () => {
    // Computed with mpmath: c / (1e4 sqrt(2.5e9)).
    printed(qualityNoise(1e4, 2.5e9), "0.599584916");
  });
});

describe("photoelectrons", () => {
  const cm2 = (area: number) => 2 * Math.sqrt(area / Math.PI) * 0.01;

  // Photons cm-2 s-1 A-1 from magnitude 0: Bessell, Castelli & Plez 1998, A&A 333, 231.
  test.each([
    [0, 756.1],
    [1, 1392.6],
    [2, 995.5],
    [3, 702.0],
    [4, 452.0],
    [5, 193.1],
    [6, 93.3],
    [7, 43.6],
  ])("band %i gives %d from a star of magnitude 0", (band, flux) => {
    within(photoelectrons(0, band, cm2(1), 1, 1, 1e-10, 0, 0, Number.NaN), flux, 1e-14);
  });

  test("V agrees with its energy flux at 545 nm to a part in a thousand", () => {
    // 3.631e-9 erg s-1 cm-2 A-1 (the same table) at hc / 545 nm: 996.2 photons, computed with mpmath.
    within(photoelectrons(0, 2, cm2(1), 1, 1, 1e-10, 0, 0, Number.NaN), 996.2, 1e-3);
  });

  test("every factor counts as it should", () => {
    const plain = photoelectrons(0, 2, 1, 1, 1, 1e-8, 0, 0, Number.NaN);
    within(photoelectrons(5, 2, 1, 1, 1, 1e-8, 0, 0, Number.NaN), plain / 100);
    within(photoelectrons(0, 2, 2, 1, 1, 1e-8, 0, 0, Number.NaN), plain * 4);
    within(photoelectrons(0, 2, 1, 0.25, 3, 2e-8, 0, 0, Number.NaN), plain * 1.5);
    within(photoelectrons(0, 2, 1, 1, 1, 1e-8, 0.5, 0, Number.NaN), plain * 0.75);
    within(photoelectrons(4.5, 2, 1, 1, 1, 1e-8, 0, 0.25, 2), plain / 100);
  });

  test("an extinction needs its airmass, and an obstruction lets light past", () => {
    expect(photoelectrons(0, 2, 1, 1, 1, 1e-8, 0, 0.1, Number.NaN)).toBeNaN();
    expect(photoelectrons(0, 2, 1, 1, 1, 1e-8, 1, 0, Number.NaN)).toBeNaN();
  });
});

test("noises add in quadrature", () => {
  expect(noiseSum(3, 4)).toBe(5);
  expect(noiseSum(2, 3, 6)).toBe(7);
  expect(noiseSum(0, 0)).toBe(0);
  expect(noiseSum(1.5)).toBe(1.5);
});

test("hours are visits times exposure and overhead, over the efficiency", () => {
  expect(telescopeTime(24, 900, 300, 1)).toBe(24 * 1200);
  expect(telescopeTime(24, 900, 300, 0.75)).toBe(24 * 1600);
});

/** Velocity of the star, systemic velocity 0 and K = 1, at a mean anomaly: Kepler's equation by bisection. */
function velocity(meanAnomaly: number, e: number, omega: number): number {
  let [low, high] = [0, 2 * Math.PI];
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2;
    if (middle - e * Math.sin(middle) < meanAnomaly) low = middle;
    else high = middle;
  }
  const nu = 2 * Math.atan2(Math.sqrt(1 + e) * Math.sin(low / 2), Math.sqrt(1 - e) * Math.cos(low / 2));
  return Math.cos(nu + omega) + e * Math.cos(omega);
}

/** 1 / sigma_K of unit noise from the normal equations of K and the systemic velocity. */
function precision(shape: readonly number[]): number {
  const sum = shape.reduce((total, h) => total + h, 0);
  return Math.sqrt(shape.reduce((total, h) => total + h * h, 0) - (sum * sum) / shape.length);
}

describe("what a visit contributes", () => {
  test("in the closed form printed for chosen orbits", () => {
    // Computed with mpmath by quadrature over one period: 0.3481, 0.4019, 0.0577, 0.1323.
    const values: readonly (readonly [number, number, string])[] = [
      [0.5, 0, "0.3481"],
      [0.5, 90, "0.4019"],
      [0.9, 0, "0.0577"],
      [0.9, 90, "0.1323"],
    ];
    for (const [e, omega, text] of values) printed(samplingPower(0, e, omega * deg), text);
  });

  test("is the variance of the curve over time", () => {
    const samples = 4096;
    for (const [e, omega] of [
      [0.1, 0.3],
      [0.5171, 3.2327],
      [0.7, 5],
      [0.85, -1],
    ] as const) {
      const curve = Array.from({ length: samples }, (_, index) =>
        velocity(((index + 0.5) / samples) * 2 * Math.PI, e, omega),
      );
      within(samplingPower(0, e, omega), precision(curve) ** 2 / samples, 1e-6);
    }
  });

  test("is that of a circle as the eccentricity goes to 0, whatever omega is", () => {
    expect(samplingPower(0, 0, Number.NaN)).toBe(0.5);
    for (const omega of [0, 1, 4]) within(samplingPower(0, 1e-9, omega), 0.5, 1e-15);
  });

  test("is not known for an eccentric orbit of unknown omega, except at the quadratures", () => {
    expect(samplingPower(0, 0.3, Number.NaN)).toBeNaN();
    expect(samplingPower(1, 0.3, Number.NaN)).toBe(1);
  });

  test("at the quadratures is 1 for every orbit: half the visits at each extreme", () => {
    for (const e of [0, 0.4, 0.9]) {
      const half = Array<number>(10).fill(1 + e * Math.cos(0.7));
      within(precision([...half, ...half.map((h) => h - 2)]) ** 2 / 20, samplingPower(1, e, 0.7), 1e-14);
    }
  });
});

describe("visits", () => {
  test("for a significance of 5 at K = 2.5 m/s and 3 m/s of noise", () => {
    // 2 (5 x 3 / 2.5)^2 = 72 by hand; rounding must not make it 73.
    expect(visitsNeeded(2.5, 3, 5, 0, 0, 0)).toBe(72);
    expect(visitsNeeded(2.5, 3, 5, 1, 0, 0)).toBe(36);
  });

  test("a whole quotient is not rounded up", () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 300 }), fc.double({ min: 0.1, max: 30, noNaN: true }), (n, noise) => {
        // (n sigma / K)^2 = n^2 at the quadratures, and even.
        expect(visitsNeeded(noise, noise, 2 * n, 1, 0, 0)).toBe(4 * n * n);
      }),
    );
  });

  test("never fewer than the two parameters and two more", () => {
    expect(visitsNeeded(100, 1, 3, 0, 0, 0)).toBe(4);
    expect(massVisits(100, 1, 1e20, 0, 3, 0, 0, 0)).toBe(4);
  });

  test("at the quadratures an odd number gives less than its share", () => {
    // (n sigma / K)^2 = 35: 35 visits count as 35 - 1/35, so 36 are needed.
    expect(visitsNeeded(1, 1, Math.sqrt(35), 1, 0, 0)).toBe(36);
    expect(visitsNeeded(1, 1, Math.sqrt(34.9), 1, 0, 0)).toBe(35);
    // The split 18 and 17 from the normal equations.
    within(visitSignificance(1, 1, 35, 1, 0, 0), precision([...Array(18).fill(1), ...Array(17).fill(-1)]), 1e-14);
  });

  test("are as few as give the significance", () => {
    const amplitude = fc.double({ min: 0.1, max: 100, noNaN: true });
    const e = fc.oneof(fc.constant(0), fc.double({ min: 0, max: 0.95, noNaN: true }));
    const goal = fc.double({ min: 3, max: 50, noNaN: true });
    fc.assert(
      fc.property(amplitude, amplitude, goal, fc.constantFrom(0, 1), e, (K, noise, n, sampling, shape) => {
        const visits = visitsNeeded(K, noise, n, sampling, shape, 0.4);
        expect(visitSignificance(K, noise, visits, sampling, shape, 0.4)).toBeGreaterThanOrEqual(n * (1 - 1e-11));
        if (visits > 4) expect(visitSignificance(K, noise, visits - 1, sampling, shape, 0.4)).toBeLessThan(n);
      }),
    );
  });

  test("of a mass whose star is uncertain", () => {
    // n = 5, K = 2.5, sigma = 3, sigma_M / M = 5 %: 74.057; n = 20: 2073.6; n = 40 unreachable. Computed with mpmath.
    printed(massVisitsExactly(2.5, 3, 1, 0.05, 5, 0, 0, 0), "74.057");
    expect(massVisits(2.5, 3, 1, 0.05, 5, 0, 0, 0)).toBe(75);
    printed(massVisitsExactly(2.5, 3, 1, 0.05, 20, 0, 0, 0), "2073.6");
    expect(massVisits(2.5, 3, 1, 0.05, 40, 0, 0, 0)).toBeNaN();
    // Where the errors are equal no number of visits is enough either.
    expect(massVisits(2.5, 3, 1, 0.15, 10, 0, 0, 0)).toBeNaN();
    expect(massVisits(2.5, 3, 1, 0, 5, 0, 0, 0)).toBe(72);
  });

  test("ten phases of a known ephemeris have the uncertainty of their normal equations", () => {
    // sigma = 2 m/s: sigma_K = 0.843500299 with a free systemic velocity, computed with mpmath. The uniform law is near.
    const phases = [0.02, 0.11, 0.23, 0.27, 0.34, 0.52, 0.61, 0.74, 0.79, 0.93];
    const sigma = 2 / precision(phases.map((phase) => -Math.sin(2 * Math.PI * phase)));
    printed(sigma, "0.843500299");
    within(1 / visitSignificance(1, 2, 10, 0, 0, 0), sigma, 0.1);
  });
});

/** The same random numbers in every run: a linear congruence (Numerical Recipes, 3rd ed., ranqd1). */
function randomNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state + 0.5) / 4294967296;
  };
}

describe("a semi-amplitude fitted to simulated visits", () => {
  const random = randomNumbers(20);
  const gaussian = () => Math.sqrt(-2 * Math.log(random())) * Math.cos(2 * Math.PI * random());

  test.each([
    { sampling: 0, e: 0, omega: 0 },
    { sampling: 0, e: 0.5, omega: 1.1 },
    { sampling: 1, e: 0.3, omega: 0.6 },
  ])("scatters as $sampling, e = $e, omega = $omega say", ({ sampling, e, omega }) => {
    const [K, noise, trials] = [2.5, 3, 4000];
    const visits = visitsNeeded(K, noise, 5, sampling, e, omega);
    const shape = Array.from({ length: visits }, (_, index) => {
      if (sampling === 1) return (index % 2 === 0 ? 1 : -1) + e * Math.cos(omega);
      return velocity(((index + 0.5) / visits) * 2 * Math.PI, e, omega);
    });
    const mean = shape.reduce((sum, h) => sum + h, 0) / visits;
    const weight = shape.reduce((sum, h) => sum + (h - mean) ** 2, 0);
    const fitted = Array.from({ length: trials }, () =>
      shape.reduce((sum, h) => sum + ((h - mean) * (K * h + noise * gaussian())) / weight, 0),
    );
    const average = fitted.reduce((sum, value) => sum + value, 0) / trials;
    const scatter = Math.sqrt(fitted.reduce((sum, value) => sum + (value - average) ** 2, 0) / (trials - 1));
    const sigma = K / visitSignificance(K, noise, visits, sampling, e, omega);
    // A scatter of 4000 draws is good to 1/sqrt(8000) = 1.1 %, a mean to sigma/63: four of each. Few eccentric visits
    // are not quite uniform.
    expect(Math.abs(average - K)).toBeLessThan((4 * sigma) / Math.sqrt(trials));
    expect(Math.abs(scatter / sigma - 1)).toBeLessThan(0.05);
    expect(visitsExactly(K, noise, 5, sampling, e, omega)).toBeLessThanOrEqual(visits);
  });
});
