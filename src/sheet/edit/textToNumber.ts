import { cellAt } from "../../call/column.js";
import type { ColumnSpan } from "../book/book.js";
import { rowsOutside } from "../book/spans.js";
import { cellByCell } from "../evaluate/operateColumns.js";
import { numberFromText } from "../values/numberFromText.js";
import type { Edit } from "./draft.js";
import { writeContent } from "./draft.js";

/** Makes numbers of typed texts that read as numbers; every other cell stays as it is. */
export function textToNumber({ sheet, column, from, to }: ColumnSpan): Edit {
  return (draft) => {
    const { session } = draft;
    const { runs, claims } = session.peek(sheet, column);
    const end = Math.min(to, session.column(sheet, column).cells.length());
    const typed = rowsOutside(runs, from, end).flatMap((span) => rowsOutside(claims, span.from, span.to));
    for (const span of typed) {
      const cells = session.world.slice(sheet, column, span.from, span.to);
      if (cells.others?.some((each) => typeof each === "string" && numberFromText(each) !== undefined)) {
        const converted = cellByCell(cells.length, (row) => {
          const cell = cellAt(cells, row);
          return typeof cell === "string" ? (numberFromText(cell) ?? cell) : cell;
        });
        writeContent(draft, { sheet, column, from: span.from }, converted, []);
      }
    }
  };
}
