import { html, nothing } from "lit-html";
import type { Dialogs } from "../dialogs.js";

export interface TextQuestion {
  readonly title: string;
  readonly label: string;
  readonly value: string;
  readonly action: string;
  readonly check?: (text: string) => string | undefined;
  readonly done: (text: string) => void;
}

/** Asks for one text. */
export function textDialog(dialogs: Dialogs, question: TextQuestion): void {
  const { title, label, action, check, done } = question;
  let value = question.value;
  let problem: string | undefined;
  dialogs.open(title, ({ close, redraw }) => {
    const enter = () => {
      problem = value.trim() === "" ? "Type something first." : check?.(value.trim());
      if (problem !== undefined) return redraw();
      close();
      done(value.trim());
    };
    return html`<div class="field">
        <label for="text-answer">${label}</label>
        <input
          id="text-answer"
          type="text"
          .value=${value}
          aria-describedby="text-problem"
          aria-invalid=${problem ? "true" : nothing}
          @input=${(event: Event) => {
            value = (event.target as HTMLInputElement).value;
          }}
          @keydown=${(event: KeyboardEvent) => {
            if (event.key === "Enter") enter();
          }}
        />
        <p class="shell-problem" id="text-problem" role="alert">${problem ?? ""}</p>
      </div>
      <div class="shell-actions"><button type="button" class="main" @click=${enter}>${action}</button></div>`;
  });
}
