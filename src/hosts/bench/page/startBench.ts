import { html, nothing, render, type TemplateResult } from "lit-html";
import { keepOffline } from "../offline/keepOffline.js";
import type { BenchEvent } from "../protocol/bench.js";
import type { BookState } from "../protocol/bookState.js";
import { type BenchClient, createBenchClient } from "./benchClient.js";
import { createPage, type OwnedPage, type Voice } from "./createPage.js";
import type { CreateEditor } from "./editor/editor.js";
import type { CreateGrid } from "./grid/grid.js";
import { checkPanel } from "./panels/check/checkPanel.js";
import { comparePanel } from "./panels/compare/comparePanel.js";
import { findPanel } from "./panels/find/findPanel.js";
import { historyPanel } from "./panels/history/historyPanel.js";
import { planPanel } from "./panels/plan/planPanel.js";
import { revisePanel } from "./panels/revise/revisePanel.js";
import { whyPanel } from "./panels/why/whyPanel.js";
import { buildSkeleton, type Skeleton } from "./shell/skeleton.js";
import { startShell } from "./shell/startShell.js";

/** So many breakdowns within so long [ms] are mended by a new worker. */
const mostBreakdowns = 3;
const breakdownSpan = 20_000;

const createPanels = [whyPanel, checkPanel, planPanel, revisePanel, comparePanel, historyPanel, findPanel];

/** Starts the worker, waits for the book, and builds the page around it. */
export async function startBench(root: HTMLElement, createGrid: CreateGrid, createEditor: CreateEditor): Promise<void> {
  const skeleton = buildSkeleton(root);
  const voice = createVoice(skeleton);
  let page: OwnedPage | undefined;
  let onEvent = (_event: BenchEvent) => {};
  const client: BenchClient = createBenchClient(
    () => new Worker(new URL("worker.js", document.baseURI)),
    (event) => onEvent(event),
    (message) => void recover(message),
  );

  let breakdowns: readonly number[] = [];

  /** The worker broke down: another one opens the last whole sheet, unless that breaks down again and again. */
  async function recover(message: string): Promise<void> {
    const now = performance.now();
    breakdowns = [...breakdowns.filter((each) => now - each < breakdownSpan), now];
    if (breakdowns.length > mostBreakdowns) {
      client.end();
      voice.trouble(
        `The calculation breaks down again and again by a fault of this program (${message}), so it was stopped. Load the page again; what was kept in this browser is still there.`,
      );
      return;
    }
    client.restart();
    // Whoever waits for the first state asks again.
    if (!page) return;
    const state = await client.bench.start().catch(() => undefined);
    if (!state) return;
    page.receive(state);
    voice.trouble(
      `The calculation broke down by a fault of this program (${message}). The book is as it was after its last step.`,
    );
  }

  const state = await firstState(client, voice);
  if (!state) return;
  page = createPage(client.bench, state, voice);
  const owned = page;
  const shell = startShell(skeleton, owned, createPanels, createGrid, createEditor);
  onEvent = (event) => {
    if (event.is === "state") owned.receive(event.state);
    else if (event.is === "progress") shell.progress(event);
    else if (event.is === "idle") shell.progress(undefined);
    else void recover(event.message);
  };
  await shell.resumeDraft();
  await keepOffline((takeOver) =>
    voice.offer("A newer version of this page lies ready. What you work on is kept.", "Load it", takeOver),
  );
}

async function firstState({ bench }: BenchClient, voice: Voice): Promise<BookState | undefined> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await bench.start();
    } catch (fault) {
      if (attempt <= mostBreakdowns) continue;
      const message = fault instanceof Error ? fault.message : String(fault);
      voice.trouble(
        `This page could not start: ${message} Load it again; what was kept in this browser is still there.`,
      );
      return undefined;
    }
  }
}

function createVoice({ said, trouble }: Skeleton): Voice {
  let going: ReturnType<typeof setTimeout> | undefined;
  const close = () => render(nothing, trouble);
  const show = (text: string, action: TemplateResult | typeof nothing, isFault: boolean) =>
    render(
      html`<p class="caution">${isFault ? html`<span class="mark" aria-hidden="true"></span>` : nothing}<span>${text}</span>${action}<button type="button" class="quiet" @click=${close}>Close</button></p>`,
      trouble,
    );
  return {
    announce(text) {
      // The same words twice are told twice.
      said.textContent = "";
      requestAnimationFrame(() => {
        said.textContent = text;
      });
      clearTimeout(going);
      going = setTimeout(() => {
        said.textContent = "";
      }, 5_000);
    },
    trouble: (text) => show(text, nothing, true),
    offer: (text, action, run) => show(text, html`<button type="button" @click=${run}>${action}</button>`, false),
  };
}
