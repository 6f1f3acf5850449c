import { createBenchWorkerParts } from "./parts.js";

const parts = createBenchWorkerParts((event) => postMessage({ event }));

self.addEventListener("message", async ({ data }: MessageEvent<{ id: number; method: string; given: unknown[] }>) => {
  const { id, method, given } = data;
  try {
    const call = parts[method as keyof typeof parts] as (...given: unknown[]) => unknown;
    postMessage({ id, answer: await call(...given) });
  } catch (error) {
    postMessage({ id, fault: String(error) });
  }
});
