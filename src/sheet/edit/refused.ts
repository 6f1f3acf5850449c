/** An edit that cannot be done as asked; nothing has changed. The message is for the analyst. */
export class EditRefused extends Error {
  override readonly name = "EditRefused";
}
