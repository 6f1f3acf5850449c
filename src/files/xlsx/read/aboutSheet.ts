import type { ColumnPresentation, SheetPresentation } from "../../../sheet/display/workbook.js";
import { plainColumn } from "../../../sheet/display/workbook.js";
import { mostColumns, mostRows } from "../../../sheet/limits.js";
import { damaged } from "../../zip/zipProblem.js";
import { attributesOf } from "../xml/attributes.js";
import type { CellReading } from "./cellOfRaw.js";
import { usualStyle } from "./readStyles.js";
import { isTrue } from "./readWorkbookPart.js";
import type { BuiltSheet } from "./sheetBuilder.js";

/** Elements whose loss an analyst would notice. */
const noticed: ReadonlySet<string> = new Set([
  "mergeCell",
  "cfRule",
  "dataValidation",
  "drawing",
  "legacyDrawing",
  "hyperlink",
  "autoFilter",
  "sheetProtection",
  "tablePart",
]);

interface ColumnsEntry {
  readonly from: number;
  readonly to: number;
  readonly width: number | undefined;
  readonly hidden: boolean;
  readonly style: number;
}

/** Takes what a sheet says besides its cells. */
export function aboutSheet(reading: CellReading) {
  const others = new Set<string>();
  const entries: ColumnsEntry[] = [];
  let frozenRows = 0;
  let frozenColumns = 0;
  let aside = 0;
  return {
    others,
    open(name: string, source: string): void {
      if (name === "extLst") {
        aside++;
      } else if (name === "col" && aside === 0) {
        entries.push(columnsEntry(attributesOf(source)));
        if (entries.length > mostColumns) {
          throw damaged("it says something of more columns than there are");
        }
      } else if (name === "pane" && aside === 0) {
        const attributes = attributesOf(source);
        if (attributes.get("state")?.startsWith("frozen")) {
          frozenRows = wholeOf(attributes.get("ySplit"), mostRows);
          frozenColumns = wholeOf(attributes.get("xSplit"), mostColumns);
        }
      } else if (noticed.has(name)) {
        others.add(name);
      }
    },
    close(name: string): void {
      aside -= name === "extLst" ? 1 : 0;
    },
    finish({ columns, formats }: BuiltSheet): Omit<SheetPresentation, "hidden"> {
      // Whatever reaches to the last column of all is said of columns without end.
      const length = entries.reduce((most, { to }) => (to === mostColumns ? most : Math.max(most, to)), columns.length);
      const entryOf: (ColumnsEntry | undefined)[] = new Array(length).fill(undefined);
      for (const entry of entries) {
        entryOf.fill(entry, entry.from, Math.min(entry.to, length));
      }
      const presented = entryOf.map((entry, column): ColumnPresentation => {
        const usual = reading.styles[entry?.style ?? 0] ?? usualStyle;
        const own = formats.get(column)?.finish(usual) ?? emptyFormats(usual);
        const { width, hidden } = entry ?? plainColumn;
        return { width, hidden, formats: own };
      });
      return { frozenRows, frozenColumns, columns: withoutPlainEnd(presented) };
    },
  };
}

function emptyFormats({ format, code }: { format: typeof usualStyle.format; code: string | undefined }) {
  return format.kind === "general" && code === undefined ? [] : [{ from: 0, to: mostRows, format, code }];
}

function withoutPlainEnd(columns: readonly ColumnPresentation[]): readonly ColumnPresentation[] {
  let end = columns.length;
  const isPlain = ({ width, hidden, formats }: ColumnPresentation) =>
    width === undefined && !hidden && formats.length === 0;
  while (end > 0 && isPlain(columns[end - 1] as ColumnPresentation)) {
    end--;
  }
  return columns.slice(0, end);
}

function columnsEntry(attributes: ReadonlyMap<string, string>): ColumnsEntry {
  const from = wholeOf(attributes.get("min"), mostColumns) - 1;
  const to = wholeOf(attributes.get("max"), mostColumns);
  const width = Number(attributes.get("width") ?? Number.NaN);
  if (from < 0 || to <= from) {
    throw damaged("it says something of columns that are none");
  }
  return {
    from,
    to,
    width: attributes.get("customWidth") !== "0" && width >= 0 && width <= 255 ? width : undefined,
    hidden: isTrue(attributes.get("hidden")),
    style: Number(attributes.get("style") ?? 0),
  };
}

function wholeOf(text: string | undefined, most: number): number {
  const value = Number(text ?? 0);
  return Number.isInteger(value) && value >= 0 && value <= most ? value : 0;
}
