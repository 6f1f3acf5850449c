import { strFromU8, unzipSync } from "fflate";
import { SaxesParser } from "saxes";

interface Element {
  readonly name: string;
  readonly attributes: ReadonlyMap<string, string>;
  readonly children: Element[];
  text: string;
}

/** An XML text as a tree, read by a general parser that refuses what is not well-formed and what has no name space. */
function parse(xml: string): Element {
  const root: Element = { name: "", attributes: new Map(), children: [], text: "" };
  const open = [root];
  const parser = new SaxesParser({ xmlns: true });
  parser.on("opentag", ({ local, attributes }) => {
    const values = Object.values(attributes).map(({ name, value }): [string, string] => [name, value]);
    const element: Element = { name: local, attributes: new Map(values), children: [], text: "" };
    open.at(-1)?.children.push(element);
    open.push(element);
  });
  parser.on("closetag", () => void open.pop());
  parser.on("text", (text) => {
    (open.at(-1) as Element).text += text;
  });
  parser.write(xml).close();
  return root.children[0] as Element;
}

/** The order of elements in CT_Worksheet, CT_Workbook, CT_Stylesheet (ECMA-376 part 1, annex A.2); those that matter here. */
const orders: Readonly<Record<string, readonly string[]>> = {
  worksheet: ["sheetPr", "dimension", "sheetViews", "sheetFormatPr", "cols", "sheetData", "mergeCells"],
  workbook: ["fileVersion", "workbookPr", "bookViews", "sheets", "externalReferences", "definedNames", "calcPr"],
  styleSheet: ["numFmts", "fonts", "fills", "borders", "cellStyleXfs", "cellXfs", "cellStyles", "dxfs"],
  sst: ["si"],
  metadata: ["metadataTypes", "metadataStrings", "mdxMetadata", "futureMetadata", "cellMetadata", "valueMetadata"],
};

/** What of a written workbook breaks the rules of ECMA-376 that worksheet programs hold files to. */
export function packageProblems(bytes: Uint8Array): string[] {
  const problems: string[] = [];
  const files = new Map(Object.entries(unzipSync(bytes)).map(([name, content]) => [name, strFromU8(content)]));
  const trees = new Map([...files].map(([name, xml]) => [name, parse(xml)]));
  const must = (holds: boolean, what: string) => {
    if (!holds) {
      problems.push(what);
    }
  };
  checkContentTypes(trees, must);
  checkRelationships(trees, must);
  for (const [name, tree] of trees) {
    const order = orders[tree.name];
    if (order !== undefined) {
      const places = tree.children.map((each) => order.indexOf(each.name));
      must(
        places.every((place, index) => place >= 0 && place >= (places[index - 1] ?? 0)),
        `${name}: order of elements`,
      );
    }
  }
  const styles = trees.get("xl/styles.xml") as Element;
  const strings = trees.get("xl/sharedStrings.xml") as Element;
  const metadata = trees.get("xl/metadata.xml") as Element;
  for (const group of [...styles.children, ...metadata.children]) {
    must(Number(group.attributes.get("count")) === group.children.length, `${group.name}: count`);
  }
  checkStyles(styles, must);
  let uses = 0;
  for (const [name, tree] of trees) {
    if (tree.name === "worksheet") {
      uses += checkSheet(name, tree, { styles, strings, metadata }, must);
    }
  }
  must(Number(strings.attributes.get("count")) === uses, "shared strings: count");
  must(Number(strings.attributes.get("uniqueCount")) === strings.children.length, "shared strings: uniqueCount");
  return problems;
}

type Must = (holds: boolean, what: string) => void;
type Trees = ReadonlyMap<string, Element>;

/** ECMA-376 part 2, section 7.2.3: every part has a type, none is named that is not there. */
function checkContentTypes(trees: Trees, must: Must): void {
  const types = trees.get("[Content_Types].xml") as Element;
  const overrides = types.children.filter(({ name }) => name === "Override").map((each) => each.attributes.get("PartName")?.slice(1) ?? ""); // biome-ignore format: one list
  must(new Set(overrides).size === overrides.length, "content types: one each");
  for (const name of overrides) {
    must(trees.has(name), `content types: ${name} is not there`);
  }
  for (const name of trees.keys()) {
    must(
      name === "[Content_Types].xml" || name.endsWith(".rels") || overrides.includes(name),
      `content types: ${name}`,
    );
  }
}

/** Section 6.5: targets exist, identifiers are unique. */
function checkRelationships(trees: Trees, must: Must): void {
  for (const [name, tree] of trees) {
    if (tree.name === "Relationships") {
      const folder = name.replace(/_rels\/[^/]*$/, "");
      const ids = tree.children.map((each) => each.attributes.get("Id"));
      must(new Set(ids).size === ids.length, `${name}: identifiers`);
      for (const each of tree.children) {
        must(trees.has(folder + each.attributes.get("Target")), `${name}: ${each.attributes.get("Target")}`);
      }
    }
  }
  const workbook = trees.get("xl/workbook.xml") as Element;
  const known = (trees.get("xl/_rels/workbook.xml.rels") as Element).children.map((each) => each.attributes.get("Id"));
  for (const sheet of childrenOf(workbook, "sheets")) {
    must(known.includes(sheet.attributes.get("r:id")), "workbook: a sheet without its part");
  }
  const sheets = childrenOf(workbook, "sheets");
  must(
    sheets.some((each) => each.attributes.get("state") === undefined),
    "workbook: a sheet that is shown",
  );
}

function checkStyles(styles: Element, must: Must): void {
  const formats = new Set(childrenOf(styles, "numFmts").map((each) => Number(each.attributes.get("numFmtId"))));
  const bases = childrenOf(styles, "cellStyleXfs").length;
  for (const xf of childrenOf(styles, "cellXfs")) {
    const id = Number(xf.attributes.get("numFmtId"));
    must(id < 164 || formats.has(id), `styles: format ${id}`);
    must(Number(xf.attributes.get("xfId")) < bases, "styles: base style");
    for (const [attribute, group] of [
      ["fontId", "fonts"],
      ["fillId", "fills"],
      ["borderId", "borders"],
    ] as const) {
      // biome-ignore format: three pairs
      must(Number(xf.attributes.get(attribute)) < childrenOf(styles, group).length, `styles: ${attribute}`);
    }
  }
}

/** Section 18.3.1: rows and cells in order, every index within its list. Returns how many texts it names. */
function checkSheet(
  name: string,
  sheet: Element,
  lists: Record<"styles" | "strings" | "metadata", Element>,
  must: Must,
): number {
  // biome-ignore format: one signature
  let uses = 0;
  let lastRow = 0;
  const styles = childrenOf(lists.styles, "cellXfs").length;
  const shared = new Set<string>();
  for (const row of childrenOf(sheet, "sheetData")) {
    const number = Number(row.attributes.get("r"));
    must(number > lastRow, `${name}: row ${number}`);
    lastRow = number;
    let lastColumn = "";
    for (const cell of row.children) {
      const address = cell.attributes.get("r") ?? "";
      const [, letters = "", digits = ""] = /^([A-Z]+)(\d+)$/.exec(address) ?? [];
      must(Number(digits) === number, `${name}: ${address} in row ${number}`);
      must(letters.length > lastColumn.length || (letters.length === lastColumn.length && letters > lastColumn), `${name}: ${address} out of order`); // biome-ignore format: one rule
      lastColumn = letters;
      must(Number(cell.attributes.get("s") ?? 0) < styles, `${name}: style of ${address}`);
      const type = cell.attributes.get("t");
      must(type === undefined || ["b", "e", "n", "s", "str"].includes(type), `${name}: type of ${address}`);
      must(
        cell.children
          .map((each) => each.name)
          .join(" ")
          .match(/^(f )?v$|^f?$/) !== null,
        `${name}: content of ${address}`,
      );
      const [formula] = cell.children.filter((each) => each.name === "f");
      const [value] = cell.children.filter((each) => each.name === "v");
      if (type === "s") {
        uses++;
        must(Number(value?.text) < lists.strings.children.length, `${name}: text of ${address}`);
      }
      const meta = cell.attributes.get("cm");
      must((meta !== undefined) === (formula?.attributes.get("t") === "array"), `${name}: cm of ${address}`);
      must(meta === undefined || Number(meta) <= childrenOf(lists.metadata, "cellMetadata").length, `${name}: cm of ${address}`); // biome-ignore format: one rule
      checkFormula(name, address, formula, shared, must);
    }
  }
  return uses;
}

/** Section 18.3.1.40: a shared formula is written out in the first cell of its range, the others name it. */
function checkFormula(
  name: string,
  address: string,
  formula: Element | undefined,
  shared: Set<string>,
  must: Must,
): void {
  // biome-ignore format: one signature
  if (formula === undefined) {
    return;
  }
  const { attributes, text } = formula;
  must(!text.startsWith("="), `${name}: "=" in ${address}`);
  must(
    attributes.get("t") !== "array" || attributes.get("ref")?.split(":")[0] === address,
    `${name}: range of ${address}`,
  );
  const index = attributes.get("si");
  must((index !== undefined) === (attributes.get("t") === "shared"), `${name}: shared formula of ${address}`);
  if (index !== undefined) {
    const isFirst = attributes.has("ref");
    must(isFirst === !shared.has(index) && isFirst === (text !== ""), `${name}: shared formula of ${address}`);
    shared.add(index);
  } else {
    must(text !== "", `${name}: formula of ${address} is empty`);
  }
}

function childrenOf(parent: Element, name: string): readonly Element[] {
  return parent.children.find((each) => each.name === name)?.children ?? [];
}
