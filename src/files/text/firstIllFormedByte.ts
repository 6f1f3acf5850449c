/**
 * Where the first ill-formed UTF-8 sequence begins (Unicode Standard, table 3-7); the length where there is none.
 * Of the first `known` bytes, known to be well-formed, those that continue a character begun earlier are passed over.
 */
export function firstIllFormedByte(bytes: Uint8Array, known = 0): number {
  let at = 0;
  while (at < known && isContinuation(bytes[at])) {
    at++;
  }
  while (at < bytes.length) {
    const length = sequenceLength(bytes, at);
    if (length === 0) {
      return at;
    }
    at += length;
  }
  return bytes.length;
}

function sequenceLength(bytes: Uint8Array, at: number): number {
  const first = bytes[at] as number;
  if (first < 0x80) {
    return 1;
  }
  if (first < 0xc2 || first > 0xf4) {
    return 0;
  }
  const length = first < 0xe0 ? 2 : first < 0xf0 ? 3 : 4;
  const second = bytes[at + 1] ?? 0;
  const least = first === 0xe0 ? 0xa0 : first === 0xf0 ? 0x90 : 0x80;
  const most = first === 0xed ? 0x9f : first === 0xf4 ? 0x8f : 0xbf;
  if (second < least || second > most) {
    return 0;
  }
  for (let next = 2; next < length; next++) {
    if (!isContinuation(bytes[at + next])) {
      return 0;
    }
  }
  return length;
}

function isContinuation(byte: number | undefined): boolean {
  return byte !== undefined && byte >= 0x80 && byte <= 0xbf;
}
