import { columnKey } from "./columnKey.js";
import { bareName, type RecognisedColumn } from "./recogniseColumn.js";

/** What of a column decides whose uncertainties it holds. */
export interface HeadedColumn {
  readonly header: string;
  readonly recognised: RecognisedColumn;
}

/**
 * For each column the column of values whose uncertainties it holds, undefined for values: the one that its name says,
 * or else the one it stands beside. A column of uncertainties without values is nobody's.
 */
export function ownersOfSigmas(columns: readonly HeadedColumn[]): readonly (number | undefined)[] {
  const names = new Map<string, number>();
  columns.forEach(({ recognised }, index) => {
    if (!recognised.isUncertainty) names.set(columnKey(recognised.name), index);
  });
  let beside: number | undefined;
  return columns.map(({ recognised }, index) => {
    if (!recognised.isUncertainty) {
      beside = index;
      return undefined;
    }
    return names.get(columnKey(bareName(recognised.name))) ?? beside;
  });
}
