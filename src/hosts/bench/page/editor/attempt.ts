import type { Page } from "../page.js";

/** Carries out what a key asked for; where that breaks down, the analyst is told. */
export function attempt(page: Page, work: () => Promise<void>): void {
  work().catch((fault: Error) => page.trouble(`That key did nothing: ${fault.message}`));
}
