import type { SheetReading } from "./readSheet.js";
import type { SheetEntry } from "./readWorkbookPart.js";

/** What sheets hold besides cells, by the element that holds it, as a sentence says it. */
const namesOfElements: readonly (readonly [element: string, name: string])[] = [
  ["mergeCell", "merged cells (their first cell keeps the value)"],
  ["cfRule", "conditional formats"],
  ["dataValidation", "rules for what may be typed"],
  ["autoFilter", "filters"],
  ["drawing", "charts and pictures"],
  ["legacyDrawing", "comments"],
  ["hyperlink", "links"],
  ["sheetProtection", "protection"],
  ["tablePart", "tables (their cells and formulas stay)"],
];

/** Sentences on what of the sheets is not kept. */
export function notesOf(sheets: readonly SheetEntry[], readings: readonly (SheetReading | undefined)[]): string[] {
  const notes: string[] = [];
  for (const [index, { name }] of sheets.entries()) {
    const reading = readings[index];
    if (reading === undefined) {
      notes.push(`The sheet ${name} is a chart and not a table; it comes as an empty sheet.`);
      continue;
    }
    const lost = namesOfElements.filter(([element]) => reading.others.has(element)).map(([, text]) => text);
    if (lost.length > 0) {
      notes.push(`The sheet ${name} has ${listed(lost)}, which are not kept.`);
    }
    if (reading.hasOtherFormulas) {
      notes.push(`The sheet ${name} has formulas of a kind that is not read (data tables); their values are kept.`);
    }
  }
  return notes;
}

function listed(texts: readonly string[]): string {
  return texts.length < 2 ? texts.join("") : `${texts.slice(0, -1).join(", ")} and ${texts.at(-1)}`;
}
