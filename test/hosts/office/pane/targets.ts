import type { Cell } from "../../../../src/call/cell.js";

/** An invented survey: no star or planet of this table exists. */
export const targets: readonly (readonly Cell[])[] = [
  [
    "Target",
    "Period [d]",
    "Star mass [solMass]",
    "Star mass sigma [solMass]",
    "Planet mass [jupiterMass]",
    "Planet mass sigma [jupiterMass]",
    "Eccentricity",
  ],
  ["Lantern 1 b", 3.0821, 0.94, 0.03, 0.71, 0.04, 0.012],
  ["Lantern 1 c", 41.7, 0.94, 0.03, 0.052, 0.009, 0.11],
  ["Lantern 2 b", 412.6, 1.21, 0.05, 2.4, 0.2, 0.31],
  ["Quarry 1 b", 11.187, 0.122, 0.005, 0.0034, 0.0006, 0.02],
  ["Quarry 2 b", 365.25, 1, 0.01, 0.00315, 0.00001, 0.017],
];

/** The same with faults that people make. */
export const faulty: readonly (readonly Cell[])[] = [
  ["Target", "Period", "Star mass [solMass]", "Planet mass [jupiterMass]", "K [m/s]", "Radius [Mjupp]"],
  ["Lantern 1 b", 3.0821, 0.94, 226, 95, 1.1],
  ["Lantern 1 c", 41.7, 0, 300, "n/a", 0.4],
  ["Lantern 2 b", 412.6, 1.21, 763, 70.2, 1.2],
];
