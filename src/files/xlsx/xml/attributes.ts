import { damaged } from "../../zip/zipProblem.js";
import { isBlank, localName } from "./xmlScanner.js";
import { unescapeXml } from "./xmlText.js";

/** Reads what stands behind the name in a tag: attributes by their names without prefixes. */
export function eachAttribute(source: string, take: (name: string, value: string) => void): void {
  const { length } = source;
  let at = 0;
  for (;;) {
    const before = at;
    at = afterBlanks(source, at);
    if (at === length) {
      return;
    }
    let nameEnd = at;
    while (nameEnd < length && isOfName(source.charCodeAt(nameEnd))) {
      nameEnd++;
    }
    const equals = afterBlanks(source, nameEnd);
    const start = afterBlanks(source, equals + 1);
    const mark = source[start];
    const isQuoted = source[equals] === "=" && (mark === '"' || mark === "'");
    const end = isQuoted ? source.indexOf(mark, start + 1) : -1;
    if (end < 0 || nameEnd === at || before === at) {
      throw damaged(`a tag in it has the attribute ${source.slice(at, at + 20).trim()}, which is none`);
    }
    const name = source.slice(at, nameEnd);
    const value = unescapeXml(source.slice(start + 1, end));
    if (value === undefined) {
      throw damaged(`the attribute ${name.slice(0, 20)} holds an "&" that stands for no character`);
    }
    if (!name.startsWith("xmlns")) {
      take(localName(name), value);
    }
    at = end + 1;
  }
}

function afterBlanks(source: string, from: number): number {
  let at = from;
  while (isBlank(source.charCodeAt(at))) {
    at++;
  }
  return at;
}

/** Letters, digits and the four other characters of names; of characters beyond ASCII all are let pass. */
function isOfName(code: number): boolean {
  return (
    (code >= 97 && code <= 122) ||
    (code >= 65 && code <= 90) ||
    (code >= 45 && code <= 58 && code !== 47) ||
    code === 95 ||
    code >= 128
  );
}

/** The attributes of a tag as a map. */
export function attributesOf(source: string): ReadonlyMap<string, string> {
  const attributes = new Map<string, string>();
  eachAttribute(source, (name, value) => attributes.set(name, value));
  return attributes;
}
