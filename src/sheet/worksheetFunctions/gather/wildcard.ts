const special = /[*?~]/;

/** Whether a pattern holds the signs ? (one character), * (any run of characters) or ~ (takes the next sign as it is). */
export function hasWildcards(pattern: string): boolean {
  return special.test(pattern);
}

/** A regular expression for a pattern with wildcards, without regard to case. */
export function wildcardExpression(pattern: string, part: "whole" | "anywhere"): RegExp {
  let source = "";
  const characters = [...pattern];
  for (let index = 0; index < characters.length; index++) {
    const character = characters[index] as string;
    const next = characters[index + 1];
    if (character === "~" && next !== undefined && special.test(next)) {
      source += escaped(next);
      index++;
    } else if (character === "*") {
      source += ".*";
    } else if (character === "?") {
      source += ".";
    } else {
      source += escaped(character);
    }
  }
  return new RegExp(part === "whole" ? `^${source}$` : source, "isu");
}

function escaped(character: string): string {
  return character.replace(/[\\^$.*+?()[\]{}|/]/u, "\\$&");
}
