import { describe, expect, test } from "vitest";
import packageData from "../../../package.json" with { type: "json" };
import { schemaProblems } from "../../catalog/schemaProblems.js";
import { addinFolderFiles } from "./addinFolder.js";
import { manifestProblems } from "./manifestProblems.js";
import { pngSize } from "./pngSize.js";
import { elementsNamed, readXml } from "./readXml.js";

const files = addinFolderFiles();
const xml = files.get("manifest.xml")!.toString();
// Wherever the folder was last built for.
const base = /<IconUrl DefaultValue="(https:.*)\/assets\//.exec(xml)![1]!;
const unified = JSON.parse(files.get("manifest.json")!.toString());

function without(path: string): ReadonlyMap<string, Buffer> {
  return new Map([...files].filter(([name]) => name !== path));
}

describe("the XML manifest", () => {
  test("is one that a host takes", () => {
    expect(manifestProblems(xml, base, files)).toEqual([]);
  });

  test("has the version of the package", () => {
    expect(elementsNamed(readXml(xml), "Version")[0]!.text).toBe(`${packageData.version}.0`);
  });

  const planted: [string, string | RegExp, string, string][] = [
    ["a resource that is not there", 'resid="Group.Label"', 'resid="Group.Labels"', "no resource Group.Labels"],
    ["a resource twice", '<bt:Url id="Help.Url"', '<bt:Url id="Pane.Url"', "two resources Pane.Url"],
    ["a long resource name", /Group\.Label"/g, `Group.Label.${"x".repeat(25)}"`, "is longer than 32 characters"],
    [
      "a long short string",
      'DefaultValue="Barycell is ready"',
      `DefaultValue="${"x".repeat(126)}"`,
      "is longer than 125",
    ],
    ["a long long string", 'DefaultValue="Type =', `DefaultValue="${"x".repeat(250)}=`, "is longer than 250"],
    [
      "an address without https",
      `"${base}/help.html"/>\n  <App`,
      '"http://localhost/help.html"/>\n  <App',
      "not https",
    ],
    ["a page that is not there", `${base}/functions.js"`, `${base}/function.js"`, "no file function.js"],
    [
      "an icon of another size",
      `DefaultValue="${base}/assets/icon-16.png"`,
      `DefaultValue="${base}/assets/icon-32.png"`,
      "has 32 x 32 pixels, not 16",
    ],
    ["a button without an icon size", '<bt:Image size="80" resid="Icon.80"/>', "", "an icon has the sizes 16 32"],
    ["another namespace", 'DefaultValue="BARY"', 'DefaultValue="BARYCELL"', "the namespace is BARYCELL"],
    [
      "children in another order",
      /( *<Id>.*<\/Id>\n)( *<Version>.*<\/Version>\n)/,
      "$2$1",
      "children of OfficeApp are not in order",
    ],
    [
      "a form factor before the runtimes",
      /(<Runtimes>[\s\S]*<\/Runtimes>)(\s*)(<AllFormFactors>[\s\S]*<\/AllFormFactors>)/,
      "$3$2$1",
      "children of Host are not in order",
    ],
    ["functions without metadata", /<Metadata>[\s\S]*<\/Metadata>/, "", "ExtensionPoint has no Metadata"],
    [
      "a runtime of its own",
      '<FunctionFile resid="Pane.Url"/>',
      '<FunctionFile resid="Help.Url"/>',
      "not shared by one page",
    ],
    ["a runtime that ends", 'lifetime="long"', 'lifetime="short"', "does not live long"],
    ["no requirement", '<Set Name="SharedRuntime" MinVersion="1.1"/>', "", "a requirement is missing"],
    ["a place not filled in", "<ProviderName>Barycell", "<ProviderName>{{base}}", "was not filled in"],
  ];

  test.each(planted)("is refused with %s", (_, from, to, problem) => {
    const changed = xml.replace(from, to);
    expect(changed).not.toBe(xml);
    expect(manifestProblems(changed, base, files).join("\n")).toContain(problem);
  });

  test("is refused without an icon's file", () => {
    expect(manifestProblems(xml, base, without("assets/icon-80.png"))).toContain("no file assets/icon-80.png");
  });

  test("is refused where its elements do not close", () => {
    expect(() => manifestProblems(xml.replace("</Hosts>", ""), base, files)).toThrow();
  });
});

describe("the unified manifest", () => {
  const addresses = (text: string) =>
    [...text.matchAll(/"(https:[^"]*)"/g)].flatMap(([, url]) =>
      url!.startsWith(`${base}/`) ? url!.slice(base.length + 1) : [],
    );

  test("fits the host's schema", () => {
    expect(schemaProblems(undefined, unified)).toEqual([]);
    expect(schemaProblems(undefined, { ...unified, version: undefined })).not.toEqual([]);
    expect(schemaProblems(undefined, { ...unified, accentColor: "navy" })).not.toEqual([]);
  });

  test("names files that are there", () => {
    const named = [...addresses(JSON.stringify(unified)), ...Object.values<string>(unified.icons)];
    expect(named.filter((path) => !files.has(path))).toEqual([]);
  });

  // Sizes of the unified manifest's icons: 192 in colour, 32 as outline (learn.microsoft.com, manifest schema, "icons").
  test("has icons of the right size", () => {
    expect(pngSize(files.get(unified.icons.color)!)).toEqual({ width: 192, height: 192 });
    expect(pngSize(files.get(unified.icons.outline)!)).toEqual({ width: 32, height: 32 });
    const icons = JSON.stringify(unified.extensions).matchAll(/"size":(\d+),"url":"([^"]+)"/g);
    const found = [...icons].map(([, size, path]) => [
      Number(size),
      pngSize(files.get(path!.slice(base.length + 1))!).width,
    ]);
    expect(found).toHaveLength(6);
    for (const [size, width] of found) expect(width).toBe(size);
  });

  test("says the same as the XML manifest", () => {
    const root = readXml(xml);
    expect(unified.id).toBe(elementsNamed(root, "Id")[0]!.text);
    expect(unified.version).toBe(packageData.version);
    const [runtime] = unified.extensions[0].runtimes;
    expect(runtime.customFunctions.namespace.id).toBe("BARY");
    const sets = elementsNamed(root, "Set").map(({ attributes }) => [attributes.Name, attributes.MinVersion]);
    const capabilities = unified.extensions[0].requirements.capabilities as { name: string; minVersion: string }[];
    expect(capabilities.map(({ name, minVersion }) => [name, minVersion]).sort()).toEqual(sets.sort());
  });
});
