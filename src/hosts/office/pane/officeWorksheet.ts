import { areaText, cellIn, readArea } from "./areaText.js";
import { cellOfOffice, officeOfCell } from "./officeCells.js";
import type { Area, AreaCells, Worksheet } from "./worksheet.js";

/** Cells of one answer of the host; on the web an answer has at most 5 MB. */
const mostCellsAtOnce = 50_000;

/** The worksheet through the host's own objects, which are looked up when they are needed. */
export const officeWorksheet: Worksheet = {
  selection: () =>
    Excel.run(async (context) => {
      const range = context.workbook.getSelectedRange();
      range.load("address");
      await context.sync();
      return areaOf(range.address);
    }),

  read: (areas) => Excel.run((context) => readAreas(context, areas)),

  usedArea: (name) =>
    Excel.run(async (context) => {
      const { worksheets } = context.workbook;
      const sheet = name === undefined ? worksheets.getActiveWorksheet() : worksheets.getItemOrNullObject(name);
      sheet.load("name");
      await context.sync();
      if (sheet.isNullObject) return undefined;
      const range = sheet.getUsedRangeOrNullObject(true);
      range.load("address");
      await context.sync();
      return range.isNullObject ? undefined : areaOf(range.address);
    }),

  spillSource: async (cell) => {
    if (!Office.context.requirements.isSetSupported("ExcelApi", "1.12")) return undefined;
    return Excel.run(async (context) => {
      const source = rangeOf(context, cell).getSpillParentOrNullObject();
      source.load("address");
      await context.sync();
      return source.isNullObject ? undefined : areaOf(source.address);
    });
  },

  write: (area, cells) =>
    Excel.run(async (context) => {
      rangeOf(context, area).values = cells.map((row) => row.map(officeOfCell));
      await context.sync();
    }),

  insertFormula: (cell, formula) =>
    Excel.run(async (context) => {
      rangeOf(context, cell).formulas = [[formula]];
      await context.sync();
    }),

  fillDown: (area) =>
    Excel.run(async (context) => {
      const first = rangeOf(context, cellIn(area));
      first.autoFill(rangeOf(context, area), "FillCopy");
      await context.sync();
    }),

  addSheet: (name, cells) =>
    Excel.run(async (context) => {
      const { worksheets } = context.workbook;
      worksheets.load("items/name");
      await context.sync();
      const free = freeName(
        name,
        worksheets.items.map((item) => item.name.toLowerCase()),
      );
      const sheet = worksheets.add(free);
      const area = { sheet: free, row: 0, column: 0, rows: cells.length, columns: cells[0]?.length ?? 0 };
      for (const part of rowParts(area)) {
        const rows = cells.slice(part.row, part.row + part.rows);
        sheet.getRange(areaText(part)).values = rows.map((row) => row.map(officeOfCell));
        await context.sync();
      }
      sheet.activate();
      await context.sync();
      return free;
    }),

  goTo: (area) =>
    Excel.run(async (context) => {
      context.workbook.worksheets.getItem(area.sheet).activate();
      rangeOf(context, area).select();
      await context.sync();
    }),

  watchSelection: (changed) =>
    Excel.run(async (context) => {
      context.workbook.onSelectionChanged.add(async () => changed());
      await context.sync();
    }),

  kept: async (name) => {
    const text: unknown = Office.context.document.settings.get(name);
    return typeof text === "string" ? text : undefined;
  },

  keep: (name, text) => {
    const { settings } = Office.context.document;
    const before: unknown = settings.get(name);
    settings.set(name, text);
    return new Promise((resolve, reject) => {
      settings.saveAsync((result) => {
        if (result.status !== Office.AsyncResultStatus.Failed) return resolve();
        // What is not in the workbook must not look as if it were.
        settings.set(name, before);
        reject(new Error(result.error.message));
      });
    });
  },
};

async function readAreas(
  context: Excel.RequestContext,
  areas: readonly Area[],
): Promise<readonly (AreaCells | undefined)[]> {
  const sheets = new Map(
    areas.map(({ sheet }) => [sheet, context.workbook.worksheets.getItemOrNullObject(sheet)] as const),
  );
  for (const sheet of sheets.values()) sheet.load("name");
  await context.sync();
  const answers: (AreaCells | undefined)[] = [];
  let waiting: { at: number; area: Area; ranges: Excel.Range[] }[] = [];
  let cells = 0;
  const settle = async () => {
    await context.sync();
    for (const { at, area, ranges } of waiting) {
      const before = answers[at];
      answers[at] = {
        area,
        values: [
          ...(before?.values ?? []),
          ...ranges.flatMap(({ values }) => values.map((row) => row.map(cellOfOffice))),
        ],
        formulas: [
          ...(before?.formulas ?? []),
          ...ranges.flatMap(({ formulas }) => formulas.map((row) => row.map(formulaOfOffice))),
        ],
      };
    }
    waiting = [];
    cells = 0;
  };
  for (const [at, area] of areas.entries()) {
    answers[at] = undefined;
    const sheet = sheets.get(area.sheet)!;
    if (sheet.isNullObject) continue;
    for (const part of rowParts(area)) {
      const size = part.rows * part.columns;
      if (cells + size > mostCellsAtOnce && cells > 0) await settle();
      const range = sheet.getRange(areaText(part));
      range.load("values,formulas");
      waiting.push({ at, area, ranges: [range] });
      cells += size;
    }
  }
  if (waiting.length > 0) await settle();
  return answers;
}

/** The area in parts of whole rows that the host can answer at once. */
function rowParts(area: Area): Area[] {
  const most = Math.max(1, Math.floor(mostCellsAtOnce / area.columns));
  const parts: Area[] = [];
  for (let down = 0; down < area.rows; down += most) {
    parts.push({ ...area, row: area.row + down, rows: Math.min(most, area.rows - down) });
  }
  return parts;
}

function rangeOf(context: Excel.RequestContext, area: Area): Excel.Range {
  return context.workbook.worksheets.getItem(area.sheet).getRange(areaText(area));
}

function areaOf(address: string): Area {
  const area = readArea(address, "");
  if (area) return area;
  // Whole columns and rows, and selections of several areas, stand for their first cell.
  const [, sheet = "", letters = "A", row = "1"] = /^(.*!)?\$?([A-Z]*)\$?(\d*)/i.exec(address) ?? [];
  return readArea(`${sheet}${letters || "A"}${row || "1"}`, "")!;
}

function formulaOfOffice(formula: unknown): string | undefined {
  return typeof formula === "string" && formula.startsWith("=") ? formula : undefined;
}

function freeName(name: string, taken: readonly string[]): string {
  for (let number = 1; ; number++) {
    const candidate = number === 1 ? name : `${name} ${number}`;
    if (!taken.includes(candidate.toLowerCase())) return candidate;
  }
}
