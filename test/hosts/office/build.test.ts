import { mkdtemp, rm, stat } from "node:fs/promises";
import { createServer as createSecureServer, get } from "node:https";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { gzipSync } from "node:zlib";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { addinFiles } from "../../../src/hosts/office/build/addinFiles.js";
import { baseAddress } from "../../../src/hosts/office/build/baseAddress.js";
import { freePort } from "../../../src/hosts/office/build/freePort.js";
import { localhostCertificate } from "../../../src/hosts/office/build/localhostCertificate.js";
import { addinFolderFiles } from "./addinFolder.js";
import { manifestProblems } from "./manifestProblems.js";

describe("the built folder", () => {
  const files = addinFolderFiles();

  test("has functions that load fast: at most 130 kB gzipped", () => {
    expect(gzipSync(files.get("functions.js")!).length).toBeLessThanOrEqual(130_000);
  });

  test("holds what is hosted, and nothing else", () => {
    expect([...files.keys()].filter((path) => !/^assets\/\w+-\d+\.png$|LICENSE/.test(path)).sort()).toEqual([
      "functions.js",
      "functions.json",
      "help.css",
      "help.html",
      "manifest.json",
      "manifest.xml",
      "pane.css",
      "pane.html",
      "pane.js",
    ]);
  });
});

describe("a folder for another place", () => {
  test("names that place everywhere", async () => {
    const base = "https://tools.example.org/rv/barycell";
    const files = await addinFiles(base);
    const buffers = new Map([...files].map(([path, content]) => [path, Buffer.from(content)]));
    const scripts = ["functions.js", "pane.js"].map((name) => [name, Buffer.alloc(0)] as const);
    const xml = String(files.get("manifest.xml"));
    expect(manifestProblems(xml, base, new Map([...buffers, ...scripts]))).toEqual([]);
    expect(xml).toContain("<AppDomain>https://tools.example.org</AppDomain>");
    expect(JSON.parse(String(files.get("manifest.json"))).validDomains).toEqual(["tools.example.org"]);
    expect(String(files.get("functions.json"))).toContain(`"${base}/help.html#REFLEX"`);
    for (const [name, content] of files) expect(`${name} ${content}`).not.toContain("localhost");
  });

  test.each([
    [undefined, "https://localhost:3443"],
    ["https://tools.example.org/barycell/", "https://tools.example.org/barycell"],
    ["https://tools.example.org", "https://tools.example.org"],
  ])("is at %s", (asked, base) => {
    expect(baseAddress(asked)).toBe(base);
  });

  test.each(["http://tools.example.org", "tools.example.org", "", "https://a.example/?x=1", 'https://a.example/"'])(
    "is not at %j",
    (asked) => {
      expect(() => baseAddress(asked)).toThrow("give the https address of the folder");
    },
  );
});

describe("this machine as a server", () => {
  let folder: string;
  beforeAll(async () => {
    folder = `${await mkdtemp(join(tmpdir(), "barycell-certificate-"))}/`;
  });
  afterAll(() => rm(folder, { recursive: true }));

  test("takes the next port where one is taken", async () => {
    const taken = createServer();
    const first = await freePort(3543);
    await new Promise<void>((resolve) => taken.listen(first, "localhost", resolve));
    expect(await freePort(first)).toBeGreaterThan(first);
    await new Promise((resolve) => taken.close(resolve));
  });

  test("makes a certificate once, that a browser which trusts it accepts for localhost", async () => {
    const made = await localhostCertificate(new Date(), folder);
    expect((await stat(`${folder}localhost.key`)).mode & 0o077).toBe(0);
    const server = createSecureServer({ key: made.key, cert: made.cert }, (_, answer) => answer.end("here"));
    const port = await freePort(3643);
    await new Promise<void>((resolve) => server.listen(port, "localhost", resolve));
    const status = await new Promise((resolve, reject) => {
      get({ host: "localhost", port, ca: made.cert }, (answer) => resolve(answer.statusCode)).on("error", reject);
    });
    server.closeAllConnections();
    await new Promise((resolve) => server.close(resolve));
    expect(status).toBe(200);
    expect((await localhostCertificate(new Date(), folder)).cert).toBe(made.cert);
    const later = new Date(Date.now() + 365 * 86_400_000);
    expect((await localhostCertificate(later, folder)).cert).not.toBe(made.cert);
  });
});
