/** "5,000 cells". */
export function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}

/** A text in quotes, cut where it is long. */
export function quoted(text: string, most = 40): string {
  return `"${text.length > most ? `${text.slice(0, most - 1)}\u2026` : text}"`;
}

/** The first of many names in quotes, and how many more there are. */
export function listed(names: readonly string[]): string {
  const shown = names.slice(0, 3).map((name) => quoted(name, 24));
  const rest = names.length - shown.length;
  return rest > 0 ? `${shown.join(", ")} and ${rest.toLocaleString("en")} more` : shown.join(", ");
}

/** A number to four significant digits, for a sentence. */
export function short(value: number): string {
  return String(Number(value.toPrecision(4)));
}
