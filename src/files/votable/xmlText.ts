const special: Readonly<Record<string, string>> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "\r": "&#13;",
};
// biome-ignore lint/suspicious/noControlCharactersInRegex: these are the characters XML 1.0 (section 2.2) forbids
const forbidden = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g;
const lone = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g;

/** A text within an element. What XML cannot hold at all becomes U+FFFD. */
export function xmlText(text: string): string {
  return text
    .replace(/[&<>\r]/g, (letter) => special[letter]!)
    .replace(forbidden, "\ufffd")
    .replace(lone, "\ufffd");
}

/** A text as the value of an attribute, where line breaks would become blanks. */
export function xmlAttribute(text: string): string {
  return xmlText(text).replace(/"/g, "&quot;").replace(/\n/g, "&#10;").replace(/\t/g, "&#9;");
}

/** Whether a text has to be changed to stand in XML. */
export function losesInXml(text: string): boolean {
  return text.search(forbidden) >= 0 || text.search(lone) >= 0;
}
