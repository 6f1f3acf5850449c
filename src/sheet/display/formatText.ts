import type { NumberFormat, UncertaintyDigits } from "./numberFormat.js";

/** The most digits and decimals a format may ask for. */
const mostDigits = 17;
const mostDecimals = 30;
const mostSecondDecimals = 9;

/** A format as files hold it: "fixed 2 grouped", "plus-minus 2", "date". What is printed here is read by `parseFormat`. */
export function printFormat(format: NumberFormat): string {
  switch (format.kind) {
    case "fixed":
      return `fixed ${format.decimals}${format.grouped ? " grouped" : ""}`;
    case "percent":
    case "time":
    case "date-time":
      return `${format.kind} ${format.decimals}`;
    case "significant":
    case "scientific":
    case "plus-minus":
    case "brackets":
      return `${format.kind} ${format.digits}`;
    default:
      return format.kind;
  }
}

/** The format of a text, or undefined where it is none. Letters may be capital, numbers may be left out. */
export function parseFormat(text: string): NumberFormat | undefined {
  const [kind = "", argument, extra, ...rest] = text.trim().toLowerCase().split(/\s+/);
  if (rest.length > 0 || (extra !== undefined && (kind !== "fixed" || extra !== "grouped"))) {
    return undefined;
  }
  const decimals = (least: number, most: number, otherwise: number) => count(argument, least, most, otherwise);
  switch (kind) {
    case "general":
    case "date":
      return argument === undefined ? { kind } : undefined;
    case "fixed":
      return withNumber(decimals(0, mostDecimals, 2), (value) => ({
        kind,
        decimals: value,
        grouped: extra !== undefined,
      }));
    case "percent":
      return withNumber(decimals(0, mostDecimals, 0), (value) => ({ kind, decimals: value }));
    case "time":
    case "date-time":
      return withNumber(decimals(0, mostSecondDecimals, 0), (value) => ({ kind, decimals: value }));
    case "significant":
    case "scientific":
      return withNumber(decimals(1, mostDigits, 4), (value) => ({ kind, digits: value }));
    case "plus-minus":
    case "brackets":
      return measured(kind, argument);
    default:
      return undefined;
  }
}

function measured(kind: "plus-minus" | "brackets", argument: string | undefined): NumberFormat | undefined {
  return argument === "pdg"
    ? { kind, digits: "PDG" }
    : withNumber(count(argument, 1, 4, 2), (value) => ({ kind, digits: value as UncertaintyDigits }));
}

/** A whole number within bounds; undefined where the text is something else. */
function count(text: string | undefined, least: number, most: number, otherwise: number): number | undefined {
  if (text === undefined) {
    return otherwise;
  }
  const value = /^\d{1,3}$/.test(text) ? Number(text) : -1;
  return value >= least && value <= most ? value : undefined;
}

function withNumber(value: number | undefined, make: (value: number) => NumberFormat): NumberFormat | undefined {
  return value === undefined ? undefined : make(value);
}
