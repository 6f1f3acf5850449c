/** Why something is not saved, and what to do, in one sentence for the analyst. */
export function storageProblem(error: unknown): string {
  switch ((error as { name?: string } | undefined)?.name) {
    case "QuotaExceededError":
      return "Not saved: the browser's storage is full. Save a copy as a Barycell book, then remove books that are no longer needed; both are in the menu Book.";
    case "InvalidStateError":
      return "Not saved: a newer version of this page is open beside it. Save a copy of the book if it was changed, then load the page anew.";
    default:
      return "Not saved: the browser keeps nothing for this page, as in a private window or where storage is switched off. Save a copy of the book before you close the page.";
  }
}
