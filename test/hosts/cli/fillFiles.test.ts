import { mkdirSync, statSync, symlinkSync } from "node:fs";
import { join } from "node:path";
import { afterAll, describe, expect, test } from "vitest";
import { barycell } from "./barycell.js";
import { workFolder } from "./workFolder.js";

const text = "x,y\n1,2\n3,4\n";
const derived = "x,y,z\n1,2,3\n3,4,7\n";
const sum = ["--set", "z", "=A2+B2"];
const summary = '2 rows; 1 column added (C "z"); no cell needs attention.\n';

const folders: ReturnType<typeof workFolder>[] = [];
afterAll(() => {
  for (const folder of folders) folder.remove();
});

/** A folder of its own that holds the table. */
function folderWithTable() {
  const folder = workFolder();
  folders.push(folder);
  folder.write("in.csv", text);
  return folder;
}

const usage = (message: string) => `barycell fill: ${message}\nbarycell fill --help tells more.\n`;

describe.concurrent("--out", () => {
  test("writes a new file, and one that stands there already", async () => {
    const folder = folderWithTable();
    folder.write("old.csv", "a longer text than the new one, of which nothing may be left over at the end\n");
    for (const name of ["new.csv", "old.csv"]) {
      const ended = await barycell(["fill", "in.csv", ...sum, "--out", name], { folder: folder.path });
      expect(ended).toEqual({ code: 0, out: "", note: summary });
      expect(folder.read(name)).toBe(derived);
    }
    expect(folder.read("in.csv")).toBe(text);
    expect(folder.names()).toEqual(["in.csv", "new.csv", "old.csv"]);
  });

  test("is the input itself by any path: refused without --force", async () => {
    const folder = folderWithTable();
    symlinkSync("in.csv", join(folder.path, "link.csv"));
    for (const out of ["in.csv", "./in.csv", "link.csv", join(folder.path, "in.csv")]) {
      const ended = await barycell(["fill", "in.csv", ...sum, "--out", out], { folder: folder.path });
      const message = `--out "${out}" is the input itself; name another file, or add --force to replace the input.`;
      expect(ended).toEqual({ code: 2, out: "", note: usage(message) });
      expect(folder.read("in.csv")).toBe(text);
    }
    expect(folder.names()).toEqual(["in.csv", "link.csv"]);
  });

  test("is the input itself: accepted with --force, a link stays a link", async () => {
    const folder = folderWithTable();
    symlinkSync("in.csv", join(folder.path, "link.csv"));
    const words = ["fill", "in.csv", ...sum, "--out", "link.csv", "--force"];
    expect((await barycell(words, { folder: folder.path })).code).toBe(0);
    expect(folder.read("in.csv")).toBe(derived);
    expect(folder.read("link.csv")).toBe(derived);
    const again = ["fill", "link.csv", "--set", "w", "=C2", "--out", "in.csv", "--force"];
    expect((await barycell(again, { folder: folder.path })).code).toBe(0);
    expect(folder.read("link.csv")).toBe("x,y,z,w\n1,2,3,3\n3,4,7,7\n");
    expect(folder.names()).toEqual(["in.csv", "link.csv"]);
  });
});

describe.concurrent("what cannot be done leaves everything as it was", () => {
  /** Exit 2: the command line; exit 3: a file. `others` stand beside the table. */
  const failures: readonly (readonly [name: string, words: string[], code: number, message: string])[] = [
    ["no such file", ["no.csv", ...sum], 3, 'cannot read "no.csv": there is no such file or folder; check the name.'],
    ["a folder as table", ["sub", ...sum], 3, 'cannot read "sub": it is a folder; name a file.'],
    [
      "an empty file",
      ["empty.csv", ...sum],
      3,
      "empty.csv: The file is empty; a table needs a first row of column names.",
    ],
    [
      "comments only",
      ["comments.csv", ...sum],
      3,
      "comments.csv: The file holds only blank lines and comments; a table needs a row of column names.",
    ],
    [
      "a binary file",
      ["binary.csv", ...sum],
      3,
      "binary.csv: The file is not text: byte 6 is zero, as in a binary file; save the table as text (CSV or TSV, UTF-8) and open that file.",
    ],
    ["a folder as output", ["in.csv", ...sum, "--out", "sub"], 3, 'cannot write "sub": it is a folder; name a file.'],
    [
      "an output in a missing folder",
      ["in.csv", ...sum, "--out", "no/out.csv"],
      3,
      'cannot write "no/out.csv": there is no folder "no"; make it, or name another.',
    ],
    [
      "an output below a file",
      ["in.csv", ...sum, "--out", "in.csv/out.csv"],
      3,
      'cannot write "in.csv/out.csv": a part of the path is not a folder; check the name.',
    ],
    [
      "a table that fails after the output was found writable",
      ["binary.csv", ...sum, "--out", "out.csv"],
      3,
      "binary.csv: The file is not text: byte 6 is zero, as in a binary file; save the table as text (CSV or TSV, UTF-8) and open that file.",
    ],
  ];
  const refusals: readonly (readonly [name: string, words: string[], message: string])[] = [
    [
      "a formula that cannot be read",
      ["in.csv", "--set", "z", "=A2+", "--out", "out.csv"],
      'the formula of "z" cannot be read:\n  =A2+\n      ^\nformula: =A2+ cannot be read at character 5: nothing follows "+"; a number, cell or function is needed',
    ],
    [
      "an unknown function, of a table that is not there",
      ["no.csv", "--set", "z", "=1+BARY.AXS(A2)", "--out", "out.csv"],
      'the formula of "z" cannot be read:\n  =1+BARY.AXS(A2)\n     ^\nBARY.AXS: no function has this name; did you mean BARY.AXIS?',
    ],
    [
      "a column to the right of all",
      ["in.csv", "--set", "z", "=D2+1", "--out", "out.csv"],
      'the formula of "z" refers to D2, and the table with its new columns ends at column C; check the letters.',
    ],
    [
      "a result of several rows",
      ["in.csv", "--set", "z", "=A$2:A$3*2", "--out", "out.csv"],
      'the formula of "z" gives 2 rows of results in C2; it is filled down, so refer to one cell of each column, B2 rather than B2:B3.',
    ],
    ["no table", [...sum], "give one table, for example targets.csv, or - for standard input."],
    [
      "two tables",
      ["in.csv", "out.csv", ...sum],
      'give one table; "in.csv", "out.csv" came. Texts with spaces or $ need quotes.',
    ],
    ["no column", ["in.csv"], 'say which column to add: --set "K [m/s]" "=BARY.REFLEX(...)".'],
    ["a column without formula", ["in.csv", "--set", "z"], "--set takes 2 values, 1 given."],
    [
      "a column without formula, then an option",
      ["in.csv", "--set", "z", "--out", "out.csv"],
      "--set takes 2 values, 1 given before --out.",
    ],
    ["an unknown option", ["in.csv", ...sum, "--forse"], "there is no option --forse; did you mean --force?"],
    ["two outputs", ["in.csv", ...sum, "--out", "a.csv", "--out", "b.csv"], "--out was given 2 times; give it once."],
    [
      "an unknown delimiter",
      ["in.csv", ...sum, "--delimiter", "colon"],
      '--delimiter is "colon"; it is one of comma, tab, semicolon, bar.',
    ],
    ["a units row of maybe", ["in.csv", ...sum, "--units-row", "maybe"], '--units-row is "maybe"; it is yes or no.'],
    [
      "rows that are no number",
      ["in.csv", ...sum, "--show", "x"],
      '--show is "x"; it is a number of rows, for example 20.',
    ],
  ];

  test.each([
    ...failures.map(([name, words, code, message]) => [name, words, code, `barycell fill: ${message}\n`] as const),
    ...refusals.map(([name, words, message]) => [name, words, 2, usage(message)] as const),
  ])("%s", async (_, words, code, note) => {
    const folder = folderWithTable();
    mkdirSync(join(folder.path, "sub"));
    folder.write("empty.csv", "");
    folder.write("comments.csv", "# x\n\n");
    folder.write("binary.csv", "x,y\n1,\0\n");
    const before = folder.names();
    expect(await barycell(["fill", ...words], { folder: folder.path })).toEqual({ code, out: "", note });
    expect(folder.names()).toEqual(before);
    expect(folder.read("in.csv")).toBe(text);
  });

  test.runIf(process.platform === "linux")("a device that takes nothing: it stays a device", async () => {
    const folder = folderWithTable();
    const ended = await barycell(["fill", "in.csv", ...sum, "--out", "/dev/full"], { folder: folder.path });
    const reason = "the disk is full; free some space and run this again.";
    expect(ended).toEqual({ code: 3, out: "", note: `barycell fill: cannot write "/dev/full": ${reason}\n` });
    expect(folder.names()).toEqual(["in.csv"]);
    expect(statSync("/dev/full").isCharacterDevice()).toBe(true);
  });
});

describe.concurrent("--strict", () => {
  test("exits 1 where a cell has an error; the table is written all the same", async () => {
    const folder = folderWithTable();
    const words = ["fill", "in.csv", "--set", "z", "=1/(A2-1)", "--out", "out.csv"];
    const problem = `  C2: #DIV/0! "/": right side of 1 / 0 is zero or blank; a number other than 0 is needed\n`;
    const note = `2 rows; 1 column added (C "z"); 1 cell needs attention.\n${problem}`;
    expect(await barycell(words, { folder: folder.path })).toEqual({ code: 0, out: "", note });
    expect(await barycell([...words, "--strict"], { folder: folder.path })).toEqual({ code: 1, out: "", note });
    expect(folder.read("out.csv")).toBe("x,y,z\n1,2,#DIV/0!\n3,4,0.5\n");
  });

  test("exits 0 where none has", async () => {
    const ended = await barycell(["fill", "-", ...sum, "--strict"], { input: text });
    expect(ended).toEqual({ code: 0, out: derived, note: summary });
  });
});
