import { readdir, readFile } from "node:fs/promises";
import packageData from "../../../../package.json" with { type: "json" };
import { functionsJson } from "../../../catalog/functionsJson.js";
import { helpPage } from "../../../catalog/helpPage.js";
import { fillTemplate } from "./fillTemplate.js";
import { panePage } from "./panePage.js";

const root = new URL("../../../../", import.meta.url);

/** Every file of the add-in's folder that is not a script, under its path there. `base` is where the folder is hosted. */
export async function addinFiles(base: string): Promise<ReadonlyMap<string, string | Buffer>> {
  const files = new Map<string, string | Buffer>();
  for (const name of ["manifest.xml", "manifest.json"]) {
    files.set(name, fillTemplate(await text(`manifest/${name}`), base, packageData.version));
  }
  files.set("functions.json", JSON.stringify(functionsJson(`${base}/help.html`), undefined, 1));
  files.set("help.html", helpPage());
  files.set("help.css", await text("manifest/help.css"));
  files.set("pane.html", panePage(await text("src/hosts/office/pane/pane.html")));
  files.set("pane.css", await text("src/hosts/office/pane/pane.css"));
  for (const name of await readdir(new URL("manifest/icons/", root))) {
    if (name.endsWith(".png")) files.set(`assets/${name}`, await readFile(new URL(`manifest/icons/${name}`, root)));
  }
  return files;
}

function text(path: string): Promise<string> {
  return readFile(new URL(path, root), "utf8");
}
