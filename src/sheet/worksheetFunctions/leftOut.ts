/** A function that worksheet files may hold and that is not computed here, with the reason for the analyst. */
export interface LeftOut {
  readonly name: string;
  readonly reason: string;
}

const clock = "it would change the sheet with the clock; type the date instead";
const chance = "it would change the sheet at every recalculation; paste numbers drawn once instead";
const network = "it would need the network, which this program never uses";
const program = "it asks about another program or its screen";
const hidden = "it depends on which rows are hidden; use SUM, AVERAGE or COUNT over FILTER instead";
const bytes = "it counts the bytes of old encodings; use the function without the B, which counts characters";
const bonds = "it prices bonds by calendars that are outside the purpose of this program";

const bondFunctions =
  "ACCRINT ACCRINTM AMORDEGRC AMORLINC COUPDAYBS COUPDAYS COUPDAYSNC COUPNCD COUPNUM COUPPCD DISC DURATION EUROCONVERT " +
  "INTRATE MDURATION ODDFPRICE ODDFYIELD ODDLPRICE ODDLYIELD PRICE PRICEDISC PRICEMAT RECEIVED TBILLEQ TBILLPRICE " +
  "TBILLYIELD VDB YIELD YIELDDISC YIELDMAT";
const byteFunctions = "FINDB LEFTB LENB MIDB REPLACEB RIGHTB SEARCHB";

/** Names of functions that are left out on purpose, so that a message can say why. */
export const leftOut: readonly LeftOut[] = [
  ...["NOW", "TODAY"].map((name) => ({ name, reason: clock })),
  ...["RAND", "RANDBETWEEN", "RANDARRAY"].map((name) => ({ name, reason: chance })),
  ...["WEBSERVICE", "HYPERLINK", "DDE", "RTD", "IMAGE", "STOCKHISTORY"].map((name) => ({ name, reason: network })),
  ...["INFO", "CELL", "GETPIVOTDATA"].map((name) => ({ name, reason: program })),
  ...["SUBTOTAL", "AGGREGATE"].map((name) => ({ name, reason: hidden })),
  ...byteFunctions.split(" ").map((name) => ({ name, reason: bytes })),
  ...bondFunctions.split(" ").map((name) => ({ name, reason: bonds })),
];
