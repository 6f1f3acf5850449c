import type { Place } from "../../../../sheet/book/book.js";
import type { KeptDraft } from "../../protocol/answers.js";
import type { Page } from "../page.js";

/** Keeps what is typed while it is typed, so that a crash loses nothing. */
export interface DraftKeeper {
  typed(place: Place, text: string): void;
  /** The draft of this place was entered or given up. */
  settled(place: Place): void;
}

const pause = 250;

export function createDraftKeeper({ bench, trouble }: Page): DraftKeeper {
  let waiting: KeptDraft | undefined;
  let kept: KeptDraft | undefined;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let hasFailed = false;

  function keep(draft: KeptDraft | undefined): void {
    kept = draft;
    bench.keepDraft(draft).catch((fault: Error) => {
      if (!hasFailed) trouble(`What is being typed could not be kept against a crash: ${fault.message}`);
      hasFailed = true;
    });
  }

  function keepNow(): void {
    clearTimeout(timer);
    if (waiting) keep(waiting);
    waiting = undefined;
  }

  // A page that is closed or put aside may never come back.
  document.addEventListener("visibilitychange", () => {
    if (document.visibilityState === "hidden") keepNow();
  });
  return {
    typed(place, text) {
      waiting = { place, text };
      clearTimeout(timer);
      timer = setTimeout(keepNow, pause);
    },
    settled(place) {
      if (waiting?.place === place) {
        clearTimeout(timer);
        waiting = undefined;
      }
      if (kept?.place === place) keep(undefined);
    },
  };
}
