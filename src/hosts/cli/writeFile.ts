import { open, realpath, rename, rm, stat } from "node:fs/promises";
import { basename, dirname, join, resolve } from "node:path";
import { ioProblem } from "./ioProblem.js";

/** A file that takes its place only when it is whole, so that what stood there before is never half lost. */
export interface WholeFile {
  write(pieces: Iterable<string>): Promise<void>;
  /** Leaves what stood there before untouched. */
  discard(): Promise<void>;
}

export async function openWholeFile(path: string): Promise<WholeFile> {
  const target = await realpath(path).catch(() => resolve(path));
  const standing = await stat(target).catch(() => undefined);
  if (standing?.isDirectory()) throw ioProblem("write", path, { code: "EISDIR" });
  const draft = join(dirname(target), `.${basename(target)}.${process.pid}.part`);
  const file = await open(draft, "wx", standing?.mode).catch((error: unknown) => {
    throw ioProblem("write", path, error);
  });
  const discard = async () => {
    await file.close().catch(() => undefined);
    await rm(draft, { force: true });
  };
  return {
    discard,
    async write(pieces) {
      try {
        for (const piece of pieces) await file.write(piece);
        await file.sync();
        await file.close();
        await rename(draft, target);
      } catch (error) {
        await discard();
        throw ioProblem("write", path, error);
      }
    },
  };
}

/** Whether two paths lead to one file. */
export async function isSameFile(one: string, other: string): Promise<boolean> {
  const [first, second] = await Promise.all([one, other].map((path) => stat(path).catch(() => undefined)));
  return first !== undefined && second !== undefined && first.dev === second.dev && first.ino === second.ino;
}
