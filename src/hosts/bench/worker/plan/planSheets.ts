import type { Cell } from "../../../../call/cell.js";
import { cellAt } from "../../../../call/column.js";
import type { Plan as Observations } from "../../../../plan/plan.js";
import { tellPlan } from "../../../../plan/tellPlan.js";
import { visitTable } from "../../../../plan/visitTable.js";
import type { Book } from "../../../../sheet/book/book.js";
import type { NumberFormat } from "../../../../sheet/display/numberFormat.js";
import { setCells } from "../../../../sheet/edit/setCells.js";
import { addSheet } from "../../../../sheet/edit/sheets.js";
import {
  type ColumnPresentation,
  type SheetPresentation,
  sheetPresentation,
} from "../../../../sheet/presentation/presentation.js";
import type { PlanWords } from "../../protocol/plan.js";
import type { Plan } from "../actions/plan.js";
import { bookOfSession, presentationOfSession, type Session } from "../session.js";

/** The visits on a sheet of their own, and on another what was asked and found; one step of the history. */
export function planSheets(session: Session, plan: Observations, words: PlanWords): Plan {
  const book = bookOfSession(session);
  const { header, columns } = visitTable(plan);
  const visits: Cell[][] = plan.schedule.visits.map((_, row) => columns.map((column) => cellAt(column, row)));
  const asked = askedRows(words);
  const found = tellPlan(plan).map((sentence): Cell[] => ["Found", sentence.trim()]);
  const [first, second] = sheetNames(book);
  const sheet = book.sheets.length;
  const before = presentationOfSession(session);
  return {
    name: `wrote the plan to the sheets ${first} and ${second}`,
    edits: [
      addSheet(first),
      setCells({ sheet, row: 0, column: 0 }, [header, ...visits]),
      addSheet(second),
      setCells({ sheet: sheet + 1, row: 0, column: 0 }, [["About", "What"], ...asked, ...found]),
    ],
    presentation: [
      ...book.sheets.map((_, index) => sheetPresentation(before, index)),
      visitsSeen(header),
      { frozenColumns: 0, columns: [{ width: 180 }, { width: 720 }] },
    ],
    edited: [],
    moved: true,
    select: { sheet, top: 0, left: 0, bottom: 0, right: 0 },
    said: `The visits are in the sheet "${first}", what was asked and found in "${second}".`,
  };
}

/** The first two names that are free. */
function sheetNames(book: Book): [string, string] {
  const taken = new Set(book.sheets.map(({ name }) => name.toUpperCase()));
  for (let number = 1; ; number++) {
    const first = number === 1 ? "Plan" : `Plan ${number}`;
    const second = `${first} summary`;
    if (!taken.has(first.toUpperCase()) && !taken.has(second.toUpperCase())) return [first, second];
  }
}

function askedRows(words: PlanWords): Cell[][] {
  const rows: readonly (readonly [string, string])[] = [
    ["Hours", words.hours],
    ["First night", words.from],
    ["Last night", words.to],
    ["Site", [words.longitude, words.latitude, words.height].filter((part) => part !== "").join(", ")],
    ["Worth", words.value],
    ["Has to be in", words.must.join(", ")],
    ["Left out", words.excluded.join(", ")],
    ["Airmass at most", words.airmass],
    ["Sun below", words.sun],
    ["Moon at least", words.moon],
    ["Phases", words.phases],
    ["Phase width", words.width],
    ["Visits a night", words.perNight],
    ["Time between visits", words.gap],
    ["Usable part", words.efficiency],
    ...Object.entries(words.columns).filter(([, header]) => header !== ""),
  ];
  return rows.filter(([, text]) => text !== "").map((row) => [...row]);
}

const formats: Readonly<Record<string, NumberFormat>> = {
  Phase: { kind: "fixed", decimals: 3, grouped: false },
  "Phase error": { kind: "significant", digits: 2 },
  Airmass: { kind: "fixed", decimals: 2, grouped: false },
  "Moon distance [deg]": { kind: "fixed", decimals: 0, grouped: false },
  "Barycentric correction [m/s]": { kind: "fixed", decimals: 1, grouped: false },
};

const widths: Readonly<Record<string, number>> = { Night: 112, Start: 192 };

function visitsSeen(header: readonly string[]): SheetPresentation {
  const columns = header.map((name): ColumnPresentation => {
    const format = formats[name];
    const width = widths[name];
    return { ...(format ? { format } : {}), ...(width ? { width } : {}) };
  });
  return { frozenColumns: 1, columns };
}
