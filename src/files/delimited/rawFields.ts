/**
 * The fields of one record as they are written, quotes included: joined by the delimiter they are the record again. A
 * delimiter between quotes is part of its field (RFC 4180, section 2, rule 6).
 */
export function rawFields(record: string, delimiter: string): string[] {
  const fields: string[] = [];
  let from = 0;
  for (;;) {
    const quoted = record.charCodeAt(from) === 34 ? closingQuote(record, from) : from;
    const end = record.indexOf(delimiter, quoted);
    if (end < 0) {
      fields.push(record.slice(from));
      return fields;
    }
    fields.push(record.slice(from, end));
    from = end + delimiter.length;
  }
}

/** Where the field that opens with a quote closes it; the end of the record where it never does. */
function closingQuote(record: string, from: number): number {
  for (let at = record.indexOf('"', from + 1); at >= 0; at = record.indexOf('"', at + 2)) {
    if (record.charCodeAt(at + 1) !== 34) return at + 1;
  }
  return record.length;
}
