/** A revision that cannot be matched to the table; nothing has changed. The message is for the analyst. */
export class RevisionRefused extends Error {
  override readonly name = "RevisionRefused";
}
