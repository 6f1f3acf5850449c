/** What is asked of a plan, as it was typed. */
export interface PlanWords {
  /** Telescope time there is. */
  readonly hours: string;
  /** Evenings of the first and of the last night: `2027-02-01`. */
  readonly from: string;
  readonly to: string;
  /** Each a quantity, `-70.4 deg`, or the header of a column. */
  readonly longitude: string;
  readonly latitude: string;
  readonly height: string;
  /** Header of the column of what a target is worth. */
  readonly value: string;
  /** Headers of columns that are not recognised by themselves, by quantity. */
  readonly columns: Readonly<Record<string, string>>;
  /** Names of targets that have to be in, and of those that must not. */
  readonly must: readonly string[];
  readonly excluded: readonly string[];
  readonly airmass: string;
  readonly sun: string;
  readonly moon: string;
  readonly phases: string;
  readonly width: string;
  readonly perNight: string;
  readonly gap: string;
  readonly efficiency: string;
}

export type PlanWord = keyof PlanWords;

/** What a sheet offers to a plan. */
export interface PlanStart {
  /** What a plan reads, and the header that was understood to be it. */
  readonly columns: readonly PlanColumn[];
  readonly headers: readonly string[];
  /** Headers of the columns that hold numbers. */
  readonly values: readonly string[];
  /** The one whose header says what a target is worth. */
  readonly value: string | undefined;
  readonly site: PlanSite | undefined;
}

export interface PlanColumn {
  readonly quantity: string;
  readonly header: string | undefined;
  readonly isNeeded: "always" | "for phases" | "no";
}

export interface PlanSite {
  readonly longitude: string;
  readonly latitude: string;
  /** Empty where it is not stated. */
  readonly height: string;
  /** Where it stands: "the sheet Assumptions", "columns of this sheet". */
  readonly foundIn: string;
}

export interface PlanProblem {
  /** Undefined where it is about the table as a whole. */
  readonly word: PlanWord | undefined;
  readonly message: string;
}

export type PlanAnswer =
  | { readonly is: "plan"; readonly plan: PlanReport }
  | { readonly is: "problems"; readonly problems: readonly PlanProblem[] }
  /** The targets that have to be in need more hours than there are; the sentence says what to relax. */
  | { readonly is: "infeasible"; readonly message: string }
  | { readonly is: "cancelled" };

/** Rows are rows of the sheet. */
export interface PlanReport {
  readonly sheet: number;
  /** The version of the book that was planned. */
  readonly version: number;
  /** What was chosen, what was laid, what was taken for granted. */
  readonly sentences: readonly string[];
  readonly totals: {
    readonly value: number;
    readonly hours: number;
    readonly budget: number;
    readonly visits: number;
    readonly nights: number;
    readonly darkHours: number;
  };
  readonly chosen: readonly {
    readonly row: number;
    readonly name: string;
    readonly value: number;
    readonly hours: number;
    readonly visits: number;
    /** Why it has fewer visits than it needs. */
    readonly lacks: string | undefined;
  }[];
  readonly leftOut: readonly { readonly row: number; readonly name: string; readonly because: string }[];
}

interface Missing {
  readonly is: "missing";
  readonly message: string;
}

/** Hours that the most valuable target, the two most valuable and so on need together. */
export type PlanHours =
  | {
      readonly is: "hours";
      readonly value: string;
      readonly rows: Int32Array;
      readonly values: Float64Array;
      readonly totals: Float64Array;
      readonly budget: number;
      readonly leftOut: number;
    }
  | Missing;

/** Hours in the dark within the airmass limit, night by night; times in days from J2000.0. */
export type PlanVisibility =
  | {
      readonly is: "visibility";
      readonly airmass: number;
      readonly nights: Float64Array;
      readonly targets: readonly { readonly name: string; readonly row: number; readonly hours: Float64Array }[];
      readonly problems: readonly string[];
    }
  | Missing;

/** Altitudes through one night [deg]; times in days from J2000.0, UTC. */
export type PlanNight =
  | {
      readonly is: "night";
      readonly date: string;
      readonly airmass: number;
      /** Altitude of the airmass limit. */
      readonly lowest: number;
      readonly times: Float64Array;
      readonly dark: readonly (readonly [number, number])[];
      readonly targets: readonly { readonly name: string; readonly row: number; readonly altitudes: Float64Array }[];
      readonly moon: Float64Array;
      readonly problems: readonly string[];
    }
  | Missing;
