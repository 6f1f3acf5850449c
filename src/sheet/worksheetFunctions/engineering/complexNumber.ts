import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { textFromNumber } from "../../values/textFromNumber.js";
import { outside } from "../define/outside.js";

export interface Complex {
  readonly re: number;
  readonly im: number;
  /** The letter the text was written with. */
  readonly unit: "i" | "j" | undefined;
}

const size = "(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][+-]?\\d+)?";
const form = new RegExp(`^([+-]?${size})?(?:([+-]?)(${size})?([ij]))?$`);

/** The forms of ISO/IEC 26300-3 section 6.3.10: 3, 3+4i, -4.5j, i. */
export function complexFrom(cell: Cell, what: string): Complex | CellError {
  if (cell instanceof CellError) {
    return cell;
  }
  if (typeof cell !== "string") {
    return { re: Number(cell), im: 0, unit: undefined };
  }
  return complexFromText(cell.trim()) ?? outside(what, cell, "no complex number", 'one is needed, for example "3+4i"');
}

function complexFromText(text: string): Complex | undefined {
  // A text that is only an imaginary part has no real part before it.
  const imaginaryOnly = new RegExp(`^([+-]?)(${size})?([ij])$`).exec(text);
  if (imaginaryOnly) {
    return { re: 0, im: signed(imaginaryOnly[1], imaginaryOnly[2]), unit: imaginaryOnly[3] as "i" | "j" };
  }
  const parts = form.exec(text);
  if (!parts || text === "" || (parts[4] !== undefined && parts[2] === "")) {
    return undefined;
  }
  const [, real, sign, imaginary, unit] = parts;
  return { re: Number(real), im: unit ? signed(sign, imaginary) : 0, unit: unit as "i" | "j" | undefined };
}

function signed(sign: string | undefined, digits: string | undefined): number {
  return (sign === "-" ? -1 : 1) * Number(digits ?? 1);
}

/** The text of a complex number, as short as it can be: "3+4i", "-i", "2". */
export function complexText({ re, im, unit = "i" }: Complex): string | CellError {
  if (!Number.isFinite(re) || !Number.isFinite(im)) {
    return new CellError(
      "#NUM!",
      "a complex number that is not finite",
      "the complex result is not finite; other inputs are needed",
    );
  }
  if (im === 0) {
    return textFromNumber(re);
  }
  const factor = Math.abs(im) === 1 ? (im < 0 ? "-" : "") : textFromNumber(im);
  return re === 0 ? `${factor}${unit}` : `${textFromNumber(re)}${im < 0 ? "" : "+"}${factor}${unit}`;
}
