import type { Scatter } from "../scatter";
import type { CompactionTest, CurveId, PeakInterval } from "../fit";

export interface FitOptions {
  readonly scatter: Scatter;
  /** weighs each point by the doubt of its readings; otherwise every point counts the same, as in any chart's trend line */
  readonly weigh: boolean;
}

/** A curve fitted to a test, with its peak inside the data. */
export interface FittedCurve {
  readonly curve: Curve;
  /** indices of the points it was fitted to */
  readonly used: readonly number[];
  /** of the plain residuals over the points used */
  readonly sumOfSquares: number;
  readonly peak: { readonly water: number; readonly dry: number };
  /** how many numbers the points had to fix */
  readonly parameters: number;
  /** dry density on the curve */
  at(water: number): number;
  /** what the doubts of the readings make of the peak and of the curve */
  reckon(): Reckoning;
}

export interface Reckoning {
  readonly method: "exact" | "profile" | "bootstrap";
  /** how many times the points scatter more than their readings' doubts say; 1 where they do not, or no point is left over */
  readonly widening: number;
  readonly maxDryDensity: PeakInterval;
  readonly optimumWater: PeakInterval;
  /** half the width of the 95 % interval of the curve at a water content */
  halfBand(water: number): number;
}

/** One model of a compaction curve. */
export interface Curve {
  readonly id: CurveId;
  readonly parameters: number;
  /** weighed by `auto` against the others */
  readonly weighed: boolean;
  /** what it needs, for the refusal */
  readonly needs: string;
  fit(test: CompactionTest, options: FitOptions): FittedCurve | "not-enough" | "no-peak";
}

export const distinctWaters = ({ waters }: CompactionTest): number => new Set(waters).size;

export const allPoints = ({ waters }: CompactionTest): number[] => waters.map((_, i) => i);

export const spareOf = ({ used, parameters }: FittedCurve): number => used.length - parameters;

/** Plain residuals of all points, fitted or not: measured less curve. */
export const residualsOf = ({ waters, dries }: CompactionTest, { at }: Pick<FittedCurve, "at">): number[] => waters.map((water, i) => dries[i]! - at(water));
