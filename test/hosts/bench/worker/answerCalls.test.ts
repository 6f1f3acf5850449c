import { expect, test } from "vitest";
import type { Bench } from "../../../../src/hosts/bench/protocol/bench.js";
import type { WorkerMessage } from "../../../../src/hosts/bench/protocol/message.js";
import { answerCalls, tellEvents } from "../../../../src/hosts/bench/worker/answerCalls.js";
import type { Service } from "../../../../src/hosts/bench/worker/service.js";

const bytes = new Uint8Array([1, 2, 3]);

function answered(methods: Partial<Service<Bench>>) {
  const sent: { readonly message: WorkerMessage; readonly transfer: readonly Transferable[] }[] = [];
  const line = { postMessage: (message: WorkerMessage, transfer: Transferable[]) => sent.push({ message, transfer }) };
  return { sent, line, answer: answerCalls(line, methods as Service<Bench>) };
}

test("a call is answered by its number, whether at once or later", async () => {
  const { sent, answer } = answered({ entryOf: ({ row }) => `row ${row}`, takeBack: async () => undefined });
  await answer({ id: 7, method: "entryOf", given: [{ sheet: 0, row: 3, column: 0 }] });
  await answer({ id: 8, method: "takeBack", given: ["x"] });
  expect(sent.map(({ message }) => message)).toEqual([
    { id: 7, answer: "row 3" },
    { id: 8, answer: undefined },
  ]);
});

test("what goes wrong is told to whoever called, and to nobody else", async () => {
  const { sent, answer } = answered({
    undo: () => {
      throw new Error("no room");
    },
    redo: () => Promise.reject(new Error("later")),
  });
  await answer({ id: 1, method: "undo", given: [] });
  await answer({ id: 2, method: "redo", given: [] });
  await answer({ id: 3, method: "noSuch" as keyof Bench, given: [] });
  expect(sent.map(({ message }) => message)).toEqual([
    { id: 1, fault: "no room" },
    { id: 2, fault: "later" },
    { id: 3, fault: expect.stringContaining("not a function") },
  ]);
});

test("the bytes of a file go over whole, other arrays are copied", async () => {
  const rows = new Int32Array([1]);
  const { sent, answer } = answered({
    exportAs: () => ({ name: "a", type: "b", bytes, told: [] }),
    visibleRows: () => rows,
  });
  await answer({ id: 1, method: "exportAs", given: ["csv", 0] });
  await answer({ id: 2, method: "visibleRows", given: [0] });
  expect(sent.map(({ transfer }) => transfer)).toEqual([[bytes.buffer], []]);
});

test("news of its own carries no number", () => {
  const { sent, line } = answered({});
  tellEvents(line)({ is: "idle" });
  expect(sent[0]?.message).toEqual({ event: { is: "idle" } });
});
