import type { Cell } from "../../call/cell.js";
import { readAddress } from "../../sheet/book/address.js";
import type { Entry } from "../../sheet/edit/setCells.js";
import { cellOfField } from "../cell/cellOfField.js";
import { readNumber } from "../cell/readNumber.js";
import { FileProblem } from "../fileProblem.js";
import type { CellText } from "./cellText.js";
import { cellText } from "./cellText.js";
import type { ClipboardTable } from "./clipboardTable.js";
import { htmlTokens } from "./htmlTokens.js";
import { cellOfMark, marks } from "./ownMarks.js";

type Attributes = ReadonlyMap<string, string>;

/** Cells that a table on the clipboard may have. */
const mostCells = 5_000_000;

/**
 * The first table of an HTML text; undefined where there is none. A cell over several columns or rows holds its value in
 * the first of them. Formulas come only from tables that were copied from here; elsewhere what begins with "=" is text.
 */
export function readHtmlTable(html: string): ClipboardTable | undefined {
  const grid = tableGrid();
  let depth = 0;
  let origin: string | undefined;
  let cell: { readonly attributes: Attributes; readonly text: CellText } | undefined;
  const endCell = (): void => {
    if (cell !== undefined) {
      grid.add(entryOf(cell.attributes, cell.text.finish(), origin !== undefined), cell.attributes);
      cell = undefined;
    }
  };
  for (const token of htmlTokens(html)) {
    if (token.kind === "text") {
      cell?.text.add(token.text);
    } else if (token.name === "table") {
      depth += token.kind === "open" ? 1 : -1;
      if (token.kind === "open" && depth === 1) {
        origin = token.attributes.get(marks.origin);
      } else if (depth <= 0) {
        endCell();
        if (!grid.isEmpty()) {
          break;
        }
        depth = 0;
      }
    } else if (depth === 1 && /^(tr|t[dh]|tbody|thead|tfoot)$/.test(token.name)) {
      endCell();
      if (token.kind === "open" && token.name === "tr") {
        grid.startRow();
      } else if (token.kind === "open" && /^t[dh]$/.test(token.name)) {
        cell = { attributes: token.attributes, text: cellText() };
      }
    } else {
      cell?.text.tag(token.name, token.kind === "open");
    }
  }
  endCell();
  const rows = grid.finish();
  return rows.length === 0 ? undefined : { rows, origin: origin === undefined ? undefined : readAddress(origin) };
}

function entryOf(attributes: Attributes, text: string, isOurs: boolean): Entry {
  const formula = attributes.get(marks.formula);
  if (isOurs && formula?.startsWith("=")) {
    return { formula };
  }
  const marked = cellOfMark(attributes.get(marks.kind), attributes.get(marks.value) ?? "");
  return marked === undefined ? (foreignValue(attributes, text) ?? cellOfShown(text)) : marked;
}

/** Journals set the sign of a number as a minus, which is no hyphen. */
function cellOfShown(text: string): Cell {
  return (text.startsWith("\u2212") ? readNumber(`-${text.slice(1)}`) : undefined) ?? cellOfField(text);
}

/**
 * What other programs say of a cell besides the digits they show: `x:num`, `sdval`, `data-sheets-value` (common practice,
 * from memory).
 */
function foreignValue(attributes: Attributes, text: string): Cell | undefined {
  const exact = attributes.get("x:num") || attributes.get("sdval");
  const number = exact === undefined ? undefined : readNumber(exact);
  if (number !== undefined) {
    return number;
  }
  if (attributes.has("x:str")) {
    return text === "" ? null : text;
  }
  return sheetsValue(attributes.get("data-sheets-value"));
}

function sheetsValue(json: string | undefined): Cell | undefined {
  if (json === undefined) {
    return undefined;
  }
  try {
    const held = new Map(Object.entries(JSON.parse(json) as object));
    const [text, number, logical] = [held.get("2"), held.get("3"), held.get("4")];
    return typeof number === "number" && Number.isFinite(number)
      ? number
      : typeof text === "string"
        ? text
        : typeof logical === "number"
          ? logical === 1
          : undefined;
  } catch {
    return undefined;
  }
}

/** Puts cells where they belong among cells that reach over several rows or columns. */
function tableGrid() {
  const rows: Entry[][] = [];
  /** For each column how many rows below the current one are taken by a cell above. */
  const taken: number[] = [];
  let column = 0;
  let width = 0;
  let started = false;
  const startRow = (): void => {
    if (started) {
      for (const [index, count] of taken.entries()) {
        taken[index] = Math.max(0, count - 1);
      }
    }
    started = true;
    rows.push([]);
    column = 0;
    refuse();
  };
  const refuse = (): void => {
    if (rows.length * width > mostCells) {
      throw new FileProblem(
        "too-large",
        `The table has more than ${mostCells.toLocaleString("en")} cells; save it as a file and open that file.`,
      );
    }
  };
  return {
    startRow,
    isEmpty: () => width === 0,
    add(entry: Entry, attributes: Attributes): void {
      if (!started) {
        startRow();
      }
      while ((taken[column] ?? 0) > 0) {
        column++;
      }
      const across = spanOf(attributes.get("colspan"), 1000);
      const down = spanOf(attributes.get("rowspan"), 65_534);
      const row = rows.at(-1) as Entry[];
      while (row.length < column) {
        row.push(null);
      }
      row[column] = entry;
      for (let index = column; index < column + across; index++) {
        taken[index] = down;
      }
      column += across;
      width = Math.max(width, column);
      refuse();
    },
    finish(): Entry[][] {
      return width === 0 ? [] : rows.map((row) => [...row, ...new Array<Entry>(width - row.length).fill(null)]);
    },
  };
}

/** The bounds are those of the HTML standard, section 4.9.11. */
function spanOf(text: string | undefined, most: number): number {
  const span = /^\s*\+?(\d+)/.exec(text ?? "")?.[1];
  return Math.min(Math.max(Number(span ?? 1), 1), most);
}
