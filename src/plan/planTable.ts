import { quantityReader } from "../call/blockReader.js";
import type { CallProblem } from "../call/callProblem.js";
import { type Cell, CellError } from "../call/cell.js";
import { cellAt } from "../call/column.js";
import { explain } from "../call/explain.js";
import { headerUnit } from "../call/headerUnit.js";
import type { TableColumn } from "../table/checkTable.js";
import type { Candidate } from "./choose.js";
import { type ColumnWish, type PlanColumns, planColumns } from "./planColumns.js";
import type { PlannedTarget } from "./plannedTarget.js";
import { type PlanInput, planDefinition, planInputs } from "./planQuantities.js";
import { quadraturePhases } from "./quadraturePhases.js";
import { targetName } from "./skyTargets.js";

/** A row of the table that can be planned. */
export interface PlanRow extends Candidate {
  /** Counted from 0 among the rows of data. */
  readonly row: number;
  readonly planned: PlannedTarget;
}

export interface PlanTable {
  readonly rows: readonly PlanRow[];
  /** Sentences on rows that cannot be planned. */
  readonly leftOut: readonly { readonly row: number; readonly name: string; readonly because: string }[];
  /** What was taken for granted. */
  readonly notes: readonly string[];
}

export interface PlanWish extends ColumnWish {
  /** Phases after the reference time, the same for every target, or those of each orbit's own quadratures. */
  readonly phases: readonly number[] | "quadrature";
  /** Part of the telescope time that can be used: what a visit costs more. */
  readonly efficiency: number;
}

/** The targets of a table, with what their visits cost; a sentence where a column is missing. */
export function planTable(table: readonly TableColumn[], wish: PlanWish): PlanTable | { readonly problem: string } {
  const places = planColumns(table, wish);
  if ("problem" in places) return places;
  const lacking = lackingColumns(places, wish);
  if (lacking !== undefined) return { problem: lacking };
  const count = table[0]?.column.length ?? 0;
  const reader = new RowReader(table, places, count, notNeeded(wish.phases));
  const rows: PlanRow[] = [];
  const leftOut: { row: number; name: string; because: string }[] = [];
  for (let row = 0; row < count; row++) {
    const name = targetName(table, places.name, row);
    if (table.every(({ column }) => isBlank(cellAt(column, row)))) continue;
    const because = reader.problemOf(row) ?? valueProblem(cellAt(table[places.value]!.column, row), wish.value);
    if (because === undefined) rows.push(planRow(reader, row, name, cellAt(table[places.value]!.column, row), wish));
    else leftOut.push({ row, name, because });
  }
  return { rows, leftOut, notes: notesOn(places, wish) };
}

function planRow(reader: RowReader, row: number, name: string, value: Cell, wish: PlanWish): PlanRow {
  const at = (input: PlanInput) => reader.value(input, row);
  const day = 86400;
  const visits = Math.ceil(at("visits"));
  const exposure = at("exposure") / day;
  const overhead = at("overhead") / day;
  const hours = reader.has("hours") ? at("hours") / 3600 : (visits * (exposure + overhead) * 24) / wish.efficiency;
  const phases = wish.phases === "quadrature" ? quadraturePhases(at("eccentricity"), at("omega")) : wish.phases;
  const planned: PlannedTarget = {
    name,
    rightAscension: at("rightAscension"),
    declination: at("declination"),
    period: at("period") / day,
    periodError: reader.error("period", row) / day,
    reference: at("referenceTime"),
    referenceError: reader.error("referenceTime", row),
    visits,
    exposure,
    overhead,
    phases,
    value: Number(value),
  };
  return { row, name, hours, value: Number(value), planned };
}

/** The columns that are read as a function's inputs are: units from headers, bounds, sentences. */
class RowReader {
  private readonly values = new Map<PlanInput, Float64Array>();
  private readonly errors = new Map<PlanInput, Float64Array>();
  private readonly problems: (string | undefined)[] = [];

  constructor(
    table: readonly TableColumn[],
    places: PlanColumns,
    count: number,
    private readonly ignored: ReadonlySet<PlanInput>,
  ) {
    for (const [key, input] of Object.entries(planInputs) as [PlanInput, (typeof planInputs)[PlanInput]][]) {
      const columns = (places.inputs.get(key) ?? []).map((place) => table[place]!);
      if (columns.length === 0) continue;
      const names = columns.map((_, index) => (index === 0 ? input.name : `uncertainty of ${input.name}`));
      const hours = "sexagesimal" in input.quantity && input.quantity.sexagesimal === "hours";
      const headers = columns.map((column, index) => headerUnit(names[index]!, headerCellOf(column), hours));
      const cells = { input, columns: columns.map(({ column }) => column), headers, single: false };
      const reader = quantityReader(cells, input, count);
      reader.read(0, count, {
        value: (row, problem) => this.note(key, row, problem),
        sigma: (row, problem) => this.note(key, row, problem),
      });
      reader.frames?.forEach((frame, row) => {
        if (frame === undefined || frame === "BJD_TDB") return;
        if (ignored.has(key)) reader.base[row] = Number.NaN;
        else this.problems[row] ??= wrongFrame(input.name, frame);
      });
      this.values.set(key, reader.base);
      if (reader.sides.length > 0) {
        this.errors.set(
          key,
          reader.upper.map((upper, row) => Math.max(upper, reader.lower[row]!)),
        );
      }
    }
    if (!ignored.has("omega")) this.noteOmega(count);
  }

  has(input: PlanInput): boolean {
    return this.values.has(input);
  }

  value(input: PlanInput, row: number): number {
    return this.values.get(input)?.[row] ?? planInputs[input].fallback ?? Number.NaN;
  }

  /** 0 where none is stated. */
  error(input: PlanInput, row: number): number {
    return this.errors.get(input)?.[row] ?? 0;
  }

  problemOf(row: number): string | undefined {
    return this.problems[row];
  }

  private note(input: PlanInput, row: number, problem: CallProblem | CellError): void {
    if (this.ignored.has(input)) return;
    const sentence = problem instanceof CellError ? problem.message : explain(planDefinition, problem);
    this.problems[row] ??= sentence.replace(/^PLAN: /, "");
  }

  /** An omega that is blank is no fault where the orbit is a circle. */
  private noteOmega(count: number): void {
    const shape = this.values.get("eccentricity");
    for (let row = 0; row < count && shape; row++) {
      const isRound = shape[row] === 0;
      const lacksOmega = Number.isNaN(this.value("omega", row));
      if (isRound && this.problems[row]?.startsWith("omega is blank")) this.problems[row] = undefined;
      else if (!isRound && lacksOmega) {
        this.problems[row] ??= "its orbit is eccentric and omega is missing; give it, or name the phases yourself.";
      }
    }
  }
}

/** What is told where it can be read and spoils no row where it cannot. */
function notNeeded(phases: PlanWish["phases"]): ReadonlySet<PlanInput> {
  if (phases === "quadrature") return new Set();
  return new Set(phases.length > 0 ? ["eccentricity", "omega"] : ["eccentricity", "omega", "period", "referenceTime"]);
}

function headerCellOf({ header, unitCell }: TableColumn) {
  const text = unitCell === undefined || unitCell.trim() === "" ? header : `${header} [${unitCell}]`;
  return { text, address: undefined, isNumber: false };
}

function wrongFrame(name: string, frame: string): string {
  return `${name} is in ${frame}; BJD_TDB is needed; BARYTIME turns JD_UTC into it.`;
}

/** Which columns a plan cannot do without. */
function lackingColumns({ inputs }: PlanColumns, { phases }: PlanWish): string | undefined {
  const anyPhase = phases !== "quadrature" && phases.length === 0;
  const needed: PlanInput[] = ["rightAscension", "declination", "visits", "exposure"];
  if (!anyPhase) needed.push("period", "referenceTime");
  const missing = needed.filter((input) => !inputs.has(input)).map((input) => planInputs[input].quantity);
  if (missing.length === 0) return undefined;
  const example = missing[0]!;
  const unit = example.unit === "1" ? "" : ` [${example.unit}]`;
  return `no column of ${missing.map(({ name }) => name).join(", ")} was recognised; head it for example "${example.name}${unit}", or say which column it is.`;
}

function notesOn({ inputs }: PlanColumns, { phases }: PlanWish): string[] {
  const notes: string[] = [];
  if (!inputs.has("hours")) notes.push("Hours are visits times exposure and overhead.");
  if (!inputs.has("overhead")) notes.push("No column of overhead was recognised; it counts as 0.");
  const unsure = (["period", "referenceTime"] as const).filter((input) => inputs.get(input)?.length === 1);
  if (unsure.length > 0 && (phases === "quadrature" || phases.length > 0)) {
    const names = unsure.map((input) => planInputs[input].name).join(" and ");
    notes.push(
      `No column of uncertainties of ${names} was recognised; without one in its own cell a value counts as exact.`,
    );
  }
  return notes;
}

function valueProblem(cell: Cell, header: string): string | undefined {
  if (isBlank(cell)) return `its value, in the column "${header}", is blank; give a number.`;
  const isNumber =
    typeof cell === "number" || (typeof cell === "string" && cell.trim() !== "" && Number.isFinite(Number(cell)));
  if (isNumber) return undefined;
  return `its value, in the column "${header}", is ${cell instanceof CellError ? cell.code : `"${String(cell)}"`}, not a number; give a number.`;
}

function isBlank(cell: Cell): boolean {
  return cell === null || (typeof cell === "string" && cell.trim() === "");
}
