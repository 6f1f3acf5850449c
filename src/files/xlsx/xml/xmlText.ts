const named: Readonly<Record<string, string>> = { amp: "&", lt: "<", gt: ">", quot: '"', apos: "'" };

/** Text with its references to characters resolved; undefined where one is none that XML itself knows (section 4.6). */
export function unescapeXml(text: string): string | undefined {
  if (!text.includes("&")) {
    return text;
  }
  let bad = false;
  const plain = text.replace(/&([^;&]*);?/g, (whole, name: string) => {
    const character = whole.endsWith(";") ? characterOf(name) : undefined;
    bad ||= character === undefined;
    return character ?? "";
  });
  return bad ? undefined : plain;
}

function characterOf(name: string): string | undefined {
  if (!name.startsWith("#")) {
    return Object.hasOwn(named, name) ? named[name] : undefined;
  }
  const hexadecimal = /^#x([0-9a-f]{1,6})$/i.exec(name)?.[1];
  const decimal = /^#([0-9]{1,7})$/.exec(name)?.[1];
  const code = hexadecimal ? Number.parseInt(hexadecimal, 16) : decimal ? Number(decimal) : -1;
  return isXmlCharacter(code) ? String.fromCodePoint(code) : undefined;
}

/** Production 2 of XML 1.0, fifth edition. */
function isXmlCharacter(code: number): boolean {
  return (
    code === 9 ||
    code === 10 ||
    code === 13 ||
    (code >= 0x20 && code <= 0xd7ff) ||
    (code >= 0xe000 && code <= 0xfffd) ||
    (code >= 0x10000 && code <= 0x10ffff)
  );
}

const special = /[&<>"\p{Cc}\p{Cs}\uFFFE\uFFFF]|_x[0-9A-Fa-f]{4}_/u;
/** Controls but tab and line feed, halves of a pair that stand alone, and two that are no characters. */
const unholdable = /(?![\t\n\x7F-\x9F])\p{Cc}|\p{Cs}|[\uFFFE\uFFFF]/gu;

/**
 * A text as XML of a workbook holds it: characters that XML cannot hold, and carriage returns, which it would change,
 * as _xHHHH_ (ECMA-376 part 1, section 22.9.2.19), and so the underscore of what would otherwise read as such.
 */
export function escapeText(text: string): string {
  if (!special.test(text)) {
    return text;
  }
  return text
    .replace(/_(?=x[0-9A-Fa-f]{4}_)/g, "_x005F_")
    .replace(unholdable, (character) => `_x${character.charCodeAt(0).toString(16).toUpperCase().padStart(4, "0")}_`)
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;");
}

/** The same between quotes, where a line break or a tab would become a blank (XML 1.0, section 3.3.3). */
export function escapeAttribute(text: string): string {
  return escapeText(text).replaceAll('"', "&quot;").replaceAll("\n", "&#10;").replaceAll("\t", "&#9;");
}

/** The text that stands for _xHHHH_ in a workbook. */
export function decodeText(text: string): string {
  return text.includes("_x")
    ? text.replace(/_x([0-9A-Fa-f]{4})_/g, (_, digits: string) => String.fromCharCode(Number.parseInt(digits, 16)))
    : text;
}
