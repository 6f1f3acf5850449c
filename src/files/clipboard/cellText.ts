/** The text of an HTML cell as a reader sees it. */
export interface CellText {
  add(text: string): void;
  tag(name: string, isOpening: boolean): void;
  finish(): string;
}

const lines: ReadonlySet<string> = new Set(["p", "div", "li", "ul", "ol", "h1", "h2", "h3", "h4", "tr", "table"]);

/**
 * Collects the text of a cell: white space as one blank, line breaks as such. A raised or lowered text is set apart, so
 * that 10 with a raised 3 is never 103: a raised exponent gets "^", uncertainties above and below a value a blank.
 */
export function cellText(): CellText {
  let text = "";
  let raised: "sup" | "sub" | undefined;
  const breakLine = (): void => {
    text = `${text.endsWith(" ") ? text.slice(0, -1) : text}\n`;
  };
  return {
    add(piece) {
      let plain = piece.replace(/[ \t\r\n\f]+/g, " ");
      if (text === "" || text.endsWith("\n") || text.endsWith(" ")) {
        plain = plain.replace(/^ /, "");
      }
      if (raised !== undefined && plain.trim() !== "") {
        text += separator(raised, text.at(-1) ?? "", plain[0] as string);
        raised = undefined;
      }
      text += plain;
    },
    tag(name, isOpening) {
      if (name === "br" && isOpening) {
        breakLine();
      } else if (name === "sup" || name === "sub") {
        raised = isOpening ? name : undefined;
      } else if (lines.has(name) && text !== "" && !text.endsWith("\n")) {
        breakLine();
      } else if ((name === "td" || name === "th") && isOpening && text !== "" && !text.endsWith("\n")) {
        text += " ";
      }
    },
    finish: () => text.replaceAll("\u00A0", " ").trim(),
  };
}

function separator(raised: "sup" | "sub", before: string, first: string): string {
  const followsDigit = /[\d.)]/.test(before);
  if (raised === "sup") {
    return before === "" ? "" : first === "+" && followsDigit ? " " : "^";
  }
  const isLower = /[-\u2212]/.test(first) && before !== "";
  return isLower ? " " : followsDigit && /\d/.test(first) ? "_" : "";
}
