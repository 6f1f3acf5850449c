import { createGrid } from "../../../../../src/hosts/bench/page/grid/createGrid.js";
import type { Area } from "../../../../../src/sheet/book/book.js";
import { standInPage } from "./standInPage.js";

const page = standInPage(Number(new URLSearchParams(location.search).get("rows") ?? 1_000_000));
const told: { readonly what: string; readonly with?: unknown }[] = [];
let isPicking = false;
const tell = (what: string, detail?: unknown) => told.push({ what, with: detail });

const grid = createGrid(document.getElementById("host")!, page, {
  isPicking: () => isPicking,
  pick: (area: Area, done: boolean) => tell("pick", { area, done }),
  edit: (typed) => tell("edit", typed ?? null),
  openUnit: (column, anchor) => tell("unit", { column, text: anchor.textContent }),
  openMenu: (about, at) => tell("menu", { about, at }),
  copy: (cut) => tell("copy", cut),
  paste: (data) => tell("paste", data.getData("text/plain")),
});
page.reveal = grid.reveal;

declare global {
  var gridStandIn: {
    readonly page: typeof page;
    readonly grid: typeof grid;
    readonly told: typeof told;
    pickFor(on: boolean): void;
    /** The times of frames since the last call [ms]. */
    frameTimes(): number[];
  };
}

const frameTimes: number[] = [];
requestAnimationFrame(function tick(time) {
  frameTimes.push(time);
  requestAnimationFrame(tick);
});

globalThis.gridStandIn = {
  page,
  grid,
  told,
  pickFor(on) {
    isPicking = on;
  },
  frameTimes: () => frameTimes.splice(0),
};
