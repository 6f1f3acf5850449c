import type { Area, Place } from "../../../../sheet/book/book.js";
import type { PageChange } from "../page.js";
import { listenToClipboard } from "./clipboard.js";
import type { CreateGrid } from "./grid.js";
import { createColumnWidths } from "./keys/columnWidths.js";
import { listenToKeys } from "./keys/keys.js";
import { stepped } from "./keys/motions.js";
import { createWalking } from "./keys/walking.js";
import { buildFrame } from "./layout/frame.js";
import { screenBox } from "./layout/screenBox.js";
import { createSight, type Spot } from "./layout/sight.js";
import { createActiveCell } from "./paint/activeCell.js";
import { createCellInset } from "./paint/cellInset.js";
import { createMarks } from "./paint/marks.js";
import { createPainter } from "./paint/painter.js";
import { createSpoken } from "./paint/spoken.js";
import { createTip } from "./paint/tip.js";
import { listenToPresses } from "./press/presses.js";
import { areaOf, holds, isWholeColumns, isWholeRows } from "./select/areas.js";
import { createPicking } from "./select/picking.js";
import { createSelecting } from "./select/selecting.js";

/** The cells of a sheet: only those in view are there, however many the sheet has. */
export const createGrid: CreateGrid = (host, page, events) => {
  const frame = buildFrame(host);
  const sight = createSight(page, frame, request);
  const selecting = createSelecting(page, sight);
  const marks = createMarks(page, frame, sight);
  const painter = createPainter(page, frame, sight);
  const tip = createTip(page, frame, sight);
  const activeCell = createActiveCell(frame, selecting, painter, tip);
  const spoken = createSpoken(page, frame, sight, tip);
  const reveal = (spot: Spot) => {
    sight.include(spot);
    sight.reveal(spot);
    request();
  };
  const revealPlace = (place: Place) => reveal(selecting.spotOf(place));
  const inset = createCellInset(frame, sight, revealPlace);
  const picking = createPicking(page, events, sight, selecting, marks, reveal, request);
  const walking = createWalking(page, sight, selecting, reveal);
  const widths = createColumnWidths(page, frame, sight, rearrange);
  const boxOnScreen = (place: Place) => screenBox(frame, sight, selecting.spotOf(place));
  const scrolled = new Map<number, { readonly top: number; readonly left: number }>();
  let sheet = page.sheet();
  let isAsked = false;
  let isArranged = false;

  function request(): void {
    if (isAsked) return;
    isAsked = true;
    requestAnimationFrame(() => {
      isAsked = false;
      paint();
    });
  }

  function rearrange(): void {
    isArranged = false;
    request();
  }

  function paint(): void {
    if (!isArranged) sight.arrange();
    isArranged = true;
    if (!events.isPicking()) picking.clear();
    painter.paint();
    marks.paint();
    inset.paint();
    tip.paint();
    activeCell.paint();
  }

  function changed(change: PageChange): void {
    if (change === "preferences") frame.root.dataset.flash = page.preferences().flash ? "on" : "off";
    if (change === "sheet" || change === "state") changeSheet();
    if (change === "selection" || change === "sheet") {
      sight.include(selecting.active());
      if (document.activeElement === frame.table) tip.focus(selecting.active());
      spoken.moved();
    }
    request();
  }

  function changeSheet(): void {
    isArranged = false;
    frame.table.setAttribute("aria-label", `Cells of ${page.sheetState().name}`);
    if (sheet === page.sheet()) return;
    scrolled.set(sheet, { top: sight.scroll.top(), left: sight.scroll.left() });
    sheet = page.sheet();
    sight.arrange();
    const kept = scrolled.get(sheet);
    sight.scroll.setTop(kept?.top ?? 0);
    sight.scroll.setLeft(kept?.left ?? 0);
  }

  function openUnit(column: number): void {
    sight.reveal({ row: 0, column });
    paint();
    const unit = painter.unitOf(column);
    if (unit && !unit.hidden) events.openUnit(column, unit);
    else page.announce("This column has no header yet; type its name in row 1 first.");
  }

  function openMenu(): void {
    const { area } = page.selection();
    const about = isWholeColumns(area) ? "columns" : isWholeRows(area) ? "rows" : "cells";
    const box = boxOnScreen(page.selection().active) ?? frame.table.getBoundingClientRect();
    events.openMenu(about, { x: box.left + 8, y: box.bottom });
  }

  function step(from: Area, down: number, right: number, extend: boolean): Area {
    const next = (spot: Spot) => stepped(spot, down, right, sight);
    if (events.isPicking()) return picking.stepFrom(from, next, extend);
    if (extend) {
      const lead = next(selecting.lead());
      selecting.extend(lead);
      reveal(lead);
      return page.selection().area;
    }
    // Cells elsewhere may have been selected while these were edited.
    const { active } = page.selection();
    if (!holds(from, active.row, active.column))
      selecting.cell({ row: sight.rows.toView(from.top), column: from.left });
    walking.advance(down, right);
    return areaOf(page.selection().active);
  }

  const parts = {
    page,
    events,
    frame,
    sight,
    selecting,
    picking,
    walking,
    widths,
    marks,
    tip,
    reveal,
    request,
    openUnit,
    openMenu,
  };
  listenToKeys(parts);
  listenToPresses(parts);
  listenToClipboard(page, events, frame, marks, request);
  frame.table.addEventListener("focus", () => {
    tip.focus(selecting.active());
    spoken.moved();
  });
  frame.table.addEventListener("blur", () => tip.focus(undefined));
  page.onChange(changed);
  page.cells.onArrival(request);
  const sizes = new ResizeObserver(rearrange);
  for (const watched of [frame.scroller, frame.probe]) sizes.observe(watched);
  changed("preferences");
  changed("state");
  paint();

  return {
    element: frame.root,
    showReferences(references) {
      marks.references = references;
      request();
    },
    openCell: (place) => inset.open(place),
    closeCell: () => inset.close(),
    boxOf: boxOnScreen,
    reveal: revealPlace,
    focus: () => frame.table.focus({ preventScroll: true }),
    step,
  };
};
