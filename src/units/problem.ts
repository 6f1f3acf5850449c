/** A unit that is close to what was written. */
export interface NearestUnit {
  readonly spelling: string;
  readonly symbol: string;
}

export interface UnitChoice {
  readonly symbol: string;
  readonly meaning: string;
}

/** What kept a text from being read as a unit: facts only, the sentences are made where a call is answered. */
export type UnitProblem =
  | { readonly problem: "unknown unit"; readonly text: string; readonly nearest: NearestUnit | undefined }
  | { readonly problem: "ambiguous unit"; readonly text: string; readonly choices: readonly UnitChoice[] }
  | { readonly problem: "unit grammar"; readonly text: string; readonly write: string };

/** What kept a text from being read as a quantity. */
export type QuantityProblem =
  | UnitProblem
  | { readonly problem: "not a number"; readonly text: string; readonly hint: string | undefined };

export function isProblem(value: object): value is UnitProblem | QuantityProblem {
  return "problem" in value;
}
