import { readdirSync, readFileSync, statSync } from "node:fs";
import { join } from "node:path";
import { fileURLToPath } from "node:url";

/** Where the built add-in stands. */
export const addinFolder = fileURLToPath(new URL("../../../dist/addin", import.meta.url));

/** Every file of the built add-in under its path in the folder. */
export function addinFolderFiles(): ReadonlyMap<string, Buffer> {
  const paths = (readdirSync(addinFolder, { recursive: true }) as string[]).filter((path) =>
    statSync(join(addinFolder, path)).isFile(),
  );
  return new Map(paths.map((path) => [path, readFileSync(join(addinFolder, path))]));
}
