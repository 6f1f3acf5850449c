import { findCellFunction } from "../../src/call/cellFunctions.js";
import { type Block, blockOf, type Column } from "../../src/call/column.js";
import { eccentricAnomalies } from "../../src/kernel/orbit/eccentricAnomaly.js";
import { randomNumbers, report, shortest } from "./timing.js";

const random = randomNumbers(5);

function column(rows: number, least: number, most: number): Column {
  const numbers = Float64Array.from({ length: rows }, () => least + (most - least) * random());
  return { length: rows, numbers, others: undefined };
}

const ms = (time: number) => `${time.toFixed(1)} ms`;

/** Kepler's equation, the velocity curve and barycentric corrections against as many of the engine's own sines. */
export function benchTime(): void {
  const rows = 1_000_000;
  const angles = column(rows, -Math.PI, Math.PI).numbers;
  const out = new Float64Array(rows);
  const sines = shortest(() => {
    for (let row = 0; row < rows; row++) out[row] = Math.sin(angles[row]!);
    return out;
  });
  const eccentricity = column(rows, 0, 0.95);
  const kepler = shortest(() => {
    eccentricAnomalies(rows, out, angles, eccentricity.numbers);
    return out;
  });
  report("Kepler's equation, 1,000,000 rows", ms(kepler), `${ms(sines)} of Math.sin`, kepler / sines, "aim 60 ms");

  const calls = [
    {
      name: "RVAT",
      rows,
      aim: "aim 250 ms",
      columns: [
        column(rows, 8000, 9000),
        column(rows, 1, 1000),
        column(rows, 1, 100),
        column(rows, 7000, 8000),
        eccentricity,
        column(rows, 1, 360),
      ],
      headers: ["BJD_TDB-2450000", "d", "m/s", "BJD_TDB-2450000", "e", "deg"],
    },
    {
      name: "RVAT",
      rows,
      aim: "aim 250 ms",
      columns: [column(rows, 8000, 9000), ...[365.25, 28.4, 7500.5, 0.3, 58].map((value) => column(1, value, value))],
      headers: ["BJD_TDB-2450000", "d", "m/s", "BJD_TDB-2450000", "e", "deg"],
    },
    {
      name: "BARYSPEED",
      rows: 100_000,
      aim: "aim 1000 ms",
      columns: [
        column(100_000, 50000, 60000),
        column(100_000, 0, 360),
        column(100_000, -90, 90),
        column(100_000, -180, 180),
        column(100_000, -90, 90),
        column(100_000, 0, 4000),
      ],
      headers: ["MJD_UTC", "deg", "deg", "deg", "deg", "m"],
    },
  ];
  for (const { name, rows, columns, headers, aim } of calls) {
    const called = findCellFunction(`BARY.${name}`)!;
    const argument = (block: Block) => ({ block });
    const left = new Array(called.mostArguments - 2 - columns.length).fill(undefined);
    const given = columns.map((data) => argument({ rows: data.length, columns: [data] }));
    const time = shortest(() => called.once([...given, ...left, argument(blockOf([headers]))]), 4, 2);
    const alike = columns.at(-1)!.length === 1 ? "of one orbit" : "all columns";
    const text = `${name}, ${rows.toLocaleString("en")} rows, ${alike}`;
    report(text, ms(time), `${ms(sines)} of Math.sin`, time / sines, aim);
  }
}
