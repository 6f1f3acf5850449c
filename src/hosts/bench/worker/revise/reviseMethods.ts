import { FileProblem } from "../../../../files/fileProblem.js";
import { type BookTable, bookTable } from "../../../../revision/bookTable.js";
import type { Ledger, RevisionSource } from "../../../../revision/ledger.js";
import { ledgerOf } from "../../../../revision/ledgerOf.js";
import { planRevision, type RevisionPlan } from "../../../../revision/planRevision.js";
import { revisionEdits } from "../../../../revision/revisionEdits.js";
import { RevisionRefused } from "../../../../revision/revisionRefused.js";
import { stepName } from "../../../../revision/stepName.js";
import { listed, quoted } from "../../../../revision/words.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import type { Bench } from "../../protocol/bench.js";
import type { ReviseAnswer, ReviseProblem, ReviseWords } from "../../protocol/revise.js";
import type { Plan } from "../actions/plan.js";
import type { ActionQueue } from "../actions/queue.js";
import { createWatch, type OpenedWatch } from "../books/openingWatch.js";
import type { Service } from "../service.js";
import { type BookLedger, bookOfSession, type Session } from "../session.js";
import type { SessionHolder } from "../sessionHolder.js";
import { boundedLedger } from "./boundedLedger.js";
import { ledgerId, ledgersOf, versionOfLedger } from "./keptRevisions.js";
import { keyColumns } from "./keyColumns.js";
import { ledgerSummary, ledgerView } from "./ledgerView.js";
import { readReviseWords } from "./readReviseWords.js";
import { type RevisionFile, readRevisionFile } from "./readRevisionFile.js";
import { revisionMoves } from "./revisionMoves.js";
import { revisionPreview } from "./revisionPreview.js";
import { ledgerFile, ledgerSheet } from "./writeLedger.js";

type Method =
  | "revisionTexts"
  | "keepRevisionTexts"
  | "reviseFrom"
  | "applyRevision"
  | "ledgers"
  | "ledger"
  | "writeLedger"
  | "revisionMoves";

export type ReviseMethods = Service<Pick<Bench, Method>>;

/** A revision that was shown and can be applied. */
interface Prepared {
  readonly plan: RevisionPlan;
  readonly conditions: readonly string[];
  readonly file: string;
  readonly sha256: string;
}

const noChoices = { keys: [], tables: [] };

/** Revised values from a file: shown first, then applied as one step, with a ledger of what they moved. */
export function reviseMethods(
  holder: SessionHolder,
  { run }: ActionQueue,
): { readonly methods: ReviseMethods; cancel(): void } {
  let prepared: Prepared | undefined;
  let reading: OpenedWatch | undefined;

  async function reviseFrom(file: File, sheet: number, words: ReviseWords): Promise<ReviseAnswer> {
    reading?.cancel();
    const watch = createWatch(`Reading ${file.name}`, holder.emit);
    reading = watch;
    prepared = undefined;
    try {
      const table = bookTable(bookOfSession(holder.session()), sheet);
      if (!table) return problem("table", "this sheet holds no table; show the sheet that is to be revised.");
      const read = await readRevisionFile(file, watch);
      if (read === undefined || watch.isCancelled()) return { is: "cancelled" };
      return preview(table, read, words);
    } catch (error) {
      if (watch.isCancelled()) return { is: "cancelled" };
      if (error instanceof FileProblem) return problem("file", error.message);
      const { name } = error as Error;
      if (name === "NotReadableError" || name === "NotFoundError") {
        return problem("file", `${quoted(file.name)} cannot be read any more; choose it again.`);
      }
      throw error;
    } finally {
      watch.end();
    }
  }

  function preview(table: BookTable, file: RevisionFile, words: ReviseWords): ReviseAnswer {
    const tables = file.tables.map(({ name }) => name);
    const chosen = file.tables.find(({ name }) => name === words.table) ?? file.tables[0];
    if (!chosen) {
      return problem("file", `${quoted(file.name)} holds no table; a row of column names is needed above its values.`);
    }
    const choices = { tables, keys: keyColumns(table, chosen.table) };
    const { aliases, conditions, problems } = readReviseWords(words, table);
    const key = words.key !== "" ? words.key : choices.keys[0];
    if (key === undefined)
      return { is: "problems", problems: [...problems, noKey(table, chosen.table.header)], choices };
    if (problems.length > 0) return { is: "problems", problems, choices };
    try {
      const plan = planRevision(table, chosen.table, { key, aliases, erases: words.erases });
      prepared = { plan, conditions, file: file.name, sha256: file.sha256 };
      const shown = { name: file.name, table: chosen.name, findings: file.findings };
      return { is: "preview", preview: revisionPreview(plan, shown, choices) };
    } catch (error) {
      if (!(error instanceof RevisionRefused)) throw error;
      return { is: "problems", problems: [{ word: "key", message: error.message }], choices };
    }
  }

  return {
    cancel: () => reading?.cancel(),
    methods: {
      revisionTexts() {
        const { aliases, conditions } = holder.session().revisions;
        return { aliases, conditions };
      },
      keepRevisionTexts({ aliases, conditions }) {
        const session = holder.session();
        const { revisions, version } = session;
        if (revisions.aliases === aliases && revisions.conditions === conditions) return;
        holder.replace({ ...session, version: version + 1, revisions: { ...revisions, aliases, conditions } });
      },
      reviseFrom,
      async applyRevision() {
        let made: BookLedger | undefined;
        const outcome = await run((session) => {
          const plan = revisionStep(session, prepared);
          return {
            ...plan,
            ledger(before, after) {
              made = plan.ledger?.(before, after);
              return made!;
            },
          };
        });
        if (outcome.is !== "done") return outcome;
        prepared = undefined;
        return { is: "revised", ledger: ledgerSummary(holder.session(), made!) };
      },
      ledgers: () => ledgersOf(holder.session()).map((ledger) => ledgerSummary(holder.session(), ledger)),
      ledger(id, most) {
        const session = holder.session();
        const ledger = ledgersOf(session).find((each) => ledgerId(each) === id);
        return ledger && ledgerView(session, ledger, most);
      },
      async writeLedger(id, form) {
        if (form === "sheet") {
          return run((session) => {
            const ledger = ledgerNamed(session, id);
            return ledgerSheet(session, ledger, wholeLedger(session, ledger));
          });
        }
        const session = holder.session();
        const ledger = ledgersOf(session).find((each) => ledgerId(each) === id);
        if (!ledger) return { is: "refused", message: goneMessage };
        return { is: "file", file: ledgerFile(ledger, wholeLedger(session, ledger), form) };
      },
      revisionMoves(id, x, y) {
        const session = holder.session();
        const all = ledgersOf(session);
        const ledger = all.find((each) => ledgerId(each) === id) ?? all[0];
        if (!ledger)
          return { is: "missing", message: "No revision was applied to this book yet; the panel Revise does." };
        const whole = wholeLedger(session, ledger);
        if (!whole) {
          const message = `The table before and after ${quoted(ledger.source.file)} is held only until the page is closed; its ledger tells what moved.`;
          return { is: "missing", message };
        }
        const sheet = bookOfSession(session).sheets.findIndex(({ name }) => name === ledger.sheet);
        return revisionMoves(whole, sheet, [x, y]);
      },
    },
  };
}

const goneMessage = "ledger: its revision was undone; redo it, or choose another ledger.";

function problem(word: ReviseProblem["word"], message: string): ReviseAnswer {
  return { is: "problems", problems: [{ word, message }], choices: noChoices };
}

function noKey({ columns }: BookTable, header: readonly string[]): ReviseProblem {
  const own = listed(columns.filter(({ isDerived }) => !isDerived).map((column) => column.recognised.name));
  const message = `no column of the file is headed as one of the table's, so rows cannot be matched; the table has ${own}, the file ${listed(header)}.`;
  return { word: "key", message };
}

function revisionStep(session: Session, prepared: Prepared | undefined): Plan {
  if (!prepared) throw new EditRefused("revise: no revision is shown; choose a file and look at what it would change");
  const { plan, conditions, file, sha256 } = prepared;
  const { table, columns, key } = plan;
  if (table.book !== bookOfSession(session)) {
    throw new EditRefused("revise: the book has changed since this was shown; show again what would change");
  }
  const written = columns.flatMap(({ values, sigmas }) => [values, ...sigmas]);
  if (written.every(({ changed }) => changed === 0)) {
    throw new EditRefused(`revise: ${quoted(file)} changes nothing in this table, so there is nothing to apply`);
  }
  const name = stepName(plan, file);
  const source: RevisionSource = { date: new Date().toISOString(), file, sha256 };
  return {
    name,
    edits: revisionEdits(plan),
    edited: written.flatMap(({ column: { column }, spans }) =>
      spans.map(({ from, to }) => ({
        sheet: table.sheet,
        top: table.firstRow + from,
        bottom: table.firstRow + to - 1,
        left: column,
        right: column,
      })),
    ),
    ledger: (before, after) =>
      boundedLedger(ledgerOf(before, after, table.sheet, conditions, source, key.header), key.header),
    said: `${name[0]!.toUpperCase()}${name.slice(1)}.`,
  };
}

function ledgerNamed(session: Session, id: string): BookLedger {
  const ledger = ledgersOf(session).find((each) => ledgerId(each) === id);
  if (!ledger) throw new EditRefused(goneMessage);
  return ledger;
}

/** The ledger with both states of the table, worked out again; undefined where these are no longer held. */
function wholeLedger(session: Session, ledger: BookLedger): Ledger | undefined {
  const at = versionOfLedger(session, ledger);
  if (at === undefined) return undefined;
  const { versions } = session.history;
  const [before, after] = [versions[at - 1]!.book, versions[at]!.book];
  const sheet = after.sheets.findIndex(({ name }) => name === ledger.sheet);
  const conditions = ledger.conditions.map(({ condition }) => condition);
  return ledgerOf(before, after, sheet, conditions, ledger.source, ledger.key);
}
