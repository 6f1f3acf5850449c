import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Candidate, type Choice, choose, chooseSteps, type Wish } from "../../src/plan/choose.js";
import { cumulativeHours } from "../../src/plan/cumulativeHours.js";
import { tellInfeasible } from "../../src/plan/tellChoice.js";
import { runInSlices, runWatched } from "../../src/plan/watch.js";
import { wholeValues } from "../../src/plan/wholeValues.js";

const candidate = fc.record({
  hours: fc.oneof(
    fc.integer({ min: 1, max: 40 }).map((quarters) => quarters / 4),
    fc.double({ min: 0.01, max: 10, noNaN: true }),
  ),
  value: fc.oneof(
    fc.integer({ min: -2, max: 9 }),
    fc.integer({ min: 0, max: 50 }).map((tenths) => tenths / 10),
  ),
});
const wish = fc
  .record({
    rows: fc.array(candidate, { minLength: 0, maxLength: 11 }),
    budget: fc.double({ min: 0, max: 40, noNaN: true }),
    marks: fc.array(fc.constantFrom("must", "excluded", "free", "free", "free"), { minLength: 11, maxLength: 11 }),
  })
  .map(({ rows, budget, marks }): Wish => {
    const candidates = rows.map((row, index) => ({ ...row, name: `T${index}` }));
    const marked = (mark: string) => new Set(candidates.flatMap((_, index) => (marks[index] === mark ? [index] : [])));
    return { candidates, budget, must: marked("must"), excluded: marked("excluded") };
  });

const minutesOf = (hours: number) => Math.ceil(hours * 60 - 1e-6);
const roomOf = (budget: number) => Math.floor(budget * 60 + 1e-6);

interface Best {
  readonly places: readonly number[];
  readonly value: number;
  readonly minutes: number;
}

/** Every subset that is allowed; the best by value, then by minutes, then by which comes first in the table. */
function bruteForce({ candidates, budget, must, excluded }: Wish): Best | undefined {
  let best: Best | undefined;
  for (let bits = 0; bits < 2 ** candidates.length; bits++) {
    const places = candidates.flatMap((_, index) => ((bits >> index) & 1 ? [index] : []));
    if ([...must].some((index) => !places.includes(index)) || places.some((index) => excluded.has(index))) continue;
    if (places.some((index) => candidates[index]!.value <= 0 && !must.has(index))) continue;
    const minutes = places.reduce((sum, index) => sum + minutesOf(candidates[index]!.hours), 0);
    if (minutes > roomOf(budget)) continue;
    // Tenths are exact as whole numbers.
    const value = places.reduce((sum, index) => sum + Math.round(candidates[index]!.value * 10), 0);
    const found = { places, value, minutes };
    if (!best || isBetter(found, best)) best = found;
  }
  return best;
}

function isBetter(one: Best, other: Best): boolean {
  if (one.value !== other.value) return one.value > other.value;
  if (one.minutes !== other.minutes) return one.minutes < other.minutes;
  const at = one.places.findIndex((place, index) => place !== other.places[index]);
  return at >= 0 && (other.places[at] === undefined || one.places[at]! < other.places[at]!);
}

describe("the best choice", () => {
  test("is that of trying every one, ties and all", () => {
    fc.assert(
      fc.property(wish, (one) => {
        const expected = bruteForce(one);
        const found = choose(one);
        expect(found.feasible).toBe(expected !== undefined);
        if (!found.feasible || !expected) return;
        expect(found.chosen).toEqual(expected.places);
        expect(found.value).toBeCloseTo(expected.value / 10, 9);
        expect(found.hours).toBeCloseTo(expected.minutes / 60, 9);
      }),
      { numRuns: 300 },
    );
  });

  test("of a worked example: what is worth most an hour is not always in", () => {
    // By hand: 10 h hold A and C (9 + 5 = 14), not B (4 a hour) with anything better: B + C is 13.
    const candidates = [
      { name: "A", hours: 6, value: 9 },
      { name: "B", hours: 2, value: 8 },
      { name: "C", hours: 4, value: 5 },
      { name: "D", hours: 9, value: 13 },
    ];
    const free = { candidates, budget: 10, must: new Set<number>(), excluded: new Set<number>() };
    expect(choose(free)).toMatchObject({ chosen: [0, 1], value: 17, hours: 8 });
    expect(choose({ ...free, excluded: new Set([1]) })).toMatchObject({ chosen: [0, 2], value: 14, hours: 10 });
    expect(choose({ ...free, must: new Set([3]) })).toMatchObject({ chosen: [3], value: 13, hours: 9 });
    expect(choose({ ...free, budget: 12 })).toMatchObject({ chosen: [0, 1, 2], value: 22, hours: 12 });
  });

  test("never overruns the budget by the rounding of minutes", () => {
    const candidates = Array.from({ length: 50 }, (_, index) => ({ name: `T${index}`, hours: 0.1, value: 1 }));
    const found = choose({ candidates, budget: 1.2, must: new Set(), excluded: new Set() }) as Choice;
    expect(found.chosen).toEqual([...Array(12).keys()]);
    const thirds = candidates.map((one) => ({ ...one, hours: 100.5 / 3600 }));
    const cut = choose({ candidates: thirds, budget: 1, must: new Set(), excluded: new Set() }) as Choice;
    // 100.5 s count as 2 min.
    expect(cut.chosen).toHaveLength(30);
  });

  test("is the same every time and in slices, and stops when it is told to", async () => {
    const candidates = Array.from({ length: 60 }, (_, index) => ({
      name: `T${index}`,
      hours: 1 + ((index * 7) % 11) / 3,
      value: 1 + ((index * 5) % 13) / 7,
    }));
    const one = { candidates, budget: 60, must: new Set([3]), excluded: new Set([4]) };
    const found = choose(one);
    expect(choose(one)).toEqual(found);
    expect(await runInSlices(chooseSteps(one), {})).toEqual(found);
    const seen: number[] = [];
    expect(runWatched(chooseSteps(one), { onProgress: (done) => seen.push(done) })).toEqual(found);
    expect(seen).toEqual(Array.from({ length: 58 }, (_, index) => index + 1));
    expect(runWatched(chooseSteps(one), { isCancelled: () => true })).toBeUndefined();
    expect(await runInSlices(chooseSteps(one), { isCancelled: () => true })).toBeUndefined();
  });
});

describe("a wish that cannot be granted", () => {
  const candidates = [
    { name: "Lantern 1 b", hours: 50, value: 5 },
    { name: "Lantern 2 b", hours: 40.5, value: 3 },
    { name: "Quarry 1 b", hours: 40, value: 4 },
    { name: "Quarry 2 b", hours: 12, value: 0 },
  ];

  test("says what to relax", () => {
    const found = choose({ candidates, budget: 120, must: new Set([0, 1, 2, 3]), excluded: new Set() });
    if (found.feasible) throw new Error("it was granted");
    expect(found).toMatchObject({ needed: 142.5, release: [1] });
    expect(tellInfeasible(found, candidates)).toBe(
      "the targets that have to be in need 142.5 h and the budget is 120 h; raise it to 142.5 h, or do without Lantern 2 b (40.5 h).",
    );
  });

  test("of which little is left says so of several", () => {
    const found = choose({ candidates, budget: 20, must: new Set([0, 1, 3]), excluded: new Set() });
    if (found.feasible) throw new Error("it was granted");
    expect(tellInfeasible(found, candidates)).toBe(
      "the targets that have to be in need 102.5 h and the budget is 20 h; raise it to 102.5 h, or do without Lantern 1 b (50 h) and Lantern 2 b (40.5 h).",
    );
  });

  test("loses the least value", () => {
    fc.assert(
      fc.property(wish, (one) => {
        const found = choose(one);
        if (found.feasible) return;
        const must = [...one.must];
        const worth = (places: readonly number[]) =>
          places.reduce((sum, index) => sum + Math.max(0, one.candidates[index]!.value), 0);
        const cost = (places: readonly number[]) =>
          places.reduce((sum, index) => sum + minutesOf(one.candidates[index]!.hours), 0);
        const kept = must.filter((index) => !found.release.includes(index));
        expect(cost(kept)).toBeLessThanOrEqual(roomOf(one.budget));
        for (let bits = 0; bits < 2 ** must.length; bits++) {
          const places = must.filter((_, place) => (bits >> place) & 1);
          if (cost(places) <= roomOf(one.budget)) expect(worth(places)).toBeLessThanOrEqual(worth(kept) + 1e-9);
        }
      }),
      { numRuns: 150 },
    );
  });
});

describe("values as whole numbers", () => {
  test("by their decimals", () => {
    expect(wholeValues([0.1, 0.2, 0.3])).toEqual([1, 2, 3]);
    expect(wholeValues([5, 0, -3])).toEqual([5, 0, -3]);
    expect(wholeValues([1e-9, 2])).toEqual([1, 2e9]);
  });

  test("in small steps of their sum where they have many", () => {
    const thirds = wholeValues([1 / 3, 2 / 3]);
    expect(thirds[1]! / thirds[0]!).toBeCloseTo(2, 12);
    expect(thirds.every(Number.isInteger)).toBe(true);
  });

  test("of nothing", () => {
    expect(wholeValues([0, 0])).toEqual([0, 0]);
    expect(wholeValues([])).toEqual([]);
  });
});

test("hours add up in the order of value", () => {
  const candidates: Candidate[] = [
    { name: "A", hours: 2, value: 1 },
    { name: "B", hours: 3, value: 5 },
    { name: "C", hours: 4, value: 5 },
  ];
  expect(cumulativeHours(candidates).map(({ name, total }) => [name, total])).toEqual([
    ["B", 3],
    ["C", 7],
    ["A", 9],
  ]);
});
