import { expect, test } from "vitest";
import { entryOf } from "../../../src/sheet/edit/entryOf.js";
import type { Entry } from "../../../src/sheet/edit/setCells.js";

const cases: readonly (readonly [string, Entry])[] = [
  ["", null],
  ["4.23", 4.23],
  ["-1.5E+3", -1500],
  ["12%", 0.12],
  ["true", true],
  ["=B2*2", { formula: "=B2*2" }],
  ["=", "="],
  ["'007", "007"],
  ["'=B2", "=B2"],
  ["HD 209458", "HD 209458"],
  ["4.23 d", "4.23 d"],
];

test.each(cases)("typing %s", (text, entry) => {
  expect(entryOf(text)).toEqual(entry);
});
