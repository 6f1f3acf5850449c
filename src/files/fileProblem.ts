export type FileProblemKind = "empty" | "no-header" | "binary" | "not-utf-8" | "not-utf-16" | "too-many-columns";

/** Why a file cannot be read as a table; the message is one sentence for the analyst. */
export class FileProblem extends Error {
  override readonly name = "FileProblem";

  constructor(
    readonly kind: FileProblemKind,
    message: string,
  ) {
    super(message);
  }
}
