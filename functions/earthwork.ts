import { bankVolumeColumn, bulkingColumn, looseLiftColumn, shrinkColumn, swellColumn, waterToAdd } from "../src/worksheet/earthwork";
import { blendShare, blendWater, dryTime, finesFill, gradeWell, rollFit, rollRate, waterSpray } from "../src/worksheet/site-work";
import { cells, reply } from "./reply";

/**
 * Water to spray on a volume of soil to bring it to a target water content; negative is water to dry out.
 * @customfunction WATERADD
 * @param volume Volume of soil: m³, or yd³ with "US". A cell or a column.
 * @param dry Dry density of the soil in the same state as the volume: Mg/m³, or lb/ft³ with "US".
 * @param now Water content now, percent of dry mass.
 * @param target Water content wanted, percent of dry mass.
 * @param [lossPct] Share of the sprayed water that never reaches the soil, percent. Ignored when drying. Left out: none.
 * @param [system] Units of the sheet: "SI" for m³, Mg/m³ and litres, "US" for yd³, lb/ft³ and US gallons. Left out: "SI".
 * @returns Litres or US gallons, at 1 kg a litre or 8.345 lb a gallon.
 */
export function waterAdd(volume: any[][], dry: any[][], now: any[][], target: any[][], lossPct?: any[][], system?: any[][]): any[][] {
  return reply(() => waterToAdd(cells(volume), cells(dry), cells(now), cells(target), cells(lossPct), cells(system)));
}

/**
 * Volume to dig in the bank (in place, before digging) for a fill, by balance of the dry soil.
 * @customfunction BANKVOL
 * @param fillVolume Volume of the compacted fill, any unit. A cell or a column.
 * @param fillDry Dry density of the fill, any unit.
 * @param bankDry Dry density in the bank, in the same unit.
 * @param [lossPct] Share of the bank volume that is lost (waste, stripping, haul), percent. Left out: none.
 * @returns Volume in the bank, in the unit of the fill volume.
 */
export function bankVol(fillVolume: any[][], fillDry: any[][], bankDry: any[][], lossPct?: any[][]): any[][] {
  return reply(() => bankVolumeColumn(cells(fillVolume), cells(fillDry), cells(bankDry), cells(lossPct)));
}

/**
 * Swell from bank to loose: how much more room the soil takes once it is dug.
 * @customfunction SWELLPCT
 * @param bankDry Dry density in the bank. A cell or a column.
 * @param looseDry Loose dry density, same unit.
 * @param [basis] Volume that the percent is of: "bank" or "loose". Left out: "bank".
 * @returns Swell, percent.
 */
export function swellPct(bankDry: any[][], looseDry: any[][], basis?: any[][]): any[][] {
  return reply(() => swellColumn(cells(bankDry), cells(looseDry), cells(basis)));
}

/**
 * Shrink from bank to fill: how much less room the soil takes once it is compacted. Negative where it takes more, as rock does.
 * @customfunction SHRINKPCT
 * @param bankDry Dry density in the bank. A cell or a column.
 * @param fillDry Dry density of the fill, same unit.
 * @param [basis] Volume that the percent is of: "bank" or "fill". Left out: "bank".
 * @returns Shrink, percent.
 */
export function shrinkPct(bankDry: any[][], fillDry: any[][], basis?: any[][]): any[][] {
  return reply(() => shrinkColumn(cells(bankDry), cells(fillDry), cells(basis)));
}

/**
 * Loose thickness to spread so that a lift has its thickness once it is compacted.
 * @customfunction LOOSELIFT
 * @param thickness Thickness of the compacted lift, any unit. A cell or a column.
 * @param fillDry Dry density of the compacted fill.
 * @param looseDry Loose dry density as spread, same unit.
 * @returns Loose thickness, in the unit of the lift.
 */
export function looseLiftThickness(thickness: any[][], fillDry: any[][], looseDry: any[][]): any[][] {
  return reply(() => looseLiftColumn(cells(thickness), cells(fillDry), cells(looseDry)));
}

/**
 * Bulking of moist sand: how much more room it takes than dry or flooded.
 * @customfunction SANDBULK
 * @param moistDry Dry density of the sand as it lies moist and loose. A cell or a column.
 * @param looseDry Dry density of the same sand loose and dry (or flooded), same unit.
 * @returns Bulking, percent of the volume dry.
 */
export function sandBulk(moistDry: any[][], looseDry: any[][]): any[][] {
  return reply(() => bulkingColumn(cells(moistDry), cells(looseDry)));
}

/**
 * Water to spray on a lift to bring it to a target water content; negative is to dry out. Spray in passes that soak in: do not pond.
 * @customfunction WATERSPRAY
 * @param thickness Compacted thickness of the lift: mm, or in with "US". A cell or a column.
 * @param dry Dry density of the compacted lift: Mg/m³, or lb/ft³ with "US".
 * @param now Water content now, percent of dry mass.
 * @param target Water content wanted, percent of dry mass.
 * @param [lossPct] Share of the sprayed water that never reaches the soil, percent. Ignored when drying. Left out: none.
 * @param [system] Units of the sheet: "SI" or "US". Left out: "SI".
 * @returns Litres a m² (mm of water), or US gallons a yd².
 */
export function waterSprayRate(thickness: any[][], dry: any[][], now: any[][], target: any[][], lossPct?: any[][], system?: any[][]): any[][] {
  return reply(() => waterSpray(cells(thickness), cells(dry), cells(now), cells(target), cells(lossPct), cells(system)));
}

/**
 * Days in which the surplus water of a lift evaporates. Soil dries slower than open water after its first day unless it is turned.
 * @customfunction DRYTIME
 * @param thickness Compacted thickness of the lift: mm, or in with "US". A cell or a column.
 * @param dry Dry density of the compacted lift: Mg/m³, or lb/ft³ with "US".
 * @param now Water content now, percent of dry mass.
 * @param target Water content wanted, percent of dry mass.
 * @param evaporation Evaporation: mm a day, or in a day with "US".
 * @param [system] Units of the sheet: "SI" or "US". Left out: "SI".
 * @returns Days; 0 where the soil is dry enough.
 */
export function dryTimeOfLift(thickness: any[][], dry: any[][], now: any[][], target: any[][], evaporation: any[][], system?: any[][]): any[][] {
  return reply(() => dryTime(cells(thickness), cells(dry), cells(now), cells(target), cells(evaporation), cells(system)));
}

/**
 * Water content of a blend of two moist soils.
 * @customfunction BLENDWATER
 * @param mass1 Moist mass of the first soil, any unit. A cell or a column.
 * @param water1 Water content of the first soil, percent of dry mass.
 * @param mass2 Moist mass of the second soil, same unit.
 * @param water2 Water content of the second soil, percent of dry mass.
 * @returns Water content of the blend, percent of dry mass.
 */
export function blendWaterContent(mass1: any[][], water1: any[][], mass2: any[][], water2: any[][]): any[][] {
  return reply(() => blendWater(cells(mass1), cells(water1), cells(mass2), cells(water2)));
}

/**
 * Share of the second soil in a blend that meets a target water content between the two.
 * @customfunction BLENDSHARE
 * @param water1 Water content of the first soil, percent of dry mass. A cell or a column.
 * @param water2 Water content of the second soil, percent of dry mass.
 * @param target Water content wanted, percent of dry mass.
 * @param [basis] Mass that the share is of: "moist" or "dry". Left out: "moist".
 * @returns Share of the second soil, percent.
 */
export function blendShareOfSecond(water1: any[][], water2: any[][], target: any[][], basis?: any[][]): any[][] {
  return reply(() => blendShare(cells(water1), cells(water2), cells(target), cells(basis)));
}

/**
 * Share of fines that just fills the voids of a coarse soil, and the dry density there; more fines lower the density.
 * @customfunction FINESFILL
 * @param coarseDry Dry density of the coarse soil alone, compacted.
 * @param coarseGs Specific gravity of the coarse soil.
 * @param finesDry Dry density that the fines have in the voids.
 * @param [waterDensity] Density of water in the unit of the densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Two cells: share of fines, percent of dry mass, and dry density.
 */
export function finesFillVoids(coarseDry: any[][], coarseGs: any[][], finesDry: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => finesFill(cells(coarseDry), cells(coarseGs), cells(finesDry), cells(waterDensity)));
}

/**
 * Compacted volume an hour of one roller. A pass is one traverse; keep people clear of moving plant.
 * @customfunction ROLLRATE
 * @param width Width rolled in one pass, less the overlap: m, or ft with "US". A cell or a column.
 * @param speed Speed: km/h, or mph with "US".
 * @param lift Compacted thickness of the lift: mm, or in with "US".
 * @param passes Number of passes.
 * @param [efficiency] Share of the hour that is rolled, percent; a 50-minute hour is 83.3. Left out: 100.
 * @param [system] Units of the sheet: "SI" or "US". Left out: "SI".
 * @returns Compacted m³ an hour, or yd³ an hour.
 */
export function rollRateOfRoller(width: any[][], speed: any[][], lift: any[][], passes: any[][], efficiency?: any[][], system?: any[][]): any[][] {
  return reply(() => rollRate(cells(width), cells(speed), cells(lift), cells(passes), cells(efficiency), cells(system)));
}

/**
 * Roller trial: the plateau of dry density with its 95 % interval, the passes to a target, and the pass after which the next gains too little.
 * @customfunction ROLLFIT
 * @param passes Numbers of passes. One column or one row.
 * @param dries Dry densities after them, a range of the same shape.
 * @param [targetDry] Dry density wanted, same unit.
 * @param [minGain] Least gain of dry density that is worth a pass, same unit. Left out: 0.25 % of the plateau.
 * @returns A labelled block of five rows and four columns.
 */
export function rollFitTrial(passes: any[][], dries: any[][], targetDry?: any[][], minGain?: any[][]): any[][] {
  return reply(() => rollFit(cells(passes), cells(dries), cells(targetDry), cells(minGain)));
}

/**
 * Coefficients of uniformity and curvature of a grading, and whether it is well graded.
 * @customfunction GRADEWELL
 * @param d10 Size that 10 % of the mass pass, any unit.
 * @param d30 Size that 30 % of the mass pass, same unit.
 * @param d60 Size that 60 % of the mass pass, same unit.
 * @param kind Kind of soil: "gravel" (well graded from a uniformity of 4) or "sand" (from 6).
 * @returns Three cells: uniformity coefficient, curvature coefficient, and the verdict in words.
 */
export function gradeWellOfSizes(d10: any[][], d30: any[][], d60: any[][], kind: any[][]): any[][] {
  return reply(() => gradeWell(cells(d10), cells(d30), cells(d60), cells(kind)));
}
