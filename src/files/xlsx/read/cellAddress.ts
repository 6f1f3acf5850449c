import { mostColumns, mostRows } from "../../../sheet/limits.js";
import { damaged } from "../../zip/zipProblem.js";

/** Row and column of an address as files write it, "B3": read without an object for each of millions of cells. */
export function readRow(address: string): number {
  let at = 0;
  while (address.charCodeAt(at) >= 65) {
    at++;
  }
  let row = 0;
  for (let index = at; index < address.length; index++) {
    const digit = address.charCodeAt(index) - 48;
    row = digit >= 0 && digit <= 9 ? row * 10 + digit : Number.NaN;
  }
  if (!(row >= 1 && row <= mostRows)) {
    throw damaged(`a cell in it has the address "${address.slice(0, 20)}"`);
  }
  return row - 1;
}

export function readColumn(address: string): number {
  let column = 0;
  let at = 0;
  for (; at < address.length; at++) {
    const letter = address.charCodeAt(at) - 64;
    if (letter < 1 || letter > 26) {
      break;
    }
    column = column * 26 + letter;
  }
  if (column < 1 || column > mostColumns || at > 3) {
    throw damaged(`a cell in it has the address "${address.slice(0, 20)}"`);
  }
  return column - 1;
}

/** The corners of "B2:C9" or "B2". */
export function readArea(text: string): { top: number; left: number; bottom: number; right: number } {
  const [first = "", last = first] = text.split(":");
  const area = { top: readRow(first), left: readColumn(first), bottom: readRow(last), right: readColumn(last) };
  if (area.bottom < area.top || area.right < area.left) {
    throw damaged(`a range in it is ${text.slice(0, 20)}`);
  }
  return area;
}
