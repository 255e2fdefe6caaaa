import { curveKind, effortPeak, familyPick, peakTable, plasticPeak, rapidMethod, spanOfWater } from "../src/worksheet/beyond-one-curve";
import { cells, reply } from "./reply";

/**
 * Fits every test of a sheet that holds many, one row a test: maximum dry density and optimum water content with their 95 % intervals, the curve, and what to look at. A test without a peak says why in its row.
 * @customfunction PEAKTABLE
 * @param tests Names of the tests, one beside every point, or beside the first point of each test alone. One column or one row.
 * @param waters Water contents of the points, percent of dry mass, a range of the same shape.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param [curve] Curve to fit: "auto", "parabola", "cubic", "quartic", "saturation" (needs gs), "top three" or "smooth". Left out: "auto".
 * @param [gs] Specific gravity of the solids: one cell, or a range beside the points.
 * @param [waterDensity] Density of water in the unit of the dry densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns A heading and one row a test, ten columns.
 */
export function peakTableOfTests(tests: any[][], waters: any[][], dries: any[][], curve?: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => peakTable(cells(tests), { waters: cells(waters), dries: cells(dries), curve: cells(curve), gs: cells(gs), water: cells(waterDensity) }));
}

/**
 * Shape of a compaction curve by its points: one peak, one and a half peaks, two peaks, or no distinct peak. Clean sand that bulks has one and a half.
 * @customfunction CURVEKIND
 * @param waters Water contents of the points, percent of dry mass. One column or one row.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param [liquidLimit] Liquid limit of the soil; with it the answer says where the shape is not usual.
 * @returns The shape in words.
 */
export function curveKindOfPoints(waters: any[][], dries: any[][], liquidLimit?: any[][]): any[][] {
  return reply(() => curveKind(cells(waters), cells(dries), cells(liquidLimit)));
}

/**
 * The two water contents between which the fitted curve stays above a percent of its maximum dry density, inside the range of the points.
 * @customfunction WATERSPAN
 * @param waters Water contents of the points, percent of dry mass. One column or one row.
 * @param dries Dry densities of the points, a range of the same shape.
 * @param percent Percent of the maximum dry density, such as 95.
 * @param [curve] Curve to fit: "auto", "parabola", "cubic", "quartic", "saturation" (needs gs), "top three" or "smooth". Left out: "auto".
 * @param [gs] Specific gravity of the solids.
 * @param [waterDensity] Density of water in the unit of the dry densities, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns Two cells: the water content on the dry side, and on the wet side.
 */
export function waterSpanOfCurve(waters: any[][], dries: any[][], percent: any[][], curve?: any[][], gs?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => spanOfWater(cells(percent), { waters: cells(waters), dries: cells(dries), curve: cells(curve), gs: cells(gs), water: cells(waterDensity) }));
}

/**
 * One-point method: peak of a field soil from one compacted point and a family of curves of related soils. The point must lie at 80 to 100 % of the optimum it picks, and inside the family.
 * @customfunction FAMILYPICK
 * @param waterContent Water content of the compacted point, percent of dry mass.
 * @param dry Dry density of the compacted point.
 * @param family The family, three columns: curve, water content, dry density; one row a point. The curve's name may stand beside its first point alone.
 * @param [rule] How the peak is picked: "between" two neighbouring curves, or "nearest" curve. Left out: "between".
 * @returns A labelled block: maximum dry density, optimum water content, the curves it was taken from, and what to look at.
 */
export function familyPickOfPoint(waterContent: any[][], dry: any[][], family: any[][], rule?: any[][]): any[][] {
  return reply(() => familyPick(cells(waterContent), cells(dry), cells(family), cells(rule)));
}

/**
 * Rapid method of compaction control: ratio of the fill's density to the peak of its own soil, before any water content is known.
 * @customfunction RAPIDPEAK
 * @param added Water added to each point, percent of its moist mass as it came from the fill; negative where it was dried. One column or one row.
 * @param wetDensities Wet density of each point as measured, a range of the same shape.
 * @param fieldWet Wet density of the fill, in the same unit.
 * @param [fieldWater] Water content of the fill, percent of dry mass, once it is known. Left out, the distance from the optimum is told with an assumed 15 %.
 * @returns A labelled block: D ratio, C ratio, added water at the peak, peak converted wet density, distance from the optimum, points.
 */
export function rapidPeakOfFill(added: any[][], wetDensities: any[][], fieldWet: any[][], fieldWater?: any[][]): any[][] {
  return reply(() => rapidMethod(cells(added), cells(wetDensities), cells(fieldWet), cells(fieldWater)));
}

/**
 * Peak that a published correlation expects of the same soil under another compactive effort. For plausibility only, never in place of a test.
 * @customfunction EFFORTPEAK
 * @param maxDry Maximum dry density under the first effort.
 * @param optimum Optimum water content under the first effort, percent.
 * @param effort The first compactive effort, kJ/m³: standard compaction is near 595.
 * @param otherEffort The other compactive effort, kJ/m³: modified compaction is near 2700.
 * @param liquidLimit Liquid limit of the soil, percent.
 * @param [waterDensity] Density of water in the unit of the dry density, or that unit as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns A labelled block: expected maximum dry density and optimum, with the source.
 */
export function effortPeakExpected(maxDry: any[][], optimum: any[][], effort: any[][], otherEffort: any[][], liquidLimit: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => effortPeak(cells(maxDry), cells(optimum), cells(effort), cells(otherEffort), cells(liquidLimit), cells(waterDensity)));
}

/**
 * Peak that published correlations expect of a fine-grained soil from its plastic limit. For plausibility only, never in place of a test.
 * @customfunction PLASTICPEAK
 * @param plasticLimit Plastic limit of the soil, percent.
 * @param [effort] Compactive effort, kJ/m³. Left out: 592.5, standard compaction.
 * @param [waterDensity] Unit of the answer, as density of water or as text, such as "lb/ft3". Left out: "Mg/m3".
 * @returns A labelled block: maximum dry density and optimum by each correlation, with the source.
 */
export function plasticPeakExpected(plasticLimit: any[][], effort?: any[][], waterDensity?: any[][]): any[][] {
  return reply(() => plasticPeak(cells(plasticLimit), cells(effort), cells(waterDensity)));
}
