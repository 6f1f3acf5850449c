/** One corner of a reference in a formula text. */
export interface Corner {
  row: number;
  column: number;
  fixedRow: boolean;
  fixedColumn: boolean;
}

export interface TextReference {
  sheet: string | undefined;
  first: Corner;
  second: Corner;
}

const pattern =
  /"(?:[^"]|"")*"|(?:('(?:[^']|'')+'|[A-Za-z_][A-Za-z0-9_]*)!)?(\$?)([A-Z]{1,2})(\$?)(\d+)(?::(\$?)([A-Z]{1,2})(\$?)(\d+))?/g;

export function columnName(column: number): string {
  return column < 26
    ? String.fromCharCode(65 + column)
    : String.fromCharCode(64 + Math.floor(column / 26)) + String.fromCharCode(65 + (column % 26));
}

function columnNumber(letters: string): number {
  return [...letters].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0) - 1;
}

/** Every reference of a formula text replaced by what `change` makes of it; undefined is #REF!. */
export function rewriteText(text: string, change: (reference: TextReference) => TextReference | undefined): string {
  return text.replace(pattern, (...found) => {
    const [whole, sheet, f1, c1, r1, n1, f2, c2, r2, n2] = found as string[];
    if ((whole as string).startsWith('"')) {
      return whole as string;
    }
    const first = corner(f1, c1, r1, n1);
    const second = c2 === undefined ? { ...first } : corner(f2, c2, r2, n2);
    const changed = change({ sheet: unquote(sheet), first, second });
    return changed === undefined ? "#REF!" : show(changed);
  });
}

export function referencesIn(text: string): TextReference[] {
  const found: TextReference[] = [];
  rewriteText(text, (reference) => {
    found.push(reference);
    return reference;
  });
  return found;
}

function corner(fixedColumn = "", letters = "", fixedRow = "", digits = ""): Corner {
  return {
    row: Number(digits) - 1,
    column: columnNumber(letters),
    fixedRow: fixedRow === "$",
    fixedColumn: fixedColumn === "$",
  };
}

function unquote(sheet: string | undefined): string | undefined {
  return sheet?.startsWith("'") ? sheet.slice(1, -1).replaceAll("''", "'") : sheet;
}

export function show({ sheet, first, second }: TextReference): string {
  const [a, b] = [{ ...first }, { ...second }];
  if (a.row > b.row || (a.row === b.row && b.fixedRow)) {
    [a.row, b.row] = [b.row, a.row];
    [a.fixedRow, b.fixedRow] = [b.fixedRow, a.fixedRow];
  }
  if (a.column > b.column || (a.column === b.column && b.fixedColumn)) {
    [a.column, b.column] = [b.column, a.column];
    [a.fixedColumn, b.fixedColumn] = [b.fixedColumn, a.fixedColumn];
  }
  const prefix = sheet === undefined ? "" : /^[A-Za-z_][A-Za-z0-9_]*$/.test(sheet) ? `${sheet}!` : `'${sheet}'!`;
  const one = showCorner(a);
  const two = showCorner(b);
  return one === two ? `${prefix}${one}` : `${prefix}${one}:${two}`;
}

function showCorner({ row, column, fixedRow, fixedColumn }: Corner): string {
  return `${fixedColumn ? "$" : ""}${columnName(column)}${fixedRow ? "$" : ""}${row + 1}`;
}
