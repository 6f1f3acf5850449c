import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { type ServedFolder, serveFolder } from "../../../../src/hosts/cli/serve/serveFolder.js";
import { launchChromium } from "../../../browser/launchChromium.js";

let browser: Browser;
let served: ServedFolder;

beforeAll(async () => {
  served = await serveFolder(new URL("../../../../dist/bench/", import.meta.url), 0, "test");
  browser = await launchChromium();
});

afterAll(async () => {
  await browser?.close();
  await served?.close();
});

test("the page loads from its own address alone, breaks no rule of its own, and is kept for offline", async () => {
  const context = await browser.newContext();
  const asked = new Set<string>();
  context.on("request", (request) => asked.add(request.url()));
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on("console", (message) => message.type() === "error" && complaints.push(message.text()));
  page.on("pageerror", (error) => complaints.push(error.message));
  await page.goto(served.address);
  await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
  await page.getByText("Lantern 1 b").first().waitFor();
  expect(complaints).toEqual([]);
  expect([...asked].filter((address) => !address.startsWith(served.address))).toEqual([]);
  expect(asked.has(`${served.address}worker.js`)).toBe(true);
  await context.close();
});

/** Whether a place of another address hears of it when somebody in the page tries to reach it. */
test("neither the page nor its worker can reach another address, even if a script in them tried", async () => {
  let heard = 0;
  const other = createServer((_, answer) => {
    heard++;
    answer.writeHead(200, { "Access-Control-Allow-Origin": "*" }).end();
  });
  await new Promise<void>((resolve) => other.listen(0, "127.0.0.1", resolve));
  const address = `http://127.0.0.1:${(other.address() as AddressInfo).port}/`;
  const context = await browser.newContext({ serviceWorkers: "block" });
  const page = await context.newPage();
  const worker = page.waitForEvent("worker");
  await page.goto(served.address);
  const reaching = async (to: string): Promise<string> => {
    const tried = await fetch(to, { mode: "no-cors" }).then(
      () => "reached",
      () => "refused",
    );
    return tried;
  };
  expect(await page.evaluate(reaching, address)).toBe("refused");
  expect(await (await worker).evaluate(reaching, address)).toBe("refused");
  expect(await page.evaluate(reaching, served.address)).toBe("reached");
  expect(await (await worker).evaluate(reaching, served.address)).toBe("reached");
  expect(heard).toBe(0);
  other.close();
  await context.close();
});
