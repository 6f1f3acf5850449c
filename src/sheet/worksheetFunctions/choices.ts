/** A place where ISO/IEC 26300-3 leaves the behaviour to the evaluator, and what is done here. */
export interface Choice {
  readonly section: string;
  readonly topic: string;
  readonly here: string;
}

const rows: readonly (readonly [string, string, string])[] = [
  [
    "3.4",
    "Criteria and searches",
    "the whole cell, without regard to case; ? and * stand for characters, ~ before them for themselves",
  ],
  [
    "4.3.3",
    "Epoch of dates",
    "the 1900 date system: serial 1 is 1 January 1900, 60 is 29 February 1900, which never was; 0 to 2958465",
  ],
  ["4.5", "Logicals", "a type of their own: TRUE=1 is FALSE, SUM leaves TRUE in a range out"],
  [
    "5.6",
    "Empty arguments",
    'a blank cell, so 0, "" or FALSE; the default in CEILING, FLOOR, INDEX, and in functions that the standard does not know',
  ],
  [
    "6.3.5",
    "Text as number",
    "decimal and exponent forms, comma groups, %, ISO 8601 dates and times; other text is #VALUE!",
  ],
  ["6.3.12", "Text as logical", "TRUE and FALSE in any letters; other text is #VALUE!"],
  ["6.3.13", "Numbers in a range of AND, OR, XOR", "count: 0 is FALSE, others TRUE; text and blanks are left out"],
  ["6.3.14", "Number as text", "the shortest text that reads back as the same double, capital E: 0.1, 1E-7, 1E+21"],
  ["6.4.7", "Equality of texts", "without regard to case"],
  ["6.4.9", "Order of texts", "by code points of small letters, the same on every machine"],
  ["6.4.6", "0^0", "#NUM!"],
  ["6.10.2", "Years below 1900 in DATE", "count from 1900"],
  ["6.12.24", "IRR, XIRR, RATE", "the root nearest to the guess, or #NUM!; never a step that did not settle"],
  ["6.16.10", "ATAN2(0,0)", "#DIV/0!"],
  ["6.16.62", "Sum range smaller than the range", "#VALUE!: the cells beside it are not taken in silently"],
  ["6.17.5", "Halves in ROUND", "away from zero, on the number as typed: ROUND(2.675,2) is 2.68"],
  [
    "6.18.22",
    "Names of FDIST, FINV, CHIDIST, CHIINV, TDIST, NORMSDIST",
    "as worksheet files have them: the functions that the standard calls LEGACY.FDIST and so on",
  ],
  ["6.20.13", "Characters", "count as Unicode has them"],
  ["6.20.23", "Formats of TEXT", "the codes that worksheet files hold; names of months and days in English"],
];

/** The choices that the documentation lists. */
export const choices: readonly Choice[] = rows.map(([section, topic, here]) => ({ section, topic, here }));
