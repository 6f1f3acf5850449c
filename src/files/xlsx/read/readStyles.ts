import { parseFormat } from "../../../sheet/display/formatText.js";
import type { NumberFormat } from "../../../sheet/display/numberFormat.js";
import { general } from "../../../sheet/display/numberFormat.js";
import type { ZipEntry } from "../../zip/openZip.js";
import { builtInCode, codeOf, formatOfCode } from "../formatCode.js";
import { stylePrefix } from "../styleName.js";
import { attributesOf } from "../xml/attributes.js";
import { decodeText } from "../xml/xmlText.js";
import type { Parts } from "./parts.js";

/** How the cells of one style show numbers. */
export interface CellStyle {
  readonly format: NumberFormat;
  readonly code: string | undefined;
}

export const usualStyle: CellStyle = { format: general, code: undefined };

/** The styles that cells name by number, as far as they concern numbers. */
export function readStyles(parts: Parts, entry: ZipEntry): CellStyle[] {
  const codes = new Map<number, string>();
  const names = new Map<string, string>();
  const cells: { readonly id: number; readonly named: string | undefined }[] = [];
  let isCells = false;
  parts.scan(entry, {
    open(name, source) {
      if (name === "cellXfs") {
        isCells = true;
      } else if (name === "numFmt" || name === "cellStyle" || (name === "xf" && isCells)) {
        const attributes = attributesOf(source);
        if (name === "numFmt") {
          codes.set(Number(attributes.get("numFmtId")), decodeText(attributes.get("formatCode") ?? ""));
        } else if (name === "cellStyle") {
          names.set(attributes.get("xfId") ?? "", decodeText(attributes.get("name") ?? ""));
        } else {
          cells.push({ id: Number(attributes.get("numFmtId") ?? 0), named: attributes.get("xfId") });
        }
      }
    },
    close(name) {
      isCells &&= name !== "cellXfs";
    },
    text() {},
  });
  return cells.map(({ id, named }) => {
    const own = ownFormat(named === undefined ? undefined : names.get(named));
    return own ?? styleOfCode(codes.get(id) ?? builtInCode(id));
  });
}

/** Formats that no code can say are styles with a name. */
function ownFormat(name: string | undefined): CellStyle | undefined {
  const format = name?.startsWith(stylePrefix) ? parseFormat(name.slice(stylePrefix.length)) : undefined;
  return format && { format, code: undefined };
}

function styleOfCode(code: string): CellStyle {
  const format = formatOfCode(code);
  return { format, code: codeOf(format) === code ? undefined : code };
}
