import type { Place } from "../../../../sheet/book/book.js";
import type { Page } from "../page.js";

/** Asks what cells hold, one at a time and only for the last one wanted, however fast the selection moves. */
export function createEntryReader({ bench }: Page, arrived: (place: Place, text: string) => void) {
  let wanted: Place | undefined;
  let isAsking = false;

  async function ask(): Promise<void> {
    isAsking = true;
    while (wanted) {
      const place = wanted;
      wanted = undefined;
      // A worker that broke down is told of by the page itself.
      const text = await bench.entryOf(place).catch(() => undefined);
      if (text !== undefined && !wanted) arrived(place, text);
    }
    isAsking = false;
  }

  return (place: Place): void => {
    wanted = place;
    if (!isAsking) void ask();
  };
}
