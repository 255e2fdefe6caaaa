import { columnName, columnNumber } from "../address";

/** Parts of a formula that are not code: texts, quoted sheet names, structured references. They are left alone. */
const FIXED = /"(?:[^"]|"")*"|'(?:[^']|'')*'|\[(?:[^[\]]|\[[^[\]]*\])*\]/g;

function mapCode(formula: string, change: (code: string) => string): string {
  let result = "", at = 0;
  for (const match of formula.matchAll(FIXED)) {
    result += change(formula.slice(at, match.index)) + match[0];
    at = match.index + match[0].length;
  }
  return result + change(formula.slice(at));
}

/**
 * Functions that newer spreadsheets store with a prefix, so that older ones know them as unknown.
 * Source: ECMA-376 and MS-XLSX, future functions; the ones in common use.
 */
const PREFIXED = new Set((
  "ACOT ACOTH AGGREGATE ARABIC BASE BETA.DIST BETA.INV BINOM.DIST BINOM.DIST.RANGE BINOM.INV BITAND BITLSHIFT BITOR BITRSHIFT BITXOR CEILING.MATH CEILING.PRECISE CHISQ.DIST CHISQ.DIST.RT CHISQ.INV CHISQ.INV.RT CHISQ.TEST " +
  "COMBINA CONCAT CONFIDENCE.NORM CONFIDENCE.T COVARIANCE.P COVARIANCE.S CSC CSCH DAYS DECIMAL ERF.PRECISE ERFC.PRECISE EXPON.DIST F.DIST F.DIST.RT F.INV F.INV.RT F.TEST FILTERXML FLOOR.MATH FLOOR.PRECISE FORECAST.LINEAR FORMULATEXT " +
  "GAMMA GAMMA.DIST GAMMA.INV GAMMALN.PRECISE GAUSS HYPGEOM.DIST IFNA IFS IMCOSH IMCOT ISFORMULA ISO.CEILING ISOWEEKNUM LOGNORM.DIST LOGNORM.INV MAXIFS MINIFS MODE.MULT MODE.SNGL MUNIT NEGBINOM.DIST NETWORKDAYS.INTL NORM.DIST NORM.INV NORM.S.DIST NORM.S.INV NUMBERVALUE " +
  "PDURATION PERCENTILE.EXC PERCENTILE.INC PERCENTRANK.EXC PERCENTRANK.INC PERMUTATIONA PHI POISSON.DIST QUARTILE.EXC QUARTILE.INC RANDARRAY RANK.AVG RANK.EQ RRI SEC SECH SEQUENCE SHEET SHEETS SKEW.P STDEV.P STDEV.S SWITCH T.DIST T.DIST.2T T.DIST.RT T.INV T.INV.2T T.TEST " +
  "TEXTJOIN UNICHAR UNICODE UNIQUE VAR.P VAR.S WEIBULL.DIST WORKDAY.INTL XLOOKUP XMATCH XOR Z.TEST LET LAMBDA TOCOL TOROW TAKE DROP VSTACK HSTACK CHOOSECOLS CHOOSEROWS EXPAND WRAPROWS WRAPCOLS TEXTSPLIT TEXTBEFORE TEXTAFTER ARRAYTOTEXT VALUETOTEXT BYROW BYCOL MAP REDUCE SCAN MAKEARRAY"
).split(" "));
const WORKSHEET_PREFIXED = new Set(["FILTER", "SORT"]);
const SORT_BY = "SORTBY";

/** A stored formula in our one tongue: no prefixes, `TAMP.NAME(`, `A5#`. */
export const fromStored = (formula: string): string => mapCode(formula, (code) => code
  .replace(/_xlfn\.ANCHORARRAY\(([^()]*)\)/gi, "$1#")
  .replace(/_xlfn\.(?:_xlws\.)?|_xlpm\.|_xlws\./gi, "")
  .replace(/_xldudf_TAMP_([A-Z0-9]+)\(/gi, (_, name: string) => `TAMP.${name.toUpperCase()}(`));

/** The other way: as the office host stores it and resolves it when it opens the file. */
export const toStored = (formula: string): string => mapCode(formula, (code) => code
  .replace(/\bTAMP\.([A-Z0-9]+)\(/gi, (_, name: string) => `_xldudf_TAMP_${name.toUpperCase()}(`)
  .replace(/(?<![\w.])([A-Z][A-Z0-9.]*)\(/gi, (whole, name: string) => {
    const upper = name.toUpperCase();
    return PREFIXED.has(upper) || upper === SORT_BY ? `_xlfn.${upper}(` : WORKSHEET_PREFIXED.has(upper) ? `_xlfn._xlws.${upper}(` : whole;
  })
  .replace(/(\$?[A-Z]{1,3}\$?\d{1,7})#/gi, "_xlfn.ANCHORARRAY($1)"));

export const callsOurs = (formula: string): boolean => /\bTAMP\.[A-Z0-9]+\(/i.test(formula);

const REFERENCE = /(?<![\w.$])(\$?)([A-Z]{1,3})(\$?)(\d{1,7})(?![\w(.])|(?<![\w.$])(\$?)([A-Z]{1,3}):(\$?)([A-Z]{1,3})(?![\w(.$])|(?<![\w.$:])(\$?)(\d{1,7}):(\$?)(\d{1,7})(?![\w.(])/gi;

/** A formula moved by rows and columns, as a shared formula's followers are: what has no $ moves along. */
export function moved(formula: string, rows: number, columns: number): string {
  if (rows === 0 && columns === 0) return formula;
  const row = (fixed: string, text: string): string => `${fixed}${fixed ? text : Number(text) + rows}`;
  const column = (fixed: string, text: string): string => `${fixed}${fixed ? text : columnName(columnNumber(text) + columns)}`;
  return mapCode(formula, (code) => code.replace(REFERENCE, (whole, c$?: string, c?: string, r$?: string, r?: string, a$?: string, a?: string, b$?: string, b?: string, x$?: string, x?: string, y$?: string, y?: string) => {
    if (c !== undefined && r !== undefined) return column(c$!, c) + row(r$!, r);
    if (a !== undefined && b !== undefined) return `${column(a$!, a)}:${column(b$!, b)}`;
    if (x !== undefined && y !== undefined) return `${row(x$!, x)}:${row(y$!, y)}`;
    return whole;
  }));
}
