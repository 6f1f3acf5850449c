import { createHash } from "node:crypto";
import { version } from "../version.js";
import { type ServedFolder, serveFolder } from "./serveFolder.js";

export type Serving =
  | { readonly is: "served"; readonly served: ServedFolder; readonly wanted: number }
  /** The same folder is served by another run of the command. */
  | { readonly is: "served already"; readonly address: string };

const portsTried = 20;

/** Serves a folder at a port or at the next one that is free, unless it is served there already. */
export async function serveSomewhere(folder: URL, wanted: number): Promise<Serving> {
  const signature = `barycell/${version} (${createHash("sha256").update(folder.href).digest("hex").slice(0, 12)})`;
  for (let port = wanted; ; port++) {
    const last = port === wanted + portsTried || port >= 65_535;
    try {
      return { is: "served", served: await serveFolder(folder, port, signature), wanted };
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== "EADDRINUSE" || last) throw error;
      const address = `http://127.0.0.1:${port}/`;
      if ((await signatureAt(address)) === signature) return { is: "served already", address };
    }
  }
}

async function signatureAt(address: string): Promise<string | null | undefined> {
  const answer = await fetch(address, { method: "HEAD", signal: AbortSignal.timeout(1000) }).catch(() => undefined);
  return answer?.headers.get("server");
}
