import type { Cell } from "../../../call/cell.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { logical, number, optional, whole } from "../define/parameters.js";
import { normalBelow, normalDensity, normalQuantile } from "../numerics/normal.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { firstProblem, openChance, positive } from "./distribution.js";

const normal = (name: string) =>
  define(
    name,
    [
      number("x"),
      optional(number("mean"), 0),
      optional(number("standard deviation"), 1),
      optional(logical("cumulative"), true),
    ] as const,
    (x, mean, deviation, cumulative): Cell => {
      const z = (x - mean) / deviation;
      return (
        firstProblem(name, [positive("standard deviation", deviation)]) ??
        (cumulative ? normalBelow(z) : normalDensity(z) / deviation)
      );
    },
  );

const normalInverse = (name: string) =>
  define(
    name,
    [number("probability"), number("mean"), number("standard deviation")] as const,
    (p, mean, deviation): Cell =>
      firstProblem(name, [openChance(p), positive("standard deviation", deviation)]) ??
      mean + deviation * normalQuantile(p),
  );

const standardInverse = (name: string) =>
  define(name, [number("probability")] as const, (p): Cell => firstProblem(name, [openChance(p)]) ?? normalQuantile(p));

const standardBelow = (name: string) => define(name, [number("z")] as const, normalBelow);

const logNormal = (name: string) =>
  define(
    name,
    [
      number("x"),
      optional(number("mean of ln x"), 0),
      optional(number("standard deviation of ln x"), 1),
      optional(logical("cumulative"), true),
    ] as const,
    (x, mean, deviation, cumulative): Cell => {
      const z = (Math.log(x) - mean) / deviation;
      return (
        firstProblem(name, [positive("x", x), positive("standard deviation of ln x", deviation)]) ??
        (cumulative ? normalBelow(z) : normalDensity(z) / (deviation * x))
      );
    },
  );

const logNormalInverse = (name: string) =>
  define(
    name,
    [
      number("probability"),
      optional(number("mean of ln x"), 0),
      optional(number("standard deviation of ln x"), 1),
    ] as const,
    (p, mean, deviation): Cell =>
      firstProblem(name, [openChance(p), positive("standard deviation of ln x", deviation)]) ??
      Math.exp(mean + deviation * normalQuantile(p)),
  );

const confidence = (name: string) =>
  define(
    name,
    [number("alpha"), number("standard deviation"), whole("size")] as const,
    (alpha, deviation, size): Cell =>
      firstProblem(name, [
        openChance(alpha, "alpha"),
        positive("standard deviation", deviation),
        positive("size", size),
      ]) ?? (-normalQuantile(alpha / 2) * deviation) / Math.sqrt(size),
  );

/** Sections 6.18.16, 6.18.26, 6.18.27, 6.18.43, 6.18.44, 6.18.52 to 6.18.55, 6.18.71. */
export const normals: readonly WorksheetFunction[] = [
  normal("NORM.DIST"),
  normal("NORMDIST"),
  normalInverse("NORM.INV"),
  normalInverse("NORMINV"),
  define("NORM.S.DIST", [number("z"), optional(logical("cumulative"), true)] as const, (z, cumulative) =>
    cumulative ? normalBelow(z) : normalDensity(z),
  ),
  standardBelow("NORMSDIST"),
  standardBelow("LEGACY.NORMSDIST"),
  standardInverse("NORM.S.INV"),
  standardInverse("NORMSINV"),
  standardInverse("LEGACY.NORMSINV"),
  logNormal("LOGNORM.DIST"),
  logNormal("LOGNORMDIST"),
  logNormalInverse("LOGNORM.INV"),
  logNormalInverse("LOGINV"),
  confidence("CONFIDENCE"),
  confidence("CONFIDENCE.NORM"),
  define(
    "STANDARDIZE",
    [number("x"), number("mean"), number("standard deviation")] as const,
    (x, mean, deviation): Cell =>
      firstProblem("STANDARDIZE", [positive("standard deviation", deviation)]) ?? (x - mean) / deviation,
  ),
  define(
    "FISHER",
    [number("r")] as const,
    (r): Cell =>
      Math.abs(r) < 1
        ? Math.atanh(r)
        : outside("FISHER: r", r, "not between -1 and 1", "a number between -1 and 1 is needed, for example 0.5"),
  ),
  define("FISHERINV", [number("z")] as const, Math.tanh),
];
