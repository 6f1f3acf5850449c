import { createHash } from "node:crypto";

/** Not the service worker itself, nor what nobody needs to run the page. */
const isKept = (name: string): boolean => !/^service-worker\.js$|\.(?:map|txt)$/.test(name);

/**
 * The first line of the service worker: the files it keeps, each with the digest that tells one version from another.
 * As the line changes with every file, the browser notices a new version.
 */
export function keptFilesLine(files: ReadonlyMap<string, string | Buffer>): string {
  const digests = [...files]
    .filter(([name]) => isKept(name))
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, content]) => [name, `sha256-${createHash("sha256").update(content).digest("base64")}`]);
  return `const keptFiles = ${JSON.stringify(Object.fromEntries(digests))};\n`;
}
