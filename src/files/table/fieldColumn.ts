import type { Cell } from "../../call/cell.js";
import { type Column, cellAt, columnOf } from "../../call/column.js";
import { ColumnBuilder } from "../cell/columnBuilder.js";
import { type DeclaredType, declaredCell } from "./declaredCell.js";

/** A column of declared type that grows field by field. */
export class FieldColumn {
  private readonly builder = new ColumnBuilder(0);
  private hasLongIntegers = false;

  /** `isNull`: whether a field, as it stands, is one that the file uses for no value. */
  constructor(
    readonly type: DeclaredType,
    private readonly isNull?: (field: string) => boolean,
  ) {}

  push(field: string): void {
    if (this.isNull?.(field)) {
      this.builder.pushCell(null);
      return;
    }
    this.pushCell(declaredCell(this.type, field));
  }

  pushCell(cell: Cell): void {
    if (this.type === "integer" && typeof cell === "string" && /^[+-]?\d{16,}$/.test(cell)) this.hasLongIntegers = true;
    this.builder.pushCell(cell);
  }

  finish(): Column {
    const column = this.builder.finish();
    return this.hasLongIntegers ? asTexts(column) : column;
  }
}

/** Identifiers of one column are all texts, however short some of them are. */
function asTexts(column: Column): Column {
  return columnOf(
    Array.from({ length: column.length }, (_, row) => {
      const cell = cellAt(column, row);
      return typeof cell === "number" ? String(cell) : cell;
    }),
  );
}
