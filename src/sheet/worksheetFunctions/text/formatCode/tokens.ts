/** A piece of one section of a format code. */
export type Token =
  | { readonly kind: "literal"; readonly text: string }
  | { readonly kind: "digit"; readonly sign: "0" | "#" | "?" }
  | { readonly kind: "point" }
  | { readonly kind: "group" }
  | { readonly kind: "percent" }
  | { readonly kind: "exponent"; readonly plus: boolean }
  | { readonly kind: "general" }
  | { readonly kind: "text" }
  /** Letters of a date or time: "yyyy", "mm", "h" ...; in brackets the hours, minutes or seconds that have passed. */
  | { readonly kind: "date"; readonly letters: string; readonly elapsed: boolean }
  | { readonly kind: "half day"; readonly short: boolean };

const forms: readonly (readonly [RegExp, (match: RegExpExecArray) => Token | undefined])[] = [
  [/^"([^"]*)"?/, ([, text]) => ({ kind: "literal", text: text ?? "" })],
  [/^\\(.)/su, ([, text]) => ({ kind: "literal", text: text ?? "" })],
  // A sign after _ leaves its width, a sign after * fills the cell: in a text one space, and nothing.
  [/^_./su, () => ({ kind: "literal", text: " " })],
  [/^\*./su, () => undefined],
  [/^\[(h+|m+|s+)\]/i, ([, letters]) => ({ kind: "date", letters: (letters ?? "").toLowerCase(), elapsed: true })],
  [/^\[[^\]]*\]/, () => undefined],
  [/^general/i, () => ({ kind: "general" })],
  [/^am\/pm/i, () => ({ kind: "half day", short: false })],
  [/^a\/p/i, () => ({ kind: "half day", short: true })],
  [/^e([+-])/i, ([, sign]) => ({ kind: "exponent", plus: sign === "+" })],
  [/^(y+|m+|d+|h+|s+)/i, ([, letters]) => ({ kind: "date", letters: (letters ?? "").toLowerCase(), elapsed: false })],
  [/^[0#?]/, ([sign]) => ({ kind: "digit", sign: sign as "0" | "#" | "?" })],
  [/^\./, () => ({ kind: "point" })],
  [/^,/, () => ({ kind: "group" })],
  [/^%/, () => ({ kind: "percent" })],
  [/^@/, () => ({ kind: "text" })],
  [/^./su, ([text]) => ({ kind: "literal", text: text ?? "" })],
];

/** The sections of a format code, each as tokens; semicolons within quotes separate nothing. */
export function sectionsOf(code: string): Token[][] {
  const sections: Token[][] = [[]];
  let left = code;
  while (left !== "") {
    if (left.startsWith(";")) {
      sections.push([]);
      left = left.slice(1);
      continue;
    }
    for (const [form, token] of forms) {
      const match = form.exec(left);
      if (match) {
        const made = token(match);
        if (made) {
          sections.at(-1)?.push(made);
        }
        left = left.slice(match[0].length);
        break;
      }
    }
  }
  return sections;
}
