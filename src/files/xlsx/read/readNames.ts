import type { DefinedName } from "../../../sheet/book/book.js";
import type { Functions } from "../../../sheet/formula/functions.js";
import { readFormula } from "../../../sheet/formula/readFormula.js";
import { keptFormula } from "../formula/fileFormula.js";
import { plainFormula } from "../formula/plainFormula.js";
import type { FileTables } from "../formula/tableReferences.js";
import { withoutTables } from "../formula/tableReferences.js";
import type { NameEntry } from "./readWorkbookPart.js";

/** Names that worksheet programs use for themselves: print areas, filters. */
const isInternal = (name: string): boolean => name.startsWith("_xlnm.");

/** The names of a file. A name known on one sheet alone counts everywhere, unless another is called the same. */
export function readNames(
  entries: readonly NameEntry[],
  functions: Functions,
  tables: FileTables,
  notes: string[],
): DefinedName[] {
  const names = new Map<string, DefinedName>();
  const ordered = [...entries].sort((a, b) => Number(a.sheet !== undefined) - Number(b.sheet !== undefined));
  for (const { name, text } of ordered) {
    if (isInternal(name)) {
      continue;
    }
    if (names.has(name.toUpperCase())) {
      notes.push(`The name ${name} stands for other cells on some sheet; only its first meaning is kept.`);
    } else {
      names.set(name.toUpperCase(), { name, formula: formulaOfName(name, text, functions, tables) });
    }
  }
  return [...names.values()];
}

function formulaOfName(name: string, text: string, functions: Functions, tables: FileTables) {
  const formula = readFormula(withoutTables(plainFormula(text), 0, "", tables), 0, 0, functions);
  const moves = formula.references.some((each) => each && !(each.top.fixed && each.left.fixed));
  return moves
    ? keptFormula(
        `=${text}`,
        "a name that moves with the cell",
        `${name}: the name stands for other cells in each cell that uses it, which is not supported; use the cells themselves`,
      )
    : formula;
}
