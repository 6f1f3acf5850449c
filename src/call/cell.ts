/** The error values of OpenFormula (ISO/IEC 26300-3); no host shows any other. */
export type ErrorCode = "#VALUE!" | "#N/A" | "#DIV/0!" | "#REF!" | "#NAME?" | "#NUM!" | "#NULL!";

/**
 * An error that a cell holds: a code for the worksheet, a sentence for the analyst.
 * The sentence is made when somebody reads it, so a million failing rows stay cheap.
 */
export class CellError {
  constructor(
    readonly code: ErrorCode,
    /** What went wrong, without the values of one row: problems of one topic are counted together. */
    readonly topic: string,
    private readonly say: string | (() => string),
  ) {}

  get message(): string {
    return typeof this.say === "string" ? this.say : this.say();
  }
}

/** What a worksheet cell can hold; null is a blank cell, which is not an empty text. */
export type Cell = number | string | boolean | null | CellError;
