export interface Stroke {
  readonly colour: string;
  readonly width: number;
  readonly dash?: readonly number[];
}

export interface Lettering {
  readonly colour: string;
  readonly size: number;
  readonly align: "start" | "middle" | "end";
  readonly turned?: boolean;
}

export type Shape = "circle" | "square" | "triangle" | "diamond" | "cross" | "plus";

export const shapes: readonly Shape[] = ["circle", "square", "triangle", "diamond", "cross", "plus"];

/** What figures are drawn on: the screen, or a file of paths and letters. Both give the same picture. */
export interface Surface {
  fill(x: number, y: number, width: number, height: number, colour: string): void;
  /** Joined points; pairs that are not finite break the line. */
  line(points: readonly number[] | Float64Array, stroke: Stroke): void;
  shape(shape: Shape, x: number, y: number, radius: number, colour: string, hollow?: boolean): void;
  text(text: string, x: number, y: number, lettering: Lettering): void;
  /** What follows stays within a rectangle, until `release`. */
  clip(x: number, y: number, width: number, height: number): void;
  release(): void;
}
