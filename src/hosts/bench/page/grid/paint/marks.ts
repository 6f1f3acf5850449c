import type { Area } from "../../../../../sheet/book/book.js";
import type { Page } from "../../page.js";
import type { ReferenceMark } from "../grid.js";
import { element, type Frame, paneNames } from "../layout/frame.js";
import type { Box, Sight } from "../layout/sight.js";
import { areaOf } from "../select/areas.js";
import { areaText } from "../select/areaText.js";
import { cutToPane } from "./panes.js";

/** What is outlined over the cells besides the selection. */
export interface Marks {
  references: readonly ReferenceMark[];
  picked: Area | undefined;
  copied: Area | undefined;
  /** Cells that a fill would reach. */
  ghost: Area | undefined;
  /** Before which column dragged ones would be put. */
  dropBefore: number | undefined;
  paint(): void;
}

interface Outline {
  readonly className: string;
  readonly area: Area;
  readonly label?: string;
  readonly handle?: boolean;
}

/** Above the outline, a label has this much of itself [px]. */
const labelRoom = 8;

export function createMarks(page: Page, frame: Frame, sight: Sight): Marks {
  const pools = new Map(paneNames.map((name) => [name, [] as HTMLElement[]]));

  function boxOf({ top, left, bottom, right }: Area): Box {
    const { rows, columns } = sight;
    const first = sight.boxOf({ row: rows.toView(top), column: left });
    const lastRow = Math.min(rows.lastInView(bottom), rows.count - 1);
    const last = sight.boxOf({ row: lastRow, column: Math.min(right, columns.count - 1) });
    return {
      left: first.left,
      top: first.top,
      width: last.left + last.width - first.left,
      height: last.top + last.height - first.top,
    };
  }

  function outlines(marks: Marks): Outline[] {
    const { area, active } = page.selection();
    const sheet = page.sheet();
    const found: Outline[] = [
      { className: "grid-mark grid-selection", area, handle: true },
      { className: "grid-mark grid-active", area: areaOf(active) },
    ];
    if (marks.picked) found.push({ className: "grid-mark grid-picked", area: marks.picked });
    for (const { area, colour } of marks.references) {
      found.push({ className: `grid-mark grid-ref grid-ref-${colour}`, area, label: areaText(area) });
    }
    if (marks.copied) found.push({ className: "grid-mark grid-copied", area: marks.copied });
    if (marks.ghost) found.push({ className: "grid-mark grid-ghost", area: marks.ghost });
    return found.filter(({ area }) => area.sheet === sheet);
  }

  function paintPane(name: (typeof paneNames)[number], wanted: readonly Outline[]): void {
    const pool = pools.get(name) as HTMLElement[];
    let used = 0;
    for (const { className, area, label, handle } of wanted) {
      const box = cutToPane(sight, name, area, boxOf(area));
      if (!box) continue;
      const mark = pool[used++] ?? addMark(frame.marks[name], pool);
      mark.className = box.top < labelRoom ? `${className} grid-mark-top` : className;
      setBox(mark, box);
      (mark.firstElementChild as HTMLElement).textContent = label ?? "";
      (mark.lastElementChild as HTMLElement).hidden = !handle || !box.hasEnd;
    }
    for (const mark of pool.splice(used)) mark.remove();
  }

  const drop = element("grid-drop", frame.view);
  drop.hidden = true;

  function paintDrop(before: number | undefined): void {
    drop.hidden = before === undefined;
    if (before === undefined) return;
    const box = sight.boxOf({ row: 0, column: before });
    drop.style.transform = `translateX(${Math.min(box.left, sight.width - 2)}px)`;
  }

  const marks: Marks = {
    references: [],
    picked: undefined,
    copied: undefined,
    ghost: undefined,
    dropBefore: undefined,
    paint() {
      const wanted = outlines(marks);
      for (const name of paneNames) paintPane(name, wanted);
      paintDrop(marks.dropBefore);
    },
  };
  return marks;
}

function addMark(pane: HTMLElement, pool: HTMLElement[]): HTMLElement {
  const mark = element("grid-mark", pane);
  element("grid-mark-label", mark);
  const handle = element("grid-handle", mark);
  handle.title = "Drag to fill; double-click fills to the table's end";
  pool.push(mark);
  return mark;
}

function setBox(mark: HTMLElement, { left, top, width, height }: Box): void {
  mark.style.transform = `translate(${left}px, ${top}px)`;
  mark.style.width = `${width}px`;
  mark.style.height = `${height}px`;
}
