import type { ColourName } from "./figure.js";

export interface Palette {
  readonly ground: string;
  readonly sunk: string;
  readonly line: string;
  readonly ink: string;
  readonly soft: string;
  readonly accent: string;
  colour(name: ColourName): string;
}

export const rampSteps = 16;

/** The colours of the theme that an element wears. */
export function paletteOf(element: Element): Palette {
  const style = getComputedStyle(element);
  const token = (name: string) => style.getPropertyValue(`--${name}`).trim();
  return paletteFrom(token);
}

export function paletteFrom(token: (name: string) => string): Palette {
  const ramp = Array.from({ length: rampSteps }, (_, step) =>
    mixed(token("ref-4"), token("ref-5"), step / (rampSteps - 1)),
  );
  return {
    ground: token("raised"),
    sunk: token("sunk"),
    line: token("line"),
    ink: token("ink"),
    soft: token("soft"),
    accent: token("accent"),
    colour: (name) => (name.startsWith("ramp-") ? (ramp[Number(name.slice(5))] ?? token("ink")) : token(name)),
  };
}

function mixed(from: string, to: string, part: number): string {
  const [a, b] = [channels(from), channels(to)];
  const mix = a.map((value, index) => Math.round(value + ((b[index] as number) - value) * part));
  return `rgb(${mix.join(" ")})`;
}

function channels(colour: string): number[] {
  const hex = /^#([0-9a-f]{6})$/i.exec(colour)?.[1] ?? "808080";
  return [0, 2, 4].map((at) => Number.parseInt(hex.slice(at, at + 2), 16));
}
