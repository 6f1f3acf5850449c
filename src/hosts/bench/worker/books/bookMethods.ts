import { columnOf } from "../../../../call/column.js";
import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import { calculateAll } from "../../../../files/bookFile/calculateAll.js";
import { FileProblem } from "../../../../files/fileProblem.js";
import { bookOf } from "../../../../sheet/book/bookOf.js";
import { changeInSlices } from "../../../../sheet/change.js";
import type { BookEntry, Opened } from "../../protocol/answers.js";
import type { Bench } from "../../protocol/bench.js";
import type { SavedState } from "../../protocol/bookState.js";
import { demoBook } from "../demo/demoBook.js";
import { changedValues } from "../files/changedValues.js";
import { loadFileMethods } from "../files/loadFileMethods.js";
import { functions } from "../functions.js";
import type { Service } from "../service.js";
import { renamed } from "../session.js";
import { createBookKeeper } from "../store/bookKeeper.js";
import { awaitLock, lockBook } from "../store/bookLock.js";
import { keptDraft, lastBook, listBooks, setLastBook, setRemoved, sweepRemoved } from "../store/bookShelf.js";
import type { Database } from "../store/database.js";
import { BookUnreadable, loadBook } from "../store/loadBook.js";
import { storageProblem } from "../store/storageProblem.js";
import { type BookDesk, createBookDesk } from "./bookDesk.js";
import { createWatch, type OpenedWatch } from "./openingWatch.js";

type Method =
  | "start"
  | "books"
  | "openBook"
  | "newBook"
  | "openDemo"
  | "renameBook"
  | "removeBook"
  | "takeBack"
  | "openFile"
  | "openText"
  | "exportAs"
  | "keepDraft"
  | "keptDraft";

export type BookMethods = Service<Pick<Bench, Method>>;

const elsewhere: SavedState = {
  is: "not saved",
  message: "Another tab has this book open and saves it. With the first change made here, this becomes a copy.",
};

/** The methods of the bench that are about books as a whole: opening, keeping, removing. */
export function bookMethods(
  database: () => Promise<Database>,
  emit: Parameters<typeof createBookDesk>[2],
): { readonly desk: BookDesk; readonly methods: BookMethods; cancelOpening(): void } {
  const newId = (): string => crypto.randomUUID();
  const desk = createBookDesk(database, newId, emit, lockBook);
  let opening: OpenedWatch | undefined;
  let waiting: AbortController | undefined;

  /** The book that a tab is waiting for is no longer the one it shows. */
  function stopWaiting(): void {
    waiting?.abort();
    waiting = undefined;
  }

  async function calculated(document: BookDocument, watch: OpenedWatch): Promise<BookDocument | undefined> {
    const book = await changeInSlices(document.book, [calculateAll(document.book)], functions, watch);
    return book && { ...document, book };
  }

  /** Opens what `read` gives, or says why not. */
  async function opened(what: string, read: (watch: OpenedWatch) => Promise<Opened>): Promise<Opened> {
    opening?.cancel();
    const watch = createWatch(what, emit);
    opening = watch;
    try {
      return await read(watch);
    } catch (error) {
      if (watch.isCancelled()) return { is: "cancelled" };
      if (error instanceof FileProblem || error instanceof BookUnreadable) {
        return { is: "refused", message: error.message };
      }
      if ((error as Error).name === "NotReadableError" || (error as Error).name === "NotFoundError") {
        return { is: "refused", message: `${what}: the file cannot be read any more; was it moved or is it in use?` };
      }
      throw error;
    } finally {
      watch.end();
    }
  }

  async function stored(): Promise<readonly BookEntry[]> {
    return database()
      .then(listBooks)
      .catch(() => []);
  }

  /** Two books of one name could not be told apart in the list. */
  async function freeTitle(title: string): Promise<string> {
    const taken = new Set((await stored()).map((each) => each.title));
    let free = title;
    for (let count = 2; taken.has(free); count++) free = `${title} ${count}`;
    return free;
  }

  async function openNew(given: BookDocument, name: string, saved?: SavedState): Promise<void> {
    stopWaiting();
    const id = newId();
    const document = { ...given, title: await freeTitle(given.title) };
    await desk.open({ id, document, name, release: await lockBook(id), saved: saved ?? { is: "saving" } });
    if (saved === undefined) desk.save();
  }

  async function openStored(id: string, watch: OpenedWatch): Promise<boolean> {
    stopWaiting();
    const found = await database();
    await desk.settled();
    const release = await lockBook(id);
    const loaded = await loadBook(found, id, functions).catch((error) => {
      release?.();
      throw error;
    });
    const document = loaded && (await calculated(loaded.document, watch));
    if (loaded === undefined || document === undefined) {
      release?.();
      return false;
    }
    const { record, columns, parts } = loaded;
    const keeper = createBookKeeper(found, id, record, parts);
    keeper.loaded(document.book, columns);
    if (release === undefined) {
      await desk.open({ id, document, name: "opened", borrowed: true, saved: elsewhere });
      followWhenFree(id);
    } else {
      await setLastBook(found, id).catch(() => undefined);
      await desk.open({ id, document, name: "opened", keeper, release, saved: { is: "saved", at: record.changed } });
    }
    return true;
  }

  /** Once the other tab lets the book go, it is opened here as that tab left it, unless it became a copy. */
  function followWhenFree(id: string): void {
    const wait = new AbortController();
    waiting = wait;
    void awaitLock(id, wait.signal).then(async (release) => {
      release?.();
      if (release === undefined || wait.signal.aborted || !desk.isBorrowed()) return;
      await openStored(id, createWatch("Opening", emit)).catch(() => false);
    });
  }

  /** It can be had anew at any time, so it is kept from the first change on. */
  function openDemo(saved: SavedState = { is: "saved", at: Date.now() }): Promise<void> {
    return openNew(demoBook(), "opened the demo", saved);
  }

  async function openLast(): Promise<void> {
    const watch = createWatch("Opening", emit);
    try {
      const found = await database();
      await sweepRemoved(found, Date.now()).catch(() => undefined);
      const id = await lastBook(found);
      if (id === undefined || !(await openStored(id, watch))) await openDemo();
    } catch (error) {
      const message = error instanceof BookUnreadable ? error.message : storageProblem(error);
      await openDemo({ is: "not saved", message });
    } finally {
      watch.end();
    }
  }

  const methods: BookMethods = {
    async start() {
      if (!desk.isOpen()) await openLast();
      return desk.state();
    },
    async books() {
      const kept = await stored();
      const { id, title, sheets } = desk.state();
      const rows = Math.max(...sheets.map((sheet) => sheet.rows));
      const isThere = kept.some((each) => each.id === id);
      return isThere ? kept : [{ id, title, changed: Date.now(), rows }, ...kept];
    },
    openBook: (id) =>
      opened("Opening", async (watch) => {
        if (desk.state().id === id) return { is: "opened", said: `"${desk.state().title}" is open.`, findings: [] };
        const isThere = await openStored(id, watch);
        if (watch.isCancelled()) return { is: "cancelled" };
        if (!isThere) return { is: "refused", message: "That book is no longer in this browser's storage." };
        return { is: "opened", said: `Opened "${desk.state().title}".`, findings: [] };
      }),
    newBook: (title, headers) =>
      opened(title, async () => {
        const columns = headers.map((header) => columnOf([header.trim() || null]));
        const book = bookOf([{ name: "Table", columns }]);
        const document = { title: title.trim() || "Table", book, presentation: [], marks: [], history: [] };
        await openNew(document, "new table");
        return { is: "opened", said: `"${desk.state().title}" is ready to be filled in.`, findings: [] };
      }),
    openDemo: () =>
      opened("Demo survey", async () => {
        await openDemo();
        return { is: "opened", said: "Opened the demo: an invented survey with planted mistakes.", findings: [] };
      }),
    renameBook(title) {
      if (title.trim() !== "") desk.replace(renamed(desk.session(), title.trim().slice(0, 200)));
    },
    async removeBook(id) {
      await desk.settled();
      const found = await database().catch(() => undefined);
      if (found) await setRemoved(found, id, Date.now());
      if (desk.state().id === id) await openLast();
    },
    async takeBack(id) {
      const found = await database().catch(() => undefined);
      if (found) await setRemoved(found, id, undefined);
    },
    openFile: (file) => openContent(file.name, file),
    openText: (name, text) => openContent(name, new Blob([text])),
    async exportAs(format, sheet) {
      const document = desk.document();
      const watch = createWatch("Saving a copy", emit);
      try {
        const { exportAs } = await loadFileMethods();
        return await exportAs(document, format, sheet, watch);
      } finally {
        watch.end();
      }
    },
    keepDraft: (draft) => desk.keepDraft(draft),
    async keptDraft() {
      const found = await database().catch(() => undefined);
      return found && keptDraft(found, desk.state().id).catch(() => undefined);
    },
  };

  function openContent(name: string, content: Blob): Promise<Opened> {
    return opened(`Reading ${name}`, async (watch) => {
      const { openFile } = await loadFileMethods();
      const {
        document,
        findings,
        calculated: stored,
      } = await openFile(name, content, {
        signal: watch.signal,
        progress: (done) => watch.onProgress(done, content.size),
      });
      const whole = await calculated(document, watch);
      if (whole === undefined) return { is: "cancelled" };
      await openNew(whole, document.history.at(-1) ?? "opened");
      const rows = Math.max(...desk.state().sheets.map((sheet) => sheet.rows - 1), 0);
      const said = `Opened ${name}: ${rows.toLocaleString("en")} rows.`;
      const changed = stored && changedValues(stored, whole.book);
      return { is: "opened", said, findings: changed === undefined ? findings : [...findings, changed] };
    });
  }

  return { desk, methods, cancelOpening: () => opening?.cancel() };
}
