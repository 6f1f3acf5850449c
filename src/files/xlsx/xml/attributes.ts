import { damaged } from "../../zip/zipProblem.js";
import { isBlank, localName } from "./xmlScanner.js";
import { unescapeXml } from "./xmlText.js";

/** Reads what stands behind the name in a tag: attributes by their names without prefixes. */
export function eachAttribute(source: string, take: (name: string, value: string) => void): void {
  let at = 0;
  const { length } = source;
  for (;;) {
    const before = at;
    while (at < length && isBlank(source.charCodeAt(at))) {
      at++;
    }
    if (at === length) {
      return;
    }
    const equals = source.indexOf("=", at);
    let value = equals + 1;
    while (equals > 0 && isBlank(source.charCodeAt(value))) {
      value++;
    }
    const mark = source[value];
    const end = equals < 0 || (mark !== '"' && mark !== "'") ? -1 : source.indexOf(mark, value + 1);
    const name = source.slice(at, Math.max(at, equals)).trimEnd();
    if (end < 0 || name === "" || before === at || /[\s"'<&]/.test(name)) {
      throw damaged(`a tag in it has the attribute ${source.slice(at, at + 20).trim()}, which is none`);
    }
    const plain = unescapeXml(source.slice(value + 1, end));
    if (plain === undefined) {
      throw damaged(`the attribute ${name.slice(0, 20)} holds an "&" that stands for no character`);
    }
    if (!name.startsWith("xmlns")) {
      take(localName(name), plain);
    }
    at = end + 1;
  }
}

/** The attributes of a tag as a map. */
export function attributesOf(source: string): ReadonlyMap<string, string> {
  const attributes = new Map<string, string>();
  eachAttribute(source, (name, value) => attributes.set(name, value));
  return attributes;
}
