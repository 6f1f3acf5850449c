import { tokenize } from "@borgar/fx";

/** The text of a formula in each row of a column it is filled down: texts, and between them row numbers. */
export interface RowTemplate {
  readonly texts: readonly string[];
  /** What is added to the row, counted from zero, for the numbers between the texts. */
  readonly offsets: readonly number[];
}

/** The template of a formula from its text, without "=", in one row. */
export function rowTemplate(text: string, row: number): RowTemplate {
  const texts: string[] = [];
  const offsets: number[] = [];
  let pending = "";
  for (const { type, value } of tokenize(`=${text}`, { withLocation: false, mergeRefs: true }).slice(1)) {
    if (type !== "range" && type !== "range_beam") {
      pending += value;
      continue;
    }
    const start = value.lastIndexOf("!") + 1;
    let last = 0;
    for (const match of value.slice(start).matchAll(/(\$?)(\d+)/g)) {
      if (match[1] === "") {
        texts.push(pending + value.slice(last, start + match.index));
        offsets.push(Number(match[2]) - row);
        pending = "";
        last = start + match.index + match[0].length;
      }
    }
    pending += value.slice(last);
  }
  return { texts: [...texts, pending], offsets };
}

export function textInRow({ texts, offsets }: RowTemplate, row: number): string {
  let text = texts[0] as string;
  for (let index = 0; index < offsets.length; index++) {
    text += row + (offsets[index] as number) + (texts[index + 1] as string);
  }
  return text;
}
