import { faultText, type OwnedPage } from "../createPage.js";
import type { Files } from "./files.js";

const ownType = "text/plain";
const mostPasted = 400_000_000;

export interface PageClipboard {
  copy(cut: boolean): void;
  paste(data: DataTransfer): void;
}

/** Copies as text and as a table for other programs; a paste of an own copy keeps formulas. */
export function clipboardOf(page: OwnedPage, files: Files): PageClipboard {
  /** The last own copy: what it put on the clipboard tells whether the clipboard still holds it. */
  let last: { readonly own: string; readonly text: string; readonly cut: boolean } | undefined;
  let from = page.selection().area;

  async function copy(cut: boolean): Promise<void> {
    const { area } = page.selection();
    const answer = page.bench.copy(area);
    // The browser waits for the text: a copy has to start within the key press.
    const part = async (name: "text" | "html", type: string) => new Blob([(await answer)[name]], { type });
    await navigator.clipboard.write([
      new ClipboardItem({ [ownType]: part("text", ownType), "text/html": part("html", "text/html") }),
    ]);
    const { own, text } = await answer;
    last = { own, text, cut };
    from = area;
    const cells = countOf(area);
    const what = cells === 1 ? "1 cell" : `${cells.toLocaleString("en")} cells`;
    page.announce(cut ? `${what} cut; paste moves them.` : `${what} copied.`);
  }

  /** Of the cells in use: whole columns and rows go on beyond them. */
  function countOf({ top, bottom, left, right }: typeof from): number {
    const { rows, columns } = page.sheetState();
    const across = Math.min(right, Math.max(columns - 1, left)) - left + 1;
    return (Math.min(bottom, Math.max(rows - 1, top)) - top + 1) * across;
  }

  async function paste(text: string, html: string, file: File | undefined): Promise<void> {
    const isOwn = last !== undefined && normal(text) === normal(last.text);
    if (!isOwn && file !== undefined && text === "") return files.open(file);
    if (text.length > mostPasted) {
      page.trouble("That is too much for one paste; save it as a file and open it with Book, Open a file.");
      return;
    }
    const { area, active } = page.selection();
    const place = { sheet: active.sheet, row: area.top, column: area.left };
    if (isOwn && last?.cut) {
      if (await page.act({ do: "move", area: from, place })) last = undefined;
      return;
    }
    const clipboard = { text, html, ...(isOwn && last ? { own: last.own } : {}) };
    await page.act({ do: "paste", place, clipboard, what: valuesOnly ? "values" : "formulas" });
  }

  // Ctrl+Shift+V gives a paste like any other; the key tells that values alone are wanted.
  let valuesOnly = false;
  document.addEventListener(
    "keydown",
    (event) => {
      if (event.key.toUpperCase() === "V" && (event.ctrlKey || event.metaKey)) valuesOnly = event.shiftKey;
    },
    true,
  );

  return {
    copy(cut) {
      copy(cut).catch((fault: unknown) =>
        page.trouble(`The browser did not let the cells be copied: ${messageOf(fault)}`),
      );
    },
    paste(data) {
      const [file] = data.files;
      paste(data.getData("text/plain"), data.getData("text/html"), file).catch((fault: unknown) =>
        page.trouble(faultText(fault)),
      );
    },
  };
}

function messageOf(fault: unknown): string {
  return fault instanceof Error ? fault.message : String(fault);
}

/** Some systems change the ends of lines on the clipboard. */
function normal(text: string): string {
  return text.replace(/\r\n?/g, "\n").replace(/\n$/, "");
}
