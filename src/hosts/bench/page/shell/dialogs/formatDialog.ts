import { html } from "lit-html";
import { displayMeasured } from "../../../../../sheet/display/displayMeasured.js";
import { displayNumber } from "../../../../../sheet/display/displayNumber.js";
import type { NumberFormat } from "../../../../../sheet/display/numberFormat.js";
import { headerOf } from "../selected.js";
import type { Shell } from "../shell.js";

const choices: readonly { readonly words: string; readonly format: NumberFormat }[] = [
  { words: "All digits that the number has", format: { kind: "general" } },
  { words: "Value and uncertainty, its two digits deciding", format: { kind: "plus-minus", digits: 2 } },
  { words: "Value and uncertainty in brackets", format: { kind: "brackets", digits: 2 } },
  { words: "Value and uncertainty by the Particle Data Group's rule", format: { kind: "plus-minus", digits: "PDG" } },
  ...[0, 1, 2, 3, 4, 6].map((decimals) => ({
    words: `${decimals} ${decimals === 1 ? "digit" : "digits"} behind the point`,
    format: { kind: "fixed", decimals, grouped: false } as const,
  })),
  ...[3, 4, 6].map((digits) => ({
    words: `${digits} significant digits`,
    format: { kind: "significant", digits } as const,
  })),
  { words: "Power of ten, 4 digits", format: { kind: "scientific", digits: 4 } },
  { words: "Thousands grouped", format: { kind: "fixed", decimals: 0, grouped: true } },
  { words: "Per cent", format: { kind: "percent", decimals: 1 } },
  { words: "Date", format: { kind: "date" } },
  { words: "Date and time", format: { kind: "date-time", decimals: 0 } },
];

/** How numbers of columns are shown; what the cells hold is not changed. */
export function formatDialog({ page, dialogs }: Shell, columns: readonly number[]): void {
  const present = page.sheetState().columnStates[columns[0] ?? 0]?.format ?? { kind: "general" };
  const title =
    columns.length === 1
      ? `Numbers of ${headerOf(page, columns[0] as number)}`
      : `Numbers of ${columns.length} columns`;
  dialogs.open(title, ({ close }) => {
    const set = (format: NumberFormat) => {
      close();
      void page.act({ do: "format", sheet: page.sheet(), columns, format });
    };
    return html`<ul class="shell-choices">
      ${choices.map(
        ({ words, format }) => html`<li>
          <button type="button" aria-pressed=${sameFormat(format, present) ? "true" : "false"} @click=${() => set(format)}>
            <span>${words}</span><span class="number soft">${exampleOf(format)}</span>
          </button>
        </li>`,
      )}
    </ul>`;
  });
}

function exampleOf(format: NumberFormat): string {
  if (format.kind === "plus-minus" || format.kind === "brackets")
    return displayMeasured(58.6142, 1.923, undefined, format);
  return displayNumber(format.kind === "date" || format.kind === "date-time" ? 46419.25 : 1958.6142, format);
}

function sameFormat(a: NumberFormat, b: NumberFormat): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}
