import { html } from "lit-html";
import { latest } from "../latest.js";
import type { Part, Surroundings } from "../part.js";
import { type CellStory, tellCell } from "./tellCell.js";
import { whyView } from "./whyView.js";

export function whyPart({ worksheet, redraw, attempt }: Surroundings): Part {
  let story: CellStory | undefined;
  const last = latest();

  function tell(): void {
    attempt(() =>
      last(
        worksheet.selection().then((selection) => tellCell(worksheet, selection)),
        (told) => {
          story = told;
          redraw();
        },
      ),
    );
  }

  const view = () => (story ? whyView(story, tell) : html`<p class="aside">Reading the selected cell.</p>`);
  return { id: "why", title: "Why", view, shown: tell, selected: tell };
}
