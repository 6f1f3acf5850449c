import type { NumberDefinition } from "../functions/definition.js";
import type { Unit } from "../units/unit.js";
import type { BlockReader, Report } from "./blockReader.js";

/** What the inputs of a row must be together: instants in one frame, and all there that others need. */
export function checkTogether(
  definition: NumberDefinition,
  readers: readonly BlockReader[],
  unit: Unit,
  rows: number,
  report: Report,
): void {
  checkFrames(definition, readers, unit, rows, report);
  definition.inputs.forEach((input, index) => {
    const { assumed } = readers[index]!;
    if (input.takes !== "quantity" || !input.needed || !assumed) return;
    for (const by of input.needed.by) {
      const others = readers[definition.inputs.findIndex(({ name }) => name === by)]!.base;
      for (let row = 0; row < rows; row++) {
        if (assumed[row] === 0 || others[row] === 0 || Number.isNaN(others[row])) continue;
        report.value(row, { about: "needed", input: input.name, by, because: input.needed.because });
      }
    }
  });
}

function checkFrames(
  definition: NumberDefinition,
  readers: readonly BlockReader[],
  unit: Unit,
  rows: number,
  report: Report,
): void {
  const instants = readers.flatMap(({ frames }, index) => (frames ? [{ frames, ...definition.inputs[index]! }] : []));
  const { as } = definition.result;
  const last = instants.find(({ name }) => name === as) ?? instants.at(-1);
  if (!last) return;
  for (const { name, frames } of instants) {
    if (frames === last.frames) continue;
    for (let row = 0; row < rows; row++) {
      const frame = frames[row];
      const otherFrame = last.frames[row];
      if (frame === otherFrame || frame === undefined || otherFrame === undefined) continue;
      report.value(row, { about: "two frames", input: name, frame, other: last.name, otherFrame });
    }
  }
  for (let row = 0; as !== undefined && row < rows; row++) {
    const frame = last.frames[row];
    if (frame === undefined || frame === unit.frame) continue;
    report.value(row, { about: "two frames", input: as, frame, other: "the result", otherFrame: unit.frame ?? "" });
  }
}
