import { foldName } from "./foldName.js";
import { isSymbol } from "./recogniseColumn.js";

/** What two names of one column have in common. Capitals matter in symbols of one or two letters: `M` is not `m`. */
export function columnKey(name: string): string {
  const trimmed = name.trim();
  return isSymbol(trimmed) ? trimmed : foldName(trimmed);
}
