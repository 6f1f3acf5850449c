/**
 * Functions that are younger than ECMA-376 part 1, section 18.17.7, and stand in files with a prefix
 * ([MS-XLSX] section 2.2.3, future functions).
 */
const prefixed = new Set(
  `ACOT ACOTH AGGREGATE ARABIC BASE BETA.DIST BETA.INV BINOM.DIST BINOM.DIST.RANGE BINOM.INV BITAND BITLSHIFT BITOR
  BITRSHIFT BITXOR BYCOL BYROW CEILING.MATH CEILING.PRECISE CHISQ.DIST CHISQ.DIST.RT CHISQ.INV CHISQ.INV.RT CHISQ.TEST
  CHOOSECOLS CHOOSEROWS COMBINA CONCAT CONFIDENCE.NORM CONFIDENCE.T COT COTH COVARIANCE.P COVARIANCE.S CSC CSCH DAYS
  DECIMAL DROP ERF.PRECISE ERFC.PRECISE EXPAND EXPON.DIST F.DIST F.DIST.RT F.INV F.INV.RT F.TEST FILTERXML FLOOR.MATH
  FLOOR.PRECISE FORECAST.LINEAR FORMULATEXT GAMMA GAMMA.DIST GAMMA.INV GAMMALN.PRECISE GAUSS HSTACK HYPGEOM.DIST IFNA
  IFS IMCOSH IMCOT IMCSC IMCSCH IMSEC IMSECH IMSINH IMTAN ISFORMULA ISOMITTED ISOWEEKNUM LAMBDA LET LOGNORM.DIST
  LOGNORM.INV MAKEARRAY MAP MAXIFS MINIFS MODE.MULT MODE.SNGL MUNIT NEGBINOM.DIST NORM.DIST NORM.INV NORM.S.DIST
  NORM.S.INV NUMBERVALUE PDURATION PERCENTILE.EXC PERCENTILE.INC PERCENTRANK.EXC PERCENTRANK.INC PERMUTATIONA PHI
  POISSON.DIST QUARTILE.EXC QUARTILE.INC RANDARRAY RANK.AVG RANK.EQ REDUCE RRI SCAN SEC SECH SEQUENCE SHEET SHEETS
  SKEW.P SORTBY STDEV.P STDEV.S SWITCH T.DIST T.DIST.2T T.DIST.RT T.INV T.INV.2T T.TEST TAKE TEXTAFTER TEXTBEFORE
  TEXTJOIN TEXTSPLIT TOCOL TOROW UNICHAR UNICODE UNIQUE VAR.P VAR.S VSTACK WEBSERVICE WEIBULL.DIST WRAPCOLS WRAPROWS
  XLOOKUP XMATCH XOR Z.TEST`.split(/\s+/),
);
const twicePrefixed = new Set(["FILTER", "SORT"]);

/** How functions of the add-in's namespace are stored: `_xldudf_BARY_REFLEX` (common practice, no source). */
const ownPrefix = "_xldudf_BARY_";
const ownNamespace = "BARY.";

/** A function's name as a file holds it. */
export function storedName(name: string): string {
  const upper = name.toUpperCase();
  if (upper.startsWith(ownNamespace)) {
    return ownPrefix + upper.slice(ownNamespace.length);
  }
  return twicePrefixed.has(upper) ? `_xlfn._xlws.${name}` : prefixed.has(upper) ? `_xlfn.${name}` : name;
}

/** The name in formulas of what a file holds. */
export function plainName(stored: string): string {
  const own = stored.toUpperCase().startsWith(ownPrefix.toUpperCase());
  return own ? ownNamespace + stored.slice(ownPrefix.length) : stored.replace(/^(_xlfn\.|_xlws\.)+/i, "");
}
