import { html, nothing, type TemplateResult } from "lit-html";
import type { PlanProblem, PlanStart, PlanWord, PlanWords } from "../../../protocol/plan.js";

export type NameList = "must" | "excluded";

/** Parts of the form that can be folded. */
export type FormPart = "limits" | "columns";

export interface FormActions {
  set(change: Partial<PlanWords>): void;
  /** Something else is being typed: what was wrong with it is no longer told. */
  mend(word: PlanWord): void;
  unfold(part: FormPart, isOpen: boolean): void;
  take(list: NameList): void;
  takeSite(): void;
  run(): void;
  stop(): void;
}

export interface FormState {
  readonly words: PlanWords;
  readonly start: PlanStart;
  readonly problems: readonly PlanProblem[];
  readonly isRunning: boolean;
  readonly unfolded: ReadonlySet<FormPart>;
  /** "selected" or "marked". */
  readonly rows: string;
}

type TextWord = Exclude<PlanWord, "columns" | "must" | "excluded">;

export const limitWords: readonly PlanWord[] = [
  "airmass",
  "sun",
  "moon",
  "perNight",
  "gap",
  "width",
  "efficiency",
  "phases",
];

/** Columns that a plan needs and no header names. */
export function lacksColumns(words: PlanWords, start: PlanStart): boolean {
  return start.columns.some(({ quantity, header, isNeeded }) => {
    const isPhases = isNeeded === "for phases" && words.phases !== "any";
    return (isNeeded === "always" || isPhases) && header === undefined && !words.columns[quantity];
  });
}

/** What is asked of a plan, in words that can be changed. */
export function planForm(state: FormState, actions: FormActions): TemplateResult {
  const { words, start, problems, isRunning } = state;
  const text = (word: TextWord, label: string) => textField(state, actions, word, label);
  const wrong = (...names: readonly PlanWord[]) => names.map((word) => problemsOf(problems, word));
  return html`<form class="plan-form" novalidate @submit=${(event: Event) => {
    event.preventDefault();
    actions.run();
  }}>
    <div class="plan-beside plan-three">
      ${text("hours", "Hours")} ${text("from", "First night")} ${text("to", "Last night")}
    </div>
    ${wrong("hours", "from", "to")}
    <fieldset>
      <legend>Where</legend>
      <div class="plan-beside plan-three">
        ${text("longitude", "Longitude")} ${text("latitude", "Latitude")} ${text("height", "Height")}
      </div>
      ${wrong("longitude", "latitude", "height")} ${siteNote(state, actions)}
    </fieldset>
    ${valueField(state, actions)}
    ${namesField(state, actions, "must", "Has to be in")} ${namesField(state, actions, "excluded", "Left out")}
    ${folded(
      state,
      actions,
      "limits",
      html`Limits <span class="soft">${limitsText(words)}</span>`,
      html`<div class="plan-beside">
          ${text("airmass", "Airmass at most")} ${text("sun", "Sun below")} ${text("moon", "Moon at least away")}
          ${text("perNight", "Visits a night")} ${text("gap", "Between two visits")}
          ${text("width", "Phase within, of 1")} ${text("efficiency", "Usable part of 1")}
        </div>
        ${wrong(...limitWords)} ${phasesField(state, actions)}`,
    )}
    ${folded(
      state,
      actions,
      "columns",
      html`Columns <span class="soft">${lacksColumns(words, start) ? "some are missing" : "as their headers say"}</span>`,
      html`${wrong("columns")}
        <div class="plan-beside">${start.columns.map((column) => columnField(state, actions, column))}</div>`,
    )}
    ${problems.filter(({ word }) => word === undefined).map(({ message }) => fault(message))}
    <div class="panel-actions">
      <button type="submit" class="main" ?disabled=${isRunning}>Make the plan</button>
      ${isRunning ? html`<button type="button" @click=${actions.stop}>Stop</button>` : nothing}
    </div>
  </form>`;
}

function folded(
  { unfolded }: FormState,
  actions: FormActions,
  part: FormPart,
  summary: TemplateResult,
  content: TemplateResult,
): TemplateResult {
  const toggled = (event: Event) => actions.unfold(part, (event.target as HTMLDetailsElement).open);
  return html`<details .open=${unfolded.has(part)} @toggle=${toggled}>
    <summary>${summary}</summary>
    ${content}
  </details>`;
}

function textField(
  { words, problems }: FormState,
  actions: FormActions,
  word: TextWord,
  label: string,
): TemplateResult {
  const isWrong = problems.some((problem) => problem.word === word);
  return html`<div class="field">
    <label for="plan-${word}">${label}</label>
    <input id="plan-${word}" type="text" autocomplete="off" .value=${words[word]} aria-invalid=${isWrong ? "true" : nothing}
      aria-describedby=${isWrong ? `plan-${word}-problem` : nothing}
      @input=${() => isWrong && actions.mend(word)}
      @change=${(event: Event) => actions.set({ [word]: textOf(event) })} />
  </div>`;
}

function valueField({ words, start, problems }: FormState, actions: FormActions): TemplateResult {
  return html`<div class="field">
    <label for="plan-value">A target is worth</label>
    <select id="plan-value" aria-describedby=${problems.some(({ word }) => word === "value") ? "plan-value-problem" : nothing}
      @change=${(event: Event) => actions.set({ value: textOf(event) })}>
      ${options([["", "choose a column"], ...start.values.map((header) => [header, header] as const)], words.value)}
    </select>
    ${problemsOf(problems, "value")}
  </div>`;
}

function namesField(
  { words, problems, rows }: FormState,
  actions: FormActions,
  list: NameList,
  label: string,
): TemplateResult {
  const names = words[list];
  return html`<div class="field" role="group" aria-labelledby="plan-${list}-label">
    <span class="plan-label" id="plan-${list}-label">${label}</span>
    ${
      names.length > 0
        ? html`<ul class="plan-names">
            ${names.map((name) => html`<li><button type="button" aria-label="Take ${name} from this list" @click=${() => actions.set({ [list]: names.filter((each) => each !== name) })}>${name} <span aria-hidden="true">×</span></button></li>`)}
          </ul>`
        : nothing
    }
    <div><button type="button" class="quiet" @click=${() => actions.take(list)}>Add the ${rows} rows</button></div>
    ${problemsOf(problems, list)}
  </div>`;
}

function phasesField(state: FormState, actions: FormActions): TemplateResult {
  const { words } = state;
  const isNamed = words.phases !== "quadrature" && words.phases !== "any";
  const choose = (event: Event) => {
    const chosen = textOf(event);
    actions.set({ phases: chosen === "these" ? "0.25, 0.75" : chosen });
  };
  return html`<div class="field">
      <label for="plan-which-phases">Phases</label>
      <select id="plan-which-phases" @change=${choose}>
        ${options(
          [
            ["quadrature", "where each velocity is lowest and highest"],
            ["any", "any phase"],
            ["these", "these, from the reference time"],
          ],
          isNamed ? "these" : words.phases,
        )}
      </select>
    </div>
    ${isNamed ? textField(state, actions, "phases", "These phases, 0 to 1") : nothing}`;
}

function columnField(
  { words, start }: FormState,
  actions: FormActions,
  { quantity, header, isNeeded }: PlanStart["columns"][number],
): TemplateResult {
  const id = `plan-column-${quantity.replaceAll(" ", "-")}`;
  const without = isNeeded === "no" ? "none" : "not found";
  const choices = start.headers.filter((each) => each !== header).map((each) => [each, each] as const);
  const set = (event: Event) => actions.set({ columns: { ...words.columns, [quantity]: textOf(event) } });
  return html`<div class="field">
    <label for=${id}>${quantity[0]?.toUpperCase()}${quantity.slice(1)}</label>
    <select id=${id} @change=${set}>${options([["", header ?? without], ...choices], words.columns[quantity] ?? "")}</select>
  </div>`;
}

function siteNote({ words, start }: FormState, actions: FormActions): TemplateResult | typeof nothing {
  const { site } = start;
  if (!site)
    return html`<p class="soft">The book states no site; a row "Site longitude [deg]" with its value beside it would.</p>`;
  const isSame = (["longitude", "latitude", "height"] as const).every((part) => words[part] === site[part]);
  if (isSame) return html`<p class="soft">From ${site.foundIn}; east is positive.</p>`;
  return html`<p><button type="button" class="quiet" @click=${actions.takeSite}>Take it from ${site.foundIn}</button></p>`;
}

function limitsText({ airmass, sun, phases, perNight }: PlanWords): string {
  const at = phases === "quadrature" ? "quadratures" : phases === "any" ? "any phase" : `phases ${phases}`;
  return `airmass ${airmass}, Sun below ${sun}, ${at}, ${perNight} a night`;
}

function options(entries: readonly (readonly [string, string])[], value: string) {
  return entries.map(([key, words]) => html`<option value=${key} ?selected=${key === value}>${words}</option>`);
}

function problemsOf(problems: readonly PlanProblem[], word: PlanWord) {
  const own = problems.filter((problem) => problem.word === word);
  return own.length === 0
    ? nothing
    : html`<div id="plan-${word}-problem">${own.map(({ message }) => fault(message))}</div>`;
}

function fault(message: string): TemplateResult {
  return html`<p class="panel-fault">${message[0]?.toUpperCase()}${message.slice(1)}</p>`;
}

function textOf(event: Event): string {
  return (event.target as HTMLInputElement | HTMLSelectElement).value;
}
