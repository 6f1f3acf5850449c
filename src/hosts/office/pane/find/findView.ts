import { html, nothing, type TemplateResult } from "lit-html";
import { live } from "lit-html/directives/live.js";
import { repeat } from "lit-html/directives/repeat.js";
import type { Definition } from "../../../../functions/definition.js";
import { focusOn } from "../focusOn.js";
import { buildView } from "./buildView.js";
import type { FindActions, FindState } from "./findState.js";
import { functionView } from "./functionView.js";

export function findView(state: FindState, actions: FindActions): TemplateResult {
  return state.chosen ? chosenView(state.chosen, state, actions) : searchView(state, actions);
}

function searchView({ query, found }: FindState, actions: FindActions): TemplateResult {
  const count = found.length === 1 ? "1 function" : `${found.length} functions`;
  return html`
    <div class="field">
      <label for="question">What do you want to know?</label>
      <input
        id="question"
        type="search"
        autocomplete="off"
        spellcheck="false"
        placeholder="how fast, minimum mass"
        .value=${live(query)}
        @input=${(event: Event) => actions.search((event.target as HTMLInputElement).value)}
      />
    </div>
    <p class="count" role="status">${
      found.length === 0
        ? html`No function has these words. Try a quantity (mass, period, shift) or clear the field to see all.`
        : count
    }</p>
    <ul class="answers">
      ${repeat(
        found,
        ({ name }) => name,
        (definition) => html`<li>
          <button type="button" class="answer" @click=${() => {
            actions.choose(definition);
            focusOn("chosen");
          }}>
            <span class="question">${definition.question}</span> <span class="name">${definition.name}</span>
          </button>
        </li>`,
      )}
    </ul>
  `;
}

function chosenView(definition: Definition, { build }: FindState, actions: FindActions): TemplateResult {
  return html`
    <button type="button" class="quiet" @click=${() => {
      actions.leave();
      focusOn("question");
    }}>Back to all functions</button>
    ${functionView(definition)} ${build ? buildView(definition, build, actions) : nothing}
  `;
}
