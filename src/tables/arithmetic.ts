import { wetDensityInMould } from "../compaction/mould";
import { dryDensityFromWet } from "../phase/density";
import { waterContentFromMasses } from "../phase/water-content";
import type { Role } from "./table";

/** Readings of one series by position; undefined where there is no number. */
export type Readings = readonly (number | undefined)[];

export interface Uncertain { readonly candidates: readonly Role[]; readonly readings: Readings }

type ByRole = ReadonlyMap<Role, Readings>;

/** A relation holds where the figures agree to what rounding leaves of two decimals. Common practice, no published source. */
const DENSITY_AGREES = 0.006, WATER_AGREES = 0.25;

/** The relations by which one column of a laboratory sheet follows from others. */
const FACTS: readonly { readonly of: readonly Role[]; readonly holds: (read: (role: Role) => number) => boolean }[] = [
  {
    of: ["wetDensity", "waterContent", "dryDensity"],
    holds: (read) => near(dryDensityFromWet.value({ wetDensity: read("wetDensity"), waterContent: read("waterContent") }), read("dryDensity")),
  },
  {
    of: ["wetAndTin", "dryAndTin", "tare", "waterContent"],
    holds: (read) => Math.abs(waterContentFromMasses.value({ wetMass: read("wetAndTin"), dryMass: read("dryAndTin"), tare: read("tare") }) - read("waterContent")) <= WATER_AGREES,
  },
  { of: ["mouldAndSoil", "mouldMass", "wetSoil"], holds: (read) => near(read("mouldAndSoil") - read("mouldMass"), read("wetSoil")) },
];

const near = (a: number, b: number): boolean => Math.abs(a / b - 1) <= DENSITY_AGREES;

/** Whether a fact holds at every point that has all its readings; undefined where there is none. */
function test(fact: (typeof FACTS)[number], by: ByRole): boolean | undefined {
  const columns = fact.of.map((role) => by.get(role));
  if (columns.includes(undefined)) return undefined;
  let points = 0;
  for (let i = 0; i < columns[0]!.length; i++) {
    if (columns.some((column) => column![i] === undefined)) continue;
    points++;
    if (!fact.holds((role) => by.get(role)![i]!)) return false;
  }
  return points >= 2 ? true : undefined;
}

/** More ways than this are not tried: a sheet with so many doubtful headings is for the user to read. */
const MOST_WAYS = 2000;

/**
 * Meanings of doubtful series that the arithmetic of the sheet settles: exactly one way of reading them makes
 * some relation hold and none fail. An empty answer where nothing, or more than one way, comes out.
 */
export function settle(certain: ByRole, uncertain: readonly Uncertain[]): ReadonlyMap<number, Role> {
  const ways = uncertain.reduce((count, { candidates }) => count * candidates.length, 1);
  if (uncertain.length === 0 || ways > MOST_WAYS) return new Map();
  let best = 0, found: Role[][] = [];
  function walk(chosen: Role[]): void {
    if (chosen.length < uncertain.length) {
      for (const role of uncertain[chosen.length]!.candidates) walk([...chosen, role]);
      return;
    }
    const by = new Map(certain);
    for (const [i, role] of chosen.entries()) {
      if (role === "other") continue;
      if (by.has(role)) return;
      by.set(role, uncertain[i]!.readings);
    }
    const verdicts = FACTS.map((fact) => test(fact, by));
    const holding = verdicts.filter((verdict) => verdict === true).length;
    if (verdicts.includes(false) || holding === 0 || holding < best) return;
    if (holding > best) { best = holding; found = []; }
    found.push(chosen);
  }
  walk([]);
  // facts that hold already without the doubtful series settle nothing about them
  const without = FACTS.filter((fact) => test(fact, certain) === true).length;
  if (best <= without) return new Map();
  const settled = new Map<number, Role>();
  for (let i = 0; i < uncertain.length; i++) {
    const role = found[0]![i]!;
    if (role !== "other" && found.every((way) => way[i] === role)) settled.set(i, role);
  }
  return settled;
}

/** Converts a mould's readings to a wet density in kg/m3. */
export const wetDensityKgM3 = (mouldAndSoilKg: number, mouldKg: number, volumeM3: number): number =>
  wetDensityInMould.value({ mouldAndSoil: mouldAndSoilKg, mouldMass: mouldKg, mouldVolume: volumeM3 });
