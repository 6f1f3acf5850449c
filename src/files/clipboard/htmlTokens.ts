import { unescapeHtml } from "./unescapeHtml.js";

/** A piece of HTML: a tag with its attributes, or text between tags. */
export type HtmlToken =
  | { readonly kind: "open"; readonly name: string; readonly attributes: ReadonlyMap<string, string> }
  | { readonly kind: "close"; readonly name: string }
  | { readonly kind: "text"; readonly text: string };

/** Elements whose content is no text of the page. */
const raw: ReadonlySet<string> = new Set([
  "script",
  "style",
  "title",
  "textarea",
  "template",
  "xml",
  "iframe",
  "noscript",
]);

const tagStart = /<(\/?)([a-z][^\s/>]*)/iy;
const attribute = /[\s/]*([^\s/>=][^\s/>=]*)(?:\s*=\s*(?:"([^"]*)"|'([^']*)'|([^\s>"'][^\s>]*)))?/y;

/**
 * The tags and texts of HTML as programs put it on the clipboard: end tags may be missing, attributes unquoted, comments
 * and declarations anywhere. It never fails; what makes no tag is text (the tokens of the HTML standard, section 13.2.5,
 * as far as tables need them).
 */
export function* htmlTokens(html: string): Generator<HtmlToken> {
  let at = 0;
  let text = 0;
  const pending = (end: number): HtmlToken[] =>
    end > text ? [{ kind: "text", text: unescapeHtml(html.slice(text, end)) }] : [];
  while (at < html.length) {
    const start = html.indexOf("<", at);
    if (start < 0) {
      break;
    }
    const aside = endOfAside(html, start);
    if (aside !== undefined) {
      yield* pending(start);
      at = aside;
      text = at;
      continue;
    }
    tagStart.lastIndex = start;
    const match = tagStart.exec(html);
    if (match === null) {
      at = start + 1;
      continue;
    }
    yield* pending(start);
    const name = (match[2] as string).toLowerCase();
    const { attributes, end } = readAttributes(html, tagStart.lastIndex);
    if (end === undefined) {
      return;
    }
    yield match[1] === "/" ? { kind: "close", name } : { kind: "open", name, attributes };
    at = raw.has(name) && match[1] === "" ? endOfRaw(html, name, end) : end;
    text = at;
  }
  yield* pending(html.length);
}

function endOfAside(html: string, start: number): number | undefined {
  const next = html[start + 1];
  if (next !== "!" && next !== "?") {
    return undefined;
  }
  const isComment = html.startsWith("<!--", start);
  const end = html.indexOf(isComment ? "-->" : ">", start + (isComment ? 4 : 2));
  return end < 0 ? html.length : end + (isComment ? 3 : 1);
}

function endOfRaw(html: string, name: string, from: number): number {
  const close = new RegExp(`</${name}[\\s/>]`, "gi");
  close.lastIndex = from;
  return close.exec(html)?.index ?? html.length;
}

function readAttributes(html: string, from: number) {
  const attributes = new Map<string, string>();
  let at = from;
  for (;;) {
    attribute.lastIndex = at;
    const match = attribute.exec(html);
    if (match === null) {
      break;
    }
    at = attribute.lastIndex;
    const name = (match[1] as string).toLowerCase();
    if (!attributes.has(name)) {
      attributes.set(name, unescapeHtml(match[2] ?? match[3] ?? match[4] ?? ""));
    }
  }
  const end = html.indexOf(">", at);
  return { attributes, end: end < 0 ? undefined : end + 1 };
}
