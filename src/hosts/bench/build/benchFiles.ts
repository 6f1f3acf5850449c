import { readFile } from "node:fs/promises";
import packageData from "../../../../package.json" with { type: "json" };
import { benchPage } from "./benchPage.js";
import { styleSheet } from "./styleSheet.js";
import { webManifest } from "./webManifest.js";

const root = new URL("../../../../", import.meta.url);
const page = new URL("src/hosts/bench/page/", root);

/** Every file of the page's folder that is not a script, under its path there. */
export async function benchFiles(): Promise<ReadonlyMap<string, string | Buffer>> {
  return new Map<string, string | Buffer>([
    ["index.html", benchPage(await readFile(new URL("index.html", page), "utf8"))],
    ["bench.css", await styleSheet(page)],
    ["manifest.webmanifest", webManifest(packageData.version)],
    ["icons/barycell.svg", await readFile(new URL("manifest/icons/barycell.svg", root))],
    ["icons/icon-192.png", await readFile(new URL("manifest/icons/icon-192.png", root))],
  ]);
}
