import { recogniseColumn } from "../../../../table/recogniseColumn.js";

/**
 * A header that tells by itself what the file tells by a UCD beside it, as sheets have no other place for it: `P1 [d]`
 * becomes `P1 (orbital period) [d]` where the column holds periods. Left alone where the name says it already.
 */
export function namedHeader(header: string, unitCell: string | undefined, ucd: string | undefined): string {
  if (ucd === undefined) return header;
  const { quantity } = recogniseColumn(header, unitCell, ucd);
  if (quantity === undefined || recogniseColumn(header, unitCell).quantity === quantity) return header;
  const { name, rest } = /^(?<name>.*?)(?<rest>(?:\s+sigma[+-]?)?(?:\s*\[[^\]]*\])?)$/.exec(header)!.groups!;
  const told = `${name} (${quantity.name})${rest}`;
  return recogniseColumn(told, unitCell).quantity === quantity ? told : header;
}
