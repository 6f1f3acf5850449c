import { createEditor } from "../../../../../src/hosts/bench/page/editor/createEditor.js";
import type { Editor } from "../../../../../src/hosts/bench/page/editor/editor.js";
import type { Page, PageChange, Remote, Selection } from "../../../../../src/hosts/bench/page/page.js";
import type { Bench } from "../../../../../src/hosts/bench/protocol/bench.js";
import type { BookState, ColumnState } from "../../../../../src/hosts/bench/protocol/bookState.js";
import { standInBench } from "./standInBench.js";
import { standInGrid } from "./standInGrid.js";

const column = (name: string, unit: string) => ({ name, unit }) as ColumnState;
const columnStates = [
  column("Target", ""),
  column("Period", "d"),
  column("Star mass", "solMass"),
  column("Planet mass", "jupiterMass"),
  column("K", "m/s"),
];
const state = {
  id: "1",
  version: 1,
  sheets: [
    { name: "Targets", columnStates },
    { name: "More stars", columnStates: [] },
  ],
  names: [{ name: "star_mass", refersTo: "=Targets!$C$2" }],
} as unknown as BookState;

const entries = new Map([
  ["0,0,1", "Period [d]"],
  ["0,1,1", "4.230785"],
  ["0,2,1", "two\nlines"],
  ["0,1,4", "=B2*2+C$2"],
]);
const log: { readonly what: string; readonly given: unknown }[] = [];
const said: string[] = [];
const listeners = new Set<(change: PageChange) => void>();
const tell = (change: PageChange) => {
  for (const listener of listeners) listener(change);
};
const methods = standInBench(entries, (what, given) => log.push({ what, given }));
const delays: Record<string, number> = {};
/** Methods that break down, those named in the address from the start. */
const broken = new Set(location.hash.slice(1).split(","));
const bench = new Proxy({} as Remote<Bench>, {
  get:
    (_, name: keyof typeof methods) =>
    async (...given: unknown[]) => {
      if (broken.has(name)) throw new Error("the worker broke down");
      const answer = (methods[name] as (...given: unknown[]) => unknown)(...given);
      await new Promise((resolve) => setTimeout(resolve, delays[name] ?? 0));
      return answer;
    },
});
let sheet = 0;
const cellOf = (row: number, column: number): Selection => ({
  area: { sheet, top: row, left: column, bottom: row, right: column },
  active: { sheet, row, column },
});
let selection = cellOf(1, 5);

const page = {
  bench,
  state: () => state,
  sheet: () => sheet,
  sheetState: () => state.sheets[sheet]!,
  showSheet(wanted: number) {
    sheet = wanted;
    selection = cellOf(0, 0);
    tell("sheet");
    tell("selection");
  },
  selection: () => selection,
  select(area: Selection["area"], active?: Selection["active"]) {
    if (area.sheet !== sheet) page.showSheet(area.sheet);
    selection = { area, active: active ?? { sheet, row: area.top, column: area.left } };
    tell("selection");
  },
  async act(action: never) {
    const outcome = await bench.act(action);
    if (outcome.is === "refused") said.push(outcome.message);
    if (outcome.is === "done") tell("state");
    return outcome.is === "done";
  },
  announce: (text: string) => said.push(text),
  trouble: (text: string) => said.push(text),
  onChange(listener: (change: PageChange) => void) {
    listeners.add(listener);
    return () => listeners.delete(listener);
  },
} as unknown as Page;

const line = document.getElementById("line")!;
let editor: Editor;
const { grid, marks } = standInGrid(document.getElementById("grid")!, page, {
  isPicking: () => editor.isPicking(),
  pick: (area, done) => editor.pick(area, done),
  edit: (typed) => editor.beginInCell(typed),
} as Parameters<typeof standInGrid>[2]);
editor = createEditor(line, page, grid);

/** What a test reaches of the page. */
export const standIn = { editor, page, entries, log, said, marks, delays, broken };
Object.assign(globalThis, { standIn });
grid.focus();
