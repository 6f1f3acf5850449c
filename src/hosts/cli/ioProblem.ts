/** A file that cannot be read or written; the message says which, why and what to do. */
export class IoProblem extends Error {
  override readonly name = "IoProblem";
}

/** The sentence for a failure the operating system reports. */
export function ioProblem(doing: string, path: string, error: unknown): IoProblem {
  const code = (error as { code?: string }).code ?? String(error);
  const reason = reasons[code] ?? `the system answers ${code}`;
  return new IoProblem(`cannot ${doing} "${path}": ${reason}.`);
}

const reasons: Readonly<Record<string, string>> = {
  ENOENT: "there is no such file or folder; check the name",
  EACCES: "access is not permitted; check the file's and its folder's permissions",
  EPERM: "access is not permitted; check the file's and its folder's permissions",
  EISDIR: "it is a folder; name a file",
  ENOTDIR: "a part of the path is not a folder; check the name",
  ENOSPC: "the disk is full; free some space and run this again",
  EROFS: "the disk is read-only; name a file elsewhere",
  ENAMETOOLONG: "the name is too long",
  EEXIST: "it is already there",
};
