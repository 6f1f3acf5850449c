import type { TableFile } from "../files/table/tableFile.js";
import { columnKey } from "../table/columnKey.js";
import { headerText } from "../table/headerText.js";
import { type RecognisedColumn, recogniseColumn } from "../table/recogniseColumn.js";
import { ownersOfSigmas } from "../table/sigmaColumns.js";
import { isPlainNumberKind } from "../units/kind.js";
import { convertible, one, type Unit } from "../units/unit.js";
import type { BookColumn, BookTable } from "./bookTable.js";
import type { RevisionFinding } from "./revisionFinding.js";

/** What of a table file revises another. */
export type RevisionTable = Pick<TableFile, "header" | "unitsRow" | "columns" | "rows" | "notes">;

export interface RevisionColumn {
  /** Its place in the revision. */
  readonly index: number;
  readonly header: string;
  readonly recognised: RecognisedColumn;
  readonly sigmaOf: number | undefined;
}

/** A column of values of the table with the one that revises it, and the same of their uncertainties. */
export interface PairedColumn {
  readonly column: BookColumn;
  readonly from: RevisionColumn;
  readonly by: "header" | "quantity";
  readonly units: UnitsOfPair | undefined;
  readonly sigmas: readonly RevisionColumn[];
}

/** Undefined for texts and for plain numbers without a unit. */
export interface UnitsOfPair {
  readonly to: Unit;
  readonly from: Unit;
}

export function revisionColumns(revision: RevisionTable): readonly RevisionColumn[] {
  const headed = revision.header.map((header, index) => {
    const unitCell = revision.unitsRow?.[index];
    const stated = unitCell === undefined || unitCell.trim() === "" || unitCell.trim() === "-" ? {} : { unitCell };
    const recognised = recogniseColumn(header, stated.unitCell, revision.notes[index]?.ucd);
    return { index, header: headerText({ header, ...stated }), recognised };
  });
  const owners = ownersOfSigmas(headed);
  return headed.map((own, index) => ({ ...own, sigmaOf: owners[index] }));
}

/**
 * Columns belong together by their name or else by the quantity that both hold, where one of each does. What cannot be
 * taken as it stands is left aside with a finding.
 */
export function pairRevision(
  table: BookTable,
  columns: readonly RevisionColumn[],
  keys: { readonly table: BookColumn; readonly revision: RevisionColumn },
): { readonly pairs: readonly PairedColumn[]; readonly findings: readonly RevisionFinding[] } {
  const findings: RevisionFinding[] = [];
  const values = columns.filter((own) => own !== keys.revision && !own.recognised.isUncertainty);
  const places = table.columns.filter((own) => own !== keys.table && own.sigmaOf === undefined);
  const left = new Set(values);
  const chosen = new Map<BookColumn, { from: RevisionColumn; by: PairedColumn["by"] }>();
  for (const by of ["header", "quantity"] as const) {
    for (const column of places) {
      if (chosen.has(column)) continue;
      const fitting = values.filter((from) => left.has(from) && isSame(by, column.recognised, from.recognised));
      if (by === "quantity" && places.some((other) => other !== column && !chosen.has(other) && isSame(by, other.recognised, column.recognised))) continue; // biome-ignore format: one condition
      if (fitting.length > 1) {
        findings.push({
          about: "several columns",
          header: column.header,
          headers: fitting.map(({ header }) => header),
        });
        for (const from of fitting) left.delete(from);
      } else if (fitting[0]) {
        chosen.set(column, { from: fitting[0], by });
        left.delete(fitting[0]);
      }
    }
  }
  const pairs = places.flatMap((column): PairedColumn[] => {
    const pair = chosen.get(column);
    if (!pair) return [];
    const { from } = pair;
    const problem = column.isDerived
      ? { about: "derived" as const, header: column.header }
      : unitsProblem(column, from);
    if (problem) findings.push(problem);
    if (problem) return [];
    const sigmas = columns.filter(({ sigmaOf }) => sigmaOf === from.index).slice(0, 2);
    if (sigmas[0] && column.sigmas.length === 0) {
      findings.push({ about: "no place for uncertainty", header: column.header, from: sigmas[0].header });
    }
    const units = unitsOf(column, from);
    if (units && units.from.text !== units.to.text) {
      findings.push({ about: "converted", header: column.header, unit: units.to, fromUnit: units.from });
    }
    return [{ column, ...pair, units, sigmas: column.sigmas.length === 0 ? [] : sigmas }];
  });
  const nobodys = columns.filter(({ recognised, sigmaOf }) => recognised.isUncertainty && sigmaOf === undefined);
  const headers = [...left, ...nobodys].map(({ header }) => header);
  if (headers.length > 0) findings.push({ about: "columns left", headers });
  return { pairs, findings };
}

function isSame(by: PairedColumn["by"], table: RecognisedColumn, revision: RecognisedColumn): boolean {
  if (by === "header") return columnKey(table.name) === columnKey(revision.name);
  return table.quantity !== undefined && table.quantity.name === revision.quantity?.name;
}

function unitsOf({ recognised: to }: BookColumn, { recognised: from }: RevisionColumn): UnitsOfPair | undefined {
  const isPlain = !to.unit && !from.unit && !(to.quantity && isPlainNumberKind(to.quantity.kind));
  return isPlain ? undefined : { to: to.unit ?? one, from: from.unit ?? one };
}

/** Whether there is a unit on both sides, and the same kind. */
function unitsProblem(column: BookColumn, from: RevisionColumn): RevisionFinding | undefined {
  const [to, own] = [column.recognised, from.recognised];
  const about = { header: column.header, from: from.header };
  const problem = to.problem ?? own.problem;
  if (problem) return { about: "unit problem", header: column.header, from: (to.problem ? column : from).header, unit: problem }; // biome-ignore format: one value
  if (!to.unit && !own.unit) return undefined;
  const isPlain = (unit: Unit | undefined) => unit === undefined || isPlainNumberKind(unit.kind);
  if (!own.unit && !isPlain(to.unit)) return { about: "no unit", ...about, unit: to.unit! };
  if (!to.unit && !isPlain(own.unit)) return { about: "no unit in table", ...about, unit: own.unit! };
  const [unit, fromUnit] = [to.unit ?? one, own.unit ?? one];
  return convertible(unit, fromUnit) ? undefined : { about: "kind", ...about, unit, fromUnit };
}
