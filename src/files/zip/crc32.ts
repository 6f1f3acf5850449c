const tables = makeTables();

/** Four tables, so that four bytes are taken at a time. */
function makeTables(): Uint32Array[] {
  const first = Uint32Array.from({ length: 256 }, (_, byte) => {
    let value = byte;
    for (let bit = 0; bit < 8; bit++) {
      value = value & 1 ? (value >>> 1) ^ 0xedb88320 : value >>> 1;
    }
    return value;
  });
  const all = [first];
  for (let index = 1; index < 4; index++) {
    const before = all[index - 1] as Uint32Array;
    all.push(before.map((value) => (value >>> 8) ^ (first[value & 0xff] as number)));
  }
  return all;
}

/** The checksum of zip files (ISO 3309, polynomial 04C11DB7 hex) over bytes that follow those summed up in `sum`. */
export function crc32(bytes: Uint8Array, sum = 0): number {
  const [zero, one, two, three] = tables as [Uint32Array, Uint32Array, Uint32Array, Uint32Array];
  let value = ~sum;
  let at = 0;
  for (const end = bytes.length - 3; at < end; at += 4) {
    value ^=
      (bytes[at] as number) |
      ((bytes[at + 1] as number) << 8) |
      ((bytes[at + 2] as number) << 16) |
      ((bytes[at + 3] as number) << 24);
    value =
      (three[value & 0xff] as number) ^
      (two[(value >>> 8) & 0xff] as number) ^
      (one[(value >>> 16) & 0xff] as number) ^
      (zero[value >>> 24] as number);
  }
  for (; at < bytes.length; at++) {
    value = (value >>> 8) ^ (zero[(value ^ (bytes[at] as number)) & 0xff] as number);
  }
  return ~value >>> 0;
}
