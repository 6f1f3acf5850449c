import type { Bound } from "../functions/quantity.js";
import type { Kind } from "../units/kind.js";
import type { UnitProblem } from "../units/problem.js";
import type { Unit } from "../units/unit.js";

/** A header cell as it stands in the worksheet. */
export interface HeaderCell {
  readonly text: string;
  readonly address: string | undefined;
  /** A number where a header belongs: the header row was not kept in place when the formula was filled down. */
  readonly isNumber: boolean;
}

/** Where a unit was written. */
export type UnitPlace =
  | { readonly place: "header"; readonly header: HeaderCell }
  | { readonly place: "text"; readonly text: string };

/**
 * Why a call has no answer, as facts. `input` is the name of an input as the definition gives it, or
 * "uncertainty of ..." for a column beside it. Sentences are made in explain.ts and nowhere else.
 */
export type CallProblem =
  | { readonly about: "too many arguments"; readonly given: number; readonly most: number }
  | { readonly about: "missing"; readonly input: string }
  | { readonly about: "blank"; readonly input: string }
  | {
      readonly about: "no unit";
      readonly input: string;
      readonly value: string;
      readonly header: HeaderCell | undefined;
    }
  | { readonly about: "unit"; readonly input: string; readonly at: UnitPlace; readonly unit: UnitProblem }
  | {
      readonly about: "wrong kind";
      readonly input: string;
      readonly value: string;
      readonly unit: Unit;
      readonly wanted: Kind;
      readonly at: UnitPlace;
    }
  | {
      readonly about: "disagreement";
      readonly input: string;
      readonly text: string;
      readonly unit: Unit;
      readonly header: HeaderCell;
      readonly headerUnit: Unit;
    }
  | {
      readonly about: "not a number";
      readonly input: string;
      readonly value: string;
      readonly hint: string | undefined;
    }
  | {
      readonly about: "bound";
      readonly input: string;
      readonly value: string;
      readonly bound: Bound;
      readonly side: "lower" | "upper";
    }
  | { readonly about: "zero for blank"; readonly input: string; readonly unit: Unit }
  | { readonly about: "zero or blank"; readonly input: string; readonly bound: Bound }
  | {
      readonly about: "beyond numbers";
      readonly input: string;
      readonly value: string;
      /** The unit in which no number can hold the result, where it is not the value itself. */
      readonly asked?: Unit;
    }
  | { readonly about: "uncertainty beyond numbers"; readonly result: string }
  | {
      readonly about: "word";
      readonly input: string;
      readonly text: string;
      readonly words: readonly string[];
      readonly nearest: string | undefined;
    }
  | {
      readonly about: "lengths";
      readonly input: string;
      readonly rows: number;
      readonly other: string;
      readonly otherRows: number;
    }
  | { readonly about: "shape"; readonly input: string; readonly rows: number; readonly columns: number }
  | {
      readonly about: "header of another column";
      readonly input: string;
      readonly header: HeaderCell;
      readonly own: HeaderCell;
    }
  | { readonly about: "header count"; readonly given: number; readonly inputs: number; readonly columns: number }
  | { readonly about: "no result"; readonly result: string; readonly values: string }
  | { readonly about: "result unit missing"; readonly header: HeaderCell | undefined }
  | { readonly about: "result unit"; readonly header: string; readonly unit: UnitProblem }
  | { readonly about: "result kind"; readonly header: string; readonly unit: Unit; readonly wanted: Unit }
  | { readonly about: "several rows"; readonly rows: number }
  | { readonly about: "count"; readonly input: string; readonly value: string; readonly most: number }
  | { readonly about: "count of columns"; readonly input: string; readonly count: number; readonly rows: number }
  | {
      readonly about: "needed";
      readonly input: string;
      readonly by: string;
      readonly because: string;
    }
  | {
      readonly about: "two frames";
      readonly input: string;
      readonly frame: string;
      readonly other: string;
      readonly otherFrame: string;
    }
  | { readonly about: "no clock"; readonly input: string; readonly frame: string; readonly wanted: string }
  | {
      readonly about: "zero of date";
      readonly input: string;
      readonly value: string;
      readonly header: HeaderCell | undefined;
      readonly unit: Unit;
      /** The unit in which the number is a date of our time. */
      readonly meant: string;
    }
  | {
      readonly about: "hours or degrees";
      readonly input: string;
      readonly text: string;
      readonly header: HeaderCell;
      readonly headerUnit: Unit;
    }
  | { readonly about: "no unit stated"; readonly text: string }
  | { readonly about: "unknown name"; readonly text: string; readonly nearest: string | undefined };
