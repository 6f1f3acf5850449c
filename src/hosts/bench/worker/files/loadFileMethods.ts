import { FileProblem } from "../../../../files/fileProblem.js";

type FileMethods = typeof import("./fileMethods.js");

/** Readers and writers of files are loaded with the first file: calculating needs none of them. */
export async function loadFileMethods(): Promise<FileMethods> {
  try {
    return await import(/* webpackChunkName: "files" */ "./fileMethods.js");
  } catch {
    throw new FileProblem(
      "other-kind",
      "The part of the page that reads and writes files could not be loaded; start the page's server again (barycell bench) and try once more.",
    );
  }
}
