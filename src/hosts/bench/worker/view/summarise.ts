import { CellError } from "../../../../call/cell.js";
import type { Area } from "../../../../sheet/book/book.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import type { Summary } from "../../protocol/answers.js";
import { clipArea } from "../actions/clipArea.js";
import { bookOfSession, type Session } from "../session.js";
import { columnStatesOf } from "../state/columnStates.js";
import { visibleSpans } from "./visibleRows.js";

/** What the cells of an area come to, as far as they are in view; all zero where there are no numbers. */
export function summarise(session: Session, asked: Area): Summary {
  const book = bookOfSession(session);
  const area = clipArea(book, asked);
  const { sheet, left, right } = area;
  const spans = visibleSpans(session, sheet, area.top, area.bottom + 1);
  let [filled, numbers, errors, least, most] = [0, 0, 0, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  // Sum with what each addition loses kept apart (Neumaier 1974, ZAMM 54, 39).
  let [sum, lost] = [0, 0];
  const units = new Set<string>();
  for (let column = left; column <= right; column++) {
    const before = numbers;
    for (const { from, to } of spans) {
      const { numbers: values, others } = readColumn(book, { sheet, column, from, to });
      for (let row = 0; row < to - from; row++) {
        const other = others?.[row];
        if (other === undefined) {
          const value = values[row] as number;
          const next = sum + value;
          lost += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
          sum = next;
          numbers++;
          filled++;
          if (value < least) least = value;
          if (value > most) most = value;
        } else if (other !== null) {
          filled++;
          if (other instanceof CellError) errors++;
        }
      }
    }
    if (numbers > before) units.add(unitOfColumn(columnStatesOf(book, sheet)[column]));
  }
  const total = sum + lost;
  const [unit = ""] = units.size === 1 ? units : [];
  if (numbers === 0) return { filled, numbers, errors, sum: 0, mean: 0, least: 0, most: 0, unit: "" };
  return { filled, numbers, errors, sum: total, mean: total / numbers, least, most, unit };
}

function unitOfColumn(state: ReturnType<typeof columnStatesOf>[number] | undefined): string {
  return state?.reading.is === "unit" ? state.reading.unit : "";
}
