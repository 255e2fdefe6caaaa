import { LINE_ALLOWANCE, zeroAirVoids } from "../phase/lines";
import { curves } from "./curves";
import { spareOf, type FitOptions, type FittedCurve } from "./curves/curve";
import { curveName, type CompactionTest, type OtherCurve, type PeakInterval, type PeakIntervals, type PeakPlace } from "./fit";
import { curveScatter } from "./scatter";

export interface Weighed { readonly fitted: FittedCurve; readonly weight: number }

/** Every weighed curve, fitted once: those admitted with their weight, and why the others are not. */
export interface Weighing {
  readonly admitted: readonly Weighed[];
  /** "cubic: no spare point" */
  readonly left: readonly string[];
  readonly pastLine: boolean;
  /** curves with a peak inside the data and not past the line, spare point or not: what the doubt about the curve is told from */
  readonly possible: readonly FittedCurve[];
}

/**
 * Weighs the curves by RSS/σ₀² + 2p with a stated scatter σ₀, among those with their peak inside the data, not past the
 * zero-air-voids line, and with at least one spare point. (A criterion that estimates its own variance is undefined on
 * tests of four to six points.) Source: Akaike's criterion with known variance; Burnham and Anderson, Model Selection and
 * Multimodel Inference (2002), section 2.2.
 */
export function weighCurves(test: CompactionTest, options: FitOptions, known?: FittedCurve): Weighing {
  const scatter = curveScatter(test.dries, options.scatter);
  const admitted: Weighed[] = [], left: string[] = [], possible: FittedCurve[] = [];
  let pastLine = false;
  for (const curve of curves) {
    if (!curve.weighed) continue;
    const fitted = known?.curve === curve ? known : curve.fit(test, options);
    if (fitted === "not-enough") {
      if (curve.id !== "saturation" || test.specificGravity !== undefined) left.push(`${curveName(curve.id)}: too few points`);
    }
    else if (fitted === "no-peak") left.push(`${curveName(curve.id)}: no peak inside the data`);
    else if (peakPastLine(test, fitted)) {
      pastLine = true;
      left.push(`${curveName(curve.id)}: its peak lies past the zero-air-voids line`);
    } else {
      possible.push(fitted);
      if (spareOf(fitted) < 1) left.push(`${curveName(curve.id)}: no spare point`);
      else admitted.push({ fitted, weight: fitted.sumOfSquares / scatter ** 2 + 2 * fitted.parameters });
    }
  }
  return { admitted, left, pastLine, possible };
}

function peakPastLine({ specificGravity, waterDensity }: CompactionTest, { peak }: FittedCurve): boolean {
  if (specificGravity === undefined) return false;
  return peak.dry > zeroAirVoids.value({ waterContent: peak.water, specificGravity, waterDensity }) * (1 + LINE_ALLOWANCE);
}

/** A difference of the criterion below this tells nothing between two curves. Burnham and Anderson, section 2.6. */
export const TELLING = 2;

/**
 * The curves that may as well be right: those whose weight differs from the least by no more than tells nothing, and those
 * that have no spare point and hence nothing against them.
 */
export function othersThan(chosen: FittedCurve, { admitted, possible }: Weighing): OtherCurve[] {
  const least = Math.min(...admitted.map(({ weight }) => weight));
  return possible.flatMap((one) => {
    if (one.curve === chosen.curve) return [];
    const weight = admitted.find(({ fitted }) => fitted === one)?.weight;
    if (weight !== undefined && weight >= least + TELLING) return [];
    return [{ curve: one.curve.id, ...one.peak, judged: weight !== undefined, intervals: () => weight === undefined ? null : one.reckon() }];
  });
}

/** The interval of the chosen curve, widened to hold the peaks of the others and their intervals where they have one. */
export function joinedInterval(own: PeakIntervals, others: readonly OtherCurve[]): PeakIntervals {
  const join = (which: keyof PeakIntervals, place: keyof PeakPlace): PeakInterval => {
    let { low, high } = own[which];
    for (const other of others) {
      const theirs = other.intervals()?.[which] ?? { low: other[place], high: other[place] };
      low = low === null || theirs.low === null ? null : Math.min(low, theirs.low);
      high = high === null || theirs.high === null ? null : Math.max(high, theirs.high);
    }
    return { low, high };
  };
  return { maxDryDensity: join("maxDryDensity", "dry"), optimumWater: join("optimumWater", "water") };
}
