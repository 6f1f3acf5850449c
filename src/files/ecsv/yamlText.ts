/** Characters that YAML 1.1 (section 5.1) does not let stand for themselves, or takes for line breaks. */
const escaped = /[\u007f-\u009f\u2028\u2029\ufeff\ufffe\uffff]/g;

/** A text as a double-quoted YAML scalar, which a JSON string is but for some characters. */
export function yamlText(text: string): string {
  return JSON.stringify(text).replace(escaped, (letter) => `\\u${letter.charCodeAt(0).toString(16).padStart(4, "0")}`);
}
