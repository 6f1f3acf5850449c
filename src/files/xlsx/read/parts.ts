import { FileProblem } from "../../fileProblem.js";
import type { ZipDirectory, ZipEntry } from "../../zip/openZip.js";
import type { Unpacked } from "../../zip/unpack.js";
import { damaged } from "../../zip/zipProblem.js";
import { attributesOf } from "../xml/attributes.js";
import { scanPart } from "../xml/scanPart.js";
import type { XmlHandler } from "../xml/xmlScanner.js";

/** A line of a relationships part. */
export interface Relationship {
  readonly id: string;
  /** The last word of its type: "worksheet", "sharedStrings"; the same in both name spaces of the standard. */
  readonly type: string;
  readonly target: string;
}

/** The parts of a package while they are read. */
export interface Parts {
  readonly unpacked: Unpacked;
  /** Part names count as equal in capital and small letters (ECMA-376 part 2, section 6.2.2.3). */
  find(name: string): ZipEntry | undefined;
  /** Reads a part that is small, in one go. */
  scan(entry: ZipEntry, handler: XmlHandler): void;
  relationshipsOf(name: string): readonly Relationship[];
}

export function openParts(directory: ZipDirectory): Parts {
  const byName = new Map([...directory.values()].map((entry) => [entry.name.toLowerCase(), entry]));
  const unpacked: Unpacked = { bytes: 0 };
  const find = (name: string) => byName.get(name.toLowerCase());
  const scan = (entry: ZipEntry, handler: XmlHandler): void => {
    for (const _ of scanPart(entry, unpacked, handler)) {
      // Small parts need no pause.
    }
  };
  return {
    unpacked,
    find,
    scan,
    relationshipsOf(name) {
      const slash = name.lastIndexOf("/") + 1;
      const entry = find(`${name.slice(0, slash)}_rels/${name.slice(slash)}.rels`);
      return entry === undefined ? [] : readRelationships(entry, name.slice(0, slash), scan);
    },
  };
}

function readRelationships(entry: ZipEntry, folder: string, scan: Parts["scan"]): Relationship[] {
  const found: Relationship[] = [];
  scan(entry, {
    open(name, source) {
      if (name === "Relationship") {
        const attributes = attributesOf(source);
        if (attributes.get("TargetMode") !== "External") {
          const type = attributes.get("Type")?.split("/").at(-1) ?? "";
          found.push({ id: attributes.get("Id") ?? "", type, target: resolve(folder, attributes.get("Target") ?? "") });
        }
      }
    },
    close() {},
    text() {},
  });
  return found;
}

/** The name of the part that a relative or absolute target means. */
function resolve(folder: string, target: string): string {
  const path = target.startsWith("/") ? target : `/${folder}${target}`;
  const steps: string[] = [];
  for (const step of path.split("/")) {
    if (step === "..") {
      steps.pop();
    } else if (step !== "." && step !== "") {
      steps.push(step);
    }
  }
  return steps.join("/");
}

/** The part that the package says is its workbook. */
export function findWorkbookPart(parts: Parts, directory: ZipDirectory): ZipEntry {
  const target = parts.relationshipsOf("").find(({ type }) => type === "officeDocument")?.target;
  if (target === undefined) {
    throw otherPackage(directory);
  }
  if (/\.bin$/i.test(target)) {
    const what = "The file is a binary workbook (.xlsb)";
    throw new FileProblem("other-kind", `${what}; save it as a workbook (.xlsx) where it was made and open that file.`);
  }
  if (/(^|\/)(word|ppt)\//i.test(target)) {
    throw new FileProblem(
      "other-kind",
      "The file is a text document or slides, not a workbook; copy the table out of it.",
    );
  }
  const entry = parts.find(target);
  if (entry === undefined) {
    throw damaged("it says where its workbook is, and there is none");
  }
  return entry;
}

function otherPackage(directory: ZipDirectory): FileProblem {
  const saveAs = "save it as a workbook (.xlsx) where it was made and open that file";
  if (directory.has("content.xml") || directory.has("mimetype")) {
    return new FileProblem("other-kind", `The file is an OpenDocument file (.ods); ${saveAs}.`);
  }
  if (directory.has("Index/Document.iwa")) {
    return new FileProblem("other-kind", `The file is a document of a kind that is not read; ${saveAs}.`);
  }
  return new FileProblem(
    "other-kind",
    "The file is a zip archive without a workbook in it; unpack it and open what is meant.",
  );
}
