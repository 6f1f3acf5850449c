import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import webpack from "webpack";
import { panePage } from "../../../../src/hosts/office/build/panePage.js";

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));
const source = "../../../../src/hosts/office/pane";

/** The pane as it is hosted, with the stand-in in the place of the host's library; by their names in the folder. */
export async function paneFiles(): Promise<ReadonlyMap<string, string>> {
  const folder = await mkdtemp(join(tmpdir(), "pane-"));
  try {
    await bundle(folder);
    const [pane, office, page, style] = await Promise.all([
      readFile(join(folder, "pane.js"), "utf8"),
      readFile(join(folder, "office.js"), "utf8"),
      readFile(at(`${source}/pane.html`), "utf8"),
      readFile(at(`${source}/pane.css`), "utf8"),
    ]);
    return new Map([
      ["pane.html", panePage(page).replace(/https:[^"]*\/office\.js/, "office.js")],
      ["pane.css", style],
      ["pane.js", pane],
      ["functions.js", ""],
      ["office.js", office],
    ]);
  } finally {
    await rm(folder, { recursive: true });
  }
}

function bundle(folder: string): Promise<void> {
  const options = { transpileOnly: true, configFile: at("../../../../tsconfig.json") };
  const compiler = webpack({
    mode: "production",
    devtool: false,
    target: ["web", "es2022"],
    entry: { pane: at(`${source}/main.ts`), office: at("standIn/page.ts") },
    output: { path: folder, filename: "[name].js" },
    module: { rules: [{ test: /\.ts$/, loader: "ts-loader", options }] },
    resolve: { extensions: [".ts", ".js"], extensionAlias: { ".js": [".ts", ".js"] } },
    optimization: { minimize: false },
    performance: { hints: false },
  });
  return new Promise((resolve, reject) => {
    compiler?.run((error, stats) => {
      if (error || stats?.hasErrors()) reject(error ?? new Error(stats?.toString("errors-only")));
      else compiler.close(() => resolve());
    });
  });
}
