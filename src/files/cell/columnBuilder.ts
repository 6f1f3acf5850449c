import type { Cell } from "../../call/cell.js";
import type { Column, OtherCell } from "../../call/column.js";
import { cellOfField } from "./cellOfField.js";

/** Beyond so many different texts a column is names rather than classes, and looking each one up costs more than it saves. */
const mostInterned = 4096;

/** A column that grows by one field at a time. */
export class ColumnBuilder {
  private length = 0;
  private numbers = new Float64Array(256);
  private others: (OtherCell | undefined)[] | undefined;
  private texts = new Map<string, string>();

  /** `blanks`: how many rows had passed before the column appeared. */
  constructor(blanks: number) {
    if (blanks > 0) {
      this.numbers = new Float64Array(blanks + 256).fill(Number.NaN, 0, blanks);
      this.others = new Array(blanks).fill(null);
      this.length = blanks;
    }
  }

  /** A field of a text that does not say what its columns hold. */
  push(field: string): void {
    this.pushCell(cellOfField(field));
  }

  pushCell(cell: Cell): void {
    if (typeof cell === "number") {
      this.add(cell, undefined);
    } else {
      this.add(Number.NaN, typeof cell === "string" ? this.intern(cell) : cell);
    }
  }

  pushBlank(): void {
    this.add(Number.NaN, null);
  }

  finish(): Column {
    return { length: this.length, numbers: this.numbers.slice(0, this.length), others: this.others };
  }

  private add(number: number, other: OtherCell | undefined): void {
    if (this.length === this.numbers.length) {
      const grown = new Float64Array(this.length * 2);
      grown.set(this.numbers);
      this.numbers = grown;
    }
    this.numbers[this.length] = number;
    if (other !== undefined) {
      this.others ??= new Array(this.length).fill(undefined);
    }
    this.others?.push(other);
    this.length++;
  }

  private intern(text: string): string {
    const known = this.texts.get(text);
    if (known !== undefined) {
      return known;
    }
    if (this.texts.size < mostInterned) {
      this.texts.set(text, text);
    }
    return text;
  }
}
