import type { Page } from "../../page.js";
import type { GridEvents } from "../grid.js";
import type { Frame } from "../layout/frame.js";
import type { Sight, Spot } from "../layout/sight.js";
import type { Marks } from "../paint/marks.js";
import type { Tip } from "../paint/tip.js";
import { areaBetween, everything, isSameArea } from "../select/areas.js";
import type { Picking } from "../select/picking.js";
import type { Selecting } from "../select/selecting.js";
import { chordOf, isTyping } from "./chordOf.js";
import type { ColumnWidths } from "./columnWidths.js";
import { fillDown, fillRight } from "./filling.js";
import { motions } from "./motions.js";
import type { Walking } from "./walking.js";

export interface KeyParts {
  readonly page: Page;
  readonly events: GridEvents;
  readonly frame: Frame;
  readonly sight: Sight;
  readonly selecting: Selecting;
  readonly picking: Picking;
  readonly walking: Walking;
  readonly widths: ColumnWidths;
  readonly marks: Marks;
  readonly tip: Tip;
  reveal(spot: Spot): void;
  request(): void;
  openUnit(column: number): void;
  openMenu(): void;
}

/** Keys of the focused cells. */
export function listenToKeys(parts: KeyParts): void {
  const { page, events, frame, sight, selecting, walking, widths, tip } = parts;
  const { table } = frame;
  let isLeaving = false;
  // A jump waits for the worker; keys pressed meanwhile are about where it lands.
  let waiting: Promise<void> | undefined;

  async function move(chord: string, extend: boolean): Promise<void> {
    const motion = motions[chord]!;
    walking.forget();
    if (events.isPicking()) return parts.picking.move(await motion(parts.picking.lead(), page, sight), extend);
    const from = extend ? selecting.lead() : selecting.active();
    const found = motion({ ...from, row: Math.min(from.row, sight.rows.count - 1) }, page, sight);
    const spot = found instanceof Promise ? await found : found;
    if (extend) selecting.extend(spot);
    else selecting.cell(spot);
    parts.reveal(spot);
  }

  function selectUsed(): void {
    const { rows, columns } = page.sheetState();
    const sheet = page.sheet();
    const start = { sheet, row: 0, column: 0 };
    const end = { sheet, row: Math.max(rows - 1, 0), column: Math.max(columns - 1, 0) };
    const used = areaBetween(start, end);
    const isUsed = isSameArea(page.selection().area, used);
    selecting.area(isUsed ? everything(sheet) : used, page.selection().active, end);
  }

  const commands: Readonly<Record<string, () => void>> = {
    Tab: () => walking.advance(0, 1),
    "Shift+Tab": () => walking.advance(0, -1),
    Enter: () => walking.advance(1, 0),
    "Shift+Enter": () => walking.advance(-1, 0),
    F2: () => events.edit(undefined),
    Delete: () => void page.act({ do: "clear", area: page.selection().area }),
    Backspace: () => void page.act({ do: "clear", area: page.selection().area }),
    "Ctrl+A": selectUsed,
    "Ctrl+Space": () => selecting.widen("columns"),
    "Shift+Space": () => selecting.widen("rows"),
    "Ctrl+Shift+Space": () => selecting.all(),
    "Ctrl+D": () => fillDown(page),
    "Ctrl+R": () => fillRight(page),
    "Ctrl+Shift+D": () => void page.act({ do: "fill to end", area: page.selection().area }),
    "Alt+U": () => parts.openUnit(page.selection().active.column),
    "Alt+Shift+ArrowRight": () => widths.widen(1),
    "Alt+Shift+ArrowLeft": () => widths.widen(-1),
    "Alt+Shift+F": () => widths.fit(widths.together(page.selection().active.column)),
    ContextMenu: () => parts.openMenu(),
    "Shift+F10": () => parts.openMenu(),
    Escape: dismiss,
  };

  /** Takes away what is in the way, one after the other; with nothing left, Tab leaves the cells. */
  function dismiss(): void {
    if (tip.dismiss()) return;
    if (parts.marks.copied) {
      parts.marks.copied = undefined;
      parts.request();
    } else {
      isLeaving = true;
      frame.live.textContent = "Tab leaves the cells.";
    }
  }

  /** The motion of a chord; Shift extends by it, except where Alt makes it another key. */
  const motionOf = (event: KeyboardEvent, chord: string) =>
    event.altKey && event.shiftKey ? "" : chord.replace("Shift+", "");

  function press(event: KeyboardEvent, chord: string): Promise<void> | undefined {
    const plain = motionOf(event, chord);
    if (commands[chord]) commands[chord]();
    else if (motions[plain]) return move(plain, event.shiftKey);
    else events.edit(event.key);
    return undefined;
  }

  function hold(work: Promise<void>): void {
    const held = work
      .catch((fault) => page.trouble(`The cell that this key leads to was not found: ${fault}`))
      .finally(() => {
        if (waiting === held) waiting = undefined;
      });
    waiting = held;
  }

  const isOurs = (event: KeyboardEvent, chord: string) =>
    chord in commands || motionOf(event, chord) in motions || isTyping(event);

  /** From a button inside a header the cells are one key away. */
  function leaveButton(event: KeyboardEvent): void {
    const isForButton = ["Enter", " ", "Tab", "Shift", "Control", "Alt", "Meta"].includes(event.key);
    if (isForButton || event.defaultPrevented) return;
    event.preventDefault();
    event.stopPropagation();
    table.focus({ preventScroll: true });
  }

  table.addEventListener("keydown", (event) => {
    if (event.target !== table) return leaveButton(event);
    if (event.defaultPrevented || event.isComposing) return;
    const chord = chordOf(event);
    if (isLeaving && (chord === "Tab" || chord === "Shift+Tab")) return;
    if (!["Shift", "Control", "Alt", "Meta"].includes(event.key)) isLeaving = false;
    if (!isOurs(event, chord)) return;
    event.preventDefault();
    event.stopPropagation();
    const work = waiting ? waiting.then(() => press(event, chord)) : press(event, chord);
    if (work) hold(work);
  });
  table.addEventListener("blur", () => {
    isLeaving = false;
  });
}
