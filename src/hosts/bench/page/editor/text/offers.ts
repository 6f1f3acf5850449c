import { columnLetters } from "../../../../../sheet/book/address.js";
import type { Place } from "../../../../../sheet/book/book.js";
import type { FunctionEntry } from "../../../protocol/answers.js";
import type { ColumnState } from "../../../protocol/bookState.js";

/** Something that may be put in place of the words typed. */
export interface Offer {
  readonly insert: string;
  readonly tells: string;
  readonly entry?: FunctionEntry;
}

export interface Vocabulary {
  readonly functions: readonly FunctionEntry[];
  readonly names: readonly { readonly name: string; readonly refersTo: string }[];
  readonly columns: readonly ColumnState[];
  readonly place: Place;
  /** An argument is being typed, which is more often a cell than another call. */
  readonly isArgument: boolean;
}

/** A list longer than this is read by nobody; another letter shortens it. */
const mostOffers = 60;

/** What begins with a word: our functions and columns by their headers, defined names, then the other functions. */
export function offersByName(word: string, phrase: string, vocabulary: Vocabulary): Offer[] {
  if (word === "") return offersOfColumns(phrase, vocabulary);
  const wanted = word.toUpperCase();
  const functions = vocabulary.functions.filter(({ name }) => beginsWith(name.toUpperCase(), wanted));
  const names = vocabulary.names.filter(({ name }) => name.toUpperCase().startsWith(wanted));
  // A name that is whole needs nothing more, so that Enter enters the formula.
  const unfinished = names.filter(({ name }) => name.length > word.length);
  const isWhole = unfinished.length < names.length;
  const ours = functions.filter(({ own }) => own);
  const others = functions.filter(({ own }) => !own).sort((one, other) => rank(one, wanted) - rank(other, wanted));
  if (isWhole) return unfinished.map(offerOfName);
  const columns = offersOfColumns(phrase || word, vocabulary);
  const own = ours.map(offerOfFunction);
  return [
    ...(vocabulary.isArgument ? [...columns, ...own] : [...own, ...columns]),
    ...unfinished.map(offerOfName),
    ...others.map(offerOfFunction),
  ].slice(0, mostOffers);
}

/** Functions by name alone, for what may be a cell or the beginning of a function: LOG10. */
export function offersOfFunctions(word: string, functions: readonly FunctionEntry[]): Offer[] {
  const wanted = word.toUpperCase();
  return functions.filter(({ name }) => name.startsWith(wanted)).map(offerOfFunction);
}

export function offersByQuestion(found: readonly string[], functions: readonly FunctionEntry[]): Offer[] {
  return found.flatMap((name) => functions.filter((entry) => entry.name === name).map(offerOfFunction));
}

export function offerOfFunction(entry: FunctionEntry): Offer {
  const insert = entry.parameters.length === 0 ? `${entry.name}()` : `${entry.name}(`;
  return { insert, tells: entry.question, entry };
}

function offerOfName({ name, refersTo }: Vocabulary["names"][number]): Offer {
  return { insert: name, tells: refersTo };
}

/** BARY.REFLEX begins with "bary.r" and with "ref". */
function beginsWith(name: string, wanted: string): boolean {
  return name.startsWith(wanted) || name.includes(`.${wanted}`);
}

function rank({ name }: FunctionEntry, wanted: string): number {
  return name === wanted ? 0 : name.startsWith(wanted) ? 1 : 2;
}

/** The cells of this row under headers that begin with these words, or that have a word which does. */
function offersOfColumns(words: string, { columns, place }: Vocabulary): Offer[] {
  const wanted = words.trim().toLowerCase();
  if (place.row === 0 || wanted === "") return [];
  return columns
    .flatMap((state, column) => (column === place.column ? [] : [{ state, column, at: placeIn(state.name, wanted) }]))
    .filter(({ at }) => at >= 0)
    .sort((one, other) => Math.sign(one.at) - Math.sign(other.at))
    .map(({ state, column }) => ({
      insert: `${columnLetters(column)}${place.row + 1}`,
      tells: state.unit === "" ? state.name : `${state.name} [${state.unit}]`,
    }));
}

function placeIn(header: string, wanted: string): number {
  const name = header.toLowerCase();
  return name.startsWith(wanted) ? 0 : name.search(new RegExp(`\\s${escaped(wanted)}`));
}

function escaped(words: string): string {
  return words.replace(/[\\^$.*+?()[\]{}|]/g, "\\$&");
}
