import { headerUnitSpan } from "./headerUnitSpan.js";

/**
 * A header with another unit where it states one, else with the unit in square brackets behind its name. An empty unit
 * takes the brackets away. `isName`: a header that could be read as a unit is a name, as "K" over a semi-amplitude.
 */
export function headerWithUnit(header: string, unit: string, isName = false): string {
  const span = isName ? undefined : headerUnitSpan(header);
  if (span === undefined) {
    const name = header.trimEnd();
    return unit === "" ? header : `${name}${name === "" ? "" : " "}[${unit}]`;
  }
  if (unit === "" && !span.whole) {
    return `${header.slice(0, span.from - 1).trimEnd()}${header.slice(span.to + 1)}`;
  }
  return `${header.slice(0, span.from)}${unit}${header.slice(span.to)}`;
}
