/** The header as a column of one row of headers would have it, `Period [d]`. */
export function headerText({ header, unitCell }: { readonly header: string; readonly unitCell?: string }): string {
  return unitCell === undefined ? header : `${header} [${unitCell}]`;
}
