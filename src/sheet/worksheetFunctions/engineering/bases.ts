import type { Cell, CellError } from "../../../call/cell.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { number, optional, text, whole } from "../define/parameters.js";
import { fromLibrary } from "../library/fromLibrary.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

interface Base {
  readonly name: "BIN" | "OCT" | "HEX";
  readonly radix: 2 | 8 | 16;
  readonly example: string;
}

const bases: readonly Base[] = [
  { name: "BIN", radix: 2, example: "1010" },
  { name: "OCT", radix: 8, example: "17" },
  { name: "HEX", radix: 16, example: "FF" },
];

const mostDigits = 10;
const noPlaces = optional(whole("places"), 0);

/** A text of ten digits whose first is in the upper half stands for a number below 0 (two's complement). */
function read(name: string, digits: string, { radix, example }: Base): number | CellError {
  const value = Number.parseInt(digits, radix);
  if (digits.length > mostDigits || (digits !== "" && Number.isNaN(value)) || !hasOnlyDigits(digits, radix)) {
    return outside(
      `${name}: digits`,
      digits,
      `no number of up to ${mostDigits} digits in base ${radix}`,
      `such a number is needed, for example "${example}"`,
    );
  }
  const span = radix ** mostDigits;
  return digits === "" ? 0 : value >= span / 2 ? value - span : value;
}

function hasOnlyDigits(digits: string, radix: number): boolean {
  return [...digits].every((digit) => !Number.isNaN(Number.parseInt(digit, radix)));
}

function write(name: string, value: number, { radix }: Base, places: number): Cell {
  const span = radix ** mostDigits;
  if (value < -span / 2 || value >= span / 2) {
    return outside(
      `${name}: number`,
      value,
      `outside ${-span / 2} to ${span / 2 - 1}`,
      "a number within is needed, for example 9",
    );
  }
  const digits = (value < 0 ? value + span : value).toString(radix).toUpperCase();
  if (places < 0 || places > mostDigits || (value >= 0 && places > 0 && digits.length > places)) {
    return outside(
      `${name}: places`,
      places,
      `too few or too many for ${digits}`,
      `a whole number from ${digits.length} to ${mostDigits} is needed`,
    );
  }
  return value < 0 ? digits : digits.padStart(places, "0");
}

function conversions(from: Base): WorksheetFunction[] {
  const toDecimal = `${from.name}2DEC`;
  const fromDecimal = `DEC2${from.name}`;
  return [
    define(toDecimal, [text("digits")] as const, (digits) => read(toDecimal, digits, from)),
    define(fromDecimal, [whole("number"), noPlaces] as const, (value, places) =>
      write(fromDecimal, value, from, places),
    ),
    ...bases
      .filter((to) => to !== from)
      .map((to) => {
        const name = `${from.name}2${to.name}`;
        return define(name, [text("digits"), noPlaces] as const, (digits, places) => {
          const value = read(name, digits, from);
          return typeof value === "number" ? write(name, value, to, places) : value;
        });
      }),
  ];
}

const wrongRadix = (name: string, radix: number) =>
  radix >= 2 && radix <= 36
    ? undefined
    : outside(`${name}: base`, radix, "outside 2 to 36", "a base from 2 to 36 is needed, for example 16");

const base = define(
  "BASE",
  [whole("number"), whole("base"), optional(whole("least length"), 0)] as const,
  (value, radix, length) => {
    const isExact = value >= 0 && value <= Number.MAX_SAFE_INTEGER;
    return (
      wrongRadix("BASE", radix) ??
      (isExact
        ? value.toString(radix).toUpperCase().padStart(Math.min(length, 255), "0")
        : outside(
            "BASE: number",
            value,
            "outside 0 to 9007199254740991",
            "a whole number within is needed, for example 255",
          ))
    );
  },
);

const decimal = define("DECIMAL", [text("digits"), whole("base")] as const, (digits, radix) => {
  const bare = digits.trim().replace(radix === 16 ? /^0?x|h$/i : /^$/, "");
  return (
    wrongRadix("DECIMAL", radix) ??
    (hasOnlyDigits(bare, radix)
      ? [...bare].reduce((value, digit) => value * radix + Number.parseInt(digit, radix), 0)
      : outside(
          "DECIMAL: digits",
          digits,
          `no number in base ${radix}`,
          'digits of that base are needed, for example "FF" in base 16',
        ))
  );
});

const roman = fromLibrary("ROMAN", [whole("number")] as const, (value) =>
  value < 0 || value > 3999
    ? outside(
        "ROMAN: number",
        value,
        "outside 0 to 3999",
        "a whole number within is needed, for example 2024",
        "#VALUE!",
      )
    : undefined,
);

/** The classic form alone; a second argument asks for shorter forms, which no two programs write alike. */
const romanWithForm = define("ROMAN", [number("number"), optional(whole("form"), 0)] as const, (value, form) =>
  form === 0 ? roman.call([value]) : outside("ROMAN: form", form, "not 0", "0, the classic form, is needed", "#VALUE!"),
);

const arabic = fromLibrary("ARABIC", [text("numeral")] as const);

/** Section 6.19. */
export const numberBases: readonly WorksheetFunction[] = [
  ...bases.flatMap(conversions),
  base,
  decimal,
  romanWithForm,
  {
    ...arabic,
    call: (given) => arabic.call(given.map((each) => (typeof each === "string" ? each.trim().toUpperCase() : each))),
  },
];
