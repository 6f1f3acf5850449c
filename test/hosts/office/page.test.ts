import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { launchChromium } from "../../browser/launchChromium.js";
import { type Served, serveFiles } from "../../browser/serveFiles.js";
import { addinFolderFiles } from "./addinFolder.js";
import { answerHostLibrary, type Outside } from "./hostLibrary.js";

const files = addinFolderFiles();
const library = "https://appsforoffice.microsoft.com/lib/1/hosted/";

describe("the add-in's page", () => {
  let browser: Browser;
  let served: Served;
  let page: Page;
  let outside: Outside;
  const inside: string[] = [];
  const refused: string[] = [];
  const mistakes: Error[] = [];

  beforeAll(async () => {
    [browser, served] = await Promise.all([launchChromium(), serveFiles(files)]);
    page = await browser.newPage();
    outside = await answerHostLibrary(page);
    page.on("pageerror", (error) => mistakes.push(error));
    page.on("request", (request) => {
      if (request.url().startsWith(served.base)) inside.push(request.url().slice(served.base.length));
    });
    await page.addInitScript(() => {
      const world = globalThis as unknown as { refused: string[] };
      world.refused = [];
      addEventListener("securitypolicyviolation", (event) => {
        world.refused.push(`${event.effectiveDirective} ${event.blockedURI}`);
      });
    });
    await page.goto(`${served.base}pane.html`);
    await page.waitForFunction(() => typeof Office !== "undefined" && Office.onReady().then(() => true));
    await page.waitForLoadState("networkidle");
    refused.push(...(await page.evaluate(() => (globalThis as unknown as { refused: string[] }).refused)));
  });
  afterAll(async () => {
    await browser?.close();
    await served?.close();
  });

  test("loads its own files and the host's library, and asks for nothing else", () => {
    expect(inside.filter((path) => path !== "favicon.ico").sort()).toEqual([
      "functions.js",
      "pane.css",
      "pane.html",
      "pane.js",
    ]);
    expect(outside.asked.length).toBeGreaterThan(0);
    expect(outside.asked.filter((url) => !url.startsWith(library))).toEqual([]);
  });

  test("has nothing refused by its policy", () => {
    expect(refused).toEqual([]);
  });

  test("shows the pane, and stops nowhere but for want of a worksheet", async () => {
    expect(await page.locator("#pane").textContent()).not.toBe("");
    const own = mistakes.filter(({ stack }) => stack?.includes(served.base)).map(({ message }) => message);
    expect(own.filter((message) => message !== "Excel is not defined")).toEqual([]);
  });

  test("has every function ready where the host looks for it", async () => {
    const found = await page.evaluate(() => {
      const { _association } = CustomFunctions as unknown as { _association: { mappings: object } };
      return Object.keys(_association.mappings);
    });
    expect(found).toEqual(
      JSON.parse(files.get("functions.json")!.toString()).functions.map(({ id }: { id: string }) => id),
    );
  });

  test("reaches nothing elsewhere, whoever tries", async () => {
    const before = outside.asked.length;
    const tries = await page.evaluate(async () => {
      const elsewhere = "https://example.org/";
      const sent = await fetch(elsewhere).then(
        () => "sent",
        () => "refused",
      );
      const socket = await new Promise((resolve) => {
        try {
          const opened = new WebSocket("wss://example.org/");
          opened.onopen = () => resolve("opened");
          opened.onerror = () => resolve("refused");
        } catch {
          resolve("refused");
        }
      });
      const image = await new Promise((resolve) => {
        const element = new Image();
        element.onload = () => resolve("shown");
        element.onerror = () => resolve("refused");
        element.src = `${elsewhere}x.png`;
      });
      return [sent, socket, image];
    });
    expect(tries).toEqual(["refused", "refused", "refused"]);
    expect(outside.asked.length).toBe(before);
  });

  test("states a policy that names no other place", () => {
    for (const name of ["pane.html", "help.html"]) {
      const [, policy] = /<meta http-equiv="Content-Security-Policy" content="([^"]*)">/.exec(
        files.get(name)!.toString(),
      )!;
      expect(policy).toMatch(/^default-src 'none'; /);
      expect(policy).not.toContain("unsafe");
      expect([...policy!.matchAll(/https?:\/\/[^\s;]+|\*/g)].map(([place]) => place)).toEqual(
        name === "pane.html" ? ["https://appsforoffice.microsoft.com"] : [],
      );
    }
  });
});
