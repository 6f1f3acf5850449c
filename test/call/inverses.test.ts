import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Given, numberFrom } from "./door.js";
import { logarithmic } from "./table.js";

/** Round trips lose at most a few roundings of the way; the laws' condition numbers are below 10 where not said. */
const lossless = 1e-13;
const close = (found: number, wanted: number, tolerance = lossless) =>
  expect(Math.abs(found / wanted - 1)).toBeLessThanOrEqual(tolerance);

const period = logarithmic(0.1, 1e6);
const star = logarithmic(1e-3, 100);
const planet = logarithmic(1e-6, 1e3);
const eccentricity = fc.oneof(fc.double({ min: 0, max: 0.99, noNaN: true }), fc.constantFrom(0, 0.99));
const inclination = fc.oneof(fc.double({ min: 0.5, max: 179.5, noNaN: true }), fc.constant(90));

function property(inputs: readonly fc.Arbitrary<number>[], check: (...values: number[]) => void): void {
  fc.assert(
    fc.property(fc.tuple(...inputs), (values) => check(...values)),
    { numRuns: 120 },
  );
}

describe("there and back", () => {
  test("AXIS, PERIOD and TOTALMASS", () =>
    property([period, star, planet], (P, M, m) => {
      const axis = numberFrom("AXIS", P!, M!, m!, "d; solMass; jupiterMass");
      close(numberFrom("PERIOD", axis, M!, m!, "AU; solMass; jupiterMass"), P!);
      const total = numberFrom("TOTALMASS", axis, P!, "AU; d", "jupiterMass");
      const starMass = numberFrom("INTO", M!, "solMass", "jupiterMass");
      close(total, starMass + m!);
    }));

  test("STARAXIS and AXIS share the distance as the masses say", () =>
    property([period, star, planet], (P, M, m) => {
      const headers = "d; solMass; jupiterMass";
      const [axis, own] = ["AXIS", "STARAXIS"].map((name) => numberFrom(name, P!, M!, m!, headers)) as [number, number];
      const mass = numberFrom("INTO", M!, "solMass", "jupiterMass");
      close(own / axis, m! / (mass + m!));
    }));

  test("PLANETSPEED and STARSPEED balance momentum", () =>
    property([period, star, planet], (P, M, m) => {
      const headers = "d; solMass; jupiterMass";
      const mass = numberFrom("INTO", M!, "solMass", "jupiterMass");
      const [ofPlanet, ofStar] = ["PLANETSPEED", "STARSPEED"].map((name) =>
        numberFrom(name, P!, M!, m!, headers, "m/s"),
      ) as [number, number];
      close((ofPlanet * m!) / (ofStar * mass), 1);
    }));

  test("REFLEX and PLANETMASS", () =>
    property([period, star, planet, eccentricity, inclination], (P, M, m, e, i) => {
      const K = numberFrom("REFLEX", P!, M!, m!, e!, i!, "d; solMass; jupiterMass; e; deg");
      close(numberFrom("PLANETMASS", K, P!, M!, i!, e!, "m/s; d; solMass; deg; e"), m!);
    }));

  test("REFLEX edge-on and MINMASS", () =>
    property([period, star, planet, eccentricity], (P, M, m, e) => {
      const K = numberFrom("REFLEX", P!, M!, m!, e!, undefined, "d; solMass; jupiterMass; e");
      close(numberFrom("MINMASS", K, P!, M!, e!, "m/s; d; solMass; e"), m!);
      close(numberFrom("PLANETMASS", K, P!, M!, 90, e!, "m/s; d; solMass; deg; e"), m!);
      // A circular orbit of the star: its speed is the amplitude.
      const circular = numberFrom("REFLEX", P!, M!, m!, undefined, undefined, "d; solMass; jupiterMass");
      close(numberFrom("STARSPEED", P!, M!, m!, "d; solMass; jupiterMass"), circular);
    }));

  test("MASSFUNCTION is (m sin i)^3 / (M + m)^2", () =>
    property([period, star, planet, eccentricity], (P, M, m, e) => {
      const K = numberFrom("REFLEX", P!, M!, m!, e!, undefined, "d; solMass; jupiterMass; e");
      const f = numberFrom("MASSFUNCTION", K, P!, e!, "m/s; d; e");
      const planetInSuns = numberFrom("INTO", m!, "jupiterMass", "solMass");
      close(f, planetInSuns ** 3 / (M! + planetInSuns) ** 2);
    }));

  test("PLANETSHIFT and SHIFTMASS, and both by way of K", () =>
    property([period, star, logarithmic(1e-4, 100), eccentricity, inclination], (P, M, m, e, i) => {
      const headers = "d; solMass; jupiterMass; e; deg";
      const z = numberFrom("PLANETSHIFT", P!, M!, m!, e!, i!, headers);
      close(numberFrom("SHIFTMASS", z, P!, M!, e!, i!, "1; d; solMass; e; deg"), m!);
      const K = numberFrom("REFLEX", P!, M!, m!, e!, i!, headers);
      close(numberFrom("SHIFT", K, undefined, "m/s"), z);
      close(numberFrom("SHIFTSPEED", z), K);
    }));

  const speed = fc.tuple(logarithmic(1e-6, 0.9 * 299792458), fc.constantFrom(1, -1)).map(([size, sign]) => size * sign);
  test("SHIFT and SHIFTSPEED", () =>
    property([speed], (v) => {
      close(numberFrom("SHIFTSPEED", numberFrom("SHIFT", v!, undefined, "m/s")), v!);
      if (Math.abs(v!) < 2.9e7) {
        close(numberFrom("SHIFTSPEED", numberFrom("SHIFT", v!, "linear", "m/s"), "linear"), v!);
      }
    }));

  test("LINESHIFT is the wavelength times SHIFT", () =>
    property([logarithmic(200, 2500), speed], (wavelength, v) => {
      const shift = numberFrom("SHIFT", v!, undefined, "m/s");
      close(numberFrom("LINESHIFT", wavelength!, v!, undefined, "nm; m/s"), wavelength! * shift);
    }));

  test("PIXELSHIFT and PIXELSPEED", () =>
    property([speed, logarithmic(1e3, 1e6), logarithmic(1, 10)], (v, R, s) => {
      const pixels = numberFrom("PIXELSHIFT", v!, R!, s!, "m/s; 1; 1");
      close(numberFrom("PIXELSPEED", pixels, R!, s!), v!);
    }));

  test("VACUUM and AIR", () =>
    property([fc.double({ min: 201, max: 2498, noNaN: true })], (wavelength) => {
      for (const formula of ["Ciddor1996", "Morton2000"]) {
        const air = numberFrom("AIR", wavelength!, formula, "nm");
        // Air slows light down: its wavelength in air is shorter, by 2.7 to 3.3 parts in ten thousand (Ciddor 1996).
        expect(1 - air / wavelength!).toBeGreaterThan(2.6e-4);
        expect(1 - air / wavelength!).toBeLessThan(3.4e-4);
        close(numberFrom("VACUUM", air, formula, "nm"), wavelength!, 1e-15);
      }
    }));
});

describe("monotonic laws", () => {
  const rises = (name: string, given: (value: number) => readonly Given[], from: number, to: number) => {
    fc.assert(
      fc.property(logarithmic(from, to), logarithmic(1.0001, 10), (value, factor) => {
        const [low, high] = [value, value * factor].map((one) => numberFrom(name, ...given(one))) as [number, number];
        expect(high).toBeGreaterThan(low);
      }),
      { numRuns: 100 },
    );
  };
  const falls = (name: string, given: (value: number) => readonly Given[], from: number, to: number) =>
    rises(name, (value) => given(1 / value), 1 / to, 1 / from);
  const reflexHeaders = "d; solMass; jupiterMass; e; deg";

  test("a larger period: wider orbit, slower star", () => {
    rises("AXIS", (P) => [P, 1, 1, "d; solMass; jupiterMass"], 0.1, 1e5);
    falls("REFLEX", (P) => [P, 1, 1, 0, 90, reflexHeaders], 0.1, 1e5);
  });

  test("a heavier star: wider orbit, slower reflex", () => {
    rises("AXIS", (M) => [10, M, 1, "d; solMass; jupiterMass"], 0.01, 100);
    falls("REFLEX", (M) => [10, M, 1, 0, 90, reflexHeaders], 0.01, 100);
  });

  test("a heavier planet or a more eccentric orbit: a larger amplitude", () => {
    rises("REFLEX", (m) => [10, 1, m, 0, 90, reflexHeaders], 1e-4, 1000);
    rises("REFLEX", (e) => [10, 1, 1, e, 90, reflexHeaders], 1e-3, 0.099);
    rises("REFLEX", (i) => [10, 1, 1, 0, i, reflexHeaders], 0.1, 9);
  });

  test("a larger amplitude: a heavier planet; a less inclined orbit: a heavier planet", () => {
    rises("MINMASS", (K) => [K, 10, 1, 0, "m/s; d; solMass; e"], 1e-3, 1e5);
    falls("PLANETMASS", (i) => [50, 10, 1, i, 0, "m/s; d; solMass; deg; e"], 0.1, 9);
  });

  test("a larger speed: a larger shift", () => {
    rises("SHIFT", (v) => [v, undefined, "m/s"], 1e-3, 2.9e7);
    rises("AIR", (wavelength) => [wavelength, undefined, "nm"], 201, 240);
  });
});
