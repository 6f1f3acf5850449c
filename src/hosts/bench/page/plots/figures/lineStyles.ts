import type { LegendEntry, LineLayer } from "../draw/figure.js";

/** As many lines as are told apart by colour and by dashes. */
export const mostLines = 6;
const dashes: readonly (readonly number[])[] = [[], [7, 3], [2, 3], [9, 3, 2, 3], [14, 4], [4, 5]];

export interface NamedLine {
  readonly name: string;
  readonly x: Float64Array;
  readonly y: Float64Array;
}

/** Lines with their names, each of its own colour and dashes. */
export function namedLines(lines: readonly NamedLine[]): { layers: LineLayer[]; legend: LegendEntry[] } {
  const styles = together(lines)
    .slice(0, mostLines)
    .map((line, index) => ({
      line,
      colour: `ref-${index as 0 | 1 | 2 | 3 | 4 | 5}` as const,
      dash: dashes[index] ?? [],
    }));
  return {
    layers: styles.map(({ line: { x, y }, colour, dash }) => ({ draw: "line", x, y, colour, dash })),
    legend: styles.map(({ line: { name }, colour, dash }) => ({
      text: name,
      paint: { colour, shape: "circle" },
      dash,
    })),
  };
}

/** Planets of one star make one line. */
function together(lines: readonly NamedLine[]): readonly NamedLine[] {
  const different: NamedLine[] = [];
  for (const line of lines) {
    const same = different.findIndex(({ y }) => y.every((value, index) => value === line.y[index]));
    const known = different[same];
    if (known) different[same] = { ...known, name: `${known.name}, ${line.name}` };
    else different.push(line);
  }
  return different;
}
