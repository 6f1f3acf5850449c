import type { DeclaredType } from "../table/declaredCell.js";
import { type Explanation, readExplanation } from "./explanation.js";

/** A column as a byte-by-byte description gives it. */
export interface ByteColumn {
  /** Characters of a line, from 0, the end not included. */
  readonly from: number;
  readonly to: number;
  readonly type: DeclaredType;
  /** As written; undefined for `---`. */
  readonly unit: string | undefined;
  readonly label: string;
  readonly explanation: Explanation;
}

const entry = /^ *(?:(\d+) *- *)?(\d+) +(\d*[AIFEDGLX])(\d*)(?:\.\d+)?\s+(\S+)\s+(\S+)(?:\s+(.*))?$/;

/**
 * The lines between the rules of a byte-by-byte description (CDS, Standards for Astronomical Catalogues 2.0, section
 * 3.2): bytes, FORTRAN format, units, label, explanation; lines that begin no entry go on with the explanation.
 * Undefined where an entry cannot be read, with its number.
 */
export function readByteByByte(lines: readonly string[]): readonly ByteColumn[] {
  const entries: { readonly parts: RegExpExecArray; explanation: string }[] = [];
  for (const line of lines) {
    const parts = entry.exec(line);
    const last = entries[entries.length - 1];
    if (parts) entries.push({ parts, explanation: parts[7] ?? "" });
    else if (last && line.trim() !== "") last.explanation += ` ${line.trim()}`;
  }
  return entries.map(({ parts, explanation }) => {
    const [, first, last, format, , unit, label] = parts;
    const letter = format!.slice(-1);
    return {
      from: Number(first ?? last) - 1,
      to: Number(last),
      type:
        letter === "A" || letter === "X" ? "text" : letter === "I" ? "integer" : letter === "L" ? "logical" : "number",
      unit: /^-+$/.test(unit!) ? undefined : unit,
      label: label!,
      explanation: readExplanation(explanation),
    };
  });
}
