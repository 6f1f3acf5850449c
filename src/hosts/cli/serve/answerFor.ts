import { readdir, readFile } from "node:fs/promises";
import { extname, sep } from "node:path";
import { fileURLToPath } from "node:url";
import { localPolicy } from "../../localPolicy.js";

export interface Asked {
  readonly method: string;
  /** As it came, not decoded. */
  readonly path: string;
  /** The Host header: where the browser believes it is. */
  readonly host: string | undefined;
}

export interface Answer {
  readonly status: number;
  readonly headers: Readonly<Record<string, string>>;
  readonly body: string | Buffer;
}

const types: Readonly<Record<string, string>> = {
  ".html": "text/html; charset=utf-8",
  ".js": "text/javascript; charset=utf-8",
  ".css": "text/css; charset=utf-8",
  ".json": "application/json",
  ".webmanifest": "application/manifest+json",
  ".svg": "image/svg+xml",
  ".png": "image/png",
  ".woff2": "font/woff2",
};

const always: Readonly<Record<string, string>> = {
  "Content-Security-Policy": `${localPolicy}; frame-ancestors 'none'`,
  "X-Content-Type-Options": "nosniff",
  "Referrer-Policy": "no-referrer",
  "Cross-Origin-Opener-Policy": "same-origin",
  "Cross-Origin-Resource-Policy": "same-origin",
  "Cache-Control": "no-cache",
};

/**
 * What the server at `home` (127.0.0.1 and its port) says. Only a name that the folder lists is served, so no path leads
 * out of it. A page of another name that was pointed at this machine is refused by the Host header; localhost is sent on,
 * as a browser keeps the books of each address apart.
 */
export async function answerFor(asked: Asked, folder: URL, home: string): Promise<Answer> {
  const port = home.slice(home.lastIndexOf(":"));
  if (asked.host === `localhost${port}`) return sentOn(`http://${home}${pathOnly(asked.path)}`);
  if (asked.host !== home) return said(403, `This server answers to http://${home}/ alone.`);
  if (asked.method !== "GET" && asked.method !== "HEAD") {
    return said(405, "This server only gives files.", { Allow: "GET, HEAD" });
  }
  const name = decoded(asked.path);
  const file = name === "" ? "index.html" : name;
  const type = types[extname(file ?? "")];
  const names = await readdir(folder, { recursive: true });
  if (file === undefined || type === undefined || !names.some((each) => each.replaceAll(sep, "/") === file)) {
    return said(404, "There is no such file.");
  }
  const body = await readFile(fileURLToPath(folder) + file);
  return { status: 200, headers: { ...always, "Content-Type": type }, body };
}

function decoded(path: string): string | undefined {
  try {
    return decodeURIComponent(pathOnly(path).slice(1));
  } catch {
    return undefined;
  }
}

function pathOnly(path: string): string {
  return path.startsWith("/") ? (path.split(/[?#]/)[0] as string) : "/";
}

function sentOn(address: string): Answer {
  return said(308, `The page is at ${address}`, { Location: address });
}

function said(status: number, text: string, headers: Readonly<Record<string, string>> = {}): Answer {
  return { status, headers: { ...always, "Content-Type": "text/plain; charset=utf-8", ...headers }, body: `${text}\n` };
}
