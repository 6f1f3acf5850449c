import fc from "fast-check";
import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { describe, expect, test } from "vitest";
import { crc32 } from "../../../src/files/zip/crc32.js";
import { openZip } from "../../../src/files/zip/openZip.js";
import { unpack } from "../../../src/files/zip/unpack.js";
import { zipLimits } from "../../../src/files/zip/zipLimits.js";
import { zipWriter } from "../../../src/files/zip/zipWriter.js";

const unpacked = (file: Uint8Array, name: string, limits = zipLimits): string => {
  const entry = openZip(file, limits).get(name);
  return strFromU8(Buffer.concat(entry === undefined ? [] : [...unpack(entry, limits, { bytes: 0 })]));
};

describe("zip files", () => {
  test("have the checksum of their standard", () => {
    // The check value of CRC-32 over "123456789", ITU-T V.42 (from memory).
    expect(crc32(strToU8("123456789"))).toBe(0xcbf43926);
    const pieces = fc.tuple(fc.uint8Array({ maxLength: 40 }), fc.uint8Array({ maxLength: 40 }));
    fc.assert(
      fc.property(pieces, ([first, second]) => {
        expect(crc32(second, crc32(first))).toBe(crc32(Uint8Array.from([...first, ...second])));
      }),
    );
  });

  test("are read by a general library as they were written, and the other way round", () => {
    const files = fc.uniqueArray(fc.tuple(fc.stringMatching(/^[a-zé][a-z./]{0,9}x$/), fc.string({ maxLength: 300 })), { selector: ([name]) => name, maxLength: 5 }); // biome-ignore format: one arbitrary
    fc.assert(
      fc.property(files, fc.constantFrom(0 as const, 6 as const), (each, level) => {
        const zip = zipWriter();
        for (const [name, text] of each) {
          zip.begin(name);
          zip.write(text.slice(0, 7));
          zip.write(text.slice(7));
        }
        const ours = unzipSync(zip.finish());
        const theirs = zipSync(Object.fromEntries(each.map(([name, text]) => [name, strToU8(text)])), { level });
        for (const [name, text] of each) {
          const whole = strFromU8(strToU8(text));
          expect(strFromU8(ours[name] as Uint8Array)).toBe(whole);
          if (!/(^|\/)\.\.?(\/|$)/.test(name)) {
            expect(unpacked(theirs, name)).toBe(whole);
          }
        }
      }),
    );
  });

  test("with a comment, and with something after their end, are read", () => {
    const file = zipSync({ a: strToU8("1") });
    const longer = Uint8Array.from([...file, ...new Array<number>(500).fill(32)]);
    expect(unpacked(longer, "a")).toBe("1");
  });

  test("beyond a limit are refused: all parts together, one part over its ratio, many parts", () => {
    const file = zipSync({ a: new Uint8Array(50_000), b: strToU8("x") });
    const refused = (limits: Partial<typeof zipLimits>) => () => unpacked(file, "a", { ...zipLimits, ...limits });
    expect(refused({ mostBytes: 40_000 })).toThrow("a alone to 0 MB");
    expect(refused({ smallBytes: 1000, mostRatio: 20 })).toThrow(/a to 0 MB, \d+ times its size/);
    expect(refused({ mostEntries: 1 })).toThrow("it has 2 parts");
    expect(refused({})).not.toThrow();
  });

  test("sizes that are said wrongly are noticed as they are unpacked", () => {
    const file = zipSync({ a: new Uint8Array(50_000) });
    const entry = openZip(file).get("a") as NonNullable<ReturnType<ReturnType<typeof openZip>["get"]>>;
    const taken = (changed: object, limits = zipLimits) => () => [...unpack({ ...entry, ...changed }, limits, { bytes: 0 })]; // biome-ignore format: one call
    expect(taken({})).not.toThrow();
    expect(taken({ size: 10 })).toThrow("is larger than it says");
    expect(taken({ size: 50_001 })).toThrow("is not what was packed");
    expect(taken({ crc: 1 })).toThrow("is not what was packed");
    expect(taken({}, { ...zipLimits, smallBytes: 1000, mostRatio: 20 })).toThrow("to more than 20 times its size");
    expect(taken({}, { ...zipLimits, mostBytes: 1000 })).toThrow("more than 0 MB");
  });

  test("two parts in one place, or of one name, are refused", () => {
    const file = zipSync({ a: strToU8("1234567890"), b: strToU8("1234567890") }, { level: 0 });
    const view = new DataView(file.buffer, file.byteOffset);
    const entries = [...file.keys()].filter((at) => at + 46 < file.length && view.getUint32(at, true) === 0x02014b50);
    const renamed = file.slice();
    renamed[(entries[1] as number) + 46] = "a".charCodeAt(0);
    expect(() => openZip(renamed)).toThrow("two of its parts are in one place or have one name");
  });
});
