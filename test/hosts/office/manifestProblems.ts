import { pngSize } from "./pngSize.js";
import { type Element, elementsNamed, readXml } from "./readXml.js";

/**
 * The order of children that the host's schemas of manifests ask for (learn.microsoft.com, "Office add-ins XML manifest"
 * reference); those that must be there are not marked with "?".
 */
const order: Readonly<Record<string, readonly string[]>> = {
  OfficeApp: [
    "Id",
    "AlternateId?",
    "Version",
    "ProviderName",
    "DefaultLocale",
    "DisplayName",
    "Description",
    "IconUrl",
    "HighResolutionIconUrl",
    "SupportUrl",
    "AppDomains?",
    "Hosts",
    "Requirements?",
    "DefaultSettings",
    "Permissions",
    "VersionOverrides",
  ],
  VersionOverrides: ["Description?", "Requirements?", "Hosts", "Resources"],
  "Host Workbook": ["Runtimes", "AllFormFactors", "DesktopFormFactor"],
  "ExtensionPoint CustomFunctions": ["Script", "Page", "Metadata", "Namespace"],
  DesktopFormFactor: ["GetStarted?", "FunctionFile", "ExtensionPoint"],
  GetStarted: ["Title", "Description", "LearnMoreUrl"],
  Group: ["Label", "Icon", "Control"],
  "Control Button": ["Label", "Supertip", "Icon", "Action"],
  Supertip: ["Title", "Description"],
  Resources: ["bt:Images", "bt:Urls", "bt:ShortStrings", "bt:LongStrings"],
};

const longest: Readonly<Record<string, number>> = { "bt:ShortStrings": 125, "bt:LongStrings": 250 };

/** What a worksheet host would refuse of the add-in's XML manifest, or leave out without a word. */
export function manifestProblems(xml: string, base: string, files: ReadonlyMap<string, Buffer>): string[] {
  const root = readXml(xml);
  const all = [root, ...everyElement(root)];
  const resources = ["bt:Image", "bt:Url", "bt:String"]
    .flatMap((name) => elementsNamed(root, name))
    .filter(({ attributes }) => attributes.id);
  const ids = resources.map(({ attributes }) => attributes.id!);
  const valueNamed = (id: string | undefined) =>
    resources.find(({ attributes }) => attributes.id === id)?.attributes.DefaultValue;
  const used = all.flatMap(({ attributes }) => attributes.resid ?? []);
  const addresses = all.flatMap(({ name, attributes: { DefaultValue: value } }) =>
    value !== undefined && (/Url$|SourceLocation|bt:Image/.test(name) || value.startsWith("http")) ? [value] : [],
  );
  return [
    ...all.flatMap(orderProblems),
    ...ids.filter((id, index) => ids.indexOf(id) < index).map((id) => `two resources ${id}`),
    ...ids.filter((id) => id.length > 32).map((id) => `resource ${id} is longer than 32 characters`),
    ...ids.filter((id) => !used.includes(id)).map((id) => `resource ${id} is not used`),
    ...used.filter((id) => !ids.includes(id)).map((id) => `no resource ${id}`),
    ...Object.entries(longest).flatMap(([group, most]) =>
      elementsNamed(root, group).flatMap(({ children }) =>
        children
          .filter(({ attributes }) => (attributes.DefaultValue?.length ?? 0) > most)
          .map(({ attributes }) => `${attributes.id} is longer than ${most} characters`),
      ),
    ),
    ...addresses.filter((address) => !address.startsWith("https://")).map((address) => `not https: ${address}`),
    ...addresses
      .filter((address) => address.startsWith(`${base}/`) && !files.has(address.slice(base.length + 1)))
      .map((address) => `no file ${address.slice(base.length + 1)}`),
    ...iconProblems(root, valueNamed, base, files),
    ...runtimeProblems(root, valueNamed),
    ...(/\{\{/.test(xml) ? ["a place was not filled in"] : []),
  ];
}

function everyElement(element: Element): Element[] {
  return element.children.flatMap((child) => [child, ...everyElement(child)]);
}

function orderProblems(element: Element): string[] {
  const wanted = order[`${element.name} ${element.attributes["xsi:type"] ?? ""}`.trim()] ?? order[element.name];
  if (!wanted) return [];
  const names = wanted.map((name) => name.replace("?", ""));
  const places = element.children.map(({ name }) => names.indexOf(name));
  const missing = wanted.filter(
    (name) => !name.endsWith("?") && !element.children.some((child) => child.name === name),
  );
  return [
    ...missing.map((name) => `${element.name} has no ${name}`),
    ...(places.includes(-1) ? [`${element.name} has a child that does not belong there`] : []),
    ...(places.some((place, index) => index > 0 && place < places[index - 1]!)
      ? [`the children of ${element.name} are not in order`]
      : []),
  ];
}

type ValueNamed = (id: string | undefined) => string | undefined;

function iconProblems(
  root: Element,
  valueNamed: ValueNamed,
  base: string,
  files: ReadonlyMap<string, Buffer>,
): string[] {
  const icons = elementsNamed(root, "Icon");
  const named = icons.flatMap(({ children }) =>
    children.map(({ attributes }) => [valueNamed(attributes.resid), Number(attributes.size)] as const),
  );
  const own = (
    [
      ["IconUrl", 32],
      ["HighResolutionIconUrl", 64],
    ] as const
  ).map(([name, size]) => [elementsNamed(root, name)[0]?.attributes.DefaultValue, size] as const);
  const sizes = icons.map(({ children }) => children.map(({ attributes }) => attributes.size).join(" "));
  return [
    ...sizes.filter((text) => text !== "16 32 80").map((text) => `an icon has the sizes ${text}`),
    ...[...own, ...named].flatMap(([address, size]) => {
      const file = files.get(address?.slice(base.length + 1) ?? "");
      if (!file) return [`no icon of ${size} pixels at ${address}`];
      const { width, height } = pngSize(file);
      return width === size && height === size ? [] : [`${address} has ${width} x ${height} pixels, not ${size}`];
    }),
  ];
}

/** One page for functions, commands and pane is what makes the runtime shared. */
function runtimeProblems(root: Element, valueNamed: ValueNamed): string[] {
  const [runtime] = elementsNamed(root, "Runtime");
  const page = runtime?.attributes.resid;
  const pages = [
    elementsNamed(root, "Page")[0]?.children[0]?.attributes.resid,
    elementsNamed(root, "FunctionFile")[0]?.attributes.resid,
    elementsNamed(root, "Action")[0]?.children[0]?.attributes.resid,
  ];
  const sets = elementsNamed(root, "Set").map(({ attributes }) => attributes.Name);
  const settings = elementsNamed(root, "DefaultSettings")[0]?.children[0]?.attributes.DefaultValue;
  const namespace = valueNamed(elementsNamed(root, "Namespace")[0]?.attributes.resid);
  return [
    ...(runtime?.attributes.lifetime === "long" ? [] : ["the runtime does not live long"]),
    ...(pages.every((id) => id === page) && settings === valueNamed(page)
      ? []
      : ["the runtime is not shared by one page"]),
    ...(sets.includes("SharedRuntime") && sets.includes("CustomFunctionsRuntime") ? [] : ["a requirement is missing"]),
    ...(namespace === "BARY" ? [] : [`the namespace is ${namespace}`]),
  ];
}
