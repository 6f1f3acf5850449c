import { quoteField, quoteFirstField } from "./fieldWriter.js";

/** Fields as a line, without its end. One that would be blank has its first field quoted, for blank lines are no records. */
export function lineOfFields(fields: readonly string[], delimiter: string): string {
  const line = fields
    .map((field, column) => (column === 0 ? quoteFirstField(field) : quoteField(field)))
    .join(delimiter);
  return line.trim() === "" ? `""${line}` : line;
}
