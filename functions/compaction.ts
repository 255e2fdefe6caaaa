import { batchWaterColumn, curveDry, curveFlags, effortColumn, fineDryColumn, fineWaterColumn, mouldVolumeColumn, mouldWet, peakBlock, peakDry, peakWater, wholeDryColumn, wholeWaterColumn } from "../src/worksheet/compaction";
import { cells, reply } from "./reply";

/**
 * Wet density of soil compacted in a mould or driven into a cylinder.
 * @customfunction MOULDWET
 * @param mouldAndSoil Mass of mould and wet soil. A cell or a column.
 * @param mould Mass of the empty mould, weighed the same way (with or without base plate).
 * @param volume Volume of the mould, as calibrated.
 * @param [massUnit] Unit of the masses: "g", "kg", "lb" or "Mg". Needed only where it does not go with the volume, such as grams with cubic feet.
 * @param [volumeUnit] Unit of the volume: "cm3" (also "mL"), "L", "m3", "ft3", "in3" or "mm3".
 * @returns Wet density: plain mass over volume without units; with units lb/ft³ for ft³ and in³, kg/m³ for m³, else Mg/m³.
 */
export function mouldWetDensity(mouldAndSoil: any[][], mould: any[][], volume: any[][], massUnit?: any[][], volumeUnit?: any[][]): any[][] {
  return reply(() => mouldWet(cells(mouldAndSoil), cells(mould), cells(volume), cells(massUnit), cells(volumeUnit)));
}

/**
 * Compactive effort: work of the rammer on a unit volume of soil. Light (standard) compaction is near 595, heavy (modified) near 2700 kJ/m³.
 * @customfunction BLOWWORK
 * @param rammerMass Mass of the rammer, kg.
 * @param drop Drop of the rammer, mm.
 * @param blows Blows on each layer.
 * @param layers Number of layers.
 * @param volume Volume of the mould, cm³.
 * @returns Compactive effort, kJ/m³.
 */
export function blowWork(rammerMass: any[][], drop: any[][], blows: any[][], layers: any[][], volume: any[][]): any[][] {
  return reply(() => effortColumn(cells(rammerMass), cells(drop), cells(blows), cells(layers), cells(volume)));
}

/**
 * Fits a compaction curve and fills a labelled block: maximum dry density and optimum water content with their 95 % intervals, the curve and why it was taken, saturation and air voids at the optimum, and what to look at.
 * @customfunction PEAKFIT
 * @param waters Water contents of the points, percent of dry mass. One column or one row.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param [curve] Curve to fit: "auto", "parabola", "cubic", "quartic", "saturation" (needs gs), "top three" or "smooth". Left out: "auto".
 * @param [gs] Specific gravity of the solids; needed for saturation, air voids and the zero-air-voids line.
 * @param [waterDensity] Density of water in the unit of the dry densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns A block of thirteen rows and four columns.
 */
export function peakFit(waters: any[][], dries: any[][], curve?: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => peakBlock({ waters: cells(waters), dries: cells(dries), curve: cells(curve), gs: cells(gs), water: cells(waterDensity) }));
}

/**
 * Maximum dry density of a compaction test, from the fitted curve. An error says why where the points hold no peak.
 * @customfunction PEAKDRY
 * @param waters Water contents of the points, percent of dry mass. One column or one row.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param [curve] Curve to fit: "auto", "parabola", "cubic", "quartic", "saturation" (needs gs), "top three" or "smooth". Left out: "auto".
 * @param [gs] Specific gravity of the solids.
 * @param [waterDensity] Density of water in the unit of the dry densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Maximum dry density, in the unit of the dry densities.
 */
export function peakDryDensity(waters: any[][], dries: any[][], curve?: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => peakDry({ waters: cells(waters), dries: cells(dries), curve: cells(curve), gs: cells(gs), water: cells(waterDensity) }));
}

/**
 * Optimum water content of a compaction test, from the fitted curve. An error says why where the points hold no peak.
 * @customfunction PEAKWATER
 * @param waters Water contents of the points, percent of dry mass. One column or one row.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param [curve] Curve to fit: "auto", "parabola", "cubic", "quartic", "saturation" (needs gs), "top three" or "smooth". Left out: "auto".
 * @param [gs] Specific gravity of the solids.
 * @param [waterDensity] Density of water in the unit of the dry densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Optimum water content, percent of dry mass.
 */
export function peakWaterContent(waters: any[][], dries: any[][], curve?: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => peakWater({ waters: cells(waters), dries: cells(dries), curve: cells(curve), gs: cells(gs), water: cells(waterDensity) }));
}

/**
 * Dry density on the fitted compaction curve at given water contents, inside the range of the points.
 * @customfunction CURVEDRY
 * @param at Water content at which the curve is wanted, percent. A cell, a row or a column.
 * @param waters Water contents of the points, percent of dry mass. One column or one row.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param [curve] Curve to fit: "auto", "parabola", "cubic", "quartic", "saturation" (needs gs), "top three" or "smooth". Left out: "auto".
 * @param [gs] Specific gravity of the solids.
 * @param [waterDensity] Density of water in the unit of the dry densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Dry density on the curve, in the unit of the dry densities.
 */
export function curveDryDensity(at: any[][], waters: any[][], dries: any[][], curve?: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => curveDry(cells(at), { waters: cells(waters), dries: cells(dries), curve: cells(curve), gs: cells(gs), water: cells(waterDensity) }));
}

/**
 * What to look at in a compaction test, one row a finding: points past the zero-air-voids line, stray readings, a peak that is not bracketed, and more.
 * @customfunction CURVEFLAGS
 * @param waters Water contents of the points, percent of dry mass. One column or one row.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param [curve] Curve to fit: "auto", "parabola", "cubic", "quartic", "saturation" (needs gs), "top three" or "smooth". Left out: "auto".
 * @param [gs] Specific gravity of the solids; without it no point can be held against the zero-air-voids line.
 * @param [waterDensity] Density of water in the unit of the dry densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Rows of: where, what, why.
 */
export function curveFlagList(waters: any[][], dries: any[][], curve?: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => curveFlags({ waters: cells(waters), dries: cells(dries), curve: cells(curve), gs: cells(gs), water: cells(waterDensity) }));
}

/**
 * Volume of a mould from its inside diameter and height. A mould's volume is better had by weighing the water it holds.
 * @customfunction MOULDVOL
 * @param diameter Inside diameter of the mould, any unit of length. A cell or a column.
 * @param height Inside height of the mould, without collar, in the same unit.
 * @returns Volume, in the unit of length cubed: mm give mm³, cm give cm³, in give in³.
 */
export function mouldVol(diameter: any[][], height: any[][]): any[][] {
  return reply(() => mouldVolumeColumn(cells(diameter), cells(height)));
}

/**
 * Mass of water to add to a batch of moist soil to bring it to a water content; negative is to dry out.
 * @customfunction MIXWATER
 * @param moistMass Moist mass of the batch, any unit. A cell or a column.
 * @param now Water content now, percent of dry mass.
 * @param target Water content wanted, percent of dry mass.
 * @returns Mass of water, in the unit of the batch.
 */
export function mixWater(moistMass: any[][], now: any[][], target: any[][]): any[][] {
  return reply(() => batchWaterColumn(cells(moistMass), cells(now), cells(target)));
}

/**
 * Maximum dry density of the whole soil, from that of the fraction tested without its oversize. Interference of the stones is not in it: keep to the standard's limits, commonly up to 30 or 40 % oversize.
 * @customfunction WHOLEDRY
 * @param fineDry Maximum dry density of the fine fraction. A cell or a column.
 * @param stonePct Oversize, percent of the dry mass of the whole soil.
 * @param stoneGs Bulk specific gravity of the oversize, oven-dry.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Dry density of the whole soil, in the unit of the fine fraction's.
 */
export function wholeDry(fineDry: any[][], stonePct: any[][], stoneGs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => wholeDryColumn(cells(fineDry), cells(stonePct), cells(stoneGs), cells(waterDensity)));
}

/**
 * Optimum water content of the whole soil, from that of the fine fraction and the water in the oversize.
 * @customfunction WHOLEWATER
 * @param fineWater Water content of the fine fraction, percent of dry mass. A cell or a column.
 * @param stonePct Oversize, percent of the dry mass of the whole soil.
 * @param stoneWater Water content of the oversize, percent of its dry mass; often 1 to 2, and a figure below 1 is taken as it stands.
 * @returns Water content of the whole soil, percent of dry mass.
 */
export function wholeWaterContent(fineWater: any[][], stonePct: any[][], stoneWater: any[][]): any[][] {
  return reply(() => wholeWaterColumn(cells(fineWater), cells(stonePct), cells(stoneWater)));
}

/**
 * Dry density of the fine fraction of a whole field sample, to be held against a laboratory test made without the oversize.
 * @customfunction FINEDRY
 * @param wholeDry Dry density of the whole soil. A cell or a column.
 * @param stonePct Oversize, percent of the dry mass of the whole soil.
 * @param stoneGs Bulk specific gravity of the oversize, oven-dry.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Dry density of the fine fraction, in the unit of the whole soil's.
 */
export function fineDry(wholeDry: any[][], stonePct: any[][], stoneGs: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => fineDryColumn(cells(wholeDry), cells(stonePct), cells(stoneGs), cells(waterDensity)));
}

/**
 * Water content of the fine fraction of a whole field sample.
 * @customfunction FINEWATER
 * @param wholeWater Water content of the whole soil, percent of dry mass. A cell or a column.
 * @param stonePct Oversize, percent of the dry mass of the whole soil.
 * @param stoneWater Water content of the oversize, percent of its dry mass; a figure below 1 is taken as it stands.
 * @returns Water content of the fine fraction, percent of dry mass.
 */
export function fineWaterContent(wholeWater: any[][], stonePct: any[][], stoneWater: any[][]): any[][] {
  return reply(() => fineWaterColumn(cells(wholeWater), cells(stonePct), cells(stoneWater)));
}
