import { html, type TemplateResult } from "lit-html";

/** The formula typeset where it can be, otherwise in plain notation. The markup is made by the catalogue, never by a file. */
export function mathView(math: string | undefined, plain: string): TemplateResult {
  if (math === undefined) return html`<p class="panel-formula code">${plain}</p>`;
  return html`<div class="panel-math" role="math" tabindex="0" aria-label=${plain} .innerHTML=${math}></div>`;
}
