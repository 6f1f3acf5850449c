import type { ColumnPresentation, SheetPresentation } from "../../../sheet/display/workbook.js";
import { plainColumn } from "../../../sheet/display/workbook.js";
import { mostColumns, mostRows } from "../../../sheet/limits.js";
import type { ZipEntry } from "../../zip/openZip.js";
import type { Unpacked } from "../../zip/unpack.js";
import { damaged } from "../../zip/zipProblem.js";
import { scanPart } from "../xml/scanPart.js";
import type { XmlHandler } from "../xml/xmlScanner.js";
import { attributesOf, eachAttribute } from "../xml/xmlScanner.js";
import { readColumn, readRow } from "./cellAddress.js";
import { usualStyle } from "./readStyles.js";
import { isTrue } from "./readWorkbookPart.js";
import type { BuiltSheet, CellReading, ExplainError, RawCell, SheetBuilder } from "./sheetBuilder.js";
import { sheetBuilder } from "./sheetBuilder.js";

export interface SheetReading extends BuiltSheet {
  readonly presentation: Omit<SheetPresentation, "hidden">;
  /** Names of elements that the sheet has and that are not kept. */
  readonly others: ReadonlySet<string>;
}

/** Elements whose loss an analyst would notice. */
const noticed: ReadonlySet<string> = new Set(["mergeCell", "cfRule", "dataValidation", "drawing", "legacyDrawing", "hyperlink", "autoFilter", "sheetProtection"]); // biome-ignore format: one list

/** Reads the XML of a sheet. */
export function* readSheet(
  entry: ZipEntry,
  unpacked: Unpacked,
  reading: CellReading,
  explain: ExplainError,
): Generator<number, SheetReading> {
  const builder = sheetBuilder(reading, explain);
  const about = aboutSheet(reading);
  const data = sheetData(builder);
  let isData = false;
  yield* scanPart(entry, unpacked, {
    open(name, attributes) {
      if (isData) {
        data.open(name, attributes);
      } else if (name === "sheetData") {
        isData = true;
      } else {
        about.open(name, attributes);
      }
    },
    close(name, depth) {
      if (name === "sheetData") {
        isData = false;
      } else if (isData) {
        data.close(name, depth);
      } else {
        about.close(name);
      }
    },
    text(piece) {
      if (isData) {
        data.text(piece);
      }
    },
  });
  const built = builder.finish();
  return { ...built, presentation: about.finish(built), others: about.others };
}

/** Takes rows, cells, and what is in them. */
function sheetData(builder: SheetBuilder): XmlHandler {
  const raw: RawCell = { type: "n", style: 0, value: undefined, formula: undefined, formulaType: "", formulaArea: "", sharedIndex: "" }; // biome-ignore format: one record
  let row = -1;
  let column = -1;
  let text: "value" | "formula" | undefined;
  let aside = 0;
  const takeCellAttribute = (name: string, value: string): void => {
    switch (name) {
      case "r":
        column = readColumn(value);
        if (readRow(value) !== row) {
          throw damaged(`the cell ${value.slice(0, 20)} stands in row ${row + 1}`);
        }
        break;
      case "t":
        raw.type = value;
        break;
      case "s":
        raw.style = Number(value);
        break;
    }
  };
  const takeFormulaAttribute = (name: string, value: string): void => {
    if (name === "t") {
      raw.formulaType = value;
    } else if (name === "ref") {
      raw.formulaArea = value;
    } else if (name === "si") {
      raw.sharedIndex = value;
    }
  };
  const openRow = (attributes: string): void => {
    const before = row++;
    column = -1;
    eachAttribute(attributes, (name, value) => {
      if (name === "r") {
        row = readRow(value);
      }
    });
    if (row <= before || row >= mostRows) {
      throw damaged(`row ${row + 1} comes after row ${before + 1}`);
    }
  };
  return {
    open(name, attributes) {
      switch (name) {
        case "c":
          raw.type = "n";
          raw.style = 0;
          raw.value = undefined;
          raw.formula = undefined;
          text = undefined;
          column++;
          eachAttribute(attributes, takeCellAttribute);
          if (column >= mostColumns || row < 0) {
            throw damaged("a cell in it lies outside the sheet");
          }
          break;
        case "v":
        case "t":
          if (name === "v" || (raw.type === "inlineStr" && aside === 0)) {
            text = "value";
            raw.value ??= "";
          }
          break;
        case "f":
          text = "formula";
          raw.formula = "";
          raw.formulaType = "";
          raw.formulaArea = "";
          raw.sharedIndex = "";
          eachAttribute(attributes, takeFormulaAttribute);
          break;
        case "rPh":
        case "extLst":
          aside++;
          break;
        case "row":
          openRow(attributes);
          break;
      }
    },
    close(name) {
      if (name === "c") {
        builder.cell(row, column, raw);
      } else if (name === "v" || name === "f" || name === "t") {
        text = undefined;
      } else if (name === "rPh" || name === "extLst") {
        aside--;
      }
    },
    text(piece) {
      if (text === "value") {
        raw.value += piece;
      } else if (text === "formula") {
        raw.formula += piece;
      }
    },
  };
}

interface ColumnsEntry {
  readonly from: number;
  readonly to: number;
  readonly width: number | undefined;
  readonly hidden: boolean;
  readonly style: number;
}

/** Takes what a sheet says besides its cells. */
function aboutSheet(reading: CellReading) {
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
  const isPlain = ({ width, hidden, formats }: ColumnPresentation) => width === undefined && !hidden && formats.length === 0; // biome-ignore format: one condition
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
