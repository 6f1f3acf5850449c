import fc from "fast-check";
import { SaxesParser } from "saxes";
import { describe, expect, test } from "vitest";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { attributesOf } from "../../../src/files/xlsx/xml/attributes.js";
import { xmlScanner } from "../../../src/files/xlsx/xml/xmlScanner.js";
import { decodeText, escapeAttribute, escapeText } from "../../../src/files/xlsx/xml/xmlText.js";

function scanned(pieces: readonly string[]): string[] {
  const events: string[] = [];
  let text = "";
  const flush = () => {
    events.push(...(text === "" ? [] : [`text ${text}`]));
    text = "";
  };
  const scanner = xmlScanner("part", {
    open(name, attributes) {
      flush();
      events.push(`open ${name} ${JSON.stringify([...attributesOf(attributes)])}`);
    },
    close(name) {
      flush();
      events.push(`close ${name}`);
    },
    text(piece) {
      text += piece;
    },
  });
  for (const piece of pieces) {
    scanner.push(piece);
  }
  scanner.end();
  return events;
}

/** The same told by a general parser. */
function parsed(xml: string): string[] {
  const events: string[] = [];
  let text = "";
  const flush = () => {
    events.push(...(text === "" ? [] : [`text ${text}`]));
    text = "";
  };
  let depth = 0;
  const parser = new SaxesParser({ xmlns: true, position: false });
  parser.on("opentag", ({ local, attributes }) => {
    flush();
    depth++;
    const own = Object.values(attributes).filter(({ name }) => !name.startsWith("xmlns"));
    events.push(`open ${local} ${JSON.stringify(own.map((each) => [each.local, each.value]))}`);
  });
  parser.on("closetag", ({ local }) => {
    flush();
    depth--;
    events.push(`close ${local}`);
  });
  parser.on("text", (piece) => {
    text += depth > 0 ? piece : "";
  });
  parser.on("cdata", (piece) => {
    text += piece;
  });
  parser.write(xml).close();
  return events;
}

const content: fc.Arbitrary<string> = fc.letrec<{ node: string }>((tie) => ({
  node: fc.oneof(
    { depthSize: "small" },
    fc.constantFrom("a", " ", "é𝛼", "&amp;", "&#x41;", "<!-- <x> -->", "<![CDATA[<&]]>", "<?pi a?>", "<v/>", "<x:v xmlns:x='y' x:b=\"1\" c='&lt;\"'/>", ">"), // biome-ignore format: one list
    fc.array(tie("node"), { maxLength: 4 }).map((each) => `<c r="A1" s = '2'>${each.join("")}</c >`),
  ),
})).node;

describe("the XML of workbooks", () => {
  test("is told as a general parser tells it, wherever it is cut", () => {
    fc.assert(
      fc.property(fc.array(content), fc.array(fc.nat(200)), (nodes, cuts) => {
        const xml = `<?xml version="1.0"?>\n<r>${nodes.join("")}</r>\n`;
        const places = [0, ...cuts.filter((each) => each < xml.length).sort((a, b) => a - b), xml.length];
        const pieces = places.slice(1).map((end, index) => xml.slice(places[index], end));
        expect(scanned(pieces)).toEqual(parsed(xml));
      }),
    );
  });

  test.each([
    "",
    "<a>",
    "<a></b>",
    "</a>",
    "<a/><b/>",
    "x<a/>",
    "<a b=1/>",
    "<a b/>",
    "<a b='1'c='2'/>",
    "<a b='<'/>",
    "<a>&x;</a>",
    "<a>& </a>",
    "<a>&#0;</a>",
    "<!DOCTYPE a><a/>",
    "<a><!ELEMENT a></a>",
    "<a",
    "<a><!-- ",
    "<a>".repeat(257),
  ])("%j is refused", (xml) => {
    // biome-ignore format: one list
    expect(() => scanned([xml])).toThrow(FileProblem);
  });

  test("holds every text (ECMA-376 part 1, section 22.9.2.19)", () => {
    // The example of the section: "_x0008_" in a file is the character U+0008; a literal "_x" is written "_x005F_x".
    expect([escapeText("\u0008"), escapeText("_x0008_"), decodeText("_x005F_x0008_")]).toEqual(["_x0008_", "_x005F_x0008_", "_x0008_"]); // biome-ignore format: one list
    const text = fc.oneof(fc.string({ unit: "binary" }), fc.string({ unit: fc.constantFrom(..."_x0041\uD800\uDC00\u0000\uFFFF\r\n\t<&\"") })); // biome-ignore format: one arbitrary
    fc.assert(
      fc.property(text, (each) => {
        const [open, inner] = parsed(`<a b="${escapeAttribute(each)}">${escapeText(each)}</a>`) as [string, string];
        const [[, attribute]] = JSON.parse(open.replace("open a ", "")) as [[string, string]];
        expect(decodeText(attribute)).toBe(each);
        expect(inner.startsWith("text ") ? decodeText(inner.slice(5)) : "").toBe(each);
      }),
    );
  });
});
