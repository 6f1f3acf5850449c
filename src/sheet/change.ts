import type { Book } from "./book/book.js";
import type { Progress } from "./calculate/calculate.js";
import { calculate } from "./calculate/calculate.js";
import type { Draft, Edit } from "./edit/draft.js";
import { closeDraft, openDraft } from "./edit/draft.js";
import type { Functions } from "./formula/functions.js";

/** Who looks at a long calculation. */
export interface Watch {
  /** Formula cells done, of those known to be needed; more may turn out to be needed. */
  onProgress?(done: number, total: number): void;
  /** Asked between slices of rows. */
  isCancelled?(): boolean;
}

/** The edits, one after the other, and one recalculation of what they changed. */
export function change(book: Book, edits: readonly Edit[], functions: Functions): Book {
  const steps = changeSteps(book, edits, functions);
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done) {
      return step.value;
    }
  }
}

/** The same under watch: undefined where it was cancelled; the book given is whole in any case. */
export function changeWatched(
  book: Book,
  edits: readonly Edit[],
  functions: Functions,
  watch: Watch,
): Book | undefined {
  const steps = changeSteps(book, edits, functions);
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done) {
      return step.value;
    }
    watch.onProgress?.(step.value.done, step.value.total);
    if (watch.isCancelled?.()) {
      return undefined;
    }
  }
}

/** Time between two moments in which others may run, so that a wish to cancel can arrive [ms]. */
const longestSlice = 12;

/** The same in slices, between which other work runs: for a page or a worker. */
export async function changeInSlices(
  book: Book,
  edits: readonly Edit[],
  functions: Functions,
  watch: Watch,
): Promise<Book | undefined> {
  const steps = changeSteps(book, edits, functions);
  let since = Number.NEGATIVE_INFINITY;
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done) {
      return step.value;
    }
    if (performance.now() - since > longestSlice) {
      watch.onProgress?.(step.value.done, step.value.total);
      await new Promise((resume) => setTimeout(resume, 0));
      since = performance.now();
    }
    if (watch.isCancelled?.()) {
      return undefined;
    }
  }
}

function* changeSteps(book: Book, edits: readonly Edit[], functions: Functions): Generator<Progress, Book> {
  let draft = openDraft(book, functions);
  for (const edit of edits) {
    if (edit.readsValues) {
      draft = openDraft(yield* calculateDraft(draft), functions);
    }
    edit(draft);
  }
  return yield* calculateDraft(draft);
}

function calculateDraft(draft: Draft): Generator<Progress, Book> {
  const { book, dirty } = closeDraft(draft);
  return calculate(book, dirty);
}
