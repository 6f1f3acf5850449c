import type { ExportFormat } from "../../protocol/bench.js";
import type { OwnedPage } from "../createPage.js";
import { download } from "../download.js";

export interface Files {
  /** Lets the analyst choose a file, then opens it as a book of its own. */
  choose(): void;
  open(file: File): Promise<void>;
  openText(name: string, text: string): Promise<void>;
  save(format: ExportFormat): Promise<void>;
}

export const formats: readonly { readonly format: ExportFormat; readonly words: string; readonly whole: boolean }[] = [
  { format: "csv", words: "CSV: values of this sheet, units in the headers", whole: false },
  { format: "tsv", words: "TSV: the same, between tabs", whole: false },
  { format: "ecsv", words: "ECSV: values of this sheet, with units and descriptions in its head", whole: false },
  { format: "votable", words: "VOTable: values of this sheet, for archives and catalogue programs", whole: false },
  { format: "xlsx", words: "Workbook (xlsx): all sheets, formulas and formats", whole: true },
  { format: "book", words: "Barycell book: everything, to open here again", whole: true },
];

export function createFiles(root: HTMLElement, page: OwnedPage): Files {
  const input = document.createElement("input");
  input.type = "file";
  input.hidden = true;
  root.append(input);
  input.addEventListener("change", () => {
    const [file] = input.files ?? [];
    input.value = "";
    if (file) void open(file);
  });

  async function open(file: File): Promise<void> {
    const opened = await page.bench.openFile(file);
    tell(opened);
  }

  function tell(opened: Awaited<ReturnType<typeof page.bench.openFile>>): void {
    if (opened.is === "refused") page.trouble(opened.message);
    if (opened.is === "cancelled") page.announce("Stopped; the file was not opened.");
    if (opened.is !== "opened") return;
    page.announce(opened.said);
    if (opened.findings.length > 0) page.trouble(opened.findings.join(" "));
  }

  return {
    choose: () => input.click(),
    open,
    async openText(name, text) {
      tell(await page.bench.openText(name, text));
    },
    async save(format) {
      const { name, type, bytes, told } = await page.bench.exportAs(format, page.sheet());
      download(name, new Blob([bytes as BlobPart], { type }));
      page.announce(`Saved as ${name}.`);
      if (told.length > 0) page.trouble(`Saved as ${name}. ${told.join(" ")}`);
    },
  };
}
