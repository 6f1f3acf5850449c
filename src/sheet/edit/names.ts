import type { DefinedName } from "../book/book.js";
import { openSession } from "../calculate/session.js";
import type { Formula } from "../formula/formula.js";
import { withReferences } from "../formula/formula.js";
import { readFormula } from "../formula/readFormula.js";
import type { Bound, Reference } from "../formula/reference.js";
import { readReference } from "../formula/reference.js";
import type { Draft, Edit } from "./draft.js";
import { touchedIn } from "./draft.js";
import { EditRefused } from "./refused.js";

/**
 * Gives cells or a constant a name: `text` is a formula such as "=Sheet1!B2:B9" or "=299792458". References are to
 * those cells for good, written with `$` or not; without a sheet they are to the sheet given.
 */
export function defineName(name: string, text: string, sheet: number): Edit {
  return (draft) => {
    refuseName(name);
    const read = readFormula(text, 0, 0, draft.functions);
    if (read.problem !== undefined || read.positional || read.names.length > 0) {
      throw new EditRefused(
        `name ${name}: ${read.problem?.message ?? `${text} depends on where it stands or on another name; cells or a constant are needed, for example =B2`}`,
      );
    }
    const formula = anchored(read, draft.session.sheetName(sheet));
    replaceName(draft, name, { name, formula });
  };
}

export function removeName(name: string): Edit {
  return (draft) => replaceName(draft, name, undefined);
}

function refuseName(name: string): void {
  const usable = /^[\p{L}_][\p{L}\p{N}_.]*$/u.test(name) && readReference(name, 0, 0) === undefined;
  if (!usable || /^(true|false|[rc])$/i.test(name)) {
    throw new EditRefused(
      `name: "${name}" cannot be used; letters, digits and _ that do not read as a cell are needed, for example star_mass`,
    );
  }
}

function anchored(formula: Formula, sheet: string): Formula {
  const fix = ({ at }: Bound): Bound => ({ at, fixed: true });
  const references = formula.references.map((each): Reference | undefined =>
    each === undefined
      ? undefined
      : {
          ...each,
          sheet: each.sheet ?? sheet,
          top: fix(each.top),
          bottom: fix(each.bottom),
          left: fix(each.left),
          right: fix(each.right),
        },
  );
  return withReferences(formula, references);
}

function replaceName(draft: Draft, name: string, defined: DefinedName | undefined): void {
  const wanted = name.toUpperCase();
  const book = draft.session.snapshot();
  for (const [sheet, { columns }] of book.sheets.entries()) {
    for (const [column, { runs }] of columns.entries()) {
      for (const { formula, from, to } of runs) {
        if (formula.names.some((each) => each.toUpperCase() === wanted)) {
          draft.stale.push({ sheet, column, from, to });
        }
      }
    }
  }
  const others = book.names.filter((each) => each.name.toUpperCase() !== wanted);
  draft.changed.push(...touchedIn(draft.session));
  draft.session = openSession({ ...book, names: defined === undefined ? others : [...others, defined] });
}
