import { lotCharacteristic, lotSpots, lotTests, lotWithin } from "../src/worksheet/lots";
import { cells, reply } from "./reply";

/**
 * Percent of a lot within its limits, estimated from its tests by the exact distribution for normal values.
 * @customfunction LOTWITHIN
 * @param values Test results of the lot, at least three. A range.
 * @param lower Lower limit; leave empty where there is none.
 * @param [upper] Upper limit. Left out: none.
 * @returns Percent within limits.
 */
export function lotWithinLimits(values: any[][], lower: any[][], upper?: any[][]): any[][] {
  return reply(() => lotWithin(cells(values), cells(lower), cells(upper)));
}

/**
 * Characteristic value of a lot: mean less k sample standard deviations.
 * @customfunction LOTCHAR
 * @param values Test results of the lot, at least two, each unrounded. A range.
 * @param [k] Factor of the specification. Left out: the factor by which a lot with 10 % below the limit is accepted 90 times of 100 (contractor's risk 10 %).
 * @returns Characteristic value, in the unit of the values.
 */
export function lotChar(values: any[][], k?: any[][]): any[][] {
  return reply(() => lotCharacteristic(cells(values), cells(k)));
}

/**
 * Random test positions in a lot, one in each of equal stretches of its length. The same seed gives the same positions.
 * @customfunction LOTSPOTS
 * @param length Length of the lot, any unit.
 * @param width Width of the lot, same unit.
 * @param count Number of tests, up to 1000.
 * @param seed Any whole number; write it down with the positions.
 * @returns A heading and one row a test: number, distance along, distance across.
 */
export function lotSpotList(length: any[][], width: any[][], count: any[][], seed: any[][]): any[][] {
  return reply(() => lotSpots(cells(length), cells(width), cells(count), cells(seed)));
}

/**
 * Number of tests that a quantity of fill needs.
 * @customfunction LOTTESTS
 * @param quantity Quantity placed, any unit. A cell or a column.
 * @param perTest Quantity that one test stands for, same unit.
 * @param [minimum] Least number of tests for anything placed at all. Left out: 1.
 * @returns Number of tests; none for no quantity.
 */
export function lotTestCount(quantity: any[][], perTest: any[][], minimum?: any[][]): any[][] {
  return reply(() => lotTests(cells(quantity), cells(perTest), cells(minimum)));
}
