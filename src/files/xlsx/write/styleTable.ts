import type { FormatSpan } from "../../../sheet/display/workbook.js";
import { builtInId, codeOf, firstOwnCode, formatOfCode } from "../formatCode.js";
import { styleName } from "../styleName.js";
import { escapeAttribute } from "../xml/xmlText.js";
import { mainSpace } from "./spaces.js";

/** The styles of a workbook in the making; cells name them by number. */
export interface StyleTable {
  indexOf(format: Pick<FormatSpan, "format" | "code"> | undefined): number;
  part(): string;
}

interface Style {
  readonly code: string;
  readonly name: string | undefined;
}

export function styleTable(): StyleTable {
  const styles: Style[] = [{ code: "General", name: undefined }];
  const known = new Map<string, number>([["General ", 0]]);
  return {
    indexOf(shown) {
      if (shown === undefined) {
        return 0;
      }
      const { format, code: given } = shown;
      // A code that does not go with the format any more was left behind when the format was changed.
      const isSame = given !== undefined && JSON.stringify(formatOfCode(given)) === JSON.stringify(format);
      const code = isSame ? given : codeOf(format);
      const name = isSame ? undefined : styleName(format);
      const key = `${code} ${name ?? ""}`;
      const index = known.get(key) ?? styles.length;
      if (index === styles.length) {
        known.set(key, index);
        styles.push({ code, name });
      }
      return index;
    },
    part: () => stylesPart(styles),
  };
}

function stylesPart(styles: readonly Style[]): string {
  const own = [...new Set(styles.map(({ code }) => code).filter((code) => builtInId(code) === undefined))];
  const idOf = (code: string): number => builtInId(code) ?? firstOwnCode + own.indexOf(code);
  const formats = own.map((code) => `<numFmt numFmtId="${idOf(code)}" formatCode="${escapeAttribute(code)}"/>`);
  const names = [...new Set(styles.flatMap(({ name }) => name ?? []))];
  const look = 'fontId="0" fillId="0" borderId="0"';
  const named = ["Normal", ...names];
  const bases = named.map(() => `<xf numFmtId="0" ${look}/>`);
  const cells = styles.map(({ code, name }) => {
    const base = name === undefined ? 0 : named.indexOf(name);
    return `<xf numFmtId="${idOf(code)}" ${look} xfId="${base}"${code === "General" ? "" : ' applyNumberFormat="1"'}/>`;
  });
  const titles = named.map(
    (name, index) =>
      `<cellStyle name="${escapeAttribute(name)}" xfId="${index}"${index === 0 ? ' builtinId="0"' : ""}/>`,
  );
  return [
    `<styleSheet xmlns="${mainSpace}">`,
    formats.length === 0 ? "" : counted("numFmts", formats),
    counted("fonts", ['<font><sz val="11"/><name val="Arial"/><family val="2"/></font>']),
    counted("fills", [
      '<fill><patternFill patternType="none"/></fill>',
      '<fill><patternFill patternType="gray125"/></fill>',
    ]),
    counted("borders", ["<border><left/><right/><top/><bottom/><diagonal/></border>"]),
    counted("cellStyleXfs", bases),
    counted("cellXfs", cells),
    counted("cellStyles", titles),
    "</styleSheet>",
  ].join("");
}

function counted(name: string, items: readonly string[]): string {
  return `<${name} count="${items.length}">${items.join("")}</${name}>`;
}
