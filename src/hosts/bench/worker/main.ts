import type { CallMessage } from "../protocol/message.js";
import { answerCalls, type Line, tellEvents } from "./answerCalls.js";
import { bookMethods } from "./books/bookMethods.js";
import { sheetService } from "./sheetService.js";
import { type Database, openDatabase } from "./store/database.js";

const line = self as unknown as Line;
const emit = tellEvents(line);

let opened: Promise<Database> | undefined;

/** The storage, opened when it is first needed, and again where that failed. */
function database(): Promise<Database> {
  opened ??= openDatabase().catch((error) => {
    opened = undefined;
    throw error;
  });
  return opened;
}

const books = bookMethods(database, emit);
const sheets = sheetService(books.desk);

const answer = answerCalls(line, {
  ...sheets,
  ...books.methods,
  cancel() {
    books.cancelOpening();
    return sheets.cancel();
  },
});

self.addEventListener("message", ({ data }: MessageEvent<CallMessage>) => void answer(data));

// What nobody awaits must not fail unseen.
self.addEventListener("unhandledrejection", ({ reason }) => {
  emit({ is: "fault", message: reason instanceof Error ? reason.message : String(reason) });
});
