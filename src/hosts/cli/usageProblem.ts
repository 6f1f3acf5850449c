/** A command line that cannot be understood; the message says what to type instead. */
export class UsageProblem extends Error {
  override readonly name = "UsageProblem";
}
