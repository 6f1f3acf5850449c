/** Why something is not saved, and what to do, in one sentence for the analyst. */
export function storageProblem(error: unknown): string {
  switch ((error as { name?: string } | undefined)?.name) {
    case "QuotaExceededError":
      return "Not saved: the browser's storage is full. Export the sheet as a .barycell file, then remove sheets that are no longer needed.";
    case "InvalidStateError":
      return "Not saved: a newer version of this page is open beside it. Export the sheet if it was changed, then load the page anew.";
    default:
      return "Not saved: the browser keeps nothing for this page, as in a private window or where storage is switched off. Export the sheet before you close the page.";
  }
}
