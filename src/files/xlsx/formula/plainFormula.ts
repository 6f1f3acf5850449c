import { tokenize } from "@borgar/fx";
import { plainName } from "./futureFunctions.js";

/** A bracket that is open: where its function writes differently, how, and where its content begins. */
interface Bracket {
  readonly as: "@" | "#" | undefined;
  readonly from: number;
}

/**
 * The text of a formula, "=" in front, as an analyst types it, from the text in a file: without the prefixes of
 * younger functions and of LET's names, with "@" and "#" for the functions that stand for them ([MS-XLSX] 2.2.3).
 */
export function plainFormula(stored: string): string {
  if (!/_x/i.test(stored)) {
    return `=${stored}`;
  }
  const tokens = tokenize(`=${stored}`, { withLocation: false, mergeRefs: true });
  const out: string[] = [];
  const open: Bracket[] = [];
  let as: Bracket["as"];
  for (const { type, value } of tokens) {
    if (type === "func") {
      const name = plainName(value);
      as = name.toUpperCase() === "SINGLE" ? "@" : name.toUpperCase() === "ANCHORARRAY" ? "#" : undefined;
      if (as === undefined) {
        out.push(name);
      }
    } else if (value === "(" && type === "operator") {
      if (as === undefined) {
        out.push("(");
      }
      open.push({ as, from: out.length });
      as = undefined;
    } else if (value === ")" && type === "operator") {
      close(out, open.pop());
    } else {
      out.push(type === "range_named" ? value.replace(/^_xlpm\./i, "") : value);
    }
  }
  return out.join("");
}

function close(out: string[], bracket: Bracket | undefined): void {
  if (bracket?.as === undefined) {
    out.push(")");
    return;
  }
  const content = out.splice(bracket.from);
  const isWhole = content.length === 1 || endOfBrackets(content) === content.length - 1;
  const text = isWhole ? content.join("") : `(${content.join("")})`;
  out.push(bracket.as === "@" ? `@${text}` : `${text}#`);
}

/** Where the brackets close that stand first, or first behind the name of a function. */
function endOfBrackets(content: readonly string[]): number {
  const start = content[0] === "(" ? 0 : /^[\w.]+$/.test(content[0] ?? "") && content[1] === "(" ? 1 : content.length;
  let depth = 0;
  for (let at = start; at < content.length; at++) {
    depth += content[at] === "(" ? 1 : content[at] === ")" ? -1 : 0;
    if (depth === 0) {
      return at;
    }
  }
  return -1;
}
