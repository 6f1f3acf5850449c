import type { CallProblem, HeaderCell } from "./callProblem.js";

/** The header cells of each input, of its value and what stands beside it. */
export type HeaderAssignment = readonly (readonly (HeaderCell | undefined)[])[];

/**
 * Which header cell belongs to which column of which input. Header cell i belongs to input i; where inputs carry
 * uncertainties the headers may instead be as many as the columns in all. `widths` has a number of columns for every
 * input that takes a header, 0 where it was left out. Where the number of header cells allows more than one way, all are
 * given, the likelier first.
 */
export function assignHeaders(
  headers: readonly HeaderCell[],
  widths: readonly number[],
): readonly HeaderAssignment[] | CallProblem {
  if (headers.length === 0) return [widths.map(() => [])];
  const given = widths.findLastIndex((width) => width > 0) + 1;
  const columns = widths.reduce((sum, width) => sum + width, 0);
  const spaced = widths.slice(0, given).reduce((sum, width) => sum + Math.max(width, 1), 0);
  const uncertain = columns > widths.filter((width) => width > 0).length;
  const found: HeaderAssignment[] = [];
  if (uncertain && headers.length === columns) found.push(inTurn(headers, widths));
  if (uncertain && headers.length === spaced && spaced !== columns) {
    const oneAtLeast = widths.map((width) => Math.max(width, 1));
    found.push(inTurn(headers, oneAtLeast));
  }
  if (headers.length >= given && headers.length <= widths.length) found.push(widths.map((_, i) => [headers[i]]));
  return found.length > 0 ? found : { about: "header count", given: headers.length, inputs: given, columns };
}

function inTurn(headers: readonly HeaderCell[], widths: readonly number[]): HeaderCell[][] {
  let next = 0;
  return widths.map((width) => {
    next += width;
    return headers.slice(next - width, next);
  });
}
