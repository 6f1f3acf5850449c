/**
 * Parses the whole records of a text that begins at a line start, fields separated by blanks, and gives the number of
 * characters they fill. A field in quotes may hold blanks, line breaks and, twice, quotes. Comment lines and blank
 * lines are no records; a record the text may have cut off is left for the next time unless the text is the last.
 */
export function eachSpacedRecord(text: string, last: boolean, take: (fields: string[]) => void): number {
  let at = 0;
  while (at < text.length) {
    const feed = text.indexOf("\n", at);
    if (feed < 0 && !last) return at;
    const end = feed < 0 ? text.length : feed;
    const line = text.slice(at, end);
    if (!line.includes('"') || line.startsWith("#")) {
      const fields = line.trim().split(" ");
      if (fields[0] !== "" && !line.startsWith("#"))
        take(fields.includes("") ? fields.filter((field) => field !== "") : fields);
      at = end + 1;
      continue;
    }
    const record = quotedRecord(text, at);
    if (record === undefined && !last) return at;
    take(record?.fields ?? line.trim().split(/ +/));
    at = record?.end ?? end + 1;
  }
  return text.length;
}

const space = 32;
const quote = 34;
const feed = 10;
const carriageReturn = 13;

/** A record with quotes; undefined where one is still open at the end of the text. */
function quotedRecord(text: string, start: number): { readonly fields: string[]; readonly end: number } | undefined {
  const fields: string[] = [];
  let at = start;
  for (;;) {
    while (text.charCodeAt(at) === space || text.charCodeAt(at) === carriageReturn) at++;
    if (at >= text.length || text.charCodeAt(at) === feed) return { fields, end: at + 1 };
    if (text.charCodeAt(at) === quote) {
      const close = closingQuote(text, at + 1);
      if (close < 0) return undefined;
      fields.push(text.slice(at + 1, close).replaceAll('""', '"'));
      at = close + 1;
    } else {
      let end = at;
      while (end < text.length && !isBreak(text.charCodeAt(end))) end++;
      fields.push(text.slice(at, end));
      at = end;
    }
  }
}

function isBreak(code: number): boolean {
  return code === space || code === feed || code === carriageReturn;
}

function closingQuote(text: string, from: number): number {
  for (let at = from; ; at += 2) {
    at = text.indexOf('"', at);
    if (at < 0 || text.charCodeAt(at + 1) !== quote) return at;
  }
}
