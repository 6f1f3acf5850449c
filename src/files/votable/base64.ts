import { FileProblem } from "../fileProblem.js";

const alphabet = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789+/";
const letters = Uint8Array.from(alphabet, (letter) => letter.charCodeAt(0));
const unknown = 255;
const blank = 254;
const padding = 253;
const sixBits = new Uint8Array(128).fill(unknown);
for (const [value, letter] of [...alphabet].entries()) sixBits[letter.charCodeAt(0)] = value;
for (const letter of " \t\r\n") sixBits[letter.charCodeAt(0)] = blank;
sixBits["=".charCodeAt(0)] = padding;

/** Bytes from base64 (RFC 4648, section 4) that arrives in pieces, with blanks and line breaks in it. */
export class Base64Decoder {
  private bits = 0;
  private held = 0;

  push(text: string): Uint8Array {
    const bytes = new Uint8Array(Math.ceil((text.length * 3) / 4) + 3);
    let length = 0;
    for (let at = 0; at < text.length; at++) {
      const code = text.charCodeAt(at);
      const value = code < 128 ? sixBits[code]! : unknown;
      if (value < 64) {
        this.bits = (this.bits << 6) | value;
        this.held += 6;
        if (this.held >= 8) {
          this.held -= 8;
          bytes[length++] = (this.bits >> this.held) & 0xff;
          this.bits &= (1 << this.held) - 1;
        }
      } else if (value === unknown) {
        throw new FileProblem(
          "not-as-standard",
          `The VOTable's binary data are not base64: they hold "${text[at]}"; copy the file again, or ask for TABLEDATA.`,
        );
      } else if (value === padding) {
        this.held = 0;
        this.bits = 0;
      }
    }
    return bytes.subarray(0, length);
  }
}

/** Bytes as base64; all pieces but the last must be a multiple of three long. */
export function base64Of(bytes: Uint8Array): string {
  const codes = new Uint8Array(Math.ceil(bytes.length / 3) * 4).fill("=".charCodeAt(0));
  let to = 0;
  for (let at = 0; at < bytes.length; at += 3) {
    const three = (bytes[at]! << 16) | ((bytes[at + 1] ?? 0) << 8) | (bytes[at + 2] ?? 0);
    codes[to++] = letters[three >> 18]!;
    codes[to++] = letters[(three >> 12) & 63]!;
    if (at + 1 < bytes.length) codes[to] = letters[(three >> 6) & 63]!;
    if (at + 2 < bytes.length) codes[to + 1] = letters[three & 63]!;
    to += 2;
  }
  return ascii.decode(codes);
}

const ascii = new TextDecoder("utf-8");
