export type FileProblemKind =
  | "empty"
  | "no-header"
  | "binary"
  | "not-utf-8"
  | "not-utf-16"
  | "too-many-columns"
  /** A file of a kind that is known and not read. */
  | "other-kind"
  /** A file of a kind that is read and departs from its standard. */
  | "not-as-standard"
  | "no-table"
  /** A packed file whose parts do not fit together, or that would unpack to more than any table is. */
  | "damaged"
  | "too-large"
  /** Under a password. */
  | "encrypted";

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
