import { densityUnit } from "../units/density-units";
import { massUnit, volumeUnit } from "../units/mass-and-volume-units";
import type { Role } from "./table";

/**
 * Headings seen on real laboratory sheets, after lower-casing and stripping dots, underscores, brackets and units.
 * Common practice, no published source. A heading matches the longest of these that stands in it as whole words;
 * those of three letters or fewer match only as the whole heading.
 */
const SYNONYMS: Readonly<Record<Exclude<Role, "open">, readonly string[]>> = {
  waterContent: [
    "water content", "moisture content", "moist content", "field moisture content", "natural moisture content", "natural moisture", "in-situ moisture content",
    "oven moisture", "oven mc", "moisture %", "moist %", "% moist", "% moisture", "% water", "water %", "m/c", "wc", "w%", "ω", "fmc", "field mc", "nmc", "in-situ mc",
    "as-rec'd mc", "wn", "wf", "wi", "mean mc", "mean w", "average w", "average water content", "mean water content", "avg %", "avg mc", "average moisture", "w̄",
    "teneur en eau", "wassergehalt", "humedad", "%",
  ],
  dryDensity: [
    "dry density", "dry dens", "dry unit weight", "dry unit wt", "dry bulk density", "dry bulk", "dry weight density", "field dry density", "in-place dry", "in-place dry density", "in-situ dry density",
    "dd", "γd", "γdry", "ρd", "ρdry", "duw", "fdd", "gamma d", "rho d", "pd", "yd",
  ],
  wetDensity: [
    "wet density", "wet dens", "bulk density", "bulk unit weight", "bulk unit wt", "moist density", "moist unit weight", "total unit weight", "total unit wt", "total density", "wet unit weight", "wet unit wt",
    "unit wt wet", "unit weight wet", "in-situ density", "wd", "bd", "γ", "γt", "γm", "γb", "γwet", "ρ", "ρb", "ρwet", "fwd", "ipd",
  ],
  mouldAndSoil: [
    "mould + soil", "mould + wet soil", "mould and soil", "mould and wet soil", "mold + soil", "mold + wet soil", "mold and soil", "mold and wet soil", "wet soil + mould", "wet soil + mold", "wt soil + mold", "soil + mould", "soil + mold",
    "mass of mould and soil", "mass of mould + soil", "mass of mould and wet soil", "cylinder + soil", "cylinder + wet soil", "cyl + wet soil", "cylinder and soil", "gross", "gross mass", "gross weight",
  ],
  mouldMass: ["mass of mould", "mould mass", "wt of mould", "wt of mold", "weight of mould", "weight of mold", "mould weight", "mold weight", "mold mass", "mould wt", "mold wt", "mould + base", "mold + base", "empty mould", "empty mold", "mass of cylinder", "wt of cylinder", "cylinder mass"],
  wetSoil: ["wet soil in mould", "wet soil in mold", "wt wet soil", "weight of wet soil", "mass of wet soil", "mass of wet soil in mould", "m2-m1", "net wet", "compacted soil", "b-a", "wet soil mass", "wet soil", "mass of compacted soil"],
  mouldVolume: ["volume of mould", "volume of mold", "mould volume", "mold volume", "vol of mould", "vol of mold", "mould vol", "mold vol", "volume", "vol", "v", "vm", "cylinder volume", "volume of cylinder"],
  wetAndTin: [
    "wet + tin", "wet + tare", "wet + can", "wet + container", "wet soil + tin", "wet soil + tare", "wet soil + can", "wet soil + container", "tin + wet", "tin + wet soil", "can + wet", "can + wet soil", "tare + wet", "tare + wet soil", "tin and wet", "tin and wet soil", "pan + wet", "pan + wet soil", "wet + pan", "dish + wet", "wet + dish",
    "container + wet soil", "container and wet soil", "mass of tin and wet soil", "mass of container and wet soil", "mass of wet soil and tin", "mass of wet soil and container", "wet soil and tin", "wet soil and tare", "gross wet", "gross wet mass", "wet wt", "cup + wet",
  ],
  dryAndTin: [
    "dry + tin", "dry + tare", "dry + can", "dry + container", "dry soil + tin", "dry soil + tare", "dry soil + can", "dry soil + container", "tin + dry", "tin + dry soil", "can + dry", "can + dry soil", "tare + dry", "tare + dry soil", "tin and dry", "tin and dry soil", "pan + dry", "pan + dry soil", "dry + pan", "dish + dry", "dry + dish",
    "container + dry soil", "container and dry soil", "mass of tin and dry soil", "mass of container and dry soil", "mass of dry soil and tin", "mass of dry soil and container", "dry soil and tin", "dry soil and tare", "gross dry", "gross dry mass", "dry wt", "cup + dry",
  ],
  tare: ["tare", "tare mass", "wt of can", "wt of tin", "weight of can", "weight of tin", "tin wt", "tin mass", "can wt", "can mass", "pan mass", "pan wt", "mass of container", "mass of tin", "mass of can", "container mass", "empty tin", "empty can", "mass of tare", "wt of container"],
  tinNumber: ["tin no", "tin number", "tin id", "can #", "can no", "can number", "tare no", "container no", "container number", "pan id", "pan no", "dish no", "cup no", "tray no", "lid/tin", "mould no", "mold no", "mould number", "cylinder no"],
  trialWater: ["assumed w", "assumed water", "assumed water content", "assumed moisture", "approx mc", "approx water content", "target mc", "target water", "target water content", "target moisture", "trial mc", "trial water", "trial water content", "est %", "nominal mc", "nominal water content", "nominal moisture", "water added", "added", "ml added", "% added", "wtr add", "cumulative water", "δ added"],
  pointName: ["point", "point no", "trial", "trial no", "trial number", "test no", "test", "determination", "determination no", "specimen", "specimen no", "run", "run no", "no", "#", "sample", "sample no"],
  other: [
    "maximum dry density", "max dry density", "max dry", "max density", "maximum dry unit weight", "maximum density", "mdd", "mduw", "optimum water content", "optimum moisture content", "optimum moisture", "optimum water", "optimum", "omc", "owc",
    "zero air voids", "zero-air-voids", "zero air voids density", "zav", "zavd", "100% sat", "saturation line", "saturation", "degree of saturation", "sat", "% sat", "sr", "air voids", "air", "% air", "void ratio", "porosity", "relative compaction", "rc",
    "density of water", "unit weight of water", "water density", "mass of water", "wt of water", "weight of water", "moisture loss", "mass of dry soil", "wt dry soil", "weight of dry soil", "net dry", "ww", "ws", "mw", "ms",
    "past the line", "past line", "least gs", "mould factor", "mold factor", "factor", "remarks", "remark", "depth", "station", "blows", "layers", "gauge water", "specific gravity",
  ],
};

/** Short forms that mean more than one thing. They are settled by their unit or by arithmetic, else the user is asked. */
const AMBIGUOUS: Readonly<Record<string, readonly Role[]>> = {
  density: ["dryDensity", "wetDensity"], "unit weight": ["dryDensity", "wetDensity"], "unit wt": ["dryDensity", "wetDensity"], dens: ["dryDensity", "wetDensity"],
  "ρw": ["wetDensity", "other"], "γw": ["wetDensity", "other"],
  mc: ["waterContent", "tare"], w: ["waterContent", "wetSoil"], m: ["waterContent", "other"], moisture: ["waterContent", "other"], water: ["waterContent", "trialWater", "other"], d: ["dryDensity", "other"],
  m1: ["tare", "mouldMass"], m2: ["wetAndTin", "mouldAndSoil"], m3: ["dryAndTin", "other"], w1: ["tare", "mouldMass"], w2: ["wetAndTin", "mouldAndSoil"], w3: ["dryAndTin", "other"],
  tin: ["tare", "tinNumber"], can: ["tare", "tinNumber"], container: ["tare", "tinNumber"], pan: ["tare", "tinNumber"], dish: ["tare", "tinNumber"], cup: ["tare", "tinNumber"], tray: ["tare", "tinNumber"],
  mould: ["mouldMass", "tinNumber"], mold: ["mouldMass", "tinNumber"], cylinder: ["mouldMass", "tinNumber"],
  wm: ["mouldMass", "other"],
};

export type UnitKind = "density" | "mass" | "volume" | "percent";

/** The kind of unit that readings of a meaning have; null for what has none. */
export const KIND: Readonly<Record<Role, UnitKind | null>> = {
  waterContent: "percent", trialWater: "percent", dryDensity: "density", wetDensity: "density",
  mouldAndSoil: "mass", mouldMass: "mass", wetSoil: "mass", wetAndTin: "mass", dryAndTin: "mass", tare: "mass", mouldVolume: "volume",
  tinNumber: null, pointName: null, other: null, open: null,
};

export interface UnitRead { readonly kind: UnitKind; readonly id: string }

/** Reads a text that is a unit and nothing else, as it stands in a unit row or in brackets. */
export function readUnit(text: string): UnitRead | undefined {
  const bare = text.trim().replace(/^[([{]\s*|\s*[)\]}]$/g, "").trim();
  if (/^(%|percent|pct|per cent|% of dry mass|% dry mass)$/i.test(bare)) return { kind: "percent", id: "%" };
  if (/^(fraction|ratio|decimal)$/i.test(bare)) return { kind: "percent", id: "fraction" };
  // before density, so that Mg is a mass and Mg/m3 is not
  const mass = massUnit(bare), volume = volumeUnit(bare), density = densityUnit(bare);
  if (density) return { kind: "density", id: density.id };
  if (volume) return { kind: "volume", id: volume.id };
  return mass ? { kind: "mass", id: mass.id } : undefined;
}

/** Splits a heading into its words and the unit that stands in it: in brackets, after a comma, or as the last word. */
export function splitHeading(text: string): { readonly words: string; readonly unit: UnitRead | undefined } {
  let rest = text, unit: UnitRead | undefined;
  for (const match of text.matchAll(/[([{]([^)\]}]*)[)\]}]/g)) {
    const read = readUnit(match[1]!);
    if (read) { unit ??= read; rest = rest.replace(match[0], " "); }
  }
  const comma = rest.lastIndexOf(",");
  if (!unit && comma >= 0) {
    unit = readUnit(rest.slice(comma + 1));
    if (unit) rest = rest.slice(0, comma);
  }
  // "Dry density lb / ft3", "DD pcf", "Water content in %"
  for (const tail of [/^(.*\S)\s+(\S+\s+\S+)\s*$/s, /^(.*\S)\s+(\S+)\s*$/s]) {
    const match = unit ? null : tail.exec(rest);
    const read = match ? readUnit(match[2]!) : undefined;
    if (read) { unit = read; rest = match![1]!.replace(/\s+in$/i, ""); }
  }
  return { words: plainWords(rest), unit };
}

/** Lower case, one space between words, no dots, underscores or brackets. */
function plainWords(text: string): string {
  return text.toLowerCase().replace(/[‐‑–—−]/g, "-").replace(/[._:;()[\]{}"]/g, " ").replace(/\s*,\s*/g, " ").replace(/&/g, " and ")
    .replace(/\s*\+\s*/g, " + ").replace(/\s+/g, " ").trim();
}

const PHRASES = (Object.entries(SYNONYMS) as [Role, readonly string[]][])
  .flatMap(([role, words]) => words.map((phrase) => ({ role, phrase })))
  .sort((a, b) => b.phrase.length - a.phrase.length);

/** Words that stand in many a title; as a heading they stand alone. */
const WHOLE_ONLY: ReadonlySet<string> = new Set(["point", "trial", "test", "specimen", "sample", "determination", "volume", "gross", "tare", "factor", "remark", "remarks", "depth", "station", "added", "optimum", "saturation"]);

function standsIn(words: string, phrase: string): boolean {
  if (words === phrase) return true;
  if (phrase.length <= 3 || WHOLE_ONLY.has(phrase)) return false;
  return ` ${words} `.includes(` ${phrase} `);
}

/** The meanings that a heading allows: one where it is plain, several where it is not, none where it says nothing known. */
export function meanings(heading: string): { readonly roles: readonly Role[]; readonly unit: UnitRead | undefined } {
  const { words, unit } = splitHeading(heading);
  // a small w is water content; a capital one may also be a mass
  if (/^w\b/.test(heading.trim()) && words === "w") return { roles: ["waterContent"], unit };
  // a trailing number tells two tins of one point apart: "Tin 2", "wet + tin (b)"
  const bare = words.replace(/\s+(?:no\s+)?(?:\d|[ab])$/, "");
  // the whole text last: in "avg %" the unit is half of the name
  for (const text of new Set([words, bare, plainWords(heading)])) {
    if (/^(?:max|maximum|optimum|opt)\b/.test(text)) return { roles: ["other"], unit };
    const several = AMBIGUOUS[text];
    if (several) return { roles: narrowed(several, unit), unit };
    const found = PHRASES.find(({ phrase }) => standsIn(text, phrase));
    if (found) return { roles: [found.role], unit };
  }
  return { roles: [], unit };
}

function narrowed(several: readonly Role[], unit: UnitRead | undefined): readonly Role[] {
  if (!unit) return several;
  const fitting = several.filter((role) => KIND[role] === unit.kind);
  return fitting.length > 0 ? fitting : several;
}

/**
 * Headings that only a sheet of field tests has: water content and dry density stand there too, but no compaction curve runs through them.
 * Common practice, no published source.
 */
export const FIELD_ONLY = /(?:\b(?:relative compaction|degree of compaction|density ratio|compaction ?%|chainage|station|stn|from (?:optimum|omc)|retest|lift)|% ?comp(?:action)?|% ?proctor)(?!\w)/i;

/** Labels of a specific gravity that stands in one cell of a sheet. */
export const SPECIFIC_GRAVITY = /^(?:specific gravity|gs|sg|s\s?g|sp gr|particle density|g_?s|ρs)\b/i;
/** A row at the foot that sums the readings up is no point. */
export const SUMMARY = /^(?:average|avg|mean|maximum|max|minimum|min|total|sum|std|st dev|standard deviation|note|notes|remarks?)\b/i;
export const ASSUMED = /assumed|\(a\)|estimated|est\b|typical/i;
