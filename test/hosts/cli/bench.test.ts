import { type ChildProcess, spawn } from "node:child_process";
import { once } from "node:events";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { fileURLToPath } from "node:url";
import { afterEach, describe, expect, test } from "vitest";
import { barycell } from "./barycell.js";

const command = fileURLToPath(new URL("../../../dist/cli.js", import.meta.url));
const running: ChildProcess[] = [];

afterEach(() => {
  for (const child of running.splice(0)) child.kill("SIGKILL");
});

/** Starts the page's server and waits for its line. */
async function started(words: readonly string[]) {
  const child = spawn(process.execPath, [command, "bench", ...words]);
  running.push(child);
  const said = { out: "", note: "" };
  child.stdout.on("data", (piece) => {
    said.out += piece;
  });
  child.stderr.on("data", (piece) => {
    said.note += piece;
  });
  await once(child.stdout, "data");
  const address = /http:\S+/.exec(said.out)?.[0] ?? "";
  return { child, said, address, port: Number(new URL(address).port) };
}

describe("bench", () => {
  test("serves the page, says where in one line, and ends with Ctrl+C", async () => {
    const { child, said, address } = await started(["--port", "0"]);
    expect(said.out).toMatch(/^Barycell is at http:\/\/127\.0\.0\.1:\d+\/ until Ctrl\+C\n$/);
    for (const name of ["", "main.js", "worker.js", "bench.css", "service-worker.js", "manifest.webmanifest"]) {
      expect((await fetch(address + name)).status, name).toBe(200);
    }
    child.kill("SIGINT");
    expect(await once(child, "exit")).toEqual([0, null]);
    expect(said.note).toBe("");
  });

  test("is not served twice", async () => {
    const { address, port } = await started(["--port", "0"]);
    expect(await barycell(["bench", "--port", String(port)])).toEqual({
      code: 0,
      out: `Barycell is served already: ${address}\n`,
      note: "",
    });
  });

  test("goes to the next free port where another program has it, and says what that means", async () => {
    const other = createServer((_, answer) => answer.end("other")).listen(0, "127.0.0.1");
    await once(other, "listening");
    const taken = (other.address() as AddressInfo).port;
    const { said, port } = await started(["--port", String(taken)]);
    await expect
      .poll(() => said.note)
      .toBe(
        `Port ${taken} is taken. A browser keeps the sheets of each port apart: those made at ${taken} are not seen at ${port}.\n`,
      );
    expect(port).toBeGreaterThan(taken);
    other.close();
  });

  test.each([
    [["--port", "x"], "--port is x; a number up to 65535 is needed, for example 4680."],
    [["--port", "70000"], "--port is 70000; a number up to 65535 is needed, for example 4680."],
    [["targets.csv"], "it takes no operands; the page opens files itself."],
  ])("%j is told what to type", async (words, message) => {
    expect(await barycell(["bench", ...words])).toEqual({
      code: 2,
      out: "",
      note: `barycell bench: ${message}\nbarycell bench --help tells more.\n`,
    });
  });
});
