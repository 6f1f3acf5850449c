import { isBookFile, readBookFile } from "../../../../files/bookFile/readBookFile.js";
import { functions } from "../functions.js";
import type { Opener } from "./opener.js";

/** A book that was saved as a file. */
export const openBookFile: Opener = {
  isFor: ({ start }) => isBookFile(new TextDecoder().decode(start)),
  longest: 400_000_000,
  async read({ size, content }, { signal, progress }) {
    const text = await content.text();
    signal.throwIfAborted();
    progress(size);
    return { document: readBookFile(text, functions), findings: [] };
  },
};
