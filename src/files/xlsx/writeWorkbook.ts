import { usedRows } from "../../sheet/book/usedRows.js";
import type { Watch } from "../../sheet/change.js";
import type { Workbook } from "../../sheet/display/workbook.js";
import { plainWorkbookSheet } from "../../sheet/display/workbook.js";
import { zipWriter } from "../zip/zipWriter.js";
import type { Steps } from "./steps.js";
import { inSlices } from "./steps.js";
import { xmlDeclaration } from "./write/spaces.js";
import { stringTable } from "./write/stringTable.js";
import { styleTable } from "./write/styleTable.js";
import {
  contentTypesPart,
  metadataPart,
  packageRelationshipsPart,
  sheetPartName,
  workbookPart,
  workbookRelationshipsPart,
} from "./write/workbookParts.js";
import { writeSheet } from "./write/writeSheet.js";

/**
 * Writes a workbook (ECMA-376, .xlsx): formulas with the values they gave, so that it can be read without calculating,
 * our functions as the add-in has them stored. The same workbook gives the same bytes. Resolves to undefined where it
 * was cancelled.
 */
export function writeWorkbook(workbook: Workbook): Promise<Uint8Array>;
export function writeWorkbook(workbook: Workbook, watch: Watch): Promise<Uint8Array | undefined>;
export function writeWorkbook(workbook: Workbook, watch?: Watch): Promise<Uint8Array | undefined> {
  return inSlices(writeSteps(workbook), watch);
}

function* writeSteps(workbook: Workbook): Steps<Uint8Array> {
  const { book } = workbook;
  const sheets = book.sheets.map((_, index) => workbook.sheets[index] ?? plainWorkbookSheet);
  const zip = zipWriter();
  const part = (name: string, text: string): void => {
    zip.begin(name);
    zip.write(xmlDeclaration + text);
  };
  part("[Content_Types].xml", contentTypesPart(sheets.length));
  part("_rels/.rels", packageRelationshipsPart());
  part("xl/workbook.xml", workbookPart({ ...workbook, sheets }));
  part("xl/_rels/workbook.xml.rels", workbookRelationshipsPart(sheets.length));
  part("xl/metadata.xml", metadataPart());

  const total = book.sheets.reduce((sum, _, index) => sum + usedRows(book, index), 0);
  let done = 0;
  const strings = stringTable();
  const styles = styleTable();
  for (const [index, sheet] of book.sheets.entries()) {
    const writing = { book, strings, styles, nextShared: 0 };
    zip.begin(sheetPartName(index));
    for (const rows of writeSheet(sheet, sheets[index] ?? plainWorkbookSheet, writing, zip)) {
      done += rows;
      yield { done: Math.min(done, total), total };
    }
  }
  part("xl/styles.xml", styles.part());
  zip.begin("xl/sharedStrings.xml");
  zip.write(xmlDeclaration);
  for (const piece of strings.part()) {
    zip.write(piece);
    yield { done: total, total };
  }
  return zip.finish();
}
