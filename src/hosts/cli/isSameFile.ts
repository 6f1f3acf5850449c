import { fstatSync, type Stats } from "node:fs";
import { stat } from "node:fs/promises";

/** Whether an input, "-" for standard input, is the file that a path leads to. */
export async function isSameFile(input: string, path: string): Promise<boolean> {
  const [first, second] = [input === "-" ? standardInput() : await statOf(input), await statOf(path)];
  return first !== undefined && second !== undefined && first.dev === second.dev && first.ino === second.ino;
}

function statOf(path: string): Promise<Stats | undefined> {
  return stat(path).catch(() => undefined);
}

function standardInput(): Stats | undefined {
  try {
    const standing = fstatSync(0);
    return standing.isFile() ? standing : undefined;
  } catch {
    return undefined;
  }
}
