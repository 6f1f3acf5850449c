import type { Parts } from "../read/parts.js";

const application = "Barycell";

export const appPartName = "docProps/app.xml";

/** Says which program wrote the file. */
export function appPart(): string {
  const space = "http://schemas.openxmlformats.org/officeDocument/2006/extended-properties";
  return `<Properties xmlns="${space}"><Application>${application}</Application></Properties>`;
}

/** Whether the file was last written by this program, so that its values are those of its formulas. */
export function isOwnFile(parts: Parts): boolean {
  const entry = parts.find(appPartName);
  let current = "";
  let found = "";
  if (entry !== undefined) {
    parts.scan(entry, {
      open(name) {
        current = name;
      },
      close() {
        current = "";
      },
      text(piece) {
        found += current === "Application" ? piece : "";
      },
    });
  }
  return found === application;
}
