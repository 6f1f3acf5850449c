import { spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";
import { expect, test } from "vitest";
import { altitude } from "../../src/kernel/night/altitude.js";
import { moonDistance } from "../../src/kernel/night/moonDistance.js";
import { moonLit } from "../../src/kernel/night/moonLit.js";
import { howToInstall, provideAstropy } from "./provideAstropy.js";

const python = provideAstropy();
if (!python) process.stderr.write(`test/astropy/night is skipped: it ${howToInstall}\n`);
const deg = Math.PI / 180;

/** Semesters ahead, which the committed tables do not reach. */
const asked = Array.from({ length: 24 }, (_, index) => {
  const utc = 2461400.5 + 61.3 * index + 0.037 * index * index;
  const [ra, dec] = [(index * 137.5) % 360, ((index * 41) % 160) - 80];
  return [utc, ra, dec, (index * 97) % 360, ((index * 53) % 150) - 75] as const;
});

test.skipIf(!python)("nights from 2027 to 2031 are those of a general library", () => {
  const script = fileURLToPath(new URL("night.py", import.meta.url));
  const { stdout, stderr, status } = spawnSync(python!, [script], {
    input: asked.map((row) => row.join(" ")).join("\n"),
    encoding: "utf8",
  });
  expect({ status, stderr }).toEqual({ status: 0, stderr: "" });
  const rows = stdout.trim().split("\n");
  expect(rows).toHaveLength(asked.length);
  rows.forEach((line, index) => {
    const [height, distance, lit] = line.split(" ").map(Number) as [number, number, number];
    const [utc, ...angles] = asked[index]!;
    const place = angles.map((angle) => angle * deg) as [number, number, number, number];
    // UT1 - UTC is not known ahead: 0.004 deg.
    expect(Math.abs(altitude(utc - 2451545, ...place) / deg - height)).toBeLessThan(0.012);
    expect(Math.abs(moonDistance(utc - 2451545, ...place) / deg - distance)).toBeLessThan(0.1);
    expect(Math.abs(moonLit(utc - 2451545) - lit)).toBeLessThan(0.003);
  });
});
