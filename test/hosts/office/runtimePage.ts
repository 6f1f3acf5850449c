import type { Browser, Page } from "playwright-core";
import { answerHostLibrary } from "./hostLibrary.js";

/** One call as the host sends it: the function's id, its arguments, and where they stand. */
export interface RuntimeCall {
  readonly id: string;
  readonly values: readonly unknown[];
  readonly addresses?: readonly (string | null)[];
}

/** What the runtime sends back: the result, or the sentence and the runtime's number of the error's code. */
export type RuntimeAnswer = { readonly value: unknown } | { readonly message: string; readonly code: number };

/** The numbers by which the runtime tells the codes that a function threw. */
export const codeNumbers: Readonly<Record<string, number>> = {
  "#N/A": 1,
  "#DIV/0!": 5,
  "#NUM!": 6,
  "#VALUE!": 7,
  "#NULL!": 8,
};

/**
 * The add-in's page with the host's real custom-functions runtime, behind a stand-in for the host: it takes the place of
 * the bridge over which the runtime is called and answers. An internal protocol, so the library's version is pinned.
 */
export async function openRuntimePage(browser: Browser, base: string, pane: string): Promise<Page> {
  const page = await browser.newPage();
  await answerHostLibrary(page);
  const body = pane
    .replace("hosted/office.js", "hosted/custom-functions-runtime.debug.js")
    .replace(/<script src="pane.js".*?<\/script>/, "");
  await page.route(`${base}pane.html`, (route) => route.fulfill({ contentType: "text/html", body }));
  await page.addInitScript(standInBridge);
  await page.goto(`${base}pane.html`);
  return page;
}

/** The answers to calls that arrive at once, in their order; sent as one text, which is the fast way into a page. */
export async function callRuntime(page: Page, calls: readonly RuntimeCall[]): Promise<RuntimeAnswer[]> {
  const sent = JSON.stringify(calls.map(({ id, values, addresses }) => [id, values, addresses ?? null]));
  const answered = await page.evaluate(async (text) => {
    const world = globalThis as unknown as { callAll(calls: unknown): Promise<unknown> };
    return JSON.stringify(await world.callAll(JSON.parse(text)));
  }, sent);
  return JSON.parse(answered);
}

/** Runs in the page, before anything else. */
function standInBridge(): void {
  type Waiting = (answer: unknown) => void;
  interface Bridge {
    sendMessageToHost(text: string): void;
    onMessageFromHost?(text: string): void;
  }
  interface Action {
    readonly Id: number;
    readonly Name: string;
    readonly ArgumentInfo: { readonly Arguments: readonly [readonly (readonly [number, boolean, unknown, number])[]] };
  }
  const waiting = new Map<number, Waiting>();
  const take = ([id, done, value, code]: readonly [number, boolean, unknown, number]) => {
    waiting.get(id)?.(done ? { value } : { message: value, code });
    waiting.delete(id);
  };
  const bridge: Bridge = {
    sendMessageToHost(text) {
      const { id, message } = JSON.parse(text);
      const actions: readonly Action[] = message?.body?.Actions ?? [];
      for (const action of actions) {
        if (action.Name === "SetInvocationArrayResults") action.ArgumentInfo.Arguments[0].forEach(take);
      }
      const results = actions.map((action) => ({ ActionId: action.Id, Value: null }));
      const body = JSON.stringify({ Results: results, TraceIds: [] });
      const answer = { id, type: 2, message: { statusCode: 200, headers: {}, body } };
      setTimeout(() => bridge.onMessageFromHost?.(JSON.stringify(answer)), 0);
    },
  };
  let next = 1;
  // 4: errors are allowed as arguments; 8: rich values come as texts of their own.
  const flags = 4 | 8;
  const callAll = (calls: readonly (readonly [string, readonly unknown[], unknown])[]) => {
    const answers = calls.map(() => {
      const id = next++;
      return { id, answer: new Promise((resolve) => waiting.set(id, resolve)) };
    });
    const entries = calls.map(([id, values, addresses], index) => {
      const number = answers[index]!.id;
      return [1, 1000, "", JSON.stringify([number, id, values, null, flags, addresses]), number];
    });
    bridge.onMessageFromHost?.(JSON.stringify({ type: 3, message: { entries } }));
    return Promise.all(answers.map(({ answer }) => answer));
  };
  Object.assign(globalThis, { _richApiNativeBridge: bridge, callAll });
}
