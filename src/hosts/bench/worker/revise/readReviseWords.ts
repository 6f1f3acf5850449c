import type { BookTable } from "../../../../revision/bookTable.js";
import { readCondition } from "../../../../revision/condition.js";
import type { Alias } from "../../../../revision/matchKeys.js";
import { RevisionRefused } from "../../../../revision/revisionRefused.js";
import { quoted } from "../../../../revision/words.js";
import type { ReviseProblem, RevisionTexts } from "../../protocol/revise.js";

export interface ReadWords {
  readonly aliases: readonly Alias[];
  readonly conditions: readonly string[];
  readonly problems: readonly ReviseProblem[];
}

/** Aliases and conditions from their lines. */
export function readReviseWords(texts: RevisionTexts, table: BookTable): ReadWords {
  const problems: ReviseProblem[] = [];
  const aliases = linesOf(texts.aliases).flatMap((line): Alias[] => {
    const alias = readAlias(line);
    if (alias) return [alias];
    const message = `the alias ${quoted(line)} cannot be read; write old = new, for example "HD 1 = HIP 1234".`;
    problems.push({ word: "aliases", message });
    return [];
  });
  const conditions = linesOf(texts.conditions).filter((line) => {
    try {
      readCondition(line, table.columns);
      return true;
    } catch (error) {
      if (!(error instanceof RevisionRefused)) throw error;
      problems.push({ word: "conditions", message: error.message });
      return false;
    }
  });
  return { aliases, conditions, problems };
}

function linesOf(text: string): string[] {
  return text
    .split(/\r?\n/)
    .map((line) => line.trim())
    .filter((line) => line !== "");
}

function readAlias(line: string): Alias | undefined {
  const equals = line.indexOf("=");
  const [old, now] = [line.slice(0, Math.max(0, equals)).trim(), line.slice(equals + 1).trim()];
  return equals < 0 || old === "" || now === "" ? undefined : { old, new: now };
}
