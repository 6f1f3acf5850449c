import { strToU8, zipSync } from "fflate";

const main = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
const office = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const relationship = (id: string, type: string, target: string) => `<Relationship Id="${id}" Type="${office}/${type}" Target="${target}"/>`; // biome-ignore format: one line of a part

/** Parts of a workbook as other programs write them: what is inside the root elements, or whole parts by name. */
export interface Parts {
  /** Inside sheetData. */
  readonly data?: string;
  /** Before sheetData. */
  readonly head?: string;
  /** After sheetData. */
  readonly tail?: string;
  /** Inside sst. */
  readonly strings?: string;
  readonly styles?: string;
  /** Before and after the sheets of the workbook. */
  readonly properties?: string;
  readonly rest?: string;
  readonly parts?: Readonly<Record<string, string | Uint8Array>>;
}

/** A workbook of one sheet packed by a general library. */
export function packed({
  data = "",
  head = "",
  tail = "",
  strings = "",
  styles = "",
  properties = "",
  rest = "",
  parts = {},
}: Parts): Uint8Array {
  // biome-ignore format: one signature
  const files: Record<string, string | Uint8Array> = {
    "_rels/.rels": `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">${relationship("r1", "officeDocument", "/xl/workbook.xml")}</Relationships>`,
    "xl/workbook.xml": `<workbook xmlns="${main}" xmlns:r="${office}">${properties}<sheets><sheet name="Targets" sheetId="7" r:id="r9"/></sheets>${rest}</workbook>`,
    "xl/_rels/workbook.xml.rels": `<Relationships>${relationship("r9", "worksheet", "worksheets/sheet1.xml")}${relationship("r2", "sharedStrings", "sharedStrings.xml")}${relationship("r3", "styles", "styles.xml")}</Relationships>`,
    "xl/worksheets/sheet1.xml": `<?xml version="1.0"?><worksheet xmlns="${main}">${head}<sheetData>${data}</sheetData>${tail}</worksheet>`,
    "xl/sharedStrings.xml": `<sst xmlns="${main}">${strings}</sst>`,
    "xl/styles.xml": `<styleSheet xmlns="${main}">${styles}</styleSheet>`,
    ...parts,
  };
  return zipSync(
    Object.fromEntries(
      Object.entries(files).map(([name, text]) => [name, typeof text === "string" ? strToU8(text) : text]),
    ),
    { level: 1 },
  );
}
