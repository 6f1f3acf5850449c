import type { Axis } from "./axis.js";
import type { Shape } from "./surface.js";

/** A picture of numbers: two axes, and layers from the back to the front. */
export interface Figure {
  /** Told to those who do not see it. */
  readonly description: string;
  readonly x: Axis;
  readonly y: Axis;
  readonly layers: readonly Layer[];
  readonly legend: readonly LegendEntry[];
  /** Rows of the sheet behind the points, where a brush can select them. */
  readonly brush: PointLayer | undefined;
}

export type Layer = PointLayer | LineLayer | LevelLayer | ArrowLayer | BandLayer;

export interface PointLayer {
  readonly draw: "points";
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly xError?: readonly [Float64Array, Float64Array] | undefined;
  readonly yError?: readonly [Float64Array, Float64Array] | undefined;
  /** The sheet's row of each point. */
  readonly rows: Int32Array;
  /** For each point the index of its paint; 0 where there is only one. */
  readonly paint: Uint8Array | undefined;
  readonly paints: readonly Paint[];
}

export interface LineLayer {
  readonly draw: "line";
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly colour: ColourName;
  readonly dash?: readonly number[];
}

/** A value across the whole figure. */
export interface LevelLayer {
  readonly draw: "level";
  readonly along: "x" | "y";
  readonly value: number;
  readonly text: string;
}

export interface ArrowLayer {
  readonly draw: "arrows";
  readonly from: { readonly x: Float64Array; readonly y: Float64Array };
  readonly to: { readonly x: Float64Array; readonly y: Float64Array };
  readonly rows: Int32Array;
}

/** Stretches along x that are set apart: the dark hours of a night. */
export interface BandLayer {
  readonly draw: "bands";
  readonly stretches: readonly (readonly [number, number])[];
}

export interface Paint {
  readonly colour: ColourName;
  readonly shape: Shape;
}

export interface LegendEntry {
  readonly text: string;
  readonly paint: Paint;
  /** Of a line, which has no shape. */
  readonly dash?: readonly number[];
}

/** Names of the theme, or a step between the quiet and the accent colour. */
export type ColourName = "ink" | "soft" | "accent" | "fault" | `ref-${0 | 1 | 2 | 3 | 4 | 5}` | `ramp-${number}`;
