import type { Completion, CompletionContext, CompletionResult } from "@codemirror/autocomplete";
import { autocompletion, pickedCompletion } from "@codemirror/autocomplete";
import type { Extension } from "@codemirror/state";
import { Compartment, EditorState } from "@codemirror/state";
import type { EditorView } from "@codemirror/view";
import { callAt } from "../text/callAt.js";
import type { Offer, Vocabulary } from "../text/offers.js";
import { offersByName, offersByQuestion, offersOfFunctions } from "../text/offers.js";
import { isFormula } from "../text/tokens.js";
import { questionIn, wordsBefore } from "../text/wordsBefore.js";
import type { Typing } from "../typing.js";

/** A question that more functions answer is not precise enough yet. */
const mostAnswers = 8;

/** Functions by name and by question, columns by their headers, and names, offered while words are typed. */
export function completion(typing: Typing): Extension {
  const list = new Compartment();
  const listOf = (chosen: boolean) =>
    autocompletion({
      override: [(context) => byName(typing, context), (context) => byQuestion(typing, context)],
      icons: false,
      defaultKeymap: false,
      maxRenderedOptions: 80,
      // Words that are no formula may be meant as they stand: Enter enters them unless one was chosen by arrow.
      selectOnOpen: chosen,
      tooltipClass: () => "editor-list",
      addToOptions: [{ render: tellsOf, position: 60 }],
    });
  return [
    list.of(listOf(false)),
    EditorState.transactionExtender.of(({ docChanged, startState, newDoc }) => {
      const is = isFormula(newDoc.sliceString(0, 1));
      const was = isFormula(startState.sliceDoc(0, 1));
      return docChanged && is !== was ? { effects: list.reconfigure(listOf(is)) } : null;
    }),
  ];
}

function vocabularyOf(typing: Typing, text: string, caret: number): Vocabulary | undefined {
  const place = typing.place();
  if (!place) return undefined;
  const { names, sheets } = typing.page.state();
  const columns = sheets[place.sheet]?.columnStates ?? [];
  return { functions: typing.functions(), names, columns, place, isArgument: callAt(text, caret) !== undefined };
}

/**
 * Nothing to offer. Null would say so too, but a source that answers null while more is typed is not asked again by the
 * library until the next key, and the list would stay as it was.
 */
function noOffers(from: number): CompletionResult {
  return { from, options: [], filter: false };
}

function byName(typing: Typing, { state, pos }: CompletionContext): CompletionResult {
  const text = state.doc.toString();
  const vocabulary = vocabularyOf(typing, text, pos);
  const words = wordsBefore(text, pos);
  if (!vocabulary || !words) return noOffers(pos);
  if (words.isReference) return resultOf(words.from, offersOfFunctions(words.word, vocabulary.functions));
  const whole = offersByName("", words.phrase, vocabulary);
  // Of several words the header is meant as a whole: "star m".
  if (words.phraseFrom < words.from && whole.length > 0) return resultOf(words.phraseFrom, whole);
  return words.word === "" ? noOffers(pos) : resultOf(words.from, offersByName(words.word, "", vocabulary));
}

async function byQuestion(typing: Typing, context: CompletionContext): Promise<CompletionResult> {
  const text = context.state.doc.toString();
  const vocabulary = vocabularyOf(typing, text, context.pos);
  const asked = vocabulary && questionAt(typing, text, context.pos);
  if (!asked || asked.words.length < 3) return noOffers(context.pos);
  const byItsName = offersByName(asked.words, "", vocabulary);
  // In an argument the column that was named is meant.
  if (vocabulary.isArgument && byItsName.length > 0) return noOffers(context.pos);
  // A worker that broke down is told of by the page itself; meanwhile nothing is offered.
  const found = await typing.page.bench.searchFunctions(asked.words).catch(() => []);
  const named = new Set(byItsName.map(({ insert }) => insert));
  const offers = offersByQuestion(found, vocabulary.functions).filter(({ insert }) => !named.has(insert));
  return resultOf(asked.from, offers.slice(0, mostAnswers), asked.prefix);
}

function questionAt(typing: Typing, text: string, caret: number) {
  const question = typing.isInLine() && caret === text.length ? questionIn(text) : undefined;
  if (question !== undefined) return { words: question, from: 0, prefix: "=" };
  const words = wordsBefore(text, caret);
  return words && !words.isReference ? { words: words.phrase, from: words.phraseFrom, prefix: "" } : undefined;
}

function resultOf(from: number, offers: readonly Offer[], prefix = ""): CompletionResult {
  const options = offers.map((offer) => ({
    label: offer.insert.replace(/\(\)?$/, ""),
    tells: offer.tells,
    type: offer.entry?.own ? "own" : "other",
    apply: (view: EditorView, picked: Completion, start: number, end: number) =>
      put(view, picked, prefix + offer.insert, start, end),
  }));
  return { from, options, filter: false };
}

function put(view: EditorView, picked: Completion, insert: string, from: number, end: number): void {
  const opened = insert.endsWith("(") && view.state.sliceDoc(end, end + 1) === "(";
  view.dispatch({
    changes: { from, to: opened ? end + 1 : end, insert },
    selection: { anchor: from + insert.length },
    userEvent: "input.complete",
    annotations: pickedCompletion.of(picked),
    scrollIntoView: true,
  });
}

function tellsOf(option: Completion): Node {
  const told = document.createElement("span");
  told.className = "editor-tells";
  told.textContent = (option as Completion & { readonly tells: string }).tells;
  return told;
}
