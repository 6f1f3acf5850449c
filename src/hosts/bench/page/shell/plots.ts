import type { Page } from "../page.js";

/** Loads the plots when they are first asked for. */
export function showPlots(section: HTMLElement, page: Page, attempt: (work: () => Promise<void>) => void): void {
  let started: Promise<{ shown(isShown: boolean): void }> | undefined;

  function follow(): void {
    const wanted = page.preferences().plots;
    section.hidden = !wanted;
    if (!wanted && !started) return;
    attempt(async () => {
      started ??= import("../plots/startPlots.js").then(({ startPlots }) => startPlots(section, page));
      (await started).shown(page.preferences().plots);
    });
  }

  page.onChange((change) => {
    if (change === "preferences") follow();
  });
  follow();
}
