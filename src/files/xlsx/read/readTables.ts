import type { ZipEntry } from "../../zip/openZip.js";
import type { FileTable } from "../formula/tableReferences.js";
import { attributesOf } from "../xml/attributes.js";
import { decodeText } from "../xml/xmlText.js";
import { readArea } from "./cellAddress.js";
import type { Parts } from "./parts.js";

/** The tables that a sheet has, from the parts it names. */
export function readTables(parts: Parts, sheetEntry: ZipEntry, sheet: string): FileTable[] {
  const targets = parts.relationshipsOf(sheetEntry.name).filter(({ type }) => type === "table");
  return targets.flatMap(({ target }) => {
    const entry = parts.find(target);
    const table = entry && readTable(parts, entry, sheet);
    return table === undefined ? [] : [table];
  });
}

function readTable(parts: Parts, entry: ZipEntry, sheet: string): FileTable | undefined {
  const columns: string[] = [];
  let about: ReadonlyMap<string, string> | undefined;
  parts.scan(entry, {
    open(name, source) {
      if (name === "table") {
        about = attributesOf(source);
      } else if (name === "tableColumn") {
        columns.push(decodeText(attributesOf(source).get("name") ?? ""));
      }
    },
    close() {},
    text() {},
  });
  const name = about?.get("displayName") ?? about?.get("name");
  const area = about?.get("ref");
  if (name === undefined || area === undefined) {
    return undefined;
  }
  const headerRows = Number(about?.get("headerRowCount") ?? 1);
  const totalsRows = Number(about?.get("totalsRowCount") ?? 0);
  return { name: decodeText(name), sheet, ...readArea(area), headerRows, totalsRows, columns };
}
