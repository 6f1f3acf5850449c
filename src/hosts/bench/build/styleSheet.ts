import { readdir, readFile } from "node:fs/promises";

/** The first ones set what the others use or mend. */
const first = ["tokens.css", "bench.css"];

/** Every style sheet below a folder as one: the tokens first, then the frame, then the parts by their names. */
export async function styleSheet(folder: URL): Promise<string> {
  const names = (await readdir(folder, { recursive: true })).filter((name) => name.endsWith(".css"));
  const parts = names.filter((name) => !first.includes(name)).sort();
  const ordered = [...first.filter((name) => names.includes(name)), ...parts];
  const texts = await Promise.all(ordered.map((name) => readFile(new URL(name, folder), "utf8")));
  return texts.map((text) => `${text.trim()}\n`).join("\n");
}
