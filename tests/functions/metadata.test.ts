import { gzipSync } from "node:zlib";
import { built, metadata, shippedFunctions } from "../support/host-runtime";

const { functions, allowErrorForDataTypeAny, allowCustomDataForDataTypeAny } = metadata();

/** What the catalogue asks for in this release. */
const CATALOGUE = [
  "WATERPCT", "DRYBASIS", "SOILDRY", "SOILWET", "VOIDFREE", "AIRLINE", "SATLINE", "FULLWATER", "SATPCT", "AIRPCT", "VOIDRATIO", "POREPCT", "LEASTGS", "PASTZAV", "WATERDENS", "DENSITYAS",
  "MOULDVOL", "MIXWATER", "WHOLEDRY", "WHOLEWATER", "FINEDRY", "FINEWATER",
  "MOULDWET", "BLOWWORK", "PEAKFIT", "PEAKDRY", "PEAKWATER", "CURVEDRY", "CURVEFLAGS",
  "PEAKTABLE", "CURVEKIND", "WATERSPAN", "FAMILYPICK", "RAPIDPEAK", "EFFORTPEAK", "PLASTICPEAK",
  "RELCOMP", "WATERGAP", "WATERRATIO", "RELDENSITY", "SANDCONE", "HOLEWET", "SANDDENS", "CONESAND", "GAUGEDRY", "GAUGEOFFSET", "PASSCHANCE", "FILLVERDICT",
  "LOTWITHIN", "LOTCHAR", "LOTSPOTS", "LOTTESTS",
  "WATERADD", "BANKVOL", "SWELLPCT", "SHRINKPCT", "LOOSELIFT", "SANDBULK", "WATERSPRAY", "DRYTIME", "BLENDWATER", "BLENDSHARE", "FINESFILL", "ROLLRATE", "ROLLFIT", "GRADEWELL",
];

test("every function of the catalogue is there, once, in metadata and bundle alike", () => {
  const ids = functions.map((fn) => fn.id);
  expect([...ids].sort()).toEqual([...CATALOGUE].sort());
  expect([...shippedFunctions().names].sort()).toEqual([...CATALOGUE].sort());
});

test("errors may come in, rich data types may not", () => {
  expect(allowErrorForDataTypeAny).toBe(true);
  expect(allowCustomDataForDataTypeAny).toBe(false);
});

/** The host's own functions of three to ten letters that a word of ours could meet. Source: ECMA-376 part 1, 18.17.7, and the function lists of the later versions. */
const NATIVE = [
  "ABS", "ACCRINT", "ADDRESS", "AGGREGATE", "AREAS", "AVERAGE", "BASE", "BYCOL", "BYROW", "CEILING", "CELL", "CHAR", "CHOOSE", "CLEAN", "CODE", "COLUMN", "COMBIN", "CONCAT", "CONVERT", "CORREL", "COUNT", "COVAR", "DATE", "DAYS", "DROP", "EXACT", "EXPAND",
  "FILTER", "FIND", "FLOOR", "FORECAST", "GROWTH", "HLOOKUP", "INDEX", "INTERCEPT", "LARGE", "LET", "LINEST", "LOOKUP", "MATCH", "MEDIAN", "MODE", "OFFSET", "PERCENTOF", "PROB", "RANK", "RATE", "REDUCE", "ROUND", "ROWS", "SCAN", "SEARCH", "SEQUENCE",
  "SLOPE", "SMALL", "SORT", "STDEV", "STEYX", "SUM", "TAKE", "TEXT", "TREND", "TRIM", "UNIQUE", "VALUE", "VAR", "VSTACK", "WRAPROWS", "XLOOKUP", "XMATCH", "YIELD",
];
test("no function bears the name of one of the host's own", () => { for (const { id } of functions) expect(NATIVE).not.toContain(id); });

/** A name that looks like a cell of a sheet, A1 to XFD1048576 or R1C1, cannot be typed as a function. */
const CELL_SHAPE = /^([A-Z]{1,3}\d+|R\d*C\d*)$/;

describe.each(functions.map((fn) => [fn.id, fn] as const))("%s", (id, fn) => {
  test("has a name the host takes", () => {
    expect(fn.name).toBe(id);
    expect(id).toMatch(/^[A-Z][A-Z0-9]{2,}$/);
    expect(id).not.toMatch(CELL_SHAPE);
  });
  test("is described so that a practitioner understands it", () => {
    expect(fn.description).toMatch(/^[A-Z].{20,}\.$/s);
    for (const parameter of fn.parameters) {
      expect([parameter.name, parameter.description]).toEqual([parameter.name, expect.stringMatching(/^[A-Z].{10,}\.$/s)]);
      // cells or whole columns for every argument
      expect(parameter.dimensionality).toBe("matrix");
    }
  });
  test("optional arguments come last", () => {
    const optional = fn.parameters.map((parameter) => parameter.optional === true);
    expect([...optional].sort()).toEqual(optional);
  });
});

test("functions.js is at most 40 kB gzipped", () => expect(gzipSync(built("functions.js")).length).toBeLessThanOrEqual(40 * 1024));
