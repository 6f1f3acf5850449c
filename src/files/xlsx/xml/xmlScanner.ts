import { damaged } from "../../zip/zipProblem.js";
import { unescapeXml } from "./xmlText.js";

/** Who is told what an XML text holds. Names come without their prefixes. */
export interface XmlHandler {
  /** `attributes` is what stands behind the name; `eachAttribute` reads it. */
  open(name: string, attributes: string): void;
  /** `depth` elements are still open. */
  close(name: string, depth: number): void;
  /** Between two tags there may be several pieces. */
  text(text: string): void;
}

/** Takes an XML text in pieces. */
export interface XmlScanner {
  push(text: string): void;
  end(): void;
}

const longestToken = 1 << 22;
const deepest = 256;
const lessThan = 60;
const greaterThan = 62;
const quote = 34;
const apostrophe = 39;
const slash = 47;

/**
 * Scans the XML of workbooks: well-formed elements, texts, comments, CDATA and instructions. A document type, with
 * which a small file can ask for endless texts or for other files, is refused (ECMA-376 part 2, section 6.2.5 forbids it).
 * Ours rather than a general parser because most of a workbook is millions of small elements, and this takes a third
 * of the time.
 */
export function xmlScanner(part: string, handler: XmlHandler): XmlScanner {
  const open: string[] = [];
  let pending = "";
  let seenRoot = false;
  const fail = (what: string) => damaged(`${part} is no XML: ${what}`);

  const takeText = (text: string): void => {
    const plain = unescapeXml(text);
    if (plain === undefined) {
      throw fail(`"${text.slice(Math.max(0, text.indexOf("&")), text.indexOf("&") + 12)}" stands for no character`);
    }
    if (open.length > 0) {
      handler.text(plain.includes("\r") ? plain.replace(/\r\n?/g, "\n") : plain);
    } else if (plain.trim() !== "" && plain.trim() !== "\uFEFF") {
      throw fail("there is text outside its elements");
    }
  };
  const takeClose = (name: string): void => {
    if (open.pop() !== name) {
      throw fail(`</${name.slice(0, 20)}> closes nothing`);
    }
    handler.close(localName(name), open.length);
  };
  const takeOpen = (tag: string): void => {
    const empty = tag.charCodeAt(tag.length - 1) === slash;
    const inner = empty ? tag.slice(0, -1) : tag;
    const nameEnd = endOfName(inner);
    const name = inner.slice(0, nameEnd);
    if (name === "" || (seenRoot && open.length === 0) || open.length >= deepest) {
      throw fail(name === "" ? "a tag has no name" : "its elements are not nested as they must be");
    }
    seenRoot = true;
    open.push(name);
    handler.open(localName(name), inner.slice(nameEnd));
    if (empty) {
      takeClose(name);
    }
  };

  /** Takes whole tokens from `from` on; returns where the first unfinished one begins. */
  const takeTokens = (text: string): number => {
    let at = 0;
    for (;;) {
      const start = text.indexOf("<", at);
      if (start < 0) {
        return at;
      }
      if (start > at) {
        takeText(text.slice(at, start));
      }
      const next = text.charCodeAt(start + 1);
      if (next === 33 || next === 63) {
        const end = endOfAside(text, start);
        if (end < 0) {
          return start;
        }
        if (text.startsWith("<![CDATA[", start) && open.length > 0) {
          handler.text(text.slice(start + 9, end - 3));
        }
        at = end;
        continue;
      }
      const end = endOfTag(text, start + 1);
      if (end < 0) {
        return start;
      }
      if (next === slash) {
        takeClose(text.slice(start + 2, end).trimEnd());
      } else {
        takeOpen(text.slice(start + 1, end));
      }
      at = end + 1;
    }
  };

  const endOfAside = (text: string, start: number): number => {
    const ends = [
      ["<!--", "-->"],
      ["<![CDATA[", "]]>"],
      ["<?", "?>"],
    ] as const;
    for (const [begin, end] of ends) {
      if (text.startsWith(begin, start)) {
        const found = text.indexOf(end, start + begin.length);
        return found < 0 ? -1 : found + end.length;
      }
    }
    if (text.length - start >= 9) {
      throw fail("it declares a document type, which no workbook needs");
    }
    return -1;
  };

  const endOfTag = (text: string, from: number): number => {
    let within = 0;
    for (let at = from; at < text.length; at++) {
      const code = text.charCodeAt(at);
      if (within !== 0) {
        within = code === within ? 0 : within;
      } else if (code === greaterThan) {
        return at;
      } else if (code === quote || code === apostrophe) {
        within = code;
      }
      if (code === lessThan) {
        throw fail('"<" stands within a tag');
      }
    }
    return -1;
  };

  return {
    push(text) {
      const all = pending === "" ? text : pending + text;
      const used = takeTokens(all);
      pending = all.slice(used);
      if (pending.length > longestToken) {
        throw fail("a text or a tag in it has no end");
      }
    },
    end() {
      if (pending !== "") {
        if (pending.includes("<")) {
          throw fail("it breaks off");
        }
        takeText(pending);
      }
      if (open.length > 0 || !seenRoot) {
        throw fail("it breaks off");
      }
    },
  };
}

function endOfName(tag: string): number {
  for (let at = 0; at < tag.length; at++) {
    if (isBlank(tag.charCodeAt(at))) {
      return at;
    }
  }
  return tag.length;
}

export function localName(name: string): string {
  const colon = name.indexOf(":");
  return colon < 0 ? name : name.slice(colon + 1);
}

export const isBlank = (code: number): boolean => code === 32 || code === 10 || code === 13 || code === 9;
