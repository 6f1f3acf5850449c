import { isUtf8 } from "node:buffer";
import fc from "fast-check";
import { expect, test } from "vitest";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { ChunkDecoder } from "../../../src/files/text/chunkDecoder.js";

function decode(chunks: readonly (string | Uint8Array)[]): string {
  const decoder = new ChunkDecoder();
  return chunks.map((chunk) => decoder.push(chunk)).join("") + decoder.end();
}

function problemOf(chunks: readonly (string | Uint8Array)[]): FileProblem | undefined {
  try {
    decode(chunks);
    return undefined;
  } catch (problem) {
    expect(problem).toBeInstanceOf(FileProblem);
    expect((problem as FileProblem).message.length).toBeLessThanOrEqual(250);
    return problem as FileProblem;
  }
}

function cut(bytes: Uint8Array, size: number): Uint8Array[] {
  return Array.from({ length: Math.ceil(bytes.length / size) }, (_, index) =>
    bytes.subarray(index * size, (index + 1) * size),
  );
}

/** The Unicode Standard 15, section 3.9, tables 3-8 to 3-11: where the first ill-formed sequence begins. */
const illFormed: [bytes: number[], offset: number, source: string][] = [
  [[0xc0, 0xaf, 0xe0, 0x80], 0, "table 3-8, non-shortest forms"],
  [[0x41, 0xed, 0xa0, 0x80], 1, "table 3-9, surrogate"],
  [[0x41, 0x42, 0xf4, 0x91, 0x92, 0x93], 2, "table 3-10, beyond U+10FFFF"],
  [[0xe1, 0x80, 0xe2], 0, "table 3-11, truncated"],
  [[0xc3, 0xa9, 0xf0, 0x91, 0x92], 2, "table 3-11, cut off at the end"],
  [[0x41, 0x80], 1, "lone continuation byte"],
  [[0x80], 0, "lone continuation byte"],
];

test.each(illFormed)("bytes %j stop being UTF-8 at %d: %s", (bytes, offset) => {
  for (const size of [1, 2, bytes.length]) {
    const problem = problemOf(cut(Uint8Array.from(bytes), size));
    expect(problem?.kind).toBe("not-utf-8");
    expect(problem?.message).toContain(`byte ${offset} `);
  }
});

test("text cut within characters comes back whole", () => {
  fc.assert(
    fc.property(fc.string({ unit: "grapheme" }), fc.integer({ min: 1, max: 5 }), (text, size) => {
      fc.pre(!text.includes("\0"));
      expect(decode(cut(Buffer.from(text, "utf8"), size))).toBe(text);
      expect(decode(cut(Buffer.from(`\uFEFF${text}`, "utf16le"), size))).toBe(`\uFEFF${text}`);
    }),
  );
});

test("UTF-16 with its byte order mark is read in either order", () => {
  const little = Buffer.from("\uFEFFname,é\n", "utf16le");
  const decoder = new ChunkDecoder();
  expect(decoder.push(little)).toBe("\uFEFFname,é\n");
  expect(decoder.encoding).toBe("utf-16le");
  expect(decode([Buffer.from(little).swap16()])).toBe("\uFEFFname,é\n");
});

test("the byte named is where the longest well-formed beginning ends (Node's isUtf8 decides)", () => {
  const bytes = fc.uint8Array({ min: 1, maxLength: 24 }).filter(([first]) => first !== 0xff && first !== 0xfe);
  fc.assert(
    fc.property(bytes, fc.integer({ min: 1, max: 7 }), (all, size) => {
      const problem = problemOf(cut(all, size));
      const wellFormed = Array.from({ length: all.length + 1 }, (_, end) => end).filter((end) =>
        isUtf8(all.subarray(0, end)),
      );
      const longest = wellFormed.at(-1) as number;
      expect(problem?.message.match(/byte (\d+)/)?.[1]).toBe(longest === all.length ? undefined : String(longest));
    }),
    { numRuns: 1000 },
  );
});

const binary: [chunks: (string | Uint8Array)[], place: string][] = [
  [[Uint8Array.from([0x50, 0x4b, 3, 4, 20, 0, 6, 0])], "byte 5 "],
  [[Uint8Array.from([0x61, 0x2c]), Uint8Array.from([0x62, 0x0a, 0x00])], "byte 4 "],
  [["ab", "c\0"], "character 4 "],
];

test.each(binary)("%j is refused as binary, with its place", (chunks, place) => {
  const problem = problemOf(chunks);
  expect(problem?.kind).toBe("binary");
  expect(problem?.message).toContain(place);
  expect(problem?.message).toContain("save the table as text");
});

test("half a UTF-16 character is refused", () => {
  expect(problemOf([Uint8Array.from([0xff, 0xfe, 0x41, 0, 0x42])])?.kind).toBe("not-utf-16");
});
