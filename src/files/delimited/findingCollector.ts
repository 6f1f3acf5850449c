import { readNumber } from "../cell/readNumber.js";
import type { Dialect } from "./dialect.js";
import type { Finding, Place } from "./finding.js";
import { lineOfRecord, type SourceText } from "./sourceText.js";

interface Ragged {
  count: number;
  readonly record: number;
  readonly fields: number;
}

/** Counts what is odd about the records as they pass; places become lines and rows only at the end. */
export class FindingCollector {
  private short: Ragged | undefined;
  private long: Ragged | undefined;
  private stray: { count: number; readonly record: number } | undefined;
  private unclosed: number | undefined;

  quote(trouble: "stray" | "unclosed", record: number): void {
    if (trouble === "unclosed") {
      this.unclosed = record;
    } else {
      this.stray ??= { count: 0, record };
      this.stray.count++;
    }
  }

  width(fields: number, expected: number, record: number): void {
    if (fields < expected) {
      this.short ??= { count: 0, record, fields };
      this.short.count++;
    } else {
      this.long ??= { count: 0, record, fields };
      this.long.count++;
    }
  }

  finish(
    header: readonly string[],
    hasUnits: boolean,
    columns: number,
    source: SourceText,
    dialect: Dialect,
  ): Finding[] {
    const firstRow = hasUnits ? 2 : 1;
    const placed = (record: number): Place => ({
      row: Math.max(record - firstRow + 1, 0),
      line: lineOfRecord(source, record, dialect.newline),
    });
    const expected = header.length;
    const findings = headerFindings(header);
    if (this.unclosed !== undefined) {
      findings.push({ kind: "unclosed-quote", first: placed(this.unclosed) });
    }
    if (this.stray !== undefined) {
      findings.push({ kind: "stray-quotes", count: this.stray.count, first: placed(this.stray.record) });
    }
    if (this.short !== undefined) {
      const { count, fields, record } = this.short;
      findings.push({ kind: "short-rows", count, first: placed(record), fields, expected });
    }
    if (this.long !== undefined) {
      const { count, fields, record } = this.long;
      findings.push({ kind: "long-rows", count, first: placed(record), fields, expected, columns });
    }
    if (columns === 1) {
      findings.push({ kind: "one-column" });
    }
    if (source.records === firstRow) {
      findings.push({ kind: "no-rows" });
    }
    if (dialect.encoding !== "utf-8") {
      findings.push({ kind: "other-encoding", encoding: dialect.encoding });
    }
    return findings;
  }
}

function headerFindings(header: readonly string[]): Finding[] {
  const findings: Finding[] = [];
  const places = new Map<string, number[]>();
  header.forEach((name, column) => {
    const known = places.get(name);
    if (known === undefined) {
      places.set(name, [column]);
    } else {
      known.push(column);
    }
  });
  for (const [name, columns] of places) {
    if (name === "") {
      findings.push({ kind: "empty-headers", columns });
    } else if (columns.length > 1) {
      findings.push({ kind: "duplicate-header", header: name, columns });
    }
  }
  const named = header.filter((name) => name !== "");
  if (named.length > 0 && named.every((name) => readNumber(name) !== undefined)) {
    findings.push({ kind: "numbers-as-header", header: named[0] as string });
  }
  return findings;
}
