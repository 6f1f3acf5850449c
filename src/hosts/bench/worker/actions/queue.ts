import type { Book } from "../../../../sheet/book/book.js";
import { changeInSlices, type Watch } from "../../../../sheet/change.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { goTo, presentVersion, recordVersion } from "../../../../sheet/history/history.js";
import type { Bench } from "../../protocol/bench.js";
import type { Action, Outcome } from "../../protocol/request.js";
import { functions } from "../functions.js";
import type { Service } from "../service.js";
import { type BookVersion, bookOfSession, presentationOfSession, type Session } from "../session.js";
import type { SessionHolder } from "../sessionHolder.js";
import { errorCount } from "../state/errorCount.js";
import { followFilters } from "../view/sheetFilters.js";
import { copyArea, type OwnClip } from "./clips.js";
import type { Plan } from "./plan.js";
import { planOf } from "./planOf.js";
import { counted } from "./words.js";

/** An action that takes longer says how far it is [ms]. */
const progressAfter = 200;

export type ActionMethods = Service<Pick<Bench, "act" | "undo" | "redo" | "goTo" | "cancel" | "copy">>;

export interface ActionQueue {
  readonly methods: ActionMethods;
  /** Carries out what `plan` makes of the session as it is when its turn comes. */
  run(plan: (session: Session) => Plan, label?: string): Promise<Outcome>;
}

/** Carries actions out one after the other, in slices, so that questions are answered meanwhile. */
export function actions(holder: SessionHolder): ActionQueue {
  let last: Promise<unknown> = Promise.resolve();
  let isCancelled = false;
  let clip: OwnClip | undefined;
  let copies = 0;

  function inTurn(work: () => Outcome | Promise<Outcome>): Promise<Outcome> {
    const turn = last.then(work);
    last = turn.catch(() => {});
    return turn;
  }

  function run(plan: (session: Session) => Plan, label?: string): Promise<Outcome> {
    return inTurn(async () => {
      isCancelled = false;
      try {
        return await carryOut(plan(holder.session()), label);
      } catch (thrown) {
        if (thrown instanceof EditRefused) return { is: "refused", message: sentence(thrown.message) };
        throw thrown;
      }
    });
  }

  async function carryOut(plan: Plan, label: string | undefined): Promise<Outcome> {
    const start = holder.session();
    const name = label ?? plan.name;
    const watch = watched(name);
    const before = bookOfSession(start);
    let book: Book | undefined = before;
    try {
      if (plan.edits.length > 0) book = await changeInSlices(before, plan.edits, functions, watch);
    } finally {
      watch.end();
    }
    const now = holder.session();
    // The book was closed, or the analyst said stop: what was begun is dropped whole.
    if (book === undefined || now.id !== start.id) return { is: "cancelled" };
    const presentation = plan.presentation ?? presentationOfSession(start);
    const ledger = plan.ledger?.(before, book);
    const version = { name, book, presentation, ...(plan.moved && { moved: plan.moved }), ...(ledger && { ledger }) };
    holder.replace(recorded(now, version, plan));
    const { select } = plan;
    const said = plan.said ?? (plan.moved ? newErrors(before, book) : undefined);
    return { is: "done", ...(select ? { select } : {}), ...(said === undefined ? {} : { said }) };
  }

  function watched(what: string): Watch & { end(): void } {
    const since = performance.now();
    let told = false;
    return {
      isCancelled: () => isCancelled,
      onProgress(done, total) {
        if (performance.now() - since < progressAfter) return;
        told = true;
        holder.emit({ is: "progress", what, done, total });
      },
      end() {
        if (told) holder.emit({ is: "idle" });
      },
    };
  }

  function turnTo(version: (present: number) => number): Promise<Outcome> {
    return inTurn(() => {
      const session = holder.session();
      const next = atVersion(session, version(session.history.present));
      if (next === session) return { is: "done" };
      holder.replace(next);
      return { is: "done" };
    });
  }

  return {
    run,
    methods: {
      act: (action: Action, label?: string) => run((session) => planOf(session, action, clip), label),
      undo: () => turnTo((present) => present - 1),
      redo: () => turnTo((present) => present + 1),
      goTo: (version) => turnTo(() => version),
      cancel: () => {
        isCancelled = true;
      },
      copy(area) {
        const session = holder.session();
        const token = `${session.id} ${++copies}`;
        const copied = copyArea(session, area, token);
        clip = copied.clip;
        return { text: copied.text, html: copied.html, own: token };
      },
    },
  };
}

/** Columns that were taken out or put elsewhere may leave ranges without what they need. */
function newErrors(before: Book, after: Book): string | undefined {
  const more = errorCount(after) - errorCount(before);
  if (more <= 0) return undefined;
  return `${counted(more, "more cell")} ${more === 1 ? "holds" : "hold"} an error now; look at the formulas that refer to what was moved, or undo.`;
}

/** The session with one more version. */
function recorded(session: Session, version: BookVersion, plan: Plan): Session {
  const before = bookOfSession(session);
  return {
    ...session,
    version: session.version + 1,
    history: recordVersion(session.history, version),
    filters: followFilters(session.filters, version.book, plan.moved === true),
    flash: plan.moved || version.book === before ? undefined : { before, edited: plan.edited },
  };
}

/** The session at another version of its history; what differs flashes where the two can be compared. */
export function atVersion(session: Session, index: number): Session {
  const history = goTo(session.history, index);
  if (history.present === session.history.present) return session;
  const [low, high] = [history.present, session.history.present].sort((a, b) => a - b) as [number, number];
  const moved = history.versions.slice(low + 1, high + 1).some((version) => version.moved);
  const before = bookOfSession(session);
  const { book } = presentVersion(history);
  return {
    ...session,
    version: session.version + 1,
    history,
    filters: followFilters(session.filters, book, moved),
    flash: moved || book === before ? undefined : { before, edited: [] },
  };
}

function sentence(message: string): string {
  return /[.?!]$/.test(message) ? message : `${message}.`;
}
