import { afterAll, describe, expect, test } from "vitest";
import { barycell } from "./barycell.js";
import { workFolder } from "./workFolder.js";

const folder = workFolder();
afterAll(folder.remove);

const fill = (input: string | Uint8Array, ...words: string[]) => barycell(["fill", "-", ...words], { input });

/** A formula of row 2 and one of row 3: hours from days, 24 to a day. */
const hours = ["--set", "t [h]", "=BARY.INTO(B2,B$1,C$1)"];
const hoursUnderUnits = ["--set", "t [h]", "=BARY.INTO(B3,B$2,C$2)"];
const unitsNote =
  "Row 2 was read as a row of units, so formulas are those of row 3; --units-row no reads it as data.\n";

/** What stands in the file and what is to come out, each difference typed by hand; RFC 4180 for the quotes. */
const tables: readonly (readonly [name: string, words: string[], text: string, filled: string, note: string])[] = [
  ["commas", hours, "Star,P [d]\nA,2\nB,0.5\n", "Star,P [d],t [h]\nA,2,48\nB,0.5,12\n", ""],
  ["tabs", hours, "Star\tP [d]\nA\t2\nB\t0.5\n", "Star\tP [d]\tt [h]\nA\t2\t48\nB\t0.5\t12\n", ""],
  ["bars", hours, "Star|P [d]\nA|2\n", "Star|P [d]|t [h]\nA|2|48\n", ""],
  [
    "semicolons, byte order mark, CRLF, comments, row of units",
    hoursUnderUnits,
    '\uFEFF# survey; of 2026, "quoted\r\nStar;P\r\n;d\r\n# first night\r\nA;2\r\n\r\nB; 0.5 \r\n# end',
    '\uFEFF# survey; of 2026, "quoted\r\nStar;P;t [h]\r\n;d;h\r\n# first night\r\nA;2;48\r\n\r\nB; 0.5 ;12\r\n# end',
    unitsNote,
  ],
  [
    "a row of units with a dash",
    hoursUnderUnits,
    "Star,P\n-,days\nA,2\n",
    "Star,P,t [h]\n-,days,h\nA,2,48\n",
    unitsNote,
  ],
  [
    "quoted fields with delimiters, quotes and line breaks",
    hours,
    '"Star, name","P [d]"\n"a ""b"", c\nd","2"\n e ,1\n',
    '"Star, name","P [d]",t [h]\n"a ""b"", c\nd","2",48\n e ,1,24\n',
    "",
  ],
  ["no line break at the end", hours, "Star,P [d]\nA,2", "Star,P [d],t [h]\nA,2,48", ""],
  ["mixed line endings", hours, "Star,P [d]\r\nA,2\nB,1\r\n", "Star,P [d],t [h]\r\nA,2,48\nB,1,24\r\n", ""],
  [
    "numbers as they were written, identifiers, long integers",
    ["--set", "Id", '=A2&"/"&B2'],
    "Gaia,Short,x\n5853498713190525696,007,1.10\n5853498713190525697,010,+1e3\n",
    "Gaia,Short,x,Id\n5853498713190525696,007,1.10,5853498713190525696/007\n5853498713190525697,010,+1e3,5853498713190525697/010\n",
    "",
  ],
  [
    "new headers and texts that need quotes",
    ["--set", "x, y", '="u;v"', "--set", 'say "k"', '="# """&A2'],
    "a,b\n1,2\n",
    'a,b,"x, y","say ""k"""\n1,2,"u;v","# ""1"\n',
    "",
  ],
  ["a header and no rows", hours, "Star,P [d]\n", "Star,P [d],t [h]\n", "The table has a header and no rows.\n"],
  [
    "one column",
    ["--set", "y", "=A2+1"],
    "x\n1\n2\n",
    "x,y\n1,2\n2,3\n",
    "The table has a single column; if there should be more, name the character between them: comma, semicolon, tab or bar.\n",
  ],
  [
    "ragged rows",
    ["--set", "y", "=A2*10"],
    "a,b\n1,2\n3\n4,5,6\n7,8,9\n",
    "a,b,,y\n1,2,,10\n3,,,30\n4,5,6,40\n7,8,9,70\n",
    "Line 3 (row 2) has 1 field where the header has 2; the missing cells are blank.\n" +
      "Line 4 (row 3) has 3 fields where the header has 2, and so on in 2 rows in all; column C has no header, added columns stand to the right of that. Is a delimiter inside a text without quotes?\n",
  ],
  [
    "two columns of one name",
    ["--set", "y", "=C2"],
    "a,b,a\n1,2,3\n",
    "a,b,a,y\n1,2,3,3\n",
    'The header "a" stands over columns A and C; refer to them by their letters, or rename all but one.\n',
  ],
  [
    "a new column of a name that is there",
    ["--set", "b", "=A2", "--set", "c", "=B2", "--set", "c", "=B2"],
    "a,b\n1,2\n",
    "a,b,b,c,c\n1,2,1,2,2\n",
    'The header "b" of column C stands over column B already.\nThe header "c" of column E stands over column D already.\n',
  ],
  [
    "a quote that is never closed",
    ["--set", "y", "=A2"],
    'a,b\n1,"2\n3,4\n',
    'a,b,y\n1,"2\n3,4\n",1',
    "Line 2 (row 1) opens a quote that is never closed; all that follows was read as one field. Close the quote, or write it twice within quotes.\n",
  ],
];

describe.concurrent("the text of the table stays, fields are appended", () => {
  test.each(tables)("%s", async (_, words, text, filled, before) => {
    const { code, out, note } = await fill(text, ...words);
    expect(out).toBe(filled);
    expect(note.startsWith(before)).toBe(true);
    expect(note.slice(before.length)).toMatch(/^\d rows?; \d columns? added \([^\n]*\); no cell needs attention\.\n$/);
    expect(code).toBe(0);
  });

  test("what the analyst says of the layout goes before what is found", async () => {
    const text = "a;b,c\n1;2,3\n";
    const given = await fill(text, "--delimiter", "semicolon", "--set", "y", "=A2");
    expect(given.out).toBe("a;b,c;y\n1;2,3;1\n");
    const data = await fill("P\nd\n2\n", "--units-row", "no", "--set", "y", "=A2");
    expect(data.out).toBe("P,y\nd,d\n2,2\n");
  });

  test("UTF-16 is read, UTF-8 is written", async () => {
    const { out, note } = await fill(Buffer.from("\uFEFFStar,P [d]\n\u03c5 And,2\n", "utf16le"), ...hours);
    expect(out).toBe("\uFEFFStar,P [d],t [h]\n\u03c5 And,2,48\n");
    expect(note).toMatch(/UTF-16LE.*saved from it is UTF-8/);
  });
});

describe.concurrent("columns", () => {
  test("refer to columns added before and after them", async () => {
    const words = ["--set", "y", "=A2*2", "--set", "z", "=B2+D2", "--set", "w", "=A2*100"];
    expect((await fill("x\n1\n3\n", ...words)).out).toBe("x,y,z,w\n1,2,102,100\n3,6,306,300\n");
  });

  test("count on from the row above, header included", async () => {
    const words = ["--set", "n", "=N(B1)+1", "--set", "sum", "=SUM(A$2:A2)", "--set", "last", "=N(D1)+A2"];
    expect((await fill("x\n5\n6\n7\n", ...words)).out).toBe("x,n,sum,last\n5,1,5,5\n6,2,11,11\n7,3,18,18\n");
  });

  test("of uncertainties stand beside a result, under headers", async () => {
    const text = "m [kg],dm,up,down\n2,0.5,1,0.25\n4,0.25,0.5,1\n";
    const words = ["--set", "m [g]", "=BARY.INTO(A2:B2,A$1,E$1)"];
    expect((await fill(text, ...words)).out).toBe(
      "m [kg],dm,up,down,m [g],m sigma [g]\n2,0.5,1,0.25,2000,500\n4,0.25,0.5,1,4000,250\n",
    );
    const sides = await fill(
      "m [kg],up,down\n2,1,0.25\n",
      "--set",
      "m [g]",
      "=BARY.INTO(A2:C2,A$1,D$1)",
      "--set",
      "n",
      "=D2/A2",
    );
    expect(sides.out).toBe("m [kg],up,down,m [g],m sigma+ [g],m sigma- [g],n\n2,1,0.25,2000,1000,250,1000\n");
  });

  test("beside a result that is no measurement are counted, none is lost", async () => {
    const words = ["--set", "y", "=A2:B2", "--set", "z [d]", "=A2:D2", "--set", "end", "=1"];
    expect((await fill("a,b,c,d\n1,2,3,4\n", ...words)).out).toBe(
      "a,b,c,d,y,y 2,z [d],z 2 [d],z 3 [d],z 4 [d],end\n1,2,3,4,1,2,1,2,3,4,1\n",
    );
  });

  test("a blank cell that need not be filled stays blank", async () => {
    // A blank eccentricity means a circular orbit: both rows have the same K.
    const text = "P [d],e\n4.5,\n4.5,0\n";
    const words = ["--set", "K [m/s]", '=BARY.REFLEX(A2,"1 solMass","1 jupiterMass",B2,,"d;;;1",C$1)'];
    const rows = (await fill(text, ...words)).out.split("\n");
    expect(rows[0]).toBe("P [d],e,K [m/s]");
    expect(rows[1]).toMatch(/^4\.5,,\d+\.\d+$/);
    expect(rows[1]!.slice(5)).toBe(rows[2]!.slice(6));
  });

  test("--show prints the first rows for the eye", async () => {
    const { out, note } = await fill("Star,P [d]\nA,2\nB,0.3333333\nC,1\n", "--show", "2", ...hours);
    // Aligned, six significant digits.
    expect(out).toBe("Star     P [d]  t [h]\nA            2     48\nB     0.333333      8\nand 1 more row\n");
    expect(note).toBe('3 rows; 1 column added (C "t [h]"); no cell needs attention.\n');
  });
});
