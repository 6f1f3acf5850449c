import { FileProblem } from "../fileProblem.js";
import type { TableFinding } from "../table/tableFinding.js";
import { instantUnitText, type TimeSystem } from "./timeSystem.js";
import { countOfArraysize, isDatatype, type VotableField } from "./votableField.js";

type Attributes = Readonly<Record<string, string>>;

export interface VotableTable {
  readonly name: string | undefined;
  readonly id: string | undefined;
  readonly stated: number | undefined;
  readonly fields: VotableField[];
  description: string | undefined;
  hasData: boolean;
}

/** Everything a VOTable says but its rows: built up as its elements open and close. */
export class VotableDescription {
  readonly remarks: string[] = [];
  private readonly path: string[] = [];
  private readonly tables: VotableTable[] = [];
  private readonly timeSystems = new Map<string, TimeSystem>();
  private table: VotableTable | undefined;
  private field: VotableField | undefined;
  private chosen: VotableTable | undefined;
  private serviceError: string | undefined;
  private isOverflow = false;
  private info: Attributes = {};

  constructor(private readonly asked: string | undefined) {}

  /** The element that is open. */
  get place(): string | undefined {
    return this.path[this.path.length - 1];
  }

  /** Whether the table that is open is the one to read. */
  get isRead(): boolean {
    return this.chosen !== undefined && this.chosen === this.table;
  }

  open(name: string, attributes: Attributes): void {
    if (this.path.length === 0 && name !== "VOTABLE") throw notVotable(name);
    this.path.push(name);
    if (name === "TABLE") this.openTable(attributes);
    else if (name === "FIELD") this.field = this.fieldOf(attributes);
    else if (name === "VALUES" && this.field) this.field = { ...this.field, nullText: attributes.null?.trim() };
    else if (name === "DATA") this.openData();
    else if (name === "INFO") this.info = attributes;
    else if (name === "PARAM") this.remark(attributes);
    else if (name === "TIMESYS") this.addTimeSystem(attributes);
  }

  close(name: string, text: string): void {
    this.path.pop();
    if (name === "FIELD" && this.field) {
      this.table?.fields.push(this.field);
      this.field = undefined;
    } else if (name === "DESCRIPTION") this.describe(tidy(text));
    else if (name === "INFO") this.closeInfo(tidy(text));
    else if (name === "TABLE") this.table = undefined;
  }

  /** The table that was read; one without data where none has any. */
  chosenTable(): VotableTable {
    const found =
      this.chosen ??
      (this.asked === undefined ? this.tables[0] : this.tables.find((one, index) => this.isAsked(one, index)));
    if (found) return found;
    if (this.tables.length === 0) {
      throw new FileProblem(
        "no-table",
        this.serviceError === undefined
          ? "The VOTable holds no TABLE."
          : `The VOTable holds no TABLE; the service that made it reports: "${this.serviceError.slice(0, 150)}".`,
      );
    }
    const names = this.tables.slice(0, 5).map((_, index) => `"${this.label(index)}"`);
    throw new FileProblem(
      "no-table",
      `The VOTable holds no table "${this.asked?.slice(0, 40)}"; it holds ${names.join(", ")}${this.tables.length > 5 ? " and more" : ""}.`.slice(
        0,
        250,
      ),
    );
  }

  findings(rows: number): TableFinding[] {
    const findings: TableFinding[] = [];
    const read = this.tables.indexOf(this.chosenTable());
    const others = this.tables.map((_, index) => this.label(index)).filter((_, index) => index !== read);
    if (others.length > 0) findings.push({ kind: "several-tables", read: this.label(read), others });
    if (this.serviceError !== undefined) findings.push({ kind: "service-error", text: this.serviceError });
    if (this.isOverflow) findings.push({ kind: "overflow" });
    const { stated } = this.tables[read]!;
    if (stated !== undefined && stated !== rows) findings.push({ kind: "row-count", rows, stated });
    return findings;
  }

  private openTable({ name, ID, nrows }: Attributes): void {
    const stated = nrows !== undefined && /^\d{1,15}$/.test(nrows) ? Number(nrows) : undefined;
    this.table = { name, id: ID, stated, fields: [], description: undefined, hasData: false };
    this.tables.push(this.table);
  }

  private openData(): void {
    const { table } = this;
    if (!table) return;
    table.hasData = true;
    const isAsked = this.asked === undefined || this.isAsked(table, this.tables.length - 1);
    if (isAsked) this.chosen ??= table;
  }

  private isAsked({ name, id }: VotableTable, index: number): boolean {
    return this.asked === name || this.asked === id || this.asked === String(index + 1);
  }

  private label(index: number): string {
    const { name, id } = this.tables[index]!;
    return name || id || String(index + 1);
  }

  private fieldOf(attributes: Attributes): VotableField {
    const { name, ID, datatype, arraysize, ucd, ref } = attributes;
    if (!isDatatype(datatype)) {
      throw new FileProblem(
        "not-as-standard",
        `The VOTable's field "${(name ?? ID ?? "").slice(0, 40)}" has the datatype "${(datatype ?? "").slice(0, 40)}", which the standard does not know; mend it.`,
      );
    }
    const count = countOfArraysize(arraysize);
    if (Number.isNaN(count)) {
      throw new FileProblem(
        "not-as-standard",
        `The VOTable's field "${(name ?? ID ?? "").slice(0, 40)}" has the arraysize "${arraysize?.slice(0, 40)}", which is no size; mend it, for example "*".`,
      );
    }
    const system = ref === undefined ? undefined : this.timeSystems.get(ref);
    const instant = system && attributes.unit === "d" ? instantUnitText(system) : undefined;
    const notes = {
      name: name ?? ID ?? `column ${(this.table?.fields.length ?? 0) + 1}`,
      unit: instant ?? (attributes.unit || undefined),
      description: undefined,
      ucd: ucd || undefined,
    };
    return { notes, datatype, arraysize, count, nullText: undefined };
  }

  private describe(text: string): void {
    if (text === "") return;
    if (this.field) this.field = { ...this.field, notes: { ...this.field.notes, description: text } };
    else if (this.place === "TABLE" && this.table) this.table.description = text;
    else if (this.place === "RESOURCE" || this.place === "VOTABLE") this.remarks.push(text);
  }

  private closeInfo(text: string): void {
    const { name, value = "" } = this.info;
    if (name === "QUERY_STATUS" && value === "ERROR") this.serviceError = text || "no reason given";
    else if (name === "QUERY_STATUS" && value === "OVERFLOW") this.isOverflow = true;
    else if (name === "comment") this.remarks.push(value);
    else if (name !== "QUERY_STATUS") this.remark(this.info);
  }

  private remark({ name, value, unit }: Attributes): void {
    if (name && value !== undefined) this.remarks.push(`${name} = ${value}${unit ? ` ${unit}` : ""}`);
  }

  private addTimeSystem({ ID, timescale = "", refposition = "", timeorigin }: Attributes): void {
    if (ID !== undefined) this.timeSystems.set(ID, { timescale, refposition, timeorigin });
  }
}

function tidy(text: string): string {
  return text.replace(/\s+/g, " ").trim();
}

function notVotable(root: string): FileProblem {
  return new FileProblem(
    "other-kind",
    `The file is XML of another kind (<${root.slice(0, 40)}>), not a VOTable; save the table as VOTable, ECSV or CSV.`,
  );
}
