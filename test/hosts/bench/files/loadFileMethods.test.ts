import { afterEach, expect, test, vi } from "vitest";

afterEach(() => {
  vi.doUnmock("../../../../src/hosts/bench/worker/files/fileMethods.js");
  vi.resetModules();
});

test("a script that cannot be loaded, the server gone and nothing kept, is told with what to do", async () => {
  vi.resetModules();
  vi.doMock("../../../../src/hosts/bench/worker/files/fileMethods.js", () => {
    throw new Error("NetworkError");
  });
  const { loadFileMethods } = await import("../../../../src/hosts/bench/worker/files/loadFileMethods.js");
  await expect(loadFileMethods()).rejects.toMatchObject({
    name: "FileProblem",
    message:
      "The part of the page that reads and writes files could not be loaded; start the page's server again (barycell bench) and try once more.",
  });
});
