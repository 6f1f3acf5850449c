import type { Definition, Input } from "../functions/definition.js";
import { definitions } from "../functions/definitions.js";
import type { Quantity } from "../functions/quantity.js";
import { nearest } from "../units/nearest.js";

/**
 * The functions that answer a question, the best first: words are looked for in the questions, in the names of the
 * functions, in what goes in and what comes out and how tables head it. Without words, all of them in their own order.
 */
export function searchFunctions(text: string): readonly Definition[] {
  const wanted = wordsOf(text).filter((word) => !emptyWords.has(word));
  if (wanted.length === 0) return definitions;
  const phrase = ` ${wordsOf(text).join(" ")} `;
  const ranked = definitions.map((definition) => rank(definition, wanted, phrase));
  const found = ranked.filter(({ matched }) => 2 * matched > wanted.length || matched === wanted.length);
  return found.sort((a, b) => b.matched - a.matched || b.score - a.score).map(({ definition }) => definition);
}

/** How much a word says about a function, by where it stands. */
const weights = { name: 12, result: 6, question: 5, input: 2, remark: 1 };

/** Words in which analysts ask for the same thing. */
const synonyms: readonly (readonly string[])[] = [
  ["semi-amplitude", "amplitude", "k", "wobble", "reflex"],
  ["speed", "velocity", "rv"],
  ["mass", "weight", "heavy", "weighs"],
  ["axis", "distance", "separation", "orbit size", "far"],
  ["period", "year", "duration"],
  ["shift", "redshift", "doppler", "z"],
  ["wavelength", "lambda", "line", "nm", "angstrom"],
  ["unit", "convert", "conversion", "into"],
  ["constant", "gravitational", "light", "parameter"],
  ["barycentre", "barycenter"],
  ["smallest", "minimum", "msini"],
  ["pixel", "detector", "sampling"],
];

const emptyWords = new Set(
  "a an and are at by can could do does for from get give given gives has have how i in is it its me my of on or that the this to what which with".split(
    " ",
  ),
);

type Index = ReadonlyMap<string, number>;

const indices = new Map(definitions.map((definition) => [definition, indexOf(definition)]));

function rank(definition: Definition, wanted: readonly string[], phrase: string) {
  const index = indices.get(definition)!;
  const scores = wanted.map((word) => scoreOf(word, index));
  // Words in the very order of the question, or a good part of it, mean that question.
  const quoted = wanted.length > 1 && ` ${wordsOf(definition.question).join(" ")} `.includes(phrase) ? weights.name : 0;
  return {
    definition,
    matched: scores.filter((score) => score > 0).length,
    score: scores.reduce((sum, score) => sum + score, quoted),
  };
}

/** The word itself counts most, then its beginning (the analyst may still be typing), a synonym, a slip of the keys. */
function scoreOf(word: string, index: Index): number {
  let best = index.get(word) ?? 0;
  for (const [known, weight] of index) {
    if (word.length > 1 && known.startsWith(word)) best = Math.max(best, 0.6 * weight);
    else if (known.length > 3 && word.startsWith(known)) best = Math.max(best, 0.5 * weight);
  }
  for (const group of synonyms) {
    if (!group.some((each) => each === word)) continue;
    for (const other of group) best = Math.max(best, 0.5 * (index.get(other) ?? 0));
  }
  if (best > 0 || word.length < 4) return best;
  const meant = nearest(word, index.keys());
  return meant === undefined ? 0 : 0.4 * index.get(meant)!;
}

function indexOf(definition: Definition): Index {
  const index = new Map<string, number>();
  const add = (text: string, weight: number) => {
    for (const word of wordsOf(text)) {
      if (!emptyWords.has(word)) index.set(word, Math.max(weight, index.get(word) ?? 0));
    }
  };
  add(definition.name, weights.name);
  add(definition.question, weights.question);
  if (definition.form === "number") add(wordsAbout(definition.result.quantity), weights.result);
  for (const input of definition.inputs as readonly Input[]) {
    add(input.name, weights.input);
    if (input.takes === "quantity") add(wordsAbout(input.quantity), weights.input);
    if (input.takes === "text" || input.takes === "count") add(input.meaning, weights.remark);
    if (input.takes === "word")
      add(input.words.map(({ word, meaning }) => `${word} ${meaning}`).join(" "), weights.remark);
  }
  add(`${definition.formula} ${definition.source} ${definition.note ?? ""}`, weights.remark);
  return index;
}

function wordsAbout({ name, meaning, headers, kind }: Quantity): string {
  return [name, meaning, kind, ...headers].join(" ");
}

function wordsOf(text: string): string[] {
  return text.toLowerCase().match(/[\p{L}\p{N}]+(?:-[\p{L}\p{N}]+)*/gu) ?? [];
}
