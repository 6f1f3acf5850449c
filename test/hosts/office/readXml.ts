export interface Element {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: Element[];
  text: string;
}

/** Reads an XML document without comments, entities or CDATA, as manifests are; anything out of order is an error. */
export function readXml(xml: string): Element {
  const root: Element = { name: "", attributes: {}, children: [], text: "" };
  const open = [root];
  const rest = xml.replace(/^<\?xml[^?]*\?>/, "").replace(/<(\/?)([\w:]+)([^<>]*?)(\/?)>|([^<]+)/g, (...found) => {
    const [, closing, name, attributes, empty, text] = found as string[];
    const parent = open.at(-1)!;
    if (text !== undefined) {
      parent.text += text;
    } else if (closing) {
      if (open.pop()!.name !== name) throw new Error(`</${name}> closes nothing`);
    } else {
      const element: Element = { name: name!, attributes: readAttributes(attributes!), children: [], text: "" };
      parent.children.push(element);
      if (!empty) open.push(element);
    }
    return "";
  });
  if (rest !== "" || open.length !== 1 || root.children.length !== 1) throw new Error(`not one element: ${rest}`);
  return root.children[0]!;
}

function readAttributes(text: string): Record<string, string> {
  const attributes: Record<string, string> = {};
  const rest = text.replace(/\s+([\w:]+)="([^"<]*)"/g, (_, name: string, value: string) => {
    attributes[name] = value;
    return "";
  });
  if (rest.trim() !== "") throw new Error(`attributes are not in order: ${rest}`);
  return attributes;
}

/** All elements of a name below an element, in the order of the document. */
export function elementsNamed(element: Element, name: string): Element[] {
  return element.children.flatMap((child) => [...(child.name === name ? [child] : []), ...elementsNamed(child, name)]);
}
