import { rmSync, type Stats } from "node:fs";
import { type FileHandle, open, realpath, rename, rm, stat } from "node:fs/promises";
import { basename, dirname, join, resolve } from "node:path";
import { IoProblem, ioProblem } from "./ioProblem.js";

/** A piece of a file: text, or bytes. */
export type Piece = string | Uint8Array;

/** Writes a file that takes its place only when it is whole, so that what stood there is never half lost. */
export type WriteFile = (pieces: Iterable<Piece>) => Promise<void>;

/** Rejects at once where the path cannot be written, before long work is done for it; leaves nothing behind until it writes. */
export async function prepareFile(path: string): Promise<WriteFile> {
  const target = await realpath(path).catch(() => resolve(path));
  const standing = await stat(target).catch(() => undefined);
  if (standing?.isDirectory()) throw ioProblem("write", path, { code: "EISDIR" });
  if (standing && !standing.isFile()) return (pieces) => writeThrough(path, target, pieces);
  const draft = join(dirname(target), `.${basename(target)}.${process.pid}.part`);
  await (await openDraft(path, draft, standing)).close();
  await rm(draft, { force: true });
  return (pieces) => writeWhole(path, { target, draft, standing }, pieces);
}

async function openDraft(path: string, draft: string, standing: Stats | undefined): Promise<FileHandle> {
  try {
    return await open(draft, "wx", standing?.mode);
  } catch (error) {
    if ((error as { code?: string }).code !== "ENOENT") throw ioProblem("write", path, error);
    throw new IoProblem(`cannot write "${path}": there is no folder "${dirname(path)}"; make it, or name another.`);
  }
}

interface Place {
  readonly target: string;
  readonly draft: string;
  readonly standing: Stats | undefined;
}

async function writeWhole(path: string, { target, draft, standing }: Place, pieces: Iterable<Piece>): Promise<void> {
  const file = await openDraft(path, draft, standing);
  const interrupted = (signal: NodeJS.Signals) => {
    rmSync(draft, { force: true });
    process.removeListener(signal, interrupted);
    process.kill(process.pid, signal);
  };
  const signals = ["SIGINT", "SIGTERM", "SIGHUP"] as const;
  for (const signal of signals) process.on(signal, interrupted);
  try {
    for (const piece of pieces) await file.appendFile(piece);
    await file.sync();
    await file.close();
    await rename(draft, target);
  } catch (error) {
    await file.close().catch(() => undefined);
    await rm(draft, { force: true });
    throw ioProblem("write", path, error);
  } finally {
    for (const signal of signals) process.removeListener(signal, interrupted);
  }
}

/** A device or a pipe has nothing to lose, and must not be replaced by a file. */
async function writeThrough(path: string, target: string, pieces: Iterable<Piece>): Promise<void> {
  try {
    const file = await open(target, "w");
    try {
      for (const piece of pieces) await file.appendFile(piece);
    } finally {
      await file.close();
    }
  } catch (error) {
    throw ioProblem("write", path, error);
  }
}
