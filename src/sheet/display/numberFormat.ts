/** How many digits of an uncertainty are shown: a number of significant digits, or the rule of the Particle Data Group. */
export type UncertaintyDigits = 1 | 2 | 3 | 4 | "PDG";

/** How a number is shown. What a cell holds is never changed by it. */
export type NumberFormat =
  /** The shortest text that reads back as the same double. */
  | { readonly kind: "general" }
  /** A number of digits behind the point; `grouped` sets commas between thousands. */
  | { readonly kind: "fixed"; readonly decimals: number; readonly grouped: boolean }
  | { readonly kind: "significant"; readonly digits: number }
  /** One digit before the point, `digits` in all, and a power of ten. */
  | { readonly kind: "scientific"; readonly digits: number }
  | { readonly kind: "percent"; readonly decimals: number }
  /** A serial of the 1900 date system in the forms of ISO 8601; `decimals` of a second. */
  | { readonly kind: "date" }
  | { readonly kind: "time"; readonly decimals: number }
  | { readonly kind: "date-time"; readonly decimals: number }
  /** A value with its standard uncertainty: 0.4716 ± 0.0155, or 0.4716(155). */
  | { readonly kind: "plus-minus"; readonly digits: UncertaintyDigits }
  | { readonly kind: "brackets"; readonly digits: UncertaintyDigits };

export type MeasuredFormat = Extract<NumberFormat, { kind: "plus-minus" | "brackets" }>;

export const general: NumberFormat = { kind: "general" };
