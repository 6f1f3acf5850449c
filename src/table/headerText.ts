import { readHeader } from "../units/readHeader.js";

/** The header as a column of one row of headers would have it, `Period [d]`. */
export function headerText({ header, unitCell }: { readonly header: string; readonly unitCell?: string }): string {
  if (unitCell === undefined) return header;
  const { name, unit } = readHeader(header);
  return name !== "" && unit ? header : `${header} [${unitCell}]`;
}
