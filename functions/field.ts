import { relativeCompactionColumn, waterGapColumn } from "../src/worksheet/field";
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
