import { quote } from "../call/explain.js";
import type { TableColumn } from "../table/checkTable.js";
import { recogniseColumn } from "../table/recogniseColumn.js";
import { nearest } from "../units/nearest.js";
import { type PlanInput, planInputs } from "./planQuantities.js";

/** Where in a table the plan finds what it reads: the place of the value, then those of its uncertainties. */
export interface PlanColumns {
  readonly name: number | undefined;
  readonly value: number;
  readonly inputs: ReadonlyMap<PlanInput, readonly number[]>;
}

export interface ColumnWish {
  /** Header of the column of values. */
  readonly value: string;
  /** Header of the column of names, where it is not to be guessed. */
  readonly name?: string | undefined;
  /** Headers by the name of the quantity: "period" -> "P orb". */
  readonly named: ReadonlyMap<string, string>;
}

/** A sentence in place of columns where one cannot be found. */
export function planColumns(
  table: readonly TableColumn[],
  wish: ColumnWish,
): PlanColumns | { readonly problem: string } {
  const value = columnHeaded(table, wish.value);
  const found = inputColumns(table, wish);
  const problems = [value, found].flatMap((one) => (typeof one === "object" && "problem" in one ? [one.problem] : []));
  if (typeof value !== "number" || "problem" in found) return { problem: problems.join(" ") };
  return { ...found, value };
}

/** The columns that say what is seen, and when; not what it is worth. */
export function inputColumns(
  table: readonly TableColumn[],
  wish: Omit<ColumnWish, "value">,
): Omit<PlanColumns, "value"> | { readonly problem: string } {
  const recognised = table.map(({ header, unitCell }) => recogniseColumn(header, unitCell));
  const problems: string[] = [];
  const headed = (header: string) => {
    const place = columnHeaded(table, header);
    if (typeof place === "number") return place;
    problems.push(place.problem);
    return undefined;
  };
  const name = wish.name === undefined ? guessName(table) : headed(wish.name);
  const known = Object.entries(planInputs).map(([key, { quantity }]) => ({
    key: key as PlanInput,
    name: quantity.name,
  }));
  for (const asked of wish.named.keys()) {
    if (known.some((one) => one.name === asked)) continue;
    const names = known.map((one) => one.name);
    const near = nearest(asked, names);
    problems.push(
      `a plan reads no column of "${asked}"; ${near ? `did you mean "${near}"?` : `it reads ${names.join(", ")}.`}`,
    );
  }
  const inputs = new Map<PlanInput, readonly number[]>();
  for (const one of known) {
    const asked = wish.named.get(one.name);
    const own = (column: (typeof recognised)[number]) => column.quantity?.name === one.name;
    const place =
      asked === undefined
        ? recognised.findIndex((column) => own(column) && !column.isUncertainty)
        : (headed(asked) ?? -1);
    if (place < 0) continue;
    const isSigma = (at: number) =>
      recognised[at]?.isUncertainty === true && (own(recognised[at]) || !recognised[at].quantity);
    const beside = [place + 1, place + 2].filter((at, index) => isSigma(at) && (index === 0 || isSigma(place + 1)));
    const elsewhere = recognised.findIndex((column) => column.isUncertainty && own(column));
    inputs.set(one.key, [place, ...(beside.length > 0 ? beside : elsewhere >= 0 ? [elsewhere] : [])]);
  }
  return problems.length > 0 ? { problem: problems.join(" ") } : { name, inputs };
}

function columnHeaded(table: readonly TableColumn[], header: string): number | { readonly problem: string } {
  return placeOf(table, header) ?? { problem: unknownHeader(table, header) };
}

/** A header as it stands, or with other capitals where that is one column's alone. */
function placeOf(table: readonly TableColumn[], header: string): number | undefined {
  const exact = table.findIndex((column) => column.header === header);
  if (exact >= 0) return exact;
  const alike = table.flatMap((column, index) => (column.header.toLowerCase() === header.toLowerCase() ? [index] : []));
  return alike.length === 1 ? alike[0] : undefined;
}

/** As many as a message has room for. */
const mostHeaders = 5;

function unknownHeader(table: readonly TableColumn[], header: string): string {
  const headers = table.map((column) => column.header);
  const near = nearest(header, headers);
  const there = headers.slice(0, mostHeaders).map((one) => quote(one));
  const more = headers.length > mostHeaders ? ` and ${headers.length - mostHeaders} more` : "";
  return `no column is headed ${quote(header)}; ${near ? `did you mean ${quote(near)}?` : `there are ${there.join(", ")}${more}.`}`;
}

const nameWords = /^(target|name|star|planet|object|host|system|id)\b/i;

function guessName(table: readonly TableColumn[]): number | undefined {
  const named = table.findIndex(({ header }) => nameWords.test(header.trim()));
  if (named >= 0) return named;
  const texts = table.findIndex(({ column }) => column.others?.some((cell) => typeof cell === "string"));
  return texts >= 0 ? texts : undefined;
}
