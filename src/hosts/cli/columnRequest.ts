/** A column asked for: its header, and the formula of its first data row. */
export interface ColumnRequest {
  readonly header: string;
  readonly formula: string;
}
