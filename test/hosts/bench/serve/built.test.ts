import { createHash } from "node:crypto";
import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { styleSheet } from "../../../../src/hosts/bench/build/styleSheet.js";
import { localPolicy } from "../../../../src/hosts/localPolicy.js";

const folder = new URL("../../../../dist/bench/", import.meta.url);
const read = (name: string): string => readFileSync(new URL(name, folder), "utf8");
const names = readdirSync(folder, { recursive: true, withFileTypes: true })
  .filter((entry) => entry.isFile())
  .map((entry) => `${entry.parentPath}/${entry.name}`.replace(/^.*dist\/bench\/+/, ""));

describe("the folder of the page", () => {
  test("its page states the policy and loads its own files alone, nothing inline", () => {
    const page = read("index.html");
    expect(page).toContain(`<meta http-equiv="Content-Security-Policy" content="${localPolicy}">`);
    const loaded = [...page.matchAll(/\b(?:src|href)="([^"]*)"/g)].map(([, address]) => address ?? "");
    expect(loaded.length).toBeGreaterThan(3);
    for (const address of loaded) expect(names, address).toContain(address);
    expect(page).not.toMatch(/<style|\bstyle=|\son\w+=|<script(?![^>]*\bsrc=)/);
  });

  test("its service worker keeps every file that is needed, each by its digest", () => {
    const [line = ""] = read("service-worker.js").split("\n");
    const kept = JSON.parse(line.replace(/^const keptFiles = /, "").replace(/;$/, "")) as Record<string, string>;
    const needed = names.filter((name) => name !== "service-worker.js" && !/\.(map|txt)$/.test(name));
    expect(Object.keys(kept).sort()).toEqual(needed.sort());
    for (const [name, digest] of Object.entries(kept)) {
      // Subresource Integrity (W3C): sha256- and the digest in base64.
      const content = readFileSync(new URL(name, folder));
      expect(digest, name).toBe(`sha256-${createHash("sha256").update(content).digest("base64")}`);
    }
  });

  test("its manifest names icons that are there, and starts in the folder", () => {
    const manifest = JSON.parse(read("manifest.webmanifest"));
    for (const { src } of manifest.icons) expect(names).toContain(src);
    expect(manifest).toMatchObject({ name: "Barycell", start_url: "./", scope: "./", display: "standalone" });
  });
});

test("style sheets are joined in order: the tokens, the frame, the parts; each whole", async () => {
  const page = new URL("../../../../src/hosts/bench/page/", import.meta.url);
  const joined = await styleSheet(page);
  const sheets = readdirSync(page, { recursive: true, encoding: "utf8" }).filter((name) => name.endsWith(".css"));
  const places = sheets.map((name) => joined.indexOf(readFileSync(new URL(name, page), "utf8").trim()));
  expect(Math.min(...places)).toBe(0);
  expect(places[sheets.indexOf("tokens.css")]).toBe(0);
  expect(joined.length).toBeGreaterThan(Math.max(...places));
});
