import { type Document, isMap, isScalar, isSeq, parseDocument } from "yaml";
import { FileProblem } from "../fileProblem.js";
import type { DeclaredType } from "../table/declaredCell.js";
import { checkColumnCount } from "../table/mostColumns.js";
import type { ColumnNotes } from "../table/tableFile.js";

export interface EcsvColumn {
  readonly notes: ColumnNotes;
  readonly type: DeclaredType;
  /** What a cell holds where it is more than one value: "float64[2]", "json". */
  readonly subtype: string | undefined;
}

/** What the commented lines at the head of an ECSV file say. */
export interface EcsvHeader {
  readonly delimiter: " " | ",";
  readonly columns: readonly EcsvColumn[];
  readonly name: string | undefined;
  readonly description: string | undefined;
  readonly comments: readonly string[];
}

/** No description of a table is longer; a text that is would only keep the reader busy. */
const longestHeader = 1 << 22;
/** References within the header that repeat a part of it; more than this is a way to fill the memory. */
const mostAliases = 20;

/**
 * The YAML of an ECSV header, its comment marks taken off. Every scalar is read as text ("failsafe"), so that a column
 * called `no` or `1e5` keeps its name, and tags, which would make objects, are passed over.
 */
export function readEcsvHeader(yaml: string): EcsvHeader {
  if (yaml.length > longestHeader) throw notAsStandard("its header is longer than any description of a table");
  const header = plainOf(yaml);
  const described = header.datatype;
  if (!Array.isArray(described) || described.length === 0) {
    throw notAsStandard('its header has no list of columns under "datatype"');
  }
  checkColumnCount(described.length);
  const delimiter = header.delimiter ?? " ";
  if (delimiter !== " " && delimiter !== ",") throw notAsStandard("its delimiter is neither a space nor a comma");
  const meta = pairsOf(header.meta);
  return {
    delimiter,
    columns: described.map(columnOf),
    name: textOf(meta.get("name")),
    description: textOf(meta.get("description")),
    comments: listOf(meta.get("comments")),
  };
}

interface PlainHeader {
  readonly datatype?: unknown;
  readonly delimiter?: unknown;
  readonly meta?: unknown;
}

function plainOf(yaml: string): PlainHeader {
  let document: Document;
  try {
    document = parseDocument(yaml, { schema: "failsafe", logLevel: "silent", uniqueKeys: false });
  } catch {
    throw notAsStandard("its header is no YAML that can be read");
  }
  const [error] = document.errors;
  if (error) throw notAsStandard(`its header is no YAML: ${reasonOf(error.message)}`);
  try {
    const part = (key: string) => {
      const node: unknown = document.get(key, true);
      return isMap(node) || isSeq(node) || isScalar(node)
        ? node.toJS(document, { maxAliasCount: mostAliases })
        : undefined;
    };
    return { datatype: part("datatype"), delimiter: part("delimiter"), meta: part("meta") };
  } catch {
    throw notAsStandard("its header repeats parts of itself too often or too deep");
  }
}

function columnOf(described: unknown, index: number): EcsvColumn {
  const parts = pairsOf(described);
  const name = textOf(parts.get("name"));
  const datatype = textOf(parts.get("datatype")) ?? textOf(parts.get("type"));
  if (name === undefined || datatype === undefined) {
    throw notAsStandard(`its header gives column ${index + 1} no name or no datatype`);
  }
  const notes = {
    name,
    unit: textOf(parts.get("unit")),
    description: textOf(parts.get("description")),
    ucd: textOf(pairsOf(parts.get("meta")).get("ucd")),
  };
  return { notes, type: declaredType(datatype), subtype: textOf(parts.get("subtype")) };
}

function declaredType(datatype: string): DeclaredType {
  if (/^float(?:16|32|64|128)$/.test(datatype)) return "number";
  if (/^u?int(?:8|16|32|64)$/.test(datatype)) return "integer";
  return datatype === "bool" ? "logical" : "text";
}

/** The pairs of a map, or of an ordered map: a list of maps of one pair each. A Map, so that no name is special. */
function pairsOf(value: unknown): ReadonlyMap<unknown, unknown> {
  if (value instanceof Map) return value;
  if (Array.isArray(value)) return new Map(value.flatMap((part) => [...pairsOf(part)]));
  return new Map(typeof value === "object" && value !== null ? Object.entries(value) : []);
}

function textOf(value: unknown): string | undefined {
  return typeof value === "string" && value !== "" ? value : undefined;
}

function listOf(value: unknown): readonly string[] {
  return Array.isArray(value) ? value.filter((part) => typeof part === "string") : [];
}

function reasonOf(message: string): string {
  if (/call stack/i.test(message)) return "it has brackets within brackets without end";
  return message.split("\n")[0]!.replace(/:$/, "").slice(0, 100);
}

function notAsStandard(what: string): FileProblem {
  return new FileProblem(
    "not-as-standard",
    `The file begins as ECSV, but ${what}; mend its header, or take the lines with # away to read it as plain text.`,
  );
}
