import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { sha256, sha256OfText } from "../../src/revision/sha256.js";

// NIST, examples for FIPS 180-4 (SHA256.pdf: "abc" and the message of 448 bits) and the SHA-2 validation vectors
// (byte-oriented, length 0); the million of "a" is FIPS 180-2, appendix B.3.
const vectors: readonly (readonly [string, string])[] = [
  ["", "e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855"],
  ["abc", "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad"],
  [
    "abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq",
    "248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1",
  ],
  ["a".repeat(1_000_000), "cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0"],
];

describe("SHA-256", () => {
  test.each(vectors)("of %.20s", (text, expected) => {
    expect(sha256OfText(text)).toBe(expected);
  });

  test("is that of the platform for any bytes, however they come in pieces", async () => {
    const pieces = fc.array(fc.uint8Array({ maxLength: 200 }), { maxLength: 6 });
    await fc.assert(
      fc.asyncProperty(pieces, async (all) => {
        const digest = sha256();
        for (const piece of all) digest.push(piece);
        const whole = Uint8Array.from(all.flatMap((piece) => [...piece]));
        const expected = Buffer.from(await crypto.subtle.digest("SHA-256", whole)).toString("hex");
        expect(digest.finish()).toBe(expected);
      }),
      { numRuns: 200 },
    );
  });
});
