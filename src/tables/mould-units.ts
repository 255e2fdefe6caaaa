import { densityUnits, type DensityUnit } from "../units/density-units";
import { massUnits, volumeUnits, type MassUnit, type VolumeUnit } from "../units/mass-and-volume-units";
import { wetDensityKgM3 } from "./arithmetic";
import { numberAt, type Grid } from "./grid";
import type { GivenOnce, Known, Problem, Role, Series } from "./table";

type Draft = { -readonly [K in keyof Series]: Series[K] };

/** Moulds hold between a third of a litre and ten litres; wet soil in them weighs between these. Common practice, no published source. */
const MOULD_M3 = { low: 0.0003, high: 0.01 }, WET_SOIL_KG_M3 = { low: 900, high: 2900 };

/** The unit in which a mould's wet density is told: the customary partner of its volume's unit. */
function partner(volume: VolumeUnit): DensityUnit {
  const id = volume.id === "ft3" || volume.id === "in3" ? "lb/ft3" : volume.id === "m3" ? "kg/m3" : "Mg/m3";
  return densityUnits.find((unit) => unit.id === id)!;
}

/** The units of readings that name none of their own. */
export interface MouldUnits { readonly mass: MassUnit; readonly volume: VolumeUnit }

const MASS_ROLES: ReadonlySet<Role> = new Set(["mouldAndSoil", "mouldMass", "wetSoil"]);

/**
 * The units of the mould's readings, and with them the unit of the densities. Grams over cubic feet are common.
 * Units that are not given are taken from size where only one pair makes the mould a mould and the soil a soil, and that is said.
 */
export function settleMouldUnits(
  grid: Grid, positions: readonly number[], series: readonly Draft[], mouldMass: GivenOnce | null, mouldVolume: GivenOnce | null,
  labels: { readonly mass: string | undefined; readonly volume: string | undefined }, notes: string[], problems: Problem[],
): { densityUnit: DensityUnit; densityUnitKnown: Known; units: MouldUnits } | null {
  const masses = series.filter(({ role }) => MASS_ROLES.has(role)), volume = series.find(({ role }) => role === "mouldVolume");
  const first = (role: Role): number | undefined => {
    const one = series.find((candidate) => candidate.role === role);
    for (const position of positions) { const value = one && numberAt(grid, one.index, position); if (value !== undefined) return value; }
    return undefined;
  };
  const gross = first("mouldAndSoil"), empty = first("mouldMass") ?? mouldMass?.value ?? 0, net = first("wetSoil"), held = first("mouldVolume") ?? mouldVolume?.value;
  if (held === undefined || (gross === undefined && net === undefined)) return null;

  const givenMass = masses.find(({ unit }) => unit !== null)?.unit ?? labels.mass, givenVolume = volume?.unit ?? labels.volume;
  const kgOf = (role: Role, otherwise: MassUnit): number => massUnits.find(({ id }) => id === masses.find((one) => one.role === role)?.unit)?.kg ?? otherwise.kg;
  const pairs: MouldUnits[] = [];
  for (const mass of massUnits) for (const capacity of volumeUnits) {
    if ((givenMass !== undefined && mass.id !== givenMass) || (givenVolume !== undefined && givenVolume !== null && capacity.id !== givenVolume)) continue;
    const m3 = held * capacity.m3, density = net !== undefined && gross === undefined ? wetDensityKgM3(net * kgOf("wetSoil", mass), 0, m3) : wetDensityKgM3(gross! * kgOf("mouldAndSoil", mass), empty * kgOf("mouldMass", mass), m3);
    if (m3 >= MOULD_M3.low && m3 <= MOULD_M3.high && density >= WET_SOIL_KG_M3.low && density <= WET_SOIL_KG_M3.high) pairs.push({ mass, volume: capacity });
  }
  if (pairs.length !== 1) {
    problems.push({
      cell: null,
      says: pairs.length === 0
        ? `The mould's readings (${gross ?? net} over ${held}${givenMass || givenVolume ? ` in ${[givenMass, givenVolume].filter((unit) => unit).join(" and ")}` : ""}) give no soil's density in any units known here: check the units, the mass of the mould and its volume.`
        : "The units of the mould's readings cannot be told from their size: choose them.",
    });
    return null;
  }
  const [pair] = pairs as [MouldUnits];
  const guessed = [givenMass ? null : pair.mass.printed, givenVolume ? null : pair.volume.printed].filter((unit) => unit !== null);
  if (guessed.length > 0) notes.push(`No unit is given for the mould's readings: taken as ${guessed.join(" and ")} from their size.`);
  for (const one of masses) if (one.unit === null) Object.assign(one, { unit: pair.mass.id, unitKnown: givenMass ? "given once" : "size" });
  if (volume && volume.unit === null) Object.assign(volume, { unit: pair.volume.id, unitKnown: givenVolume ? "given once" : "size" });
  return { densityUnit: partner(pair.volume), densityUnitKnown: guessed.length > 0 ? "size" : volume?.unitKnown ?? "given once", units: pair };
}
