import { mkdir, mkdtemp, rm, writeFile } from "node:fs/promises";
import { request } from "node:http";
import { connect } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { type ServedFolder, serveFolder } from "../../../src/hosts/cli/serve/serveFolder.js";

let outer: string;
let served: ServedFolder;

beforeAll(async () => {
  outer = await mkdtemp(join(tmpdir(), "barycell-serve-"));
  await writeFile(join(outer, "secret.html"), "secret");
  const folder = join(outer, "bench");
  await mkdir(join(folder, "icons"), { recursive: true });
  const files = { "index.html": "<p>page", "main.js": "1", "bench.css": "a{}", "manifest.webmanifest": "{}" };
  for (const [name, text] of Object.entries({ ...files, "icons/i.svg": "<svg/>", "notes.txt": "t" })) {
    await writeFile(join(folder, name), text);
  }
  served = await serveFolder(pathToFileURL(`${folder}/`), 0, "barycell/test");
});

afterAll(async () => {
  await served?.close();
  await rm(outer, { recursive: true, force: true });
});

interface Got {
  readonly status: number;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
  readonly body: string;
}

/** As a browser asks, with any Host header and a path that nothing tidies up. */
function get(path: string, headers: Record<string, string> = {}, method = "GET"): Promise<Got> {
  return new Promise((resolve, reject) => {
    const asked = request({ host: "127.0.0.1", port: served.port, path, method, headers }, (answer) => {
      let body = "";
      answer.on("data", (piece) => {
        body += piece;
      });
      answer.on("end", () => resolve({ status: answer.statusCode ?? 0, headers: answer.headers, body }));
    });
    asked.once("error", reject);
    asked.end();
  });
}

describe("a served folder", () => {
  test.each([
    ["/", "text/html; charset=utf-8", "<p>page"],
    ["/index.html?x=1", "text/html; charset=utf-8", "<p>page"],
    ["/main.js", "text/javascript; charset=utf-8", "1"],
    ["/bench.css", "text/css; charset=utf-8", "a{}"],
    ["/manifest.webmanifest", "application/manifest+json", "{}"],
    ["/icons/i.svg", "image/svg+xml", "<svg/>"],
  ])("gives %s as %s", async (path, type, body) => {
    const got = await get(path);
    expect(got).toMatchObject({ status: 200, body });
    expect(got.headers["content-type"]).toBe(type);
  });

  test("says in every answer what the page may reach: nothing but itself", async () => {
    for (const path of ["/", "/main.js", "/missing"]) {
      const { headers } = await get(path);
      expect(headers["content-security-policy"]).toBe(
        "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data: blob:; font-src 'self'; connect-src 'self'; worker-src 'self'; manifest-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
      );
      expect(headers["x-content-type-options"]).toBe("nosniff");
      expect(headers["cross-origin-resource-policy"]).toBe("same-origin");
      expect(headers["access-control-allow-origin"]).toBeUndefined();
    }
  });

  test("HEAD is GET without the body; other methods are refused", async () => {
    const head = await get("/main.js", {}, "HEAD");
    expect(head).toMatchObject({ status: 200, body: "" });
    expect(head.headers["content-length"]).toBe("1");
    expect(await get("/main.js", {}, "POST")).toMatchObject({ status: 405, headers: { allow: "GET, HEAD" } });
  });

  test.each([
    "/../secret.html",
    "/icons/../../secret.html",
    "/..%2fsecret.html",
    "/%2e%2e/secret.html",
    "/..%5csecret.html",
    "/icons/..%2f..%2fsecret.html",
    "//secret.html",
    "/notes.txt",
    "/icons",
    "/icons/",
    "/%00",
    "/%",
    "/main.js%00.html",
  ])("does not give %s", async (path) => {
    const got = await get(path);
    expect(got.status).toBe(404);
    expect(got.body).not.toContain("secret");
  });

  test("is for pages of this address alone, so that no name pointed at this machine reaches it", async () => {
    for (const host of ["evil.test", `evil.test:${served.port}`, "127.0.0.1", "127.0.0.1:1", `[::1]:${served.port}`]) {
      expect(await get("/", { host })).toMatchObject({
        status: 403,
        body: `This server answers to ${served.address} alone.\n`,
      });
    }
    expect(await get("/main.js?x", { host: `localhost:${served.port}` })).toMatchObject({
      status: 308,
      headers: { location: `${served.address}main.js` },
    });
  });

  test("outlives requests that are no HTTP", async () => {
    await new Promise<void>((resolve) => {
      const socket = connect(served.port, "127.0.0.1", () => socket.end("nonsense\r\n\r\n"));
      socket.once("close", () => resolve());
      socket.resume();
    });
    expect((await get("/")).status).toBe(200);
  });
});
