import { escapeText } from "../xml/xmlText.js";
import { mainSpace } from "./spaces.js";

/** The texts of a workbook in the making; cells name them by number. */
export interface StringTable {
  indexOf(text: string): number;
  /** The XML of its part, in pieces. */
  part(): Iterable<string>;
}

const pieceLength = 1 << 16;

export function stringTable(): StringTable {
  const indices = new Map<string, number>();
  let uses = 0;
  return {
    indexOf(text) {
      uses++;
      let index = indices.get(text);
      if (index === undefined) {
        index = indices.size;
        indices.set(text, index);
      }
      return index;
    },
    *part() {
      let piece = `<sst xmlns="${mainSpace}" count="${uses}" uniqueCount="${indices.size}">`;
      for (const text of indices.keys()) {
        piece += `<si><t${/^\s|\s$|[\n\t]/.test(text) ? ' xml:space="preserve"' : ""}>${escapeText(text)}</t></si>`;
        if (piece.length > pieceLength) {
          yield piece;
          piece = "";
        }
      }
      yield `${piece}</sst>`;
    },
  };
}
