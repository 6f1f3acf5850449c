import { html, nothing } from "lit-html";
import type { ExportedFile } from "../../../protocol/answers.js";
import type {
  LedgerForm,
  LedgerSummary,
  LedgerView,
  ReviseProblem,
  ReviseWords,
  RevisionChoices,
  RevisionPreview,
} from "../../../protocol/revise.js";
import { faultText } from "../../createPage.js";
import { download } from "../../download.js";
import type { Page } from "../../page.js";
import type { Panel } from "../../panel.js";
import { askForPlot } from "../../plots/plotSettings.js";
import { goTo } from "../goTo.js";
import { ledgerList } from "./ledgerList.js";
import { mostShown } from "./moveText.js";
import { previewView } from "./previewView.js";
import { reviseForm } from "./reviseForm.js";

const noWords: ReviseWords = { key: "", aliases: "", conditions: "", table: "", erases: false };
const noChoices: RevisionChoices = { keys: [], tables: [] };

/** Revised values from a file: what they would change, then what they moved. */
export function revisePanel(page: Page, redraw: () => void, enterTyped: () => Promise<boolean>): Panel {
  let book = "";
  let file: File | undefined;
  let words = noWords;
  let choices = noChoices;
  let problems: readonly ReviseProblem[] = [];
  let preview: RevisionPreview | undefined;
  let previewOf = 0;
  let ledgers: readonly LedgerSummary[] = [];
  let chosen: string | undefined;
  let ledger: LedgerView | undefined;
  let said = "";
  let isRunning = false;
  let isShown = false;
  let asked = 0;

  const attempt = (work: () => Promise<void>) => {
    work().catch((fault: unknown) => page.trouble(faultText(fault)));
  };

  async function load(): Promise<void> {
    if (!isShown) return;
    asked += 1;
    const mine = asked;
    const id = page.state().id;
    const [texts, all] = await Promise.all([page.bench.revisionTexts(), page.bench.ledgers()]);
    const one = all.find((each) => each.id === chosen) ?? all[0];
    const view = one && (await page.bench.ledger(one.id, mostShown));
    if (mine !== asked) return;
    if (id !== book) {
      if (book !== "") forgetFile();
      book = id;
      words = { ...words, ...texts };
    }
    [ledgers, ledger, chosen] = [all, view, view?.id];
    redraw();
  }

  function forgetFile(): void {
    [file, words, choices, problems, preview, said] = [undefined, noWords, noChoices, [], undefined, ""];
  }

  function take(given: File | undefined): void {
    if (!given) return;
    file = given;
    [words, choices] = [{ ...words, key: "", table: "" }, noChoices];
    drop(`${given.name} is chosen; nothing is changed yet.`);
  }

  /** What was shown no longer holds. */
  function drop(sentence: string): void {
    [preview, problems, said] = [undefined, [], sentence];
    redraw();
  }

  function set(change: Partial<ReviseWords>): void {
    words = { ...words, ...change, ...("table" in change ? { key: "" } : {}) };
    drop("");
  }

  async function keep(): Promise<void> {
    const { aliases, conditions } = words;
    await page.bench.keepRevisionTexts({ aliases, conditions });
  }

  async function show(): Promise<void> {
    if (isRunning || !(await enterTyped())) return;
    if (!file) {
      problems = [{ word: "file", message: "choose the file with the revised values first." }];
      redraw();
      document.getElementById("revise-choose")?.focus();
      return;
    }
    await running("Reading; how far it is stands below the table.", async () => {
      const answer = await page.bench.reviseFrom(file as File, page.sheet(), words);
      [preview, problems, said] = [undefined, [], ""];
      if (answer.is === "cancelled") said = "Stopped; nothing was changed.";
      else if (answer.is === "problems") {
        ({ problems, choices } = answer);
        said = "Nothing can be shown yet.";
      } else {
        ({ preview } = answer);
        previewOf = page.state().version;
        choices = preview;
        words = { ...words, key: preview.key, table: preview.table };
        said = `${preview.matched} ${cellsText(preview)}`;
      }
    });
    const [first] = problems;
    if (first) document.getElementById(first.word === "file" ? "revise-choose" : `revise-${first.word}`)?.focus();
    else document.getElementById("revise-preview")?.focus();
  }

  async function apply(): Promise<void> {
    if (isRunning || !(await enterTyped())) return;
    await running("Applying; how far it is stands below the table.", async () => {
      const revised = await page.bench.applyRevision();
      said = "";
      if (revised.is === "refused") page.trouble(revised.message);
      if (revised.is === "cancelled") said = "Stopped; nothing was changed.";
      if (revised.is !== "revised") return;
      [preview, chosen] = [undefined, revised.ledger.id];
      said = `${revised.ledger.file} was taken over in one step; undo takes it back.`;
      page.announce(said);
    });
    await load();
    const told = document.getElementById("revise-ledger");
    told?.focus();
    told?.scrollIntoView({ block: "start" });
  }

  async function running(sentence: string, work: () => Promise<void>): Promise<void> {
    [isRunning, said] = [true, sentence];
    redraw();
    try {
      await work();
    } finally {
      isRunning = false;
      redraw();
    }
  }

  async function write(form: LedgerForm): Promise<void> {
    if (chosen === undefined || !(await enterTyped())) return;
    const written = await page.bench.writeLedger(chosen, form);
    if (written.is === "refused") page.trouble(written.message);
    if (written.is === "done") page.announce(written.said ?? "");
    if (written.is === "file") save(written.file);
  }

  function save({ name, type, bytes, told }: ExportedFile): void {
    download(name, new Blob([bytes as BlobPart], { type }));
    page.announce([`Saved as ${name}.`, ...told].join(" "));
  }

  /** The first input across, what it moved most up. */
  function draw(): void {
    if (!ledger) return;
    askForPlot({ kind: "revision", ledger: ledger.id, ...ledger.axes });
    page.prefer({ plots: true });
  }

  const to = (place: Parameters<typeof goTo>[1]) => goTo(page, place);

  return {
    id: "revise",
    title: "Revise",
    keys: "Alt+R",
    view: () => html`<p class="soft">Takes revised values over from a file, and tells what they move and which of them moved it most.</p>
      ${reviseForm(
        { file: file?.name, words, choices, problems, isRunning },
        {
          take,
          set,
          keep: () => attempt(keep),
          show: () => attempt(show),
          stop: () => attempt(() => page.bench.cancel()),
        },
      )}
      <p role="status" class=${said === "" || preview ? "unseen" : ""}>${said}</p>
      ${
        preview
          ? previewView(preview, previewOf !== page.state().version || preview.sheet !== page.sheet(), isRunning, {
              goTo: to,
              apply: () => attempt(apply),
            })
          : nothing
      }
      ${
        ledger
          ? ledgerList(ledger, ledgers, {
              goTo: to,
              write: (form) => attempt(() => write(form)),
              choose(id) {
                chosen = id;
                attempt(load);
              },
              draw: () => draw(),
            })
          : nothing
      }`,
    shown() {
      isShown = true;
      attempt(load);
    },
    hidden() {
      isShown = false;
    },
    changed(change) {
      if (change === "state") attempt(load);
      else if (change === "sheet" && isShown) redraw();
    },
  };
}

function cellsText({ cells }: RevisionPreview): string {
  return cells === 0
    ? "Nothing would change."
    : `${cells.toLocaleString("en")} ${cells === 1 ? "cell" : "cells"} would change.`;
}
