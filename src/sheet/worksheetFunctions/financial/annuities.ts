import { outside } from "../define/outside.js";
import { number, omittable } from "../define/parameters.js";
import { fromLibrary, type LibraryName } from "../library/fromLibrary.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

const future = omittable(number("future value"), 0);
const type = omittable(number("type"), 0);

const rate = number("rate");
const periods = number("periods");
const period = number("period");
const payment = number("payment");
const present = number("present value");

/** The library adds period by period: so many are refused before they would take long. */
const mostPeriods = 100_000;

const tooMany = (name: string, input: string, value: number) =>
  value > mostPeriods
    ? outside(`${name}: ${input}`, value, `above ${mostPeriods}`, "a smaller number is needed, for example 12")
    : undefined;

const cumulative = (name: LibraryName) =>
  fromLibrary(
    name,
    [rate, periods, present, number("first period"), number("last period"), number("type")] as const,
    (_rate, _periods, _present, _first, last, _type) => tooMany(name, "last period", last),
  );

const declining = (name: LibraryName, last: readonly [string, number]) =>
  fromLibrary(
    name,
    [number("cost"), number("salvage"), number("life"), period, omittable(number(last[0]), last[1])] as const,
    (_cost, _salvage, _life, at, _last) => tooMany(name, "period", at),
  );

/** Payments at a constant rate and depreciations: section 6.12. */
export const annuities: readonly WorksheetFunction[] = [
  fromLibrary("PV", [rate, periods, payment, future, type] as const),
  fromLibrary("FV", [rate, periods, payment, omittable(present, 0), type] as const),
  fromLibrary("PMT", [rate, periods, present, future, type] as const),
  fromLibrary("NPER", [rate, payment, present, future, type] as const),
  fromLibrary("IPMT", [rate, period, periods, present, future, type] as const),
  fromLibrary("PPMT", [rate, period, periods, present, future, type] as const),
  fromLibrary("ISPMT", [rate, period, periods, present] as const),
  cumulative("CUMIPMT"),
  cumulative("CUMPRINC"),
  fromLibrary("EFFECT", [rate, periods] as const),
  fromLibrary("NOMINAL", [rate, periods] as const),
  fromLibrary("RRI", [periods, present, number("future value")] as const),
  fromLibrary("PDURATION", [rate, present, number("future value")] as const),
  fromLibrary("SLN", [number("cost"), number("salvage"), number("life")] as const),
  fromLibrary("SYD", [number("cost"), number("salvage"), number("life"), period] as const),
  declining("DB", ["months", 12]),
  declining("DDB", ["factor", 2]),
  fromLibrary("DOLLARDE", [number("price"), number("fraction")] as const),
  fromLibrary("DOLLARFR", [number("price"), number("fraction")] as const),
];
