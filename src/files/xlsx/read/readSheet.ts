import type { SheetPresentation } from "../../../sheet/display/workbook.js";
import { mostColumns, mostRows } from "../../../sheet/limits.js";
import type { ZipEntry } from "../../zip/openZip.js";
import type { Unpacked } from "../../zip/unpack.js";
import { damaged } from "../../zip/zipProblem.js";
import { eachAttribute } from "../xml/attributes.js";
import { scanPart } from "../xml/scanPart.js";
import type { XmlHandler } from "../xml/xmlScanner.js";
import { aboutSheet } from "./aboutSheet.js";
import { readColumn, readRow } from "./cellAddress.js";
import type { CellReading, ExplainError, RawCell } from "./cellOfRaw.js";
import type { BuiltSheet, SheetBuilder } from "./sheetBuilder.js";
import { sheetBuilder } from "./sheetBuilder.js";

export interface SheetReading extends BuiltSheet {
  readonly presentation: Omit<SheetPresentation, "hidden">;
  /** Names of elements that the sheet has and that are not kept. */
  readonly others: ReadonlySet<string>;
}

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
  const raw: RawCell = {
    type: "n",
    style: 0,
    value: undefined,
    formula: undefined,
    formulaType: "",
    formulaArea: "",
    sharedIndex: "",
  };
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
