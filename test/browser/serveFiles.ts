import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { extname } from "node:path";

const types: Readonly<Record<string, string>> = {
  ".html": "text/html; charset=utf-8",
  ".js": "text/javascript; charset=utf-8",
  ".css": "text/css; charset=utf-8",
  ".json": "application/json",
  ".png": "image/png",
};

export interface Served {
  readonly base: string;
  close(): Promise<void>;
}

/** Files by their path, as any static server would serve them; gone when closed. */
export async function serveFiles(files: ReadonlyMap<string, Buffer>): Promise<Served> {
  const server = createServer((request, answer) => {
    const path = new URL(request.url ?? "/", "http://localhost").pathname.slice(1);
    const file = files.get(path);
    if (!file) return answer.writeHead(404).end();
    return answer.writeHead(200, { "Content-Type": types[extname(path)] ?? "text/plain" }).end(file);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  return {
    base: `http://127.0.0.1:${(server.address() as AddressInfo).port}/`,
    close: () =>
      new Promise((resolve) => {
        server.closeAllConnections();
        server.close(() => resolve());
      }),
  };
}
