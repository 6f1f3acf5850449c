/** How a function takes a range: each of its cells by itself, as a whole, or in a way not told here. */
export type Taking = "single" | "whole" | "free";

/** Functions all of whose arguments are single values: the signatures of ECMA-376 part 1, section 18.17.7. */
const singles = new Set(
  `ABS ACOS ACOSH ASIN ASINH ATAN ATAN2 ATANH CEILING COMBIN COS COSH DEGREES EVEN EXP FACT FACTDOUBLE FLOOR INT LN LOG
  LOG10 MOD MROUND ODD PERMUT PI POWER QUOTIENT RADIANS ROMAN ROUND ROUNDDOWN ROUNDUP SIGN SIN SINH SQRT SQRTPI TAN TANH
  TRUNC ISBLANK ISERR ISERROR ISEVEN ISLOGICAL ISNA ISNONTEXT ISNUMBER ISODD ISTEXT NOT NA TRUE FALSE N T ERROR.TYPE CHAR
  CLEAN CODE CONCATENATE EXACT FIND FIXED LEFT LEN LOWER MID PROPER REPLACE REPT RIGHT SEARCH SUBSTITUTE TEXT TRIM UPPER
  VALUE DATE DATEVALUE DAY DAYS360 HOUR MINUTE MONTH SECOND TIME TIMEVALUE WEEKDAY YEAR ADDRESS BETADIST BETAINV
  BINOMDIST CHIDIST CHIINV CONFIDENCE CRITBINOM EXPONDIST FDIST FINV FISHER FISHERINV GAMMADIST GAMMAINV GAMMALN
  HYPGEOMDIST LOGINV LOGNORMDIST NEGBINOMDIST NORMDIST NORMINV NORMSDIST NORMSINV POISSON STANDARDIZE TDIST TINV WEIBULL
  DB DDB FV IPMT ISPMT NPER PMT PPMT PV RATE SLN SYD IFERROR IFNA`.split(/\s+/),
);

/** Functions all of whose arguments may be ranges, and whose result is one value. */
const wholes = new Set(
  `AND AVEDEV AVERAGE AVERAGEA COUNT COUNTA COUNTBLANK DEVSQ GEOMEAN HARMEAN KURT MAX MAXA MEDIAN MIN MINA OR PRODUCT SKEW
  STDEV STDEVA STDEVP STDEVPA SUM SUMSQ VAR VARA VARP VARPA STDEV.S STDEV.P VAR.S VAR.P XOR ROWS COLUMNS`.split(/\s+/),
);

/** Functions of which these arguments may be ranges, and whose result is one value. */
const some: ReadonlyMap<string, readonly number[]> = new Map([
  ["COUNTIF", [0]],
  ["SUMIF", [0, 2]],
  ["AVERAGEIF", [0, 2]],
  ["MATCH", [1]],
  ["VLOOKUP", [1]],
  ["HLOOKUP", [1]],
  ["LARGE", [0]],
  ["SMALL", [0]],
  ["RANK", [1]],
  ["PERCENTILE", [0]],
  ["PERCENTRANK", [0]],
  ["QUARTILE", [0]],
  ["TRIMMEAN", [0]],
  ["NPV", [1, 2, 3, 4, 5]],
  ["IRR", [0]],
]);

/** Functions that look at arrays themselves: within their arguments nothing is one cell of a range, the result is one. */
const arrays = new Set(
  "SUMPRODUCT CORREL COVAR PEARSON SLOPE INTERCEPT RSQ STEYX SUMX2MY2 SUMX2PY2 SUMXMY2".split(" "),
);

/** How a function takes its argument at an index. */
export function takingOf(name: string, index: number): Taking {
  if (singles.has(name)) {
    return "single";
  }
  if (wholes.has(name)) {
    return "whole";
  }
  const indices = some.get(name);
  return indices === undefined ? "free" : indices.includes(index) ? "whole" : "single";
}

/** Whether the result is one value whatever ranges the arguments are. */
export function givesOneValue(name: string): boolean {
  return wholes.has(name) || some.has(name) || arrays.has(name);
}

export function takesArrays(name: string): boolean {
  return arrays.has(name);
}
