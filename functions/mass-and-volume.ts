import { degreeOfSaturation, airVoidsLine, airVoidsOfPoint, leastSpecificGravity, saturationLine, saturationWater, zeroAirVoids } from "../src/phase/lines";
import { dryDensityFromWet, wetDensityFromDry } from "../src/phase/density";
import { porosityFromDensity, voidRatioFromDensity } from "../src/phase/voids";
import { waterContentFromMasses, waterContentFromWetBasis } from "../src/phase/water-content";
import { relationColumn } from "../src/worksheet/relation-column";
import { densityAs, dryMassGuard, pastZeroAirVoids, waterDensityAt } from "../src/worksheet/mass-and-volume";
import { cells, reply } from "./reply";

const DENSER_THAN_SOLIDS = "the dry density reaches that of the solids themselves (specific gravity times the density of water): check the dry density, the specific gravity and the unit of the density of water.";

/**
 * Water content in percent of dry mass, from the masses of wet and dry soil weighed with the tin.
 * @customfunction WATERPCT
 * @param wetMass Mass of wet soil and tin. A cell or a column, any unit of mass.
 * @param dryMass Mass of oven-dry soil and tin, in the same unit.
 * @param [tare] Mass of the empty tin, in the same unit. Left out: the masses are of soil alone.
 * @returns Water content, percent of dry mass: 12.5 means 12.5 %.
 */
export function waterPct(wetMass: any[][], dryMass: any[][], tare?: any[][]): any[][] {
  return reply(() => relationColumn(waterContentFromMasses, { wetMass: cells(wetMass), dryMass: cells(dryMass), tare: cells(tare) }, {
    impossible: "the masses give no water content: wet soil and tin must weigh at least as much as dry soil and tin, and that more than the tin. Were two masses swapped?",
    guard: dryMassGuard,
  }));
}

/**
 * Water content on dry mass from a reading on wet mass, such as a calcium carbide tester's.
 * @customfunction DRYBASIS
 * @param wetBasisPct Water as percent of wet mass: 10 means 10 %. A cell or a column.
 * @returns Water content, percent of dry mass.
 */
export function dryBasis(wetBasisPct: any[][]): any[][] {
  return reply(() => relationColumn(waterContentFromWetBasis, { wetBasisWater: cells(wetBasisPct) }));
}

/**
 * Dry density (or dry unit weight) from wet density and water content.
 * @customfunction SOILDRY
 * @param wetDensity Wet (bulk) density or unit weight, in any unit. A cell or a column.
 * @param waterContent Water content, percent of dry mass: 12.5 means 12.5 %.
 * @returns Dry density in the unit of the wet density.
 */
export function soilDry(wetDensity: any[][], waterContent: any[][]): any[][] {
  return reply(() => relationColumn(dryDensityFromWet, { wetDensity: cells(wetDensity), waterContent: cells(waterContent) }));
}

/**
 * Wet (bulk) density or unit weight from dry density and water content.
 * @customfunction SOILWET
 * @param dryDensity Dry density or dry unit weight, in any unit. A cell or a column.
 * @param waterContent Water content, percent of dry mass: 12.5 means 12.5 %.
 * @returns Wet density in the unit of the dry density.
 */
export function soilWet(dryDensity: any[][], waterContent: any[][]): any[][] {
  return reply(() => relationColumn(wetDensityFromDry, { dryDensity: cells(dryDensity), waterContent: cells(waterContent) }));
}

/**
 * Dry density on the zero-air-voids line, where water fills every void. No soil can be denser at that water content.
 * @customfunction VOIDFREE
 * @param waterContent Water content, percent of dry mass. A cell or a column.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param [waterDensity] Density of water in the sheet's unit (1, 1000, 9.81, 62.4), or the unit as text ("Mg/m3", "kg/m3", "kN/m3", "lb/ft3"), which means water at 20 °C. Left out: "Mg/m3".
 * @returns Dry density on the line, in the unit of the density of water.
 */
export function voidFree(waterContent: any[][], gs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(zeroAirVoids, { waterContent: cells(waterContent), specificGravity: cells(gs), waterDensity: cells(waterDensity) }));
}

/**
 * Dry density on a line of constant air voids.
 * @customfunction AIRLINE
 * @param waterContent Water content, percent of dry mass. A cell or a column.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param airVoids Air voids, percent of the total volume: 5 means 5 %.
 * @param [waterDensity] Density of water in the sheet's unit, or the unit as text, such as "kN/m3". Left out: "Mg/m3".
 * @returns Dry density on the line, in the unit of the density of water.
 */
export function airLine(waterContent: any[][], gs: any[][], airVoids: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(airVoidsLine, { waterContent: cells(waterContent), specificGravity: cells(gs), airVoids: cells(airVoids), waterDensity: cells(waterDensity) }));
}

/**
 * Dry density on a line of constant degree of saturation.
 * @customfunction SATLINE
 * @param waterContent Water content, percent of dry mass. A cell or a column.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param saturation Degree of saturation, percent: 80 means 80 %. This is not 100 less the air voids.
 * @param [waterDensity] Density of water in the sheet's unit, or the unit as text, such as "kN/m3". Left out: "Mg/m3".
 * @returns Dry density on the line, in the unit of the density of water.
 */
export function satLine(waterContent: any[][], gs: any[][], saturation: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(saturationLine, { waterContent: cells(waterContent), specificGravity: cells(gs), saturation: cells(saturation), waterDensity: cells(waterDensity) }));
}

/**
 * Water content that fills every void of a soil at a dry density: saturation water content.
 * @customfunction FULLWATER
 * @param dryDensity Dry density or dry unit weight. A cell or a column.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Water content, percent of dry mass.
 */
export function fullWater(dryDensity: any[][], gs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(saturationWater, { dryDensity: cells(dryDensity), specificGravity: cells(gs), waterDensity: cells(waterDensity) }, { impossible: DENSER_THAN_SOLIDS }));
}

/**
 * Degree of saturation: the share of the voids that water fills. It may come out above 100: then the point is not possible as reported.
 * @customfunction SATPCT
 * @param dryDensity Dry density or dry unit weight. A cell or a column.
 * @param waterContent Water content, percent of dry mass.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Degree of saturation, percent of the voids.
 */
export function satPct(dryDensity: any[][], waterContent: any[][], gs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(degreeOfSaturation, { dryDensity: cells(dryDensity), waterContent: cells(waterContent), specificGravity: cells(gs), waterDensity: cells(waterDensity) }, { impossible: DENSER_THAN_SOLIDS }));
}

/**
 * Air voids in percent of the total volume (not of the voids). Negative past the zero-air-voids line: then the point is not possible as reported.
 * @customfunction AIRPCT
 * @param dryDensity Dry density or dry unit weight. A cell or a column.
 * @param waterContent Water content, percent of dry mass.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Air voids, percent of the total volume.
 */
export function airPct(dryDensity: any[][], waterContent: any[][], gs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(airVoidsOfPoint, { dryDensity: cells(dryDensity), waterContent: cells(waterContent), specificGravity: cells(gs), waterDensity: cells(waterDensity) }));
}

/**
 * Void ratio: volume of voids over volume of solids.
 * @customfunction VOIDRATIO
 * @param dryDensity Dry density or dry unit weight. A cell or a column.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Void ratio.
 */
export function voidRatio(dryDensity: any[][], gs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(voidRatioFromDensity, { dryDensity: cells(dryDensity), specificGravity: cells(gs), waterDensity: cells(waterDensity) }, { impossible: DENSER_THAN_SOLIDS }));
}

/**
 * Porosity: volume of voids in percent of the total volume. It counts water and air; air voids count the air alone.
 * @customfunction POREPCT
 * @param dryDensity Dry density or dry unit weight. A cell or a column.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Porosity, percent of the total volume.
 */
export function porePct(dryDensity: any[][], gs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(porosityFromDensity, { dryDensity: cells(dryDensity), specificGravity: cells(gs), waterDensity: cells(waterDensity) }, { impossible: DENSER_THAN_SOLIDS }));
}

/**
 * The smallest specific gravity of the solids at which a point is possible at all. Well above that of the soil's minerals, a reading is wrong.
 * @customfunction LEASTGS
 * @param dryDensity Dry density or dry unit weight. A cell or a column.
 * @param waterContent Water content, percent of dry mass.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Specific gravity.
 */
export function leastGs(dryDensity: any[][], waterContent: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => relationColumn(leastSpecificGravity, { dryDensity: cells(dryDensity), waterContent: cells(waterContent), waterDensity: cells(waterDensity) }, {
    impossible: "no specific gravity makes this point possible: the water alone would fill more than the whole volume. Check the dry density, the water content and the unit of the density of water.",
  }));
}

/**
 * TRUE where a point lies past the zero-air-voids line, so that it is not possible as reported.
 * @customfunction PASTZAV
 * @param dryDensity Dry density or dry unit weight. A cell or a column.
 * @param waterContent Water content, percent of dry mass.
 * @param gs Specific gravity of the solids, such as 2.70.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @param [allowance] How far past the line is still let be, as a density. Left out: 0.2 % of the line, the spread of the round figures in use for the density of water.
 * @returns TRUE past the line, else FALSE.
 */
export function pastZav(dryDensity: any[][], waterContent: any[][], gs: any[][], waterDensity?: any[][], allowance?: any[][]): any[][] {
  return reply(() => pastZeroAirVoids(cells(dryDensity), cells(waterContent), cells(gs), cells(waterDensity), cells(allowance)));
}

/**
 * Density of water at a temperature, by the formula of the CIPM (2001) for air-free water.
 * @customfunction WATERDENS
 * @param temperature Temperature in °C, 0 to 40. A cell or a column.
 * @param [unit] Unit of the answer: "Mg/m3", "kg/m3", "kN/m3" or "lb/ft3". Left out: "Mg/m3".
 * @returns Density or unit weight of water.
 */
export function waterDens(temperature: any[][], unit?: any[][]): any[][] {
  return reply(() => waterDensityAt(cells(temperature), cells(unit)));
}

/**
 * A density or unit weight in another unit, unit weights at standard gravity.
 * @customfunction DENSITYAS
 * @param value Density or unit weight. A cell or a column.
 * @param from Its unit: "Mg/m3" (also "t/m3", "g/cm3"), "kg/m3", "kN/m3", "lb/ft3" (also "pcf"), "lb/yd3".
 * @param to The unit wanted.
 * @returns The same density in the unit wanted.
 */
export function densityInUnit(value: any[][], from: any[][], to: any[][]): any[][] {
  return reply(() => densityAs(cells(value), cells(from), cells(to)));
}
