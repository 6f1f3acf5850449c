/** A digest in the making. */
export interface Digest {
  push(bytes: Uint8Array): void;
  /** The digest of all bytes pushed so far, as 64 hexadecimal digits; nothing may be pushed after it. */
  finish(): string;
}

/** The first 32 bits of the fractional parts of the roots of primes; the standard's constants are defined as these. */
function fractionBits(root: (prime: number) => number, count: number): Uint32Array {
  const primes: number[] = [];
  for (let candidate = 2; primes.length < count; candidate++) {
    if (primes.every((prime) => candidate % prime !== 0)) primes.push(candidate);
  }
  return Uint32Array.from(primes, (prime) => (root(prime) % 1) * 2 ** 32);
}

const roundConstants = fractionBits(Math.cbrt, 64);
const initial = fractionBits(Math.sqrt, 8);
const blockBytes = 64;

/** SHA-256 (FIPS 180-4), piece by piece. */
export function sha256(): Digest {
  const state = Uint32Array.from(initial);
  const words = new Uint32Array(64);
  const rest = new Uint8Array(blockBytes);
  let waiting = 0;
  let length = 0;

  function push(bytes: Uint8Array): void {
    length += bytes.length;
    let at = 0;
    if (waiting > 0) {
      at = Math.min(blockBytes - waiting, bytes.length);
      rest.set(bytes.subarray(0, at), waiting);
      waiting += at;
      if (waiting < blockBytes) return;
      compress(state, words, rest, 0);
      waiting = 0;
    }
    for (; at + blockBytes <= bytes.length; at += blockBytes) compress(state, words, bytes, at);
    rest.set(bytes.subarray(at));
    waiting = bytes.length - at;
  }

  function finish(): string {
    const padding = new Uint8Array((waiting < 56 ? 56 : 120) - waiting + 8);
    padding[0] = 0x80;
    new DataView(padding.buffer).setBigUint64(padding.length - 8, BigInt(length) * 8n);
    push(padding);
    return Array.from(state, (word) => word.toString(16).padStart(8, "0")).join("");
  }

  return { push, finish };
}

/** The digest of a text in UTF-8. */
export function sha256OfText(text: string): string {
  const digest = sha256();
  digest.push(new TextEncoder().encode(text));
  return digest.finish();
}

/** One block of 64 bytes (FIPS 180-4, section 6.2.2). */
function compress(state: Uint32Array, words: Uint32Array, bytes: Uint8Array, at: number): void {
  for (let index = 0; index < 16; index++) {
    const byte = at + 4 * index;
    words[index] = (bytes[byte]! << 24) | (bytes[byte + 1]! << 16) | (bytes[byte + 2]! << 8) | bytes[byte + 3]!;
  }
  for (let index = 16; index < 64; index++) {
    const [early, late] = [words[index - 15]!, words[index - 2]!];
    const small0 = rotated(early, 7) ^ rotated(early, 18) ^ (early >>> 3);
    const small1 = rotated(late, 17) ^ rotated(late, 19) ^ (late >>> 10);
    words[index] = words[index - 16]! + small0 + words[index - 7]! + small1;
  }
  let a = state[0]!;
  let b = state[1]!;
  let c = state[2]!;
  let d = state[3]!;
  let e = state[4]!;
  let f = state[5]!;
  let g = state[6]!;
  let h = state[7]!;
  for (let index = 0; index < 64; index++) {
    const large1 = rotated(e, 6) ^ rotated(e, 11) ^ rotated(e, 25);
    const choice = (e & f) ^ (~e & g);
    const first = (h + large1 + choice + roundConstants[index]! + words[index]!) | 0;
    const large0 = rotated(a, 2) ^ rotated(a, 13) ^ rotated(a, 22);
    const majority = (a & b) ^ (a & c) ^ (b & c);
    h = g;
    g = f;
    f = e;
    e = (d + first) | 0;
    d = c;
    c = b;
    b = a;
    a = (first + large0 + majority) | 0;
  }
  state[0]! += a;
  state[1]! += b;
  state[2]! += c;
  state[3]! += d;
  state[4]! += e;
  state[5]! += f;
  state[6]! += g;
  state[7]! += h;
}

function rotated(word: number, by: number): number {
  return (word >>> by) | (word << (32 - by));
}
