import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import type { KeptDraft } from "../../protocol/answers.js";
import type { BenchEvent } from "../../protocol/bench.js";
import type { BookState, SavedState } from "../../protocol/bookState.js";
import { keptRevisions } from "../revise/keptRevisions.js";
import { bookOfSession, openSession, presentationOfSession, type Session } from "../session.js";
import type { SessionHolder } from "../sessionHolder.js";
import { stateOf } from "../state/stateOf.js";
import { type Autosave, createAutosave } from "../store/autosave.js";
import { type BookKeeper, createBookKeeper } from "../store/bookKeeper.js";
import type { Release } from "../store/bookLock.js";
import { keepDraft } from "../store/bookShelf.js";
import type { Database } from "../store/database.js";

/** A book that lies ready to be worked on: calculated, and with what is known of how it is stored. */
export interface ReadyBook {
  readonly id: string;
  readonly document: BookDocument;
  /** How the first version is called in the history. */
  readonly name: string;
  readonly keeper?: BookKeeper | undefined;
  readonly release?: Release | undefined;
  /** Another tab has it: it is not saved here, and becomes a copy with the first change. */
  readonly borrowed?: true;
  readonly saved: SavedState;
}

/** The book that is open, its saving, and the state that the page is told of. */
export interface BookDesk extends SessionHolder {
  /** Puts a book in the place of the one before, once that is saved. */
  open(ready: ReadyBook): Promise<BookState>;
  state(): BookState;
  /** All that a file of the book holds. */
  document(): BookDocument;
  isOpen(): boolean;
  /** Whether the book is another tab's and nothing was changed in it. */
  isBorrowed(): boolean;
  save(): void;
  settled(): Promise<void>;
  keepDraft(draft: KeptDraft | undefined): Promise<void>;
}

interface OnDesk {
  session: Session;
  readonly past: readonly string[];
  readonly autosave: Autosave;
  readonly release: Release | undefined;
  readonly borrowed: boolean;
}

export function createBookDesk(
  database: () => Promise<Database>,
  newId: () => string,
  emit: (event: BenchEvent) => void,
  lock: (id: string) => Promise<Release | undefined>,
): BookDesk {
  let desk: OnDesk | undefined;
  let lastVersion = 0;

  const here = (): OnDesk => {
    if (desk === undefined) throw new Error("no book is open");
    return desk;
  };
  const state = (): BookState => stateOf(here().session, here().autosave.state());
  const tell = (): void => emit({ is: "state", state: state() });

  function put(ready: Omit<ReadyBook, "document" | "name"> & Pick<OnDesk, "past">, session: Session): void {
    let { keeper } = ready;
    const own: OnDesk = {
      session,
      past: ready.past,
      release: ready.release,
      borrowed: ready.borrowed === true,
      autosave: createAutosave(
        async () => {
          keeper ??= createBookKeeper(await database(), ready.id);
          await keeper.save(documentOf(own), Date.now());
        },
        () => own === desk && tell(),
        Date.now,
        ready.saved,
      ),
    };
    desk = own;
  }

  /** The first change in a book that another tab saves goes into a copy, so that neither loses anything. */
  function putCopy(session: Session): void {
    const id = newId();
    const title = `${session.title} (copy)`;
    const { past } = here();
    const locked = lock(id);
    const release: Release = () => void locked.then((letGo) => letGo?.());
    put({ id, past, release, saved: { is: "saving" } }, { ...session, id, title });
  }

  return {
    session: () => here().session,
    emit,
    replace(session) {
      const { session: before, borrowed } = here();
      // An action of a book that was closed meanwhile has come too late.
      if (session.id !== before.id) return;
      lastVersion = Math.max(lastVersion, session.version);
      const isKept = isSameToKeep(before, session);
      if (borrowed && !isKept) putCopy(session);
      else here().session = session;
      if (!isKept) here().autosave.changed();
      tell();
    },
    async open(ready) {
      await desk?.autosave.settled();
      desk?.release?.();
      const { history: past, ...document } = ready.document;
      lastVersion += 1;
      put({ ...ready, past }, openSession({ ...document, id: ready.id, name: ready.name, version: lastVersion }));
      tell();
      return state();
    },
    state,
    document: () => documentOf(here()),
    isOpen: () => desk !== undefined,
    isBorrowed: () => desk?.borrowed === true,
    save() {
      here().autosave.changed();
      tell();
    },
    settled: async () => desk?.autosave.settled(),
    async keepDraft(draft) {
      const { session, autosave, borrowed } = here();
      if (borrowed) return;
      const found = await database().catch(() => undefined);
      await (found && keepDraft(found, session.id, draft).catch(() => undefined));
      // A draft is found again with its book, so the book has to be there.
      if (draft && !(await isStored(found, session.id))) autosave.changed();
    },
  };
}

async function isStored(database: Database | undefined, id: string): Promise<boolean> {
  const key = await database?.getKey("books", id).catch(() => undefined);
  return key !== undefined;
}

function documentOf({ session, past }: OnDesk): BookDocument {
  const { versions, present } = session.history;
  const revisions = keptRevisions(session);
  return {
    title: session.title,
    book: bookOfSession(session),
    presentation: presentationOfSession(session),
    marks: session.marks,
    ...(revisions && { revisions }),
    history: [...past, ...versions.slice(1, present + 1).map(({ name }) => name)],
  };
}

/** Whether there is nothing new to keep: a filter, a flash or a label come and go. */
function isSameToKeep(before: Session, after: Session): boolean {
  return (
    bookOfSession(before) === bookOfSession(after) &&
    presentationOfSession(before) === presentationOfSession(after) &&
    before.marks === after.marks &&
    before.revisions === after.revisions &&
    before.title === after.title
  );
}
