import type { ZipEntry } from "../../zip/openZip.js";
import { damaged } from "../../zip/zipProblem.js";
import { attributesOf } from "../xml/attributes.js";
import { decodeText } from "../xml/xmlText.js";
import type { Parts } from "./parts.js";

export interface SheetEntry {
  readonly name: string;
  /** The relationship to its part. */
  readonly id: string;
  readonly hidden: boolean;
}

export interface NameEntry {
  readonly name: string;
  readonly text: string;
  /** The sheet, counted from zero, on which alone the name is known. */
  readonly sheet: number | undefined;
}

/** What the workbook part itself says. */
export interface WorkbookPart {
  readonly sheets: readonly SheetEntry[];
  readonly names: readonly NameEntry[];
  /** Whether dates count from 1904. */
  readonly since1904: boolean;
  /** Whether what formulas gave is not to be relied on. */
  readonly recalculates: boolean;
  /** Whether formulas refer to other files. */
  readonly refersElsewhere: boolean;
}

export function isTrue(value: string | undefined): boolean {
  return value === "1" || value === "true" || value === "on";
}

export function readWorkbookPart(parts: Parts, entry: ZipEntry): WorkbookPart {
  const sheets: SheetEntry[] = [];
  const names: NameEntry[] = [];
  let since1904 = false;
  let recalculates = false;
  let refersElsewhere = false;
  let current: { name: string; sheet: number | undefined } | undefined;
  let text = "";
  parts.scan(entry, {
    open(name, source) {
      const attributes = attributesOf(source);
      if (name === "sheet") {
        const state = attributes.get("state") ?? "visible";
        const title = decodeText(attributes.get("name") ?? "");
        sheets.push({ name: title, id: attributes.get("id") ?? "", hidden: state !== "visible" });
      } else if (name === "workbookPr") {
        since1904 = isTrue(attributes.get("date1904"));
      } else if (name === "calcPr") {
        recalculates = isTrue(attributes.get("fullCalcOnLoad"));
      } else if (name === "externalReference") {
        refersElsewhere = true;
      } else if (name === "definedName") {
        const sheet = attributes.get("localSheetId");
        current = {
          name: decodeText(attributes.get("name") ?? ""),
          sheet: sheet === undefined ? undefined : Number(sheet),
        };
        text = "";
      }
    },
    close(name) {
      if (name === "definedName" && current !== undefined) {
        names.push({ ...current, text: decodeText(text) });
        current = undefined;
      }
    },
    text(piece) {
      text += current === undefined ? "" : piece;
    },
  });
  refuseSheets(sheets);
  return { sheets, names, since1904, recalculates, refersElsewhere };
}

function refuseSheets(sheets: readonly SheetEntry[]): void {
  const names = new Set(sheets.map(({ name }) => name.toUpperCase()));
  if (sheets.length === 0 || names.size !== sheets.length || names.has("")) {
    throw damaged(sheets.length === 0 ? "it has no sheet" : "two of its sheets have one name or none");
  }
}
