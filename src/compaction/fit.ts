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
  /** grain of the soil, where it is told: it sets how full of water a soil is at its optimum */
  readonly soil?: SoilGrain | undefined;
  /** water contents of the tins of each point, where there was more than one */
  readonly tins?: readonly (readonly number[])[] | undefined;
  /** stones left out of the test, where there were any */
  readonly oversize?: Oversize | undefined;
  /** the peak that somebody reported from these points, and the standard it follows */
  readonly reported?: ReportedPeak | undefined;
}

export const soilGrains = ["fine", "granular"] as const;
export type SoilGrain = (typeof soilGrains)[number];

/** Oversize of the whole soil: percent of dry mass, bulk oven-dry specific gravity, water content in percent. */
export interface Oversize { readonly percent: number; readonly gravity: number; readonly water: number }

export interface ReportedPeak {
  readonly maxDryDensity?: number | undefined;
  readonly optimumWater?: number | undefined;
  readonly standard?: StandardId | undefined;
}

export const standardIds = ["ASTM D698", "ASTM D1557", "AASHTO T 99", "AASHTO T 180", "BS 1377-4", "AS 1289", "IS 2720"] as const;
export type StandardId = (typeof standardIds)[number];

export const curveWords = ["auto", "parabola", "cubic", "quartic", "saturation", "top three", "smooth"] as const;
export type CurveWord = (typeof curveWords)[number];
/** A curve that was fitted; `auto` always ends in one of these. */
export type CurveId = Exclude<CurveWord, "auto">;

/** A curve's name inside a sentence. */
export const curveName = (id: CurveId): string => ({ saturation: "saturation curve", smooth: "smooth curve", "top three": "parabola through the top three" } as Partial<Record<CurveId, string>>)[id] ?? id;

/** An interval whose end is null is not bounded by the data on that side. */
export interface PeakInterval { readonly low: number | null; readonly high: number | null }

export interface PeakFigure extends PeakInterval { readonly value: number }

export interface PeakPlace { readonly water: number; readonly dry: number }

/** A curve that the points cannot tell from the chosen one. */
export interface OtherCurve extends PeakPlace {
  readonly curve: CurveId;
  /** false where it has no spare point, and so nothing to be judged by */
  readonly judged: boolean;
  /** computed when first asked for; null where it is not judged */
  intervals(): PeakIntervals | null;
}

export interface PeakIntervals { readonly maxDryDensity: PeakInterval; readonly optimumWater: PeakInterval }

/** Everything that is known of one fitted test. Functions, pane, chart and review read it; nothing refits. */
export interface Fit {
  readonly test: CompactionTest;
  readonly curve: CurveId;
  /** why this curve: what was asked for, or how `auto` weighed the others */
  readonly reason: string;
  readonly maxDryDensity: PeakFigure;
  readonly optimumWater: PeakFigure;
  /** the stated doubts of the readings, widened where the points scatter more than those say */
  readonly intervalFrom: "stated scatter" | "stated scatter, widened";
  /** one line on the interval: level, what it rests on, whether it is bounded */
  readonly intervalNote: string;
  /** how many times the interval was widened; 1 where it was not */
  readonly widening: number;
  /** other admissible curves that the points cannot tell from this one, with what they say. Computed when first asked for, as the findings are. */
  readonly otherCurves: readonly OtherCurve[];
  /** the interval of this curve joined with what the other curves say: scatter and doubt about the curve in one. Computed when first asked for. */
  joined(): PeakIntervals;
  /** the peak without each point in turn; null where the curve cannot be fitted without it. Computed when first asked for. */
  leaveOneOut(): readonly (PeakPlace | null)[];
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
  readonly why: "too-few-points" | "no-spread" | "valley" | "flat" | "rising" | "falling" | "no-curve-follows" | "peak-outside" | "needs-gravity" | "not-one-peak";
  readonly says: string;
  readonly findings: readonly Finding[];
}

export type FitOutcome = { readonly ok: true; readonly fit: Fit } | { readonly ok: false; readonly noFit: NoFit };
