import { CellError } from "../../../call/cell.js";
import type { Operand } from "../../values/operand.js";
import { define } from "../define/define.js";
import { anything, matrix, number, omittable, rest } from "../define/parameters.js";
import { numbersOf } from "../gather/numbersOf.js";
import { pairsOf } from "../gather/pairsOf.js";
import type { Numbers } from "../numerics/sum.js";
import { sumOf } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** A series of payments: amounts, and when, in periods after the first. */
interface Flow {
  readonly amounts: Numbers;
  time(index: number): number;
}

const worth = ({ amounts, time }: Flow, rate: number) =>
  sumOf(amounts.length, (index) => (amounts[index] as number) * (1 + rate) ** -time(index));

/**
 * The rate at which payments are worth nothing: the root nearest to the guess, looked for on a grid of rates around it
 * and then by halving, so that a result is a root and never a step that did not settle.
 */
function rateOfReturn(name: string, miss: (rate: number) => number, guess: number): number | CellError {
  const grid = Array.from({ length: 400 }, (_, step) => 1.05 ** (step / 2) - 1);
  let [low, high] = [guess, guess];
  const start = miss(guess);
  for (const width of grid) {
    const [below, above] = [(1 + guess) / (1 + width) - 1, (1 + guess) * (1 + width) - 1];
    if (start * miss(above) <= 0) {
      [low, high] = [guess, above];
      break;
    }
    if (start * miss(below) <= 0) {
      [low, high] = [below, guess];
      break;
    }
  }
  return low === high && start !== 0 ? noRate(name) : halved(miss, low, high);
}

function halved(miss: (rate: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  const lowSign = Math.sign(miss(low));
  for (let step = 0; step < 200 && high - low > 0; step++) {
    const middle = low + (high - low) / 2;
    if (middle === low || middle === high) {
      break;
    }
    const at = Math.sign(miss(middle));
    if (at === 0) {
      return middle;
    }
    [low, high] = at === lowSign ? [middle, high] : [low, middle];
  }
  return Math.abs(miss(low)) <= Math.abs(miss(high)) ? low : high;
}

const noRate = (name: string) =>
  new CellError(
    "#NUM!",
    `${name}: no rate found`,
    `${name}: no rate near the guess makes the payments worth 0; payments of both signs or another guess are needed, for example 0.1`,
  );

const guess = omittable(number("guess"), 0.1);

const irr = define("IRR", [matrix("payments"), guess] as const, (payments, start) => {
  const amounts = numbersOf([payments], "IRR: payments");
  return amounts instanceof CellError
    ? amounts
    : rateOfReturn("IRR", (rate) => worth({ amounts, time: (index) => index }, rate), start);
});

const dated = (amounts: Numbers, dates: Numbers): Flow => ({
  amounts,
  time: (index) => (Math.floor(dates[index] as number) - Math.floor(dates[0] as number)) / 365,
});

const xirr = define("XIRR", [matrix("payments"), matrix("dates"), guess] as const, (payments, dates, start) => {
  const pairs = pairsOf(payments, dates, "XIRR");
  return pairs instanceof CellError
    ? pairs
    : rateOfReturn("XIRR", (rate) => worth(dated(pairs.left, pairs.right), rate), start);
});

const xnpv = define("XNPV", [number("rate"), matrix("payments"), matrix("dates")] as const, (rate, payments, dates) => {
  const pairs = pairsOf(payments, dates, "XNPV");
  return pairs instanceof CellError ? pairs : worth(dated(pairs.left, pairs.right), rate);
});

const amountsOf = (name: string, given: readonly { operand: Operand }[]) =>
  numbersOf(
    given.map((each) => each.operand),
    `${name}: payment`,
  );

const npv = define("NPV", [number("rate"), rest(anything("payment"))] as const, (rate, given) => {
  const amounts = amountsOf("NPV", given);
  return amounts instanceof CellError ? amounts : worth({ amounts, time: (index) => index + 1 }, rate);
});

const mirr = define(
  "MIRR",
  [matrix("payments"), number("finance rate"), number("reinvestment rate")] as const,
  (payments, finance, reinvest) => {
    const amounts = numbersOf([payments], "MIRR: payments");
    if (amounts instanceof CellError) {
      return amounts;
    }
    const part = (sign: 1 | -1, rate: number) =>
      worth({ amounts: amounts.map((each) => (each * sign > 0 ? each : 0)), time: (index) => index }, rate);
    const [out, back] = [part(-1, finance), part(1, reinvest)];
    const last = amounts.length - 1;
    return out === 0 || back === 0
      ? new CellError(
          "#DIV/0!",
          "MIRR: payments of one sign",
          "MIRR: all payments are of one sign; payments of both signs are needed",
        )
      : ((back * (1 + reinvest) ** last) / -out) ** (1 / last) - 1;
  },
);

const rate = define(
  "RATE",
  [
    number("periods"),
    number("payment"),
    number("present value"),
    omittable(number("future value"), 0),
    omittable(number("type"), 0),
    guess,
  ] as const,
  (periods, payment, present, future, type, start) =>
    rateOfReturn("RATE", (each) => balance(each, periods, payment, present, future, type), start),
);

/** What is left of a loan after all periods; at rate 0 payments simply add up. */
function balance(
  rate: number,
  periods: number,
  payment: number,
  present: number,
  future: number,
  type: number,
): number {
  const growth = (1 + rate) ** periods;
  const annuity = Math.abs(rate) < 1e-12 ? periods : Math.expm1(periods * Math.log1p(rate)) / rate;
  return present * growth + payment * (1 + rate * (type === 0 ? 0 : 1)) * annuity + future;
}

const schedule = define("FVSCHEDULE", [number("principal"), matrix("rates")] as const, (principal, rates) => {
  const found = numbersOf([rates], "FVSCHEDULE: rates");
  return found instanceof CellError ? found : found.reduce((total, each) => total * (1 + each), principal);
});

/** Sections 6.12.21, 6.12.24, 6.12.27, 6.12.30, 6.12.42, 6.12.51 and 6.12.52. */
export const cashFlows: readonly WorksheetFunction[] = [irr, xirr, npv, xnpv, mirr, rate, schedule];
