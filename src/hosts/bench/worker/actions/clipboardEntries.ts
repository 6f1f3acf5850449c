import type { ClipboardTable } from "../../../../files/clipboard/clipboardTable.js";
import { readHtmlTable } from "../../../../files/clipboard/readHtmlTable.js";
import { readTsv } from "../../../../files/clipboard/readTsv.js";
import { FileProblem } from "../../../../files/fileProblem.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import type { Clipboard } from "../../protocol/request.js";

/** Attributes in which other programs say the numbers of which their plain text has the digits they show. */
const statedNumbers = /\s(?:x:num|sdval|data-sheets-value)=/;

/**
 * The table on the clipboard. The plain text is taken as it stands, unless the HTML says more: where it was copied from
 * here, in another tab; where it states numbers in full; where the text beside it is no table.
 */
export function clipboardEntries({ text, html }: Clipboard, what: "formulas" | "values"): ClipboardTable {
  const plain = (): ClipboardTable => ({ rows: readTsv(text), origin: undefined });
  const table = html === "" ? undefined : tableIn(html);
  if (table === undefined) return plain();
  if (table.origin !== undefined) {
    // The values of its formulas stand in the text alone.
    return what === "values" && text !== "" ? plain() : table;
  }
  const isTable = text.includes("\t") || (text.trim() !== "" && table.rows.every((row) => row.length <= 1));
  return isTable && !statedNumbers.test(html) ? plain() : table;
}

function tableIn(html: string): ClipboardTable | undefined {
  try {
    return readHtmlTable(html);
  } catch (problem) {
    if (problem instanceof FileProblem) throw new EditRefused(`paste: ${problem.message}`);
    throw problem;
  }
}
