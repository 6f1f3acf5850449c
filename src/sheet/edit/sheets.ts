import type { Book, Sheet } from "../book/book.js";
import { openSession } from "../calculate/session.js";
import type { Formula } from "../formula/formula.js";
import { withReferences } from "../formula/formula.js";
import type { Reference } from "../formula/reference.js";
import type { Draft, Edit } from "./draft.js";
import { touchedIn } from "./draft.js";
import { EditRefused } from "./refused.js";

/** Adds an empty sheet before position `at`, or as the last. */
export function addSheet(name: string, at?: number): Edit {
  return (draft) => {
    const book = draft.session.snapshot();
    refuseName(book, name);
    const sheets = book.sheets.slice();
    sheets.splice(at ?? sheets.length, 0, { name, columns: [] });
    reorder(draft, { ...book, sheets }, (index) => (index >= (at ?? index + 1) ? index + 1 : index));
    staleReaders(draft, name);
  };
}

/** Takes a sheet away; references to it become #REF!. */
export function removeSheet(sheet: number): Edit {
  return (draft) => {
    const book = draft.session.snapshot();
    const removed = book.sheets[sheet];
    if (removed === undefined || book.sheets.length === 1) {
      throw new EditRefused("remove sheet: a book has at least one sheet; add another one before");
    }
    staleReaders(draft, removed.name);
    const gone = renameReferences(book, removed.name, () => undefined);
    const sheets = gone.sheets.filter((_, index) => index !== sheet);
    reorder(draft, { ...gone, sheets }, (index) => (index === sheet ? undefined : index > sheet ? index - 1 : index));
  };
}

/** Gives a sheet another name; references to it name it so. */
export function renameSheet(sheet: number, name: string): Edit {
  return (draft) => {
    const book = draft.session.snapshot();
    const before = book.sheets[sheet];
    if (before === undefined) {
      return;
    }
    refuseName({ ...book, sheets: book.sheets.filter((each) => each !== before) }, name);
    staleReaders(draft, name);
    const renamed = renameReferences(book, before.name, (reference) => ({ ...reference, sheet: name }));
    const sheets = renamed.sheets.map((each, index) => (index === sheet ? { ...each, name } : each));
    reorder(draft, { ...renamed, sheets }, (index) => index);
  };
}

function refuseName(book: Book, name: string): void {
  if (name.trim() === "" || name.length > 31 || /[[\]:*?/\\]/.test(name) || /^'|'$/.test(name)) {
    throw new EditRefused(
      `sheet name: "${name}" cannot be used; 1 to 31 characters without [ ] : * ? / \\ are needed, for example Targets`,
    );
  }
  if (book.sheets.some((each) => each.name.toUpperCase() === name.toUpperCase())) {
    throw new EditRefused(
      `sheet name: there is already a sheet "${name}"; another name is needed, for example ${name} 2`,
    );
  }
}

function reorder(draft: Draft, book: Book, moved: (sheet: number) => number | undefined): void {
  const follow = <S extends { readonly sheet: number }>(span: S): S[] => {
    const sheet = moved(span.sheet);
    return sheet === undefined ? [] : [{ ...span, sheet }];
  };
  draft.changed = [...draft.changed, ...touchedIn(draft.session)].flatMap(follow);
  draft.stale = draft.stale.flatMap(follow);
  draft.session = openSession(book);
}

/** Every formula that names a sheet is to be calculated: the name means other cells from now on. */
function staleReaders(draft: Draft, name: string): void {
  const wanted = name.toUpperCase();
  const names = (formula: Formula): boolean => formula.references.some((each) => each?.sheet?.toUpperCase() === wanted);
  const book = draft.session.snapshot();
  const defined = new Set(book.names.filter(({ formula }) => names(formula)).map((each) => each.name.toUpperCase()));
  for (const [sheet, { columns }] of book.sheets.entries()) {
    for (const [column, { runs }] of columns.entries()) {
      for (const { formula, from, to } of runs) {
        if (names(formula) || formula.names.some((each) => defined.has(each.toUpperCase()))) {
          draft.stale.push({ sheet, column, from, to });
        }
      }
    }
  }
}

function renameReferences(book: Book, name: string, change: (reference: Reference) => Reference | undefined): Book {
  const wanted = name.toUpperCase();
  const rename = (formula: Formula): Formula => {
    const concerned = formula.references.some((each) => each?.sheet?.toUpperCase() === wanted);
    return concerned
      ? withReferences(
          formula,
          formula.references.map((each) => (each?.sheet?.toUpperCase() === wanted ? change(each) : each)),
        )
      : formula;
  };
  const renameSheetRuns = (sheet: Sheet): Sheet => ({
    ...sheet,
    columns: sheet.columns.map((column) => {
      const runs = column.runs.map((run) => {
        const formula = rename(run.formula);
        return formula === run.formula ? run : { ...run, formula };
      });
      return runs.every((run, index) => run === column.runs[index]) ? column : { ...column, runs };
    }),
  });
  return {
    sheets: book.sheets.map(renameSheetRuns),
    names: book.names.map((each) => ({ ...each, formula: rename(each.formula) })),
  };
}
