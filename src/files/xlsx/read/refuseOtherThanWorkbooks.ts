import { FileProblem } from "../../fileProblem.js";
import { isPacked, refuseOtherKinds } from "../../otherKinds.js";

/** Throws where the first bytes are not those of a workbook, with a sentence on what the file is. */
export function refuseOtherThanWorkbooks(bytes: Uint8Array): void {
  if (bytes.length === 0) {
    throw new FileProblem("empty", "The file is empty; copy it again from where it came.");
  }
  refuseOtherKinds(bytes);
  if (!isPacked(bytes)) {
    throw new FileProblem("other-kind", sentenceOfText(bytes));
  }
}

function sentenceOfText(bytes: Uint8Array): string {
  const start = new TextDecoder().decode(bytes.subarray(0, 1024)).trimStart().toLowerCase();
  if (/^(<\?xml|<!doctype|<html|<table|<votable)/.test(start)) {
    return /<html|<table|<!doctype html/.test(start)
      ? "The file is a web page, whatever its name says; copy the table from the page and paste it, or save it as CSV."
      : `The file is a single XML text and not a workbook; save it as a workbook (.xlsx) where it was made, or open it as a VOTable if it is one.`;
  }
  const isText = !start.includes("\uFFFD") && !start.includes("\0");
  return isText
    ? "The file is plain text and not a workbook; open it as a table of text (CSV, TSV), whatever its name says."
    : "The file is no workbook (.xlsx) and of no kind that is known; check that it is the file that was meant.";
}
