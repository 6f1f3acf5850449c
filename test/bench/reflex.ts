import { findCellFunction } from "../../src/call/cellFunctions.js";
import { type Block, blockOf, type Column } from "../../src/call/column.js";
import { randomNumbers, report, shortest } from "./timing.js";

const rows = 1_000_000;
const random = randomNumbers(1);

function column(least: number, most: number): Column {
  const numbers = Float64Array.from({ length: rows }, () => least + (most - least) * random());
  return { length: rows, numbers, others: undefined };
}

/** One call over a million rows with headers and units against the bare closed form in a loop by hand. */
export function benchReflex(): void {
  const period = column(1, 1000);
  const starMass = column(0.1, 2);
  const planetMass = column(0.01, 5);
  const eccentricity = column(0, 0.9);
  const inclination = column(30, 90);
  const columns = [period, starMass, planetMass, eccentricity, inclination];
  const headers = blockOf([
    ["Period [d]", "Star mass [solMass]", "Planet mass [jupiterMass]", "e", "Inclination [deg]"],
  ]);
  const argument = (block: Block) => ({ block });
  const reflex = findCellFunction("BARY.REFLEX")!;
  const call = () =>
    reflex.once([...columns.map((data) => argument({ rows, columns: [data] })), argument(headers), undefined]);
  const byHand = () =>
    bareClosedForm(period.numbers, starMass.numbers, planetMass.numbers, eccentricity.numbers, inclination.numbers);
  const sigmas = column(0.001, 0.1);
  const uncertain = () =>
    reflex.once([
      ...columns.map((data) => argument({ rows, columns: data === planetMass ? [data, sigmas] : [data] })),
      argument(headers),
      undefined,
    ]);

  const [a, b] = [byHand(), call().columns[0]!.numbers];
  const worst = a.reduce((most, value, row) => Math.max(most, Math.abs(value / b[row]! - 1)), 0);
  const hand = shortest(byHand);
  const ours = shortest(call);
  const ms = (time: number) => `${time.toFixed(1)} ms`;
  report("REFLEX, 1,000,000 rows, headers and units", ms(ours), `${ms(hand)} by hand`, ours / hand, "aim <= 1.5");
  report(
    "REFLEX with the sigma of one input",
    ms(shortest(uncertain, 3, 1)),
    `${ms(hand)} by hand`,
    shortest(uncertain, 3, 0) / hand,
    "",
  );
  process.stdout.write(`largest relative difference of the two: ${worst.toExponential(1)}\n`);
}

function bareClosedForm(
  period: Float64Array,
  starMass: Float64Array,
  planetMass: Float64Array,
  eccentricity: Float64Array,
  inclination: Float64Array,
): Float64Array {
  const out = new Float64Array(period.length);
  for (let row = 0; row < out.length; row++) {
    const planet = planetMass[row]! * 1.2668653e17;
    const total = starMass[row]! * 1.3271244e20 + planet;
    const e = eccentricity[row]!;
    const circular = Math.cbrt((2 * Math.PI) / (period[row]! * 86400)) / Math.cbrt(total) ** 2;
    out[row] = (planet * circular * Math.sin((inclination[row]! * Math.PI) / 180)) / Math.sqrt((1 - e) * (1 + e));
  }
  return out;
}
