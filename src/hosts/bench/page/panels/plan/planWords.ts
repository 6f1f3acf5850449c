import { usualPlanTexts } from "../../../../../plan/usualPlanTexts.js";
import type { PlanStart, PlanWords } from "../../../protocol/plan.js";
import type { Page } from "../../page.js";

const keptName = "barycell.plans";
/** Books whose plans are remembered in this browser. */
const mostBooks = 30;
const usualSpan = 181 * 86_400_000;

type Kept = readonly (readonly [book: string, words: Partial<PlanWords>])[];

const listeners = new Set<() => void>();

/** What the open book's plan asks for: what was typed, else what the sheet offers, else what is usual. */
export function wordsFor(page: Page, start: PlanStart): PlanWords {
  const kept = keptWords(page.state().id);
  const words = { ...offered(start), ...kept };
  return start.values.includes(words.value) ? words : { ...words, value: start.value ?? "" };
}

/** The same without what was typed. */
function offered({ site, value }: PlanStart): PlanWords {
  const now = Date.now();
  return {
    ...usualPlanTexts,
    hours: "60",
    from: dateOf(now),
    to: dateOf(now + usualSpan),
    longitude: site?.longitude ?? "",
    latitude: site?.latitude ?? "",
    height: site?.height ?? "",
    value: value ?? "",
    columns: {},
    must: [],
    excluded: [],
  };
}

function dateOf(time: number): string {
  return new Date(time).toISOString().slice(0, 10);
}

/** Remembers what was typed for the open book, in this browser. */
export function keepWords(page: Page, change: Partial<PlanWords>): void {
  const book = page.state().id;
  const words = { ...keptWords(book), ...change };
  const others = readKept().filter(([id]) => id !== book);
  session = [[book, words] as const, ...others].slice(0, mostBooks);
  try {
    localStorage.setItem(keptName, JSON.stringify(session));
  } catch {
    // They hold until the page is closed.
  }
  for (const listener of listeners) listener();
}

/** Forgets some of it, so that the sheet's own offer holds again. */
export function forgetWords(page: Page, names: readonly (keyof PlanWords)[]): void {
  keepWords(page, Object.fromEntries(names.map((name) => [name, undefined])));
}

/** Called after the words of a book changed. */
export function onWords(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export function keptWords(book: string): Partial<PlanWords> {
  const words = readKept().find(([id]) => id === book)?.[1] ?? {};
  return Object.fromEntries(Object.entries(words).filter(([, value]) => value !== undefined));
}

let session: Kept | undefined;

function readKept(): Kept {
  session ??= readStored();
  return session;
}

function readStored(): Kept {
  try {
    const stored: unknown = JSON.parse(localStorage.getItem(keptName) ?? "[]");
    if (!Array.isArray(stored)) return [];
    return stored.filter(isEntry).map(([book, words]) => [book, sound(words)]);
  } catch {
    return [];
  }
}

function isEntry(entry: unknown): entry is [string, Record<string, unknown>] {
  return Array.isArray(entry) && typeof entry[0] === "string" && typeof entry[1] === "object" && entry[1] !== null;
}

const lists: readonly string[] = ["must", "excluded"];

/** What has not the form it was kept in is left out. */
function sound(words: Record<string, unknown>): Partial<PlanWords> {
  const isText = (value: unknown) => typeof value === "string";
  const isRight = ([name, value]: [string, unknown]) => {
    if (lists.includes(name)) return Array.isArray(value) && value.every(isText);
    if (name === "columns") return typeof value === "object" && value !== null && Object.values(value).every(isText);
    return isText(value);
  };
  return Object.fromEntries(Object.entries(words).filter(isRight));
}
