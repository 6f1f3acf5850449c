/** A piece of a file: text, or bytes of text in UTF-8 (or in UTF-16 with a byte order mark). */
export type TextChunk = string | Uint8Array;

/** A file as it arrives. A text may be cut anywhere, bytes even within a character. */
export type TextSource = string | Iterable<TextChunk> | AsyncIterable<TextChunk>;

export type TextEncoding = "utf-8" | "utf-16le" | "utf-16be";
