import { once } from "node:events";
import { createServer, type IncomingMessage, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";
import { answerFor } from "./answerFor.js";

export interface ServedFolder {
  readonly address: string;
  readonly port: number;
  close(): Promise<void>;
}

const machine = "127.0.0.1";

/** Serves a folder on this machine alone. Rejects with the system's error where the port is taken; 0 takes any. */
export async function serveFolder(folder: URL, port: number, signature: string): Promise<ServedFolder> {
  let home = "";
  const server = createServer((request, response) => void respond(request, response));
  async function respond(request: IncomingMessage, response: ServerResponse): Promise<void> {
    const { method = "", url = "/", headers } = request;
    const answer = await answerFor({ method, path: url, host: headers.host }, folder, home).catch(() => undefined);
    if (answer === undefined) {
      response.writeHead(500).end();
      return;
    }
    const length = Buffer.byteLength(answer.body);
    response.writeHead(answer.status, { ...answer.headers, Server: signature, "Content-Length": length });
    response.end(method === "HEAD" ? undefined : answer.body);
  }
  server.listen(port, machine);
  await once(server, "listening");
  const at = (server.address() as AddressInfo).port;
  home = `${machine}:${at}`;
  return {
    address: `http://${home}/`,
    port: at,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
