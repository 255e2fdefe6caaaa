import type { Finding } from "../findings/finding";

/** The points of one compaction test, in the sheet's own density unit. */
export interface CompactionTest {
  readonly waters: readonly number[];
  readonly dries: readonly number[];
  /** specific gravity of the solids, where it is known */
  readonly specificGravity?: number | undefined;
  /** measured, or only assumed: an assumed one cannot make a point impossible without a question */
  readonly specificGravityAssumed?: boolean | undefined;
  /** density of water in the sheet's unit */
  readonly waterDensity: number;
}

export const curveWords = ["auto", "parabola", "cubic", "top three"] as const;
export type CurveWord = (typeof curveWords)[number];
/** A curve that was fitted; `auto` always ends in one of these. */
export type CurveId = Exclude<CurveWord, "auto">;

/** An interval whose end is null is not bounded by the data on that side. */
export interface PeakInterval { readonly low: number | null; readonly high: number | null }

export interface PeakFigure extends PeakInterval { readonly value: number }

/** Everything that is known of one fitted test. Functions, pane, chart and review read it; nothing refits. */
export interface Fit {
  readonly test: CompactionTest;
  readonly curve: CurveId;
  /** why this curve: what was asked for, or how `auto` weighed the others */
  readonly reason: string;
  readonly maxDryDensity: PeakFigure;
  readonly optimumWater: PeakFigure;
  /** where the interval's width comes from: the scatter about the curve, or a stated one where no point is left over */
  readonly intervalFrom: "scatter of the points" | "stated scatter";
  /** one line on the interval: level, what it rests on, whether it is bounded */
  readonly intervalNote: string;
  /** root of the residual sum of squares over the spare points; null where none is left over */
  readonly standardError: number | null;
  readonly parameters: number;
  /** indices of the points the curve was fitted to */
  readonly used: readonly number[];
  /** residuals of all points, fitted or not: measured less curve */
  readonly residuals: readonly number[];
  /** percents at the fitted peak, where the specific gravity is known */
  readonly saturationAtOptimum: number | null;
  readonly airVoidsAtOptimum: number | null;
  /** dry density on the curve */
  at(water: number): number;
  /** 95 % interval of the curve itself (not of a new point) at a water content */
  bandAt(water: number): { readonly low: number; readonly high: number };
  readonly findings: readonly Finding[];
}

/** Why no curve was fitted, with what can still be said of the points. */
export interface NoFit {
  readonly why: "too-few-points" | "no-spread" | "valley" | "flat" | "rising" | "falling" | "no-curve-follows" | "peak-outside";
  readonly says: string;
  readonly findings: readonly Finding[];
}

export type FitOutcome = { readonly ok: true; readonly fit: Fit } | { readonly ok: false; readonly noFit: NoFit };
