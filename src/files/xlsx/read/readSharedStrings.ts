import type { ZipEntry } from "../../zip/openZip.js";
import type { Unpacked } from "../../zip/unpack.js";
import { scanPart } from "../xml/scanPart.js";
import { decodeText } from "../xml/xmlText.js";

/** The texts that cells name by number; runs of one text in several fonts are joined, readings of it left out. */
export function* readSharedStrings(entry: ZipEntry, unpacked: Unpacked): Generator<number, string[]> {
  const strings: string[] = [];
  let text = "";
  let isText = false;
  let aside = 0;
  yield* scanPart(entry, unpacked, {
    open(name) {
      if (name === "si") {
        text = "";
      } else if (name === "t") {
        isText = aside === 0;
      } else if (name === "rPh" || name === "extLst") {
        aside++;
      }
    },
    close(name) {
      if (name === "si") {
        strings.push(decodeText(text));
      } else if (name === "t") {
        isText = false;
      } else if (name === "rPh" || name === "extLst") {
        aside--;
      }
    },
    text(piece) {
      if (isText) {
        text += piece;
      }
    },
  });
  return strings;
}
