import { incompleteBeta } from "../numerics/distributions";
import { noncentralStudentQuantile } from "../numerics/noncentral-t";

export const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;

/** Sample standard deviation, with n − 1. */
export function sampleDeviation(values: readonly number[]): number {
  const middle = mean(values);
  return Math.sqrt(values.reduce((sum, value) => sum + (value - middle) ** 2, 0) / (values.length - 1));
}

/**
 * Percent of a lot beyond one limit, estimated without bias from a normal sample: the symmetric beta distribution.
 * Source: FHWA TA 5080.12 (its tables agree to two decimals); Lieberman and Resnikoff, JASA 50 (1955) 457.
 */
function shareInside(quality: number, n: number): number {
  const x = Math.max(0, 0.5 - quality * Math.sqrt(n) / (2 * (n - 1)));
  return x >= 1 ? 0 : 1 - incompleteBeta(x, n / 2 - 1, n / 2 - 1);
}

/** Percent within limits; a limit that is null is not there. Needs three values at least. */
export function percentWithin(values: readonly number[], lower: number | null, upper: number | null): number {
  const n = values.length, middle = mean(values), s = sampleDeviation(values);
  // values that are all alike lie on one side, wholly
  const side = (distance: number): number => s === 0 ? (distance >= 0 ? 1 : 0) : shareInside(distance / s, n);
  const above = lower === null ? 1 : side(middle - lower), below = upper === null ? 1 : side(upper - middle);
  return Math.max(0, 100 * (above + below - 1));
}

/** Normal deviate that a tenth lies beyond. */
const TENTH = 1.2815515655446004;

/**
 * Factor of the characteristic value mean − k·s by which a lot with 10 % of its values below the limit is accepted 90 % of
 * the time (contractor's risk 10 %). Source: the Australian table for 2 to 10 tests (from memory), reproduced by the non-central t.
 */
export const characteristicFactor = (n: number): number => noncentralStudentQuantile(0.1, n - 1, TENTH * Math.sqrt(n)) / Math.sqrt(n);
