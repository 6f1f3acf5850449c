import { render } from "lit-html";
import { checkPart } from "./check/checkPart.js";
import { comparePart } from "./compare/comparePart.js";
import { findPart } from "./find/findPart.js";
import { type PaneState, paneView } from "./paneView.js";
import type { Part, Surroundings } from "./part.js";
import { whyPart } from "./why/whyPart.js";
import type { Worksheet } from "./worksheet.js";

/** Draws the pane into an element and keeps it drawn. */
export function startPane(root: HTMLElement, worksheet: Worksheet): void {
  const surroundings: Surroundings = { worksheet, redraw, announce, attempt };
  const parts: readonly Part[] = [findPart, whyPart, checkPart, comparePart].map((part) => part(surroundings));
  let state: PaneState = { active: parts[0]!, said: "", trouble: "" };

  function redraw(): void {
    render(paneView(parts, state, { show, dismiss }), root);
  }

  function update(change: Partial<PaneState>): void {
    state = { ...state, ...change };
    redraw();
  }

  function show(active: Part): void {
    update({ active, said: "", trouble: "" });
    window.scrollTo(0, 0);
    active.shown();
  }

  function dismiss(): void {
    update({ trouble: "" });
  }

  function announce(said: string): void {
    update({ said, trouble: "" });
  }

  function attempt(work: () => Promise<void>): void {
    work().catch((error: unknown) => {
      update({ trouble: `The worksheet did not answer: ${error instanceof Error ? error.message : String(error)}` });
    });
  }

  redraw();
  attempt(() => worksheet.watchSelection(() => state.active.selected()));
  state.active.shown();
}
