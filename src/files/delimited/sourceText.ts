import { lineEndOf, type Newline } from "./dialect.js";

/**
 * The text of a delimited file, whole and in order (without the byte order mark), and where its records lie in it. What
 * stands between two records are line endings, comment lines and blank lines.
 */
export interface SourceText {
  readonly blocks: readonly string[];
  /** Of each block, the number of records in the blocks before it. */
  readonly recordsBefore: readonly number[];
  /** Header, units row and data rows. */
  readonly records: number;
  /** Of each record, its beginning and end in its block and the number of its fields. */
  readonly starts: Uint32Array;
  readonly ends: Uint32Array;
  readonly widths: Uint16Array;
  /** A record whose last field is quoted and never closed; only the last can be. */
  readonly unclosed: boolean;
}

/** Where a record stands: the number of its block, its beginning and its end there. */
export interface RecordPlace {
  readonly block: number;
  readonly start: number;
  readonly end: number;
}

export function placeOfRecord(source: SourceText, record: number): RecordPlace {
  let low = 0;
  let high = source.blocks.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((source.recordsBefore[middle] as number) <= record) {
      low = middle;
    } else {
      high = middle - 1;
    }
  }
  return { block: low, start: source.starts[record] as number, end: source.ends[record] as number };
}

/** The number of a record's first line in the file, counted from 1. */
export function lineOfRecord(source: SourceText, record: number, newline: Newline): number {
  const lineEnd = lineEndOf(newline);
  const place = placeOfRecord(source, record);
  let line = 1;
  for (let block = 0; block <= place.block; block++) {
    const text = source.blocks[block] as string;
    const end = block === place.block ? place.start : text.length;
    for (let at = text.indexOf(lineEnd); at >= 0 && at < end; at = text.indexOf(lineEnd, at + 1)) {
      line++;
    }
  }
  return line;
}
