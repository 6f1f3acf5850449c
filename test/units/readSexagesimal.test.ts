import { expect, test } from "vitest";
import { readSexagesimal } from "../../src/units/readSexagesimal.js";

// h + m / 60 + s / 3600 by hand. How catalogues write angles: common practice, no source.
test.each<[string, "hours" | "degrees", number, string]>([
  ["13:08:00", "hours", 13 + 8 / 60, "hourangle"],
  ["13:08:00", "degrees", 13 + 8 / 60, "deg"],
  ["13 08 36", "hours", 13.143333333333333, "hourangle"],
  ["13h08m36s", "degrees", 13.143333333333333, "hourangle"],
  ["13h 08m 36.00s", "hours", 13.143333333333333, "hourangle"],
  ["13h08m", "hours", 13 + 8 / 60, "hourangle"],
  ["13:08.5", "hours", 13 + 8.5 / 60, "hourangle"],
  ["-30:15:00", "degrees", -30.25, "deg"],
  ["\u221230:15:00", "degrees", -30.25, "deg"],
  ["-00:30:00", "degrees", -0.5, "deg"],
  ["+05 30 00", "degrees", 5.5, "deg"],
  ["-30d15m00s", "hours", -30.25, "deg"],
  ["-30\u00b015'00\"", "degrees", -30.25, "deg"],
  ["197\u00b0 30\u2032 36\u2033", "hours", 197.51, "deg"],
  [" 23:59:59.9964 ", "hours", 23.999999, "hourangle"],
])("%s, usually in %s", (text, usual, value, unit) => {
  const reading = readSexagesimal(text, usual)!;
  expect(reading.value).toBeCloseTo(value, 12);
  expect(reading.unit.text).toBe(unit);
});

test.each([
  "13",
  "13.5",
  "13:60:00",
  "13:08:60",
  "13:08:-1",
  "1308:00",
  "13 08",
  "13:08:00 PM",
  "13.5:08:00",
  "13:08.5:00",
  "",
])("%s is no angle in sixtieths", (text) => {
  expect(readSexagesimal(text, "hours")).toBeUndefined();
});
