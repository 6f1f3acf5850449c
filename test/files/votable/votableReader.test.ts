import { describe, expect, test } from "vitest";
import { read, readPieces, refusal, rowsOf, sentencesOf } from "../table/read.js";

/** IVOA VOTable 1.4 (Recommendation 2019-10-21) and 1.5; the tables are invented. */
const top = '<?xml version="1.0"?>\n<VOTABLE version="1.4" xmlns="http://www.ivoa.net/xml/VOTable/v1.3">';
const votable = (inside: string) => `${top}<RESOURCE>${inside}</RESOURCE></VOTABLE>`;
const oneTable = (fields: string, data: string) => votable(`<TABLE>${fields}<DATA>${data}</DATA></TABLE>`);
const rows = (...texts: string[][]) =>
  `<TABLEDATA>${texts.map((row) => `<TR>${row.map((text) => `<TD>${text}</TD>`).join("")}</TR>`).join("\n")}</TABLEDATA>`;

const fields = `<DESCRIPTION>Invented planets</DESCRIPTION>
<FIELD name="Name" datatype="char" arraysize="*" ucd="meta.id;meta.main"/>
<FIELD name="P" datatype="double" unit="d" ucd="time.period"><DESCRIPTION>Orbital
  period</DESCRIPTION></FIELD>
<FIELD name="M" datatype="float" unit="'jupiterMass'" ucd="phys.mass"/>
<FIELD name="dM" datatype="float" unit="'jupiterMass'" ucd="phys.mass;stat.error"/>
<FIELD name="n" datatype="int"><VALUES null="-99"><MIN value="0"/></VALUES></FIELD>
<FIELD name="ok" datatype="boolean"/>`;

describe("VOTable 1.4 TABLEDATA", () => {
  const table = read(
    oneTable(
      fields,
      rows(
        ["A &amp; &#66;", "4.25", "0.5", "0.1", "-99", "true"],
        ["  x ", "", "NaN", "+InF", "0xff", "F"],
        ["", " 1 ", "-0", "1e-3", "7", "?"],
      ),
    ),
  );

  test("units, uncertainties and descriptions stand in the header and beside it", () => {
    expect(table.format).toBe("votable");
    expect(table.header).toEqual(["Name", "P [d]", "M [jupiterMass]", "dM sigma [jupiterMass]", "n", "ok"]);
    expect(table.notes[1]).toEqual({ name: "P", unit: "d", description: "Orbital period", ucd: "time.period" });
    expect(table.notes[3]).toMatchObject({ name: "dM", unit: "'jupiterMass'" });
    expect(table.description).toBe("Invented planets");
  });

  test("cells are of the declared types, with their nulls", () => {
    expect(rowsOf(table)).toEqual([
      ["A & B", 4.25, 0.5, 0.1, null, true],
      ["  x ", null, null, "+InF", 255, false],
      [null, 1, -0, 0.001, 7, null],
    ]);
  });

  test("comments, CDATA, prefixes and attributes change nothing", () => {
    const text = `<?xml version="1.0"?><v:VOTABLE xmlns:v="u"><!-- c > --><v:RESOURCE><v:TABLE><v:FIELD name="a" datatype="char" arraysize="*"/><v:DATA><v:TABLEDATA>
      <v:TR ID="r"><v:TD>x<!-- y --><![CDATA[<&>]]></v:TD></v:TR><v:TR><v:TD/></v:TR></v:TABLEDATA></v:DATA></v:TABLE></v:RESOURCE></v:VOTABLE>`;
    expect(rowsOf(read(text))).toEqual([["x<&>"], [null]]);
  });

  test("rows plain and not plain in turn keep their order, however the text is cut", () => {
    const text = oneTable(
      '<FIELD name="a" datatype="char" arraysize="*"/><FIELD name="b" datatype="short"/>',
      `<TABLEDATA>
      <TR><TD>one</TD><TD>1</TD></TR><TR><TD>t&lt;o</TD><TD>2</TD></TR>
      <TR ><TD>three</TD><TD>3</TD></TR>\r\n<TR><TD>fo\r\nur</TD><TD/></TR><TR><TD></TD><TD> 5 </TD></TR></TABLEDATA>`,
    );
    const expected = [["one", 1], ["t<o", 2], ["three", 3], ["fo\nur", null], [null, 5]]; // biome-ignore format: a row a line
    expect(rowsOf(read(text))).toEqual(expected);
    for (const size of [1, 2, 3, 7, 64]) {
      const pieces = Array.from({ length: Math.ceil(text.length / size) }, (_, index) =>
        new TextEncoder().encode(text.slice(index * size, (index + 1) * size)),
      );
      expect(rowsOf(readPieces(pieces))).toEqual(expected);
    }
  });

  test("arrays are read as text, and told", () => {
    const table = read(
      oneTable(
        '<FIELD name="v" datatype="double" arraysize="2"/><FIELD name="z" datatype="floatComplex"/>',
        rows(["1 2", "0.5 0.25"]),
      ),
    );
    expect(rowsOf(table)).toEqual([["1 2", "0.5 0.25"]]);
    expect(sentencesOf(table)).toEqual([
      'Column "v" holds several values a cell (double[2]); they were read as text.',
      'Column "z" holds several values a cell (floatComplex); they were read as text.',
    ]);
  });
});

describe("VOTable 1.4 BINARY and BINARY2 (sections 5.2 and 5.4)", () => {
  // Bytes written by hand from the standard: big-endian, a length before what varies, a bit a field for no value.
  const described =
    '<FIELD name="s" datatype="short"/><FIELD name="t" datatype="char" arraysize="*"/><FIELD name="u" datatype="unicodeChar" arraysize="2"/><FIELD name="d" datatype="double"/><FIELD name="l" datatype="long"/><FIELD name="b" datatype="bit" arraysize="3"/><FIELD name="o" datatype="boolean"/>';
  const first = [
    0xff, 0xfe, 0, 0, 0, 2, 0x68, 0x69, 0x03, 0xb1, 0, 0, 0x3f, 0xf8, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 7,
    0b10100000, 0x54,
  ];
  const second = [0, 5, 0, 0, 0, 0, 0, 0, 0, 0, 0x7f, 0xf8, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 8, 0, 0x3f];
  const stream = (bytes: number[]) =>
    `<STREAM encoding="base64">\n${Buffer.from(bytes).toString("base64").replace(/.{8}/g, "$&\n")}</STREAM>`;

  test("BINARY", () => {
    expect(rowsOf(read(oneTable(described, `<BINARY>${stream([...first, ...second])}</BINARY>`)))).toEqual([
      [-2, "hi", "\u03b1", 1.5, 7, "1 0 1", true],
      [5, null, null, null, 8, "0 0 0", null],
    ]);
  });

  test("BINARY2 tells an empty text from none", () => {
    expect(
      rowsOf(read(oneTable(described, `<BINARY2>${stream([0, ...first, 0b10001000, ...second])}</BINARY2>`))),
    ).toEqual([
      [-2, "hi", "\u03b1", 1.5, 7, "1 0 1", true],
      [null, "", "", null, null, "0 0 0", null],
    ]);
  });

  test("integers that a double would round stay whole", () => {
    const bytes = [0x11, 0x22, 0x10, 0xf4, 0x7d, 0xe9, 0x81, 0x15];
    const table = read(
      oneTable('<FIELD name="id" datatype="long"/>', `<BINARY>${stream([...bytes, 0, 0, 0, 0, 0, 0, 0, 9])}</BINARY>`),
    );
    expect(rowsOf(table)).toEqual([["1234567890123456789"], ["9"]]);
  });

  test.each([
    ["cut off", `<BINARY>${stream(first.slice(0, -3))}</BINARY>`, "The VOTable's binary data end within row 1"],
    [
      "not base64",
      '<BINARY><STREAM encoding="base64">ab*d</STREAM></BINARY>',
      'The VOTable\'s binary data are not base64: they hold "*"',
    ],
    [
      "another encoding",
      '<BINARY><STREAM encoding="gzip">ab</STREAM></BINARY>',
      'The VOTable\'s binary data are encoded as "gzip"',
    ],
    [
      "elsewhere",
      '<BINARY><STREAM href="file:///etc/passwd"/></BINARY>',
      "The VOTable holds its data in another file, which is not read",
    ],
    [
      "FITS",
      '<FITS><STREAM encoding="base64"/></FITS>',
      "The VOTable holds its data in a FITS file, which is not read",
    ],
  ])("%s is refused", (_, data, reason) => {
    expect(refusal(oneTable(described, data))).toContain(reason);
  });
});

describe("a file of several tables", () => {
  const one =
    '<TABLE name="stars"><FIELD name="s" datatype="int"/><DATA><TABLEDATA><TR><TD>1</TD></TR></TABLEDATA></DATA></TABLE>';
  const two =
    '<TABLE ID="t2" nrows="3"><FIELD name="p" datatype="int"/><DATA><TABLEDATA><TR><TD>2</TD></TR></TABLEDATA></DATA></TABLE>';
  const empty = '<TABLE name="none"><FIELD name="x" datatype="int"/></TABLE>';
  const text = votable(empty + one + two);

  test("the first with data is read, and the others are told", () => {
    expect(rowsOf(read(text))).toEqual([[1]]);
    expect(sentencesOf(read(text))).toEqual([
      'The file holds 3 tables; "stars" was read. The others are "none", "t2"; name one to read it instead.',
    ]);
  });

  test.each([
    ["t2", 2],
    ["3", 2],
    ["stars", 1],
  ])("%s is read where it is asked for", (table, value) => {
    // biome-ignore format: short
    expect(rowsOf(read(text, { table }))).toEqual([[value]]);
  });

  test("one that is cut off and one that is not there", () => {
    expect(sentencesOf(read(text, { table: "t2" }))).toContain(
      "The file says it has 3 rows and has 1; it may have been cut off.",
    );
    expect(refusal(text, { table: "moons" })).toBe(
      'The VOTable holds no table "moons"; it holds "none", "stars", "t2".',
    );
  });
});

describe("what else a VOTable says", () => {
  test("parameters and information are kept as remarks, errors of the service are told", () => {
    const table = read(
      votable(
        '<INFO name="QUERY_STATUS" value="OVERFLOW"/><INFO name="comment" value="kept"/><PARAM name="epoch" datatype="double" unit="yr" value="2016.0"/><TABLE><GROUP><FIELDref ref="a"/></GROUP><FIELD ID="a" name="a" datatype="int"/><DATA><TABLEDATA/></DATA></TABLE>',
      ),
    );
    expect(table.remarks).toEqual(["kept", "epoch = 2016.0 yr"]);
    expect(sentencesOf(table)).toEqual([
      "The service that made the file cut the table off (overflow); ask it for more rows if all are needed.",
      "The table has a header and no rows.",
    ]);
    const failed = votable('<INFO name="QUERY_STATUS" value="ERROR">no such column "x"</INFO>');
    expect(refusal(failed)).toBe('The VOTable holds no TABLE; the service that made it reports: "no such column "x"".');
  });

  // VOTable 1.4, section 3.5: TIMESYS.
  test.each([
    ["TDB", "BARYCENTER", "JD-origin", "t [BJD_TDB]"],
    ["UTC", "TOPOCENTER", "MJD-origin", "t [MJD_UTC]"],
    ["TCB", "BARYCENTER", "2455197.5", "t [BJD_TCB-2455197.5]"],
    ["UNKNOWN", "BARYCENTER", "0", "t [d]"],
  ])("days of %s at %s from %s", (timescale, refposition, timeorigin, header) => {
    const system = `<TIMESYS ID="s" timescale="${timescale}" refposition="${refposition}" timeorigin="${timeorigin}"/>`;
    const table = '<TABLE><FIELD name="t" datatype="double" unit="d" ref="s"/><DATA><TABLEDATA/></DATA></TABLE>';
    expect(read(votable(system + table)).header).toEqual([header]);
  });
});

describe("what is no VOTable, or is one to beware of, is refused in a sentence", () => {
  const bomb = `<?xml version="1.0"?><!DOCTYPE VOTABLE [<!ENTITY a "aaaaaaaaaa">${Array.from({ length: 9 }, (_, i) => `<!ENTITY ${"bcdefghij"[i]} "${`&${"abcdefghij"[i]};`.repeat(10)}">`).join("")}]><VOTABLE>&j;</VOTABLE>`;
  test.each([
    ["entities", bomb, "The file has a document type declaration"],
    [
      "a document type alone",
      '<!DOCTYPE VOTABLE SYSTEM "file:///etc/passwd"><VOTABLE/>',
      "The file has a document type declaration",
    ],
    [
      "an entity that nobody defined",
      oneTable('<FIELD name="a" datatype="char"/>', rows(["&lol;"])),
      "its XML is broken or was cut off (undefined entity)",
    ],
    ["other XML", '<?xml version="1.0"?><svg/>', "The file is XML of another kind (<svg>)"],
    ["a web page", "<!doctype html><html></html>", "The file is a web page, not a table"],
    [
      "cut off",
      oneTable('<FIELD name="a" datatype="int"/>', rows(["1"])).slice(0, -40),
      "its XML is broken or was cut off",
    ],
    ["no fields", oneTable("", rows(["1"])), "The VOTable's table has no FIELD, so no columns."],
    ["a datatype", oneTable('<FIELD name="a" datatype="constructor"/>', rows()), 'has the datatype "constructor"'],
    [
      "an arraysize",
      oneTable('<FIELD name="a" datatype="int" arraysize="x2y"/>', rows()),
      'has the arraysize "x2y", which is no size',
    ],
  ])("%s", (_, text, reason) => {
    const message = refusal(text);
    expect(message).toContain(reason);
    expect(message.length).toBeLessThanOrEqual(250);
  });

  test("names that mean something to the language are names", () => {
    const table = read(
      oneTable(
        '<FIELD name="__proto__" datatype="int"/><FIELD name="constructor" datatype="int" ref="__proto__" ucd="toString"/>',
        rows(["1", "2"]),
      ),
    );
    expect([table.header, rowsOf(table)]).toEqual([["__proto__", "constructor"], [[1, 2]]]);
  });
});
