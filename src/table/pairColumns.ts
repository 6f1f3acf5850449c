import { convertible, type Unit } from "../units/unit.js";
import { recogniseColumn } from "./recogniseColumn.js";

/** A column of two states of a table. */
export interface ColumnPair<C> {
  readonly from: C;
  readonly to: C;
  /** The units of both, where the unit was changed in the header: values of `to` are to be converted to compare them. */
  readonly units: UnitChange | undefined;
}

export interface UnitChange {
  readonly from: Unit;
  readonly to: Unit;
}

/** Columns belong together by their header; one whose unit was changed there is found by its name. */
export function pairColumns<C extends { readonly header: string }>(
  before: readonly C[],
  after: readonly C[],
): ColumnPair<C>[] {
  const left = [...after];
  const take = (matches: (column: C) => boolean) => {
    const at = left.findIndex(matches);
    return at < 0 ? undefined : left.splice(at, 1)[0];
  };
  const exact = before.map((from) => ({ from, to: take(({ header }) => header === from.header) }));
  return exact.flatMap(({ from, to }): ColumnPair<C>[] => {
    if (to) return [{ from, to, units: undefined }];
    const was = recogniseColumn(from.header);
    const renamed = take(({ header }) => {
      const now = recogniseColumn(header);
      return now.name === was.name && !!now.unit && !!was.unit && convertible(now.unit, was.unit);
    });
    if (!renamed) return [];
    return [{ from, to: renamed, units: { from: was.unit!, to: recogniseColumn(renamed.header).unit! } }];
  });
}
