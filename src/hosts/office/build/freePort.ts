import { createServer } from "node:net";

/** The first port from `port` on that nothing listens at. */
export async function freePort(port: number): Promise<number> {
  return (await isFree(port)) ? port : freePort(port + 1);
}

function isFree(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const server = createServer();
    server.once("error", () => resolve(false));
    server.listen(port, "localhost", () => server.close(() => resolve(true)));
  });
}
