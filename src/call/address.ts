/** The address some rows below and columns to the right of another; `$` stay where they were. */
export function offsetAddress(address: string, rows: number, columns: number): string {
  const match = /^(.*?)(\$?)([A-Z]+)(\$?)(\d+)$/i.exec(address);
  if (!match) return address;
  const [, sheet, columnLock, letters, rowLock, row] = match as unknown as [
    string,
    string,
    string,
    string,
    string,
    string,
  ];
  return `${sheet}${columnLock}${lettersOf(numberOf(letters) + columns)}${rowLock}${Number(row) + rows}`;
}

function numberOf(letters: string): number {
  return [...letters.toUpperCase()].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0);
}

function lettersOf(column: number): string {
  let letters = "";
  for (let rest = column; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  }
  return letters;
}

/** The column of an address with its sheet, "Table!C"; undefined for what is no address of a cell. */
export function columnOfAddress(address: string | undefined): string | undefined {
  const match = address === undefined ? null : /^(.*?)\$?([A-Z]+)\$?\d+$/i.exec(address);
  return match ? `${match[1]}${match[2]!.toUpperCase()}` : undefined;
}
