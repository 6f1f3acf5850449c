import { readNumber } from "../cell/readNumber.js";

/**
 * Whether the fields under a header are units: each is one, or blank, or a dash, and at least one could not be a data
 * value, being a unit and not a number.
 */
export function isUnitsRow(fields: readonly string[], isUnit: (text: string) => boolean): boolean {
  const texts = fields.map((field) => field.trim()).filter((text) => text !== "" && text !== "-");
  return texts.every(isUnit) && texts.some((text) => readNumber(text) === undefined);
}
