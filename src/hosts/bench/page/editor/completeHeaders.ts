import type { Desk } from "./desk.js";

/** Writes the headers that a call of ours lacks, where the worker finds them, and says so. */
export async function completeHeaders({ page, formula, edit }: Desk): Promise<void> {
  if (!edit) return;
  const { state } = formula.view;
  const text = formula.text();
  const answer = await page.bench.completeHeaders(text, state.selection.main.head, edit.place);
  // Typed on meanwhile: the answer is for another text.
  if (formula.view.state !== state && formula.text() !== text) return;
  if (answer.text !== text) {
    formula.view.dispatch({
      changes: { from: 0, to: text.length, insert: answer.text },
      selection: { anchor: Math.min(answer.caret, answer.text.length) },
      userEvent: "input.complete",
      scrollIntoView: true,
    });
  }
  page.announce(answer.said);
}
