import { execFile } from "node:child_process";
import { readdir, stat, utimes } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import { promisify } from "node:util";

const root = fileURLToPath(new URL("..", import.meta.url));
const built = [
  "dist/cli.js",
  "dist/index.js",
  "dist/addin/functions.js",
  "dist/addin/pane.js",
  "dist/bench/main.js",
  "dist/bench/worker.js",
];
const settings = ["webpack.config.js", "package.json", "tsconfig.json"];

/** The command is tested as it is shipped: built here, unless it is newer than all it is made of. */
export default async function buildDist(): Promise<void> {
  const sources = (await Promise.all(["src", "manifest"].map(filesIn))).flat();
  const [oldest, newest] = [await changes(built), await changes([...settings, ...sources])];
  if (Math.max(...newest) <= Math.min(...oldest)) return;
  const begun = new Date();
  const words = ["node_modules/webpack/bin/webpack.js", "--mode", "production"];
  await promisify(execFile)(process.execPath, words, { cwd: root, maxBuffer: 1 << 26 }).catch((error) => {
    throw new Error(`the build failed:\n${error.stdout}${error.stderr}`);
  });
  // What came out as it was before is not written anew.
  await Promise.all(built.map((path) => utimes(`${root}/${path}`, begun, begun)));
}

async function filesIn(folder: string): Promise<string[]> {
  return (await readdir(`${root}/${folder}`, { recursive: true })).map((path) => `${folder}/${path}`);
}

/** When each file was last changed [ms]; long ago where it is not there. */
function changes(paths: readonly string[]): Promise<number[]> {
  return Promise.all(
    paths.map((path) =>
      stat(`${root}/${path}`).then(
        ({ mtimeMs }) => mtimeMs,
        () => 0,
      ),
    ),
  );
}
