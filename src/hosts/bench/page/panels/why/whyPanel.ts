import { addressText } from "../../../../../sheet/book/address.js";
import type { Distribution, WhyCell } from "../../../protocol/answers.js";
import { faultText } from "../../createPage.js";
import type { Page } from "../../page.js";
import type { Panel } from "../../panel.js";
import { goTo } from "../goTo.js";
import { type WorkedOut, whyView } from "./whyView.js";

/** Every drawing starts from the same seed, so that the same cell always shows the same distribution. */
const firstSeed = 1;

/** The story of the active cell, kept up to date with it. */
export function whyPanel(page: Page, redraw: () => void): Panel {
  let cell: WhyCell | undefined;
  let distribution: Distribution | "drawing" | undefined;
  let isShown = false;
  let asked = 0;

  function ask(): void {
    if (!isShown) return;
    asked += 1;
    const mine = asked;
    page.bench.why(page.selection().active).then(
      (answer) => {
        if (mine !== asked) return;
        const isSame = answer.address === cell?.address && answer.exact === cell.exact;
        cell = answer;
        if (!isSame) distribution = undefined;
        redraw();
      },
      (fault) => page.trouble(faultText(fault)),
    );
  }

  function draw(): void {
    if (!cell) return;
    const { place } = cell;
    const mine = asked;
    distribution = "drawing";
    redraw();
    page.bench.draw(place, firstSeed).then(
      (answer) => {
        if (mine !== asked) return;
        distribution = answer;
        redraw();
      },
      (fault) => {
        distribution = undefined;
        page.trouble(faultText(fault));
        redraw();
      },
    );
  }

  return {
    id: "why",
    title: "Why this cell",
    keys: "Alt+W",
    view: () => whyView(cell, workedOut(page, cell), distribution, { draw, goTo: (place) => goTo(page, place) }),
    shown() {
      isShown = true;
      ask();
    },
    hidden() {
      isShown = false;
    },
    changed(change) {
      if (change !== "preferences") ask();
    },
  };
}

/** The cells that formulas fill in the row of a cell that holds none itself. */
function workedOut(page: Page, cell: WhyCell | undefined): readonly WorkedOut[] | undefined {
  if (!cell || cell.formula !== undefined || cell.filledFrom || cell.place.row === 0) return undefined;
  const { sheet, row } = cell.place;
  const columns = page.state().sheets[sheet]?.columnStates ?? [];
  return columns.flatMap(({ name, derived, sigmaOf }, column) =>
    derived && sigmaOf === undefined && name !== ""
      ? [{ name, address: addressText(row, column), place: { sheet, row, column } }]
      : [],
  );
}
