import { html, nothing, type TemplateResult } from "lit-html";
import type { ReviseProblem, ReviseWords, RevisionChoices } from "../../../protocol/revise.js";

export interface FormState {
  readonly file: string | undefined;
  readonly words: ReviseWords;
  readonly choices: RevisionChoices;
  readonly problems: readonly ReviseProblem[];
  readonly isRunning: boolean;
}

export interface FormActions {
  take(file: File | undefined): void;
  set(change: Partial<ReviseWords>): void;
  /** What was typed is done with for now. */
  keep(): void;
  show(): void;
  stop(): void;
}

/** What is asked of a revision. */
export function reviseForm(state: FormState, actions: FormActions): TemplateResult {
  const { words, choices, isRunning } = state;
  return html`<form class="revise-form" novalidate @submit=${(event: Event) => {
    event.preventDefault();
    actions.show();
  }}>
    ${fileField(state, actions)}
    ${
      choices.tables.length > 1
        ? choice("table", "Table in the file", choices.tables, words.table, (table) => actions.set({ table }))
        : nothing
    }
    ${
      choices.keys.length > 0
        ? html`<div>${choice("key", "Rows are named by", choices.keys, words.key, (key) => actions.set({ key }))} ${problemsOf(state, "key")}</div>`
        : problemsOf(state, "key")
    }
    ${problemsOf(state, "table")}
    ${lines(state, actions, "conditions", "Thresholds to watch, one a line", "K [m/s] >= 1 m/s")}
    ${lines(state, actions, "aliases", "Rows under other names, one a line", "HD 1 = HIP 1234")}
    <label class="shell-check"><input type="checkbox" .checked=${words.erases} @change=${(event: Event) => actions.set({ erases: (event.target as HTMLInputElement).checked })} /> blanks of the file erase what stands here</label>
    <div class="panel-actions">
      <button type="submit" class="main" ?disabled=${isRunning}>Show what would change</button>
      ${isRunning ? html`<button type="button" @click=${actions.stop}>Stop</button>` : nothing}
    </div>
  </form>`;
}

function fileField(state: FormState, actions: FormActions): TemplateResult {
  const choose = (event: Event) => {
    const input = (event.currentTarget as HTMLElement).closest(".revise-file")?.querySelector("input");
    input?.click();
  };
  const chosen = (event: Event) => {
    const input = event.target as HTMLInputElement;
    const [file] = input.files ?? [];
    // The same file can be chosen again after it was written anew.
    input.value = "";
    actions.take(file);
  };
  const over = (event: DragEvent) => {
    if (event.dataTransfer?.types.includes("Files")) event.preventDefault();
  };
  const drop = (event: DragEvent) => {
    const [file] = event.dataTransfer?.files ?? [];
    if (!file) return;
    event.preventDefault();
    // Elsewhere on the page it would be opened as a book of its own.
    event.stopPropagation();
    document.querySelector(".isDroppedOn")?.classList.remove("isDroppedOn");
    actions.take(file);
  };
  return html`<div class="field revise-file" @dragover=${over} @drop=${drop}>
    <span class="revise-label" id="revise-file-label">Revised values from</span>
    <div class="revise-drop">
      <button type="button" id="revise-choose" aria-describedby="revise-file-name" @click=${choose}>Choose a file…</button>
      <span id="revise-file-name">${state.file ?? "or drop one here"}</span>
      <input type="file" hidden aria-labelledby="revise-file-label" @change=${chosen} />
    </div>
    ${problemsOf(state, "file")}
  </div>`;
}

function choice(
  word: "key" | "table",
  label: string,
  names: readonly string[],
  value: string,
  set: (value: string) => void,
): TemplateResult {
  return html`<div class="field">
    <label for="revise-${word}">${label}</label>
    <select id="revise-${word}" @change=${(event: Event) => set((event.target as HTMLSelectElement).value)}>
      ${names.map((name) => html`<option value=${name} ?selected=${name === value}>${name}</option>`)}
    </select>
  </div>`;
}

function lines(
  state: FormState,
  actions: FormActions,
  word: "aliases" | "conditions",
  label: string,
  example: string,
): TemplateResult {
  const isWrong = state.problems.some((problem) => problem.word === word);
  return html`<div class="field">
    <label for="revise-${word}">${label}</label>
    <textarea id="revise-${word}" rows="2" spellcheck="false" placeholder=${example} aria-invalid=${isWrong ? "true" : nothing}
      aria-describedby=${isWrong ? `revise-${word}-problem` : nothing}
      .value=${state.words[word]}
      @input=${(event: Event) => actions.set({ [word]: (event.target as HTMLTextAreaElement).value })}
      @change=${actions.keep}></textarea>
    ${problemsOf(state, word)}
  </div>`;
}

function problemsOf({ problems }: FormState, word: ReviseProblem["word"]): TemplateResult | typeof nothing {
  const own = problems.filter((problem) => problem.word === word);
  if (own.length === 0) return nothing;
  return html`<div id="revise-${word}-problem">
    ${own.map(({ message }) => html`<p class="panel-fault">${message[0]?.toUpperCase()}${message.slice(1)}</p>`)}
  </div>`;
}
