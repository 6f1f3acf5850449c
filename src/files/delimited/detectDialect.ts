import { type Delimiter, delimiters, type Newline } from "./dialect.js";

const mostSampled = 200;

/** How often each candidate stands in one record outside quotes. */
type Counts = Map<Delimiter, number>;

interface Sample {
  readonly records: Counts[];
  readonly newlines: Record<Newline, number>;
}

/**
 * Delimiter and line ending from the beginning of a file. The header decides: of the candidates it contains, the one
 * that the records below repeat as often in the largest share of cases. A header without any is a single column,
 * unless the records agree on a candidate nevertheless.
 */
export function detectDialect(
  text: string,
  given: { readonly delimiter?: Delimiter; readonly newline?: Newline },
  whole: boolean,
): { readonly delimiter: Delimiter; readonly newline: Newline } {
  const { records, newlines } = sample(text, given.delimiter === undefined ? delimiters : [given.delimiter], whole);
  return {
    delimiter: given.delimiter ?? likeliestDelimiter(records),
    newline: given.newline ?? mostFrequent(newlines),
  };
}

function likeliestDelimiter(records: readonly Counts[]): Delimiter {
  const [header, ...rows] = records;
  const inHeader = delimiters.filter((delimiter) => header?.get(delimiter));
  if (header !== undefined && inHeader.length > 0) {
    const rank = (delimiter: Delimiter) =>
      share(rows, delimiter, header.get(delimiter)) * 1e6 + (header.get(delimiter) as number);
    return inHeader.reduce((best, next) => (rank(next) > rank(best) ? next : best));
  }
  const agreed = delimiters.find((delimiter) => {
    const count = rows[0]?.get(delimiter);
    return count !== undefined && rows.length > 1 && share(rows, delimiter, count) >= 0.9;
  });
  return agreed ?? delimiters.find((delimiter) => records.every((record) => !record.has(delimiter))) ?? ",";
}

function share(rows: readonly Counts[], delimiter: Delimiter, count: number | undefined): number {
  return rows.length === 0 ? 1 : rows.filter((row) => row.get(delimiter) === count).length / rows.length;
}

function mostFrequent(newlines: Record<Newline, number>): Newline {
  if (newlines["\r"] > newlines["\n"] + newlines["\r\n"]) {
    return "\r";
  }
  return newlines["\r\n"] > newlines["\n"] ? "\r\n" : "\n";
}

/** Comment lines and blank lines are left out; a quote counts as one only where a field begins; a last line that may be cut off does not count. */
function sample(text: string, candidates: readonly Delimiter[], whole: boolean): Sample {
  const newlines: Record<Newline, number> = { "\n": 0, "\r\n": 0, "\r": 0 };
  const records: Counts[] = [];
  const token = new RegExp(`\\r\\n|[\\r\\n${candidates.join("")}]`, "g");
  let counts: Counts = new Map();
  let start = 0;
  let fieldStart = 0;
  while (records.length < mostSampled) {
    token.lastIndex = afterQuoted(text, fieldStart);
    const match = token.exec(text);
    const end = match?.index ?? text.length;
    const isCut = match === null || (match[0] === "\r" && token.lastIndex === text.length);
    if (isCut && !whole) {
      break;
    }
    if (match === null || isNewline(match[0])) {
      if (text[start] !== "#" && text.slice(start, end).trim() !== "") {
        records.push(counts);
      }
      if (match === null) {
        break;
      }
      newlines[match[0] as Newline]++;
      counts = new Map();
      start = token.lastIndex;
    } else {
      counts.set(match[0] as Delimiter, (counts.get(match[0] as Delimiter) ?? 0) + 1);
    }
    fieldStart = token.lastIndex;
  }
  return { records, newlines };
}

function isNewline(token: string): boolean {
  return token === "\n" || token === "\r\n" || token === "\r";
}

/** Where a field that begins here leaves its quotes; here, where it has none. */
function afterQuoted(text: string, start: number): number {
  if (text[start] !== '"') {
    return start;
  }
  let at = start + 1;
  for (;;) {
    const quote = text.indexOf('"', at);
    if (quote < 0) {
      return text.length;
    }
    if (text[quote + 1] !== '"') {
      return quote + 1;
    }
    at = quote + 2;
  }
}
