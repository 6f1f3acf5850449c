import { FileProblem } from "../fileProblem.js";
import { type DescribedColumn, describedColumns } from "../table/describedColumns.js";
import { FieldColumn } from "../table/fieldColumn.js";
import { checkColumnCount } from "../table/mostColumns.js";
import type { TableFile } from "../table/tableFile.js";
import type { TableFinding } from "../table/tableFinding.js";
import type { TableReader } from "../table/tableReader.js";
import { Lines } from "../text/lines.js";
import { type ByteColumn, readByteByByte } from "./byteByByte.js";
import { catalogueUnit } from "./catalogueUnit.js";
import { isBeyond } from "./explanation.js";

const rule = /^\s*(?:-{20,}|={20,})\s*$/;
const opening = /^\s*Byte-(?:by|per)-byte Description of file:\s*(.*)$/i;
const longestHead = 1 << 20;
/** Data lines that are followed by a rule were notes after all; so many are kept to tell. */
const mostNotes = 2000;

/** How the text between two rules begins where it is no data. */
const noteLike =
  /^\s*(?:(?:global|general|table)\s+)?(?:notes?|remarks?|references?|comments?|acknowledge\w*|history|description)\b/i;

/** What was read as data between two rules. */
interface Section {
  readonly rows: number;
  readonly columns: DescribedColumn[];
  readonly beyond: (Beyond | undefined)[];
  readonly outside: Outside | undefined;
  readonly lines: readonly string[];
}

interface Outside {
  count: number;
  readonly line: number;
  readonly text: string;
}

interface Beyond {
  count: number;
  readonly row: number;
  readonly value: number;
}

/**
 * Reads a machine-readable table of the AAS journals or of CDS (Standards for Astronomical Catalogues 2.0): titles, a
 * byte-by-byte description, notes, then lines of fixed width. The data begin after the last rule.
 */
export class MachineReadableReader implements TableReader {
  rows = 0;
  private readonly lines = new Lines();
  private readonly titles: string[] = [];
  private described: ByteColumn[] | undefined;
  private columns: DescribedColumn[] = [];
  private beyond: (Beyond | undefined)[] = [];
  private entries: string[] = [];
  private notes: string[] = [];
  private rules = 0;
  private part: "titles" | "names" | "entries" | "data" = "titles";
  private length = 0;
  private line = 0;
  private outside: Outside | undefined;
  private descriptions = 0;
  private since: string[] = [];
  private before: Section | undefined;

  push(text: string): void {
    this.lines.push(text, (line) => this.take(line));
  }

  finish(): TableFile {
    this.lines.end((line) => this.take(line));
    if (!this.described) throw problem("its byte-by-byte description does not end with a rule of dashes");
    if (this.descriptions > 1) throw severalFiles(this.descriptions);
    this.settleData();
    const { findings, ...parts } = describedColumns(this.columns);
    const titles = this.titles.map((line) => line.trim()).filter((line) => line !== "" && !rule.test(line));
    const title = titles.find((line) => /^Title:/i.test(line))?.replace(/^Title:\s*/i, "");
    return {
      ...parts,
      format: "machine-readable",
      name: titles.find((line) => /^Table:/i.test(line))?.replace(/^Table:\s*/i, ""),
      description: title,
      unitsRow: undefined,
      rows: this.rows,
      remarks: [...titles.filter((line) => !/^(?:Title|Table):/i.test(line)), ...paragraphs(this.notes)],
      findings: [...this.ownFindings(), ...findings],
      delimited: undefined,
    };
  }

  private take(text: string): void {
    this.line++;
    const start = opening.exec(text);
    if (start) {
      this.descriptions++;
      this.part = "names";
      this.rules = 0;
      return;
    }
    if (this.part !== "data") {
      this.length += text.length;
      if (this.length > longestHead) throw problem("its byte-by-byte description has no end");
    }
    if (this.part === "titles") this.titles.push(text);
    else if (this.part === "data") this.takeData(text);
    else if (rule.test(text)) this.takeRule();
    else if (this.part === "entries") this.entries.push(text);
  }

  /** A rule above the names of the parts, one below, one after the entries. */
  private takeRule(): void {
    this.rules++;
    if (this.rules === 2) this.part = "entries";
    if (this.rules < 3) return;
    const described = readByteByByte(this.entries);
    if (described.length === 0) throw problem("its byte-by-byte description holds no entry that can be read");
    checkColumnCount(described.length);
    this.described = [...described];
    this.part = "data";
    this.begin();
  }

  private begin(): void {
    this.rows = 0;
    this.outside = undefined;
    this.beyond = this.described!.map(() => undefined);
    this.columns = this.described!.map(({ label, unit, type, explanation }) => {
      const { nullText, description } = explanation;
      const notes = { name: label, unit: catalogueUnit(unit), description, ucd: undefined };
      return { notes, cells: new FieldColumn(type, nullText === undefined ? undefined : nullTest(nullText)) };
    });
  }

  private takeData(text: string): void {
    if (rule.test(text)) {
      this.endSection();
      return;
    }
    if (this.since.length < mostNotes) this.since.push(text);
    if (text.trim() === "") return;
    this.rows++;
    const { described, columns } = this;
    let end = 0;
    for (let index = 0; index < columns.length; index++) {
      const { from, to, explanation, type } = described![index]!;
      const field = text.slice(from, to);
      columns[index]!.cells.push(type === "text" ? field.trim() : field);
      if (explanation.limits) this.checkLimits(index, field);
      end = Math.max(end, to);
    }
    if (text.length > end && text.slice(end).trim() !== "") {
      this.outside ??= { count: 0, line: this.line, text: text.slice(end).trim() };
      this.outside.count++;
    }
  }

  /** A rule says that what stood above it were notes, unless nothing follows: then it only closes the data. */
  private endSection(): void {
    const { rows, columns, beyond, outside, since } = this;
    const first = since.find((line) => line.trim() !== "");
    if (first !== undefined && !noteLike.test(first)) this.before = { rows, columns, beyond, outside, lines: since };
    else this.notes.push(...since);
    this.since = [];
    this.begin();
  }

  private settleData(): void {
    const { before } = this;
    if (!before) return;
    if (this.rows > 0) this.notes.push(...before.lines);
    else
      Object.assign(this, {
        rows: before.rows,
        columns: before.columns,
        beyond: before.beyond,
        outside: before.outside,
      });
  }

  private checkLimits(index: number, field: string): void {
    const { limits, nullText } = this.described![index]!.explanation;
    const value = Number(field);
    if (field.trim() === "" || Number.isNaN(value) || !isBeyond(limits!, value)) return;
    if (nullText !== undefined && nullTest(nullText)(field)) return;
    this.beyond[index] ??= { count: 0, row: this.rows, value };
    this.beyond[index]!.count++;
  }

  private ownFindings(): TableFinding[] {
    const beyond = this.described!.flatMap(({ label, explanation }, index): TableFinding[] => {
      const found = this.beyond[index];
      return found ? [{ kind: "beyond-limits", name: label, limits: explanation.limits!.text, ...found }] : [];
    });
    const outside: TableFinding[] = this.outside ? [{ kind: "outside-columns", ...this.outside }] : [];
    return [...outside, ...beyond, ...(this.rows === 0 ? [{ kind: "no-rows" } as const] : [])];
  }
}

/** The mark of no value is compared as a number where it is one: -9.9 is -9.90. */
function nullTest(nullText: string): (field: string) => boolean {
  const value = Number(nullText);
  return (field) => {
    const text = field.trim();
    return text === nullText || (text !== "" && Number(text) === value);
  };
}

/** Lines of notes, a paragraph each where the next begins with a word at the line's start or a blank line parts them. */
function paragraphs(lines: readonly string[]): string[] {
  const found: string[] = [];
  for (const line of lines) {
    const last = found.length - 1;
    if (line.trim() === "") found.push("");
    else if (last >= 0 && found[last] !== "" && /^\s/.test(line)) found[last] += ` ${line.trim()}`;
    else found.push(line.trim());
  }
  return found.filter((paragraph) => paragraph !== "");
}

function severalFiles(count: number): FileProblem {
  return new FileProblem(
    "no-table",
    `The file describes ${count} tables byte by byte, whose data stand in files of their own; put one description above the data of its table and open that.`,
  );
}

function problem(what: string): FileProblem {
  return new FileProblem(
    "not-as-standard",
    `The file looks like a machine-readable table, but ${what}; copy it again from where it came.`,
  );
}
