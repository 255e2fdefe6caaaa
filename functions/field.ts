import { holeWetColumn, relativeCompactionColumn, relativeDensityColumn, sandConeColumn, waterGapColumn, waterRatioColumn } from "../src/worksheet/field";
import { gaugeDry, gaugeOffset, sandDensityColumn, sandInConeColumn } from "../src/worksheet/field-readings";
import { fillVerdict } from "../src/worksheet/verdict";
import { passChance } from "../src/worksheet/lots";
import { cells, reply } from "./reply";

/**
 * Relative compaction: field dry density in percent of the maximum dry density of the reference test.
 * @customfunction RELCOMP
 * @param dry Field dry density or dry unit weight. A cell or a column.
 * @param maxDry Maximum dry density of the reference test, in the same unit, for the same soil and effort.
 * @returns Relative compaction, percent. A ratio outside 50 to 150 % is refused: it is two units or two soils.
 */
export function relComp(dry: any[][], maxDry: any[][]): any[][] {
  return reply(() => relativeCompactionColumn(cells(dry), cells(maxDry)));
}

/**
 * Distance of a water content from the optimum, in percentage points: positive is wet of optimum, negative is dry.
 * @customfunction WATERGAP
 * @param waterContent Water content, percent of dry mass. A cell or a column.
 * @param optimum Optimum water content of the reference test, percent of dry mass.
 * @returns Percentage points from optimum.
 */
export function waterGap(waterContent: any[][], optimum: any[][]): any[][] {
  return reply(() => waterGapColumn(cells(waterContent), cells(optimum)));
}

/**
 * Water content in percent of the optimum. Specifications that say 85 to 115 % of optimum mean this, not percentage points.
 * @customfunction WATERRATIO
 * @param waterContent Water content, percent of dry mass. A cell or a column.
 * @param optimum Optimum water content of the reference test, percent of dry mass.
 * @returns Percent of the optimum: 100 is at optimum.
 */
export function waterOverOptimum(waterContent: any[][], optimum: any[][]): any[][] {
  return reply(() => waterRatioColumn(cells(waterContent), cells(optimum)));
}

/**
 * Relative density (density index) of clean sand or gravel. Below 0 or above 100 it questions the limits or the reading.
 * @customfunction RELDENSITY
 * @param dry Dry density in place. A cell or a column.
 * @param minDry Minimum dry density of the same soil, same unit.
 * @param maxDry Maximum dry density of the same soil by vibration, same unit.
 * @returns Relative density, percent.
 */
export function relDensity(dry: any[][], minDry: any[][], maxDry: any[][]): any[][] {
  return reply(() => relativeDensityColumn(cells(dry), cells(minDry), cells(maxDry)));
}

/**
 * Wet density in place by sand replacement (sand cone).
 * @customfunction SANDCONE
 * @param soilMass Mass of the wet soil from the hole, without its bag. A cell or a column.
 * @param sandUsed Mass of sand that left the bottle: before less after.
 * @param sandInCone Mass of sand that stays in the cone and plate, from calibration.
 * @param sandDensity Bulk density of the sand, from calibration, in the unit wanted.
 * @returns Wet density, in the unit of the sand's density.
 */
export function sandCone(soilMass: any[][], sandUsed: any[][], sandInCone: any[][], sandDensity: any[][]): any[][] {
  return reply(() => sandConeColumn(cells(soilMass), cells(sandUsed), cells(sandInCone), cells(sandDensity)));
}

/**
 * Wet density in place where the volume of the hole is measured, by balloon or water.
 * @customfunction HOLEWET
 * @param soilMass Mass of the wet soil from the hole, without its bag. A cell or a column.
 * @param holeVolume Volume of the hole.
 * @returns Wet density: mass over volume, in their units.
 */
export function holeWet(soilMass: any[][], holeVolume: any[][]): any[][] {
  return reply(() => holeWetColumn(cells(soilMass), cells(holeVolume)));
}

/**
 * Bulk density of the sand for sand replacement, from filling a container of known volume.
 * @customfunction SANDDENS
 * @param full Mass of the container filled with sand. A cell or a column.
 * @param empty Mass of the empty container.
 * @param volume Volume of the container.
 * @returns Density of the sand: mass over volume, in their units.
 */
export function sandDens(full: any[][], empty: any[][], volume: any[][]): any[][] {
  return reply(() => sandDensityColumn(cells(full), cells(empty), cells(volume)));
}

/**
 * Mass of sand that stays in cone and plate, from pouring on a flat surface.
 * @customfunction CONESAND
 * @param before Mass of bottle, cone and sand before pouring. A cell or a column.
 * @param after Mass of bottle, cone and sand after pouring.
 * @returns Mass of sand in the cone, in the unit of the weighings.
 */
export function coneSand(before: any[][], after: any[][]): any[][] {
  return reply(() => sandInConeColumn(cells(before), cells(after)));
}

/**
 * Dry density in place from a nuclear gauge. A gauge's water is biased in some soils (mica, gypsum, organic matter): have the offset from oven-dried samples.
 * @customfunction GAUGEDRY
 * @param wetDensity Wet density by the gauge. A cell or a column.
 * @param gaugeWater Water by the gauge: mass a volume in the unit of the density, or percent with the kind "percent".
 * @param [offset] Correction for the soil, added to the gauge's water, in its own unit: see GAUGEOFFSET. Left out: none.
 * @param [kind] What the gauge shows as water: "mass" or "percent". Left out: "mass".
 * @returns Dry density, in the unit of the wet density.
 */
export function gaugeDryDensity(wetDensity: any[][], gaugeWater: any[][], offset?: any[][], kind?: any[][]): any[][] {
  return reply(() => gaugeDry(cells(wetDensity), cells(gaugeWater), cells(offset), cells(kind)));
}

/**
 * Mean offset of a gauge's water for one soil, from spots where the water was also had by oven. Ten spots are commonly asked for.
 * @customfunction GAUGEOFFSET
 * @param wetDensity Wet densities by the gauge. A column.
 * @param gaugeWater Water by the gauge at the same spots: mass a volume, or percent with the kind "percent".
 * @param ovenWater Water contents by oven at the same spots, percent of dry mass.
 * @param [kind] What the gauge shows as water: "mass" or "percent". Left out: "mass".
 * @returns Offset to add to the gauge's water, in its own unit.
 */
export function gaugeWaterOffset(wetDensity: any[][], gaugeWater: any[][], ovenWater: any[][], kind?: any[][]): any[][] {
  return reply(() => gaugeOffset(cells(wetDensity), cells(gaugeWater), cells(ovenWater), cells(kind)));
}

/**
 * Probability that the true relative compaction at the spot meets its limit, from one test and its uncertainty. It knows nothing of a bias that all tests share.
 * @customfunction PASSCHANCE
 * @param dry Field dry density. A cell or a column.
 * @param maxDry Maximum dry density of the reference test, same unit.
 * @param minRelComp Limit of relative compaction, percent, such as 95.
 * @param sdDry Standard uncertainty of one field test, in the unit of the densities.
 * @param [sdMax] Standard uncertainty of the maximum dry density, same unit. Left out: none.
 * @param [lotMean] Mean dry density of the lot; with its spread the estimate is drawn towards it.
 * @param [lotSd] Standard deviation of the true dry density over the lot.
 * @returns Probability, 0 to 1.
 */
export function passChanceOfTest(dry: any[][], maxDry: any[][], minRelComp: any[][], sdDry: any[][], sdMax?: any[][], lotMean?: any[][], lotSd?: any[][]): any[][] {
  return reply(() => passChance(cells(dry), cells(maxDry), cells(minRelComp), cells(sdDry), cells(sdMax), cells(lotMean), cells(lotSd)));
}

/**
 * Judges a field test against a zone of acceptance written in words: "pass", or each reason why not.
 * @customfunction FILLVERDICT
 * @param dry Field dry density. A cell or a column.
 * @param waterContent Field water content, percent of dry mass.
 * @param maxDry Maximum dry density of the reference test, same unit.
 * @param optimum Optimum water content of the reference test, percent of dry mass.
 * @param zone Clauses such as "RC >= 95; gap -2..+2; air <= 10". Quantities: RC, gap (points from optimum), ratio (percent of optimum), water, air, saturation, dry; "round 0.1" where the specification has figures rounded first.
 * @param [gs] Specific gravity of the solids; needed for air and saturation.
 * @param [waterDensity] Density of water in the unit of the densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns "pass", or the reasons. Figures are judged as calculated; one that would pass only by rounding is said to be so.
 */
export function fillVerdictOfTest(dry: any[][], waterContent: any[][], maxDry: any[][], optimum: any[][], zone: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => fillVerdict(cells(dry), cells(waterContent), cells(maxDry), cells(optimum), cells(zone), cells(gs), cells(waterDensity)));
}
