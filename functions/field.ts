import { holeWetColumn, relativeCompactionColumn, relativeDensityColumn, sandConeColumn, waterGapColumn, waterRatioColumn } from "../src/worksheet/field";
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
