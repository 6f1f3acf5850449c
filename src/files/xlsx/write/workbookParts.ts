import type { Book } from "../../../sheet/book/book.js";
import type { Workbook } from "../../../sheet/display/workbook.js";
import { formulaText } from "../../../sheet/formula/formula.js";
import { storedText } from "../formula/storedText.js";
import { escapeAttribute, escapeText } from "../xml/xmlText.js";
import { contentTypesSpace, mainSpace, officeRelationships, packageRelationships } from "./spaces.js";

const spreadsheet = "application/vnd.openxmlformats-officedocument.spreadsheetml";

export function sheetPartName(sheet: number): string {
  return `xl/worksheets/sheet${sheet + 1}.xml`;
}

export function contentTypesPart(sheets: number): string {
  const override = (name: string, type: string) => `<Override PartName="/${name}" ContentType="${type}+xml"/>`;
  return [
    `<Types xmlns="${contentTypesSpace}">`,
    '<Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>',
    '<Default Extension="xml" ContentType="application/xml"/>',
    override("xl/workbook.xml", `${spreadsheet}.sheet.main`),
    ...Array.from({ length: sheets }, (_, sheet) => override(sheetPartName(sheet), `${spreadsheet}.worksheet`)),
    override("xl/styles.xml", `${spreadsheet}.styles`),
    override("xl/sharedStrings.xml", `${spreadsheet}.sharedStrings`),
    override("xl/metadata.xml", `${spreadsheet}.sheetMetadata`),
    "</Types>",
  ].join("");
}

export function packageRelationshipsPart(): string {
  return relationshipsPart([["officeDocument", "xl/workbook.xml"]]);
}

export function workbookRelationshipsPart(sheets: number): string {
  return relationshipsPart([
    ...Array.from({ length: sheets }, (_, sheet) => ["worksheet", `worksheets/sheet${sheet + 1}.xml`] as const),
    ["styles", "styles.xml"],
    ["sharedStrings", "sharedStrings.xml"],
    ["sheetMetadata", "metadata.xml"],
  ]);
}

function relationshipsPart(targets: readonly (readonly [type: string, target: string])[]): string {
  const lines = targets.map(
    ([type, target], index) =>
      `<Relationship Id="rId${index + 1}" Type="${officeRelationships}/${type}" Target="${target}"/>`,
  );
  return `<Relationships xmlns="${packageRelationships}">${lines.join("")}</Relationships>`;
}

/**
 * The list of sheets and names. It does not ask for a calculation, so that a program without the add-in shows the values
 * that are there; the version of the calculation keeps programs from one of their own accord (common practice, no source).
 */
export function workbookPart({ book, sheets }: Workbook): string {
  const firstShown = Math.max(
    0,
    sheets.findIndex(({ hidden }) => !hidden),
  );
  const lines = book.sheets.map(({ name }, index) => {
    const isHidden = sheets[index]?.hidden === true && index !== firstShown;
    const state = isHidden ? ' state="hidden"' : "";
    return `<sheet name="${escapeAttribute(name)}" sheetId="${index + 1}"${state} r:id="rId${index + 1}"/>`;
  });
  return [
    `<workbook xmlns="${mainSpace}" xmlns:r="${officeRelationships}">`,
    `<bookViews><workbookView activeTab="${firstShown}"/></bookViews>`,
    `<sheets>${lines.join("")}</sheets>`,
    definedNames(book),
    '<calcPr calcId="191029"/>',
    "</workbook>",
  ].join("");
}

function definedNames({ names, sheets }: Book): string {
  const known = new Set(sheets.map(({ name }) => name.toUpperCase()));
  const lines = names.map(({ name, formula }) => {
    const isGone = formula.references.some((each) => each?.sheet !== undefined && !known.has(each.sheet.toUpperCase()));
    const text = isGone ? "#REF!" : storedText(formulaText(formula, 0, 0));
    return `<definedName name="${escapeAttribute(name)}">${escapeText(text)}</definedName>`;
  });
  return lines.length === 0 ? "" : `<definedNames>${lines.join("")}</definedNames>`;
}

/** What `cm="1"` of a cell means: its formula fills as many cells as it gives ([MS-XLSX] section 2.4.1067, CT_DynamicArrayProperties; the identifier is that of the extension). */
export function metadataPart(): string {
  const dynamic = "http://schemas.microsoft.com/office/spreadsheetml/2017/dynamicarray";
  const identifier = "{bdbb8cdc-fa1e-496e-a857-3c3f30c029c3}";
  return [
    `<metadata xmlns="${mainSpace}" xmlns:xda="${dynamic}">`,
    '<metadataTypes count="1"><metadataType name="XLDAPR" minSupportedVersion="120000" copy="1" pasteAll="1" ',
    'pasteValues="1" merge="1" splitFirst="1" rowColShift="1" clearFormats="1" clearComments="1" assign="1" ',
    'coerce="1" cellMeta="1"/></metadataTypes>',
    `<futureMetadata name="XLDAPR" count="1"><bk><extLst><ext uri="${identifier}">`,
    '<xda:dynamicArrayProperties fDynamic="1" fCollapsed="0"/></ext></extLst></bk></futureMetadata>',
    '<cellMetadata count="1"><bk><rc t="1" v="0"/></bk></cellMetadata></metadata>',
  ].join("");
}
