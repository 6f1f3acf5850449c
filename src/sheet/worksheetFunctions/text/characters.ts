/** Whether every character of a text is one unit of the string. */
function isPlain(text: string): boolean {
  return !/[\ud800-\udfff]/.test(text);
}

/** Characters count as Unicode has them, not as the units a string is stored in. */
export function lengthOf(text: string): number {
  return isPlain(text) ? text.length : [...text].length;
}

/** The characters from `start` (counted from 0), `count` of them. */
export function middleOf(text: string, start: number, count: number): string {
  return isPlain(text) ? text.slice(start, start + count) : [...text].slice(start, start + count).join("");
}

/** How many characters stand before a place of the string. */
export function charactersBefore(text: string, offset: number): number {
  return lengthOf(text.slice(0, offset));
}

/** The place in the string of a character, counted from 0. */
export function offsetOf(text: string, character: number): number {
  return isPlain(text) ? character : [...text].slice(0, character).join("").length;
}
