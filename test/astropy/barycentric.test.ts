import { execFileSync } from "node:child_process";
import { fileURLToPath } from "node:url";
import { expect, test } from "vitest";
import { randomNumbers } from "../bench/timing.js";
import { numberFrom } from "../call/door.js";
import { howToInstall, provideAstropy } from "./provideAstropy.js";

const python = provideAstropy();
if (!python) process.stderr.write(`test/astropy is skipped: it ${howToInstall}\n`);

const random = randomNumbers(26);
const between = (least: number, most: number) => least + (most - least) * random();

/** Any time from 1973 to 2035, any star, any site; every other star has a proper motion and a parallax. */
const rows = Array.from({ length: 200 }, (_, row) => {
  const moves = row % 2 === 1;
  return [
    between(-9800, 13000),
    between(0, 360),
    (Math.asin(between(-1, 1)) * 180) / Math.PI,
    between(-180, 180),
    between(-89, 89),
    between(0, 5000),
    moves ? between(-3000, 3000) : 0,
    moves ? between(-3000, 3000) : 0,
    moves ? between(5, 600) : 0,
    moves ? between(1991, 2016) : 2000,
  ] as const;
});

test.skipIf(!python)("200 sites, stars and dates: 1 cm/s and 1e-4 s", () => {
  const script = fileURLToPath(new URL("barycentric.py", import.meta.url));
  const answer = execFileSync(python!, [script], { input: JSON.stringify(rows), maxBuffer: 1 << 24 });
  const expected = JSON.parse(answer.toString()) as [number, number][];
  expect(expected.length).toBe(rows.length);
  rows.forEach(([utc, ra, dec, longitude, latitude, height, east, north, parallax, epoch], row) => {
    const headers = "JD_UTC-2451545; deg; deg; deg; deg; m";
    const place = [utc, ra, dec, longitude, latitude, height] as const;
    const own = `${headers}; mas/yr; mas/yr; mas; yr`;
    const speed = numberFrom("BARYSPEED", ...place, east, north, parallax, epoch, own);
    const time = numberFrom("BARYTIME", ...place, headers, "BJD_TDB-2451545");
    const [expectedSpeed, expectedDelay] = expected[row]!;
    expect(Math.abs(speed - expectedSpeed), JSON.stringify(rows[row])).toBeLessThanOrEqual(0.01);
    expect(Math.abs((time - utc) * 86400 - expectedDelay), JSON.stringify(rows[row])).toBeLessThanOrEqual(1e-4);
  });
});
