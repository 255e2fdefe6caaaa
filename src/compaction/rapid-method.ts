import { curvatureAt, fitPolynomial, unscaled, valueAt, scaled } from "../numerics/polynomial";
import { relation } from "../relations/relation";
import { peakOf } from "./peak";

const hilf = { title: "ASTM D5080", clause: "rapid determination of percent compaction, converted wet density" };

/** Wet density brought back to the water content of the fill: dry density times the fill's own (1 + w), whatever that is. */
export const convertedWetDensity = relation("convertedDensity", "wetDensity / (1 + addedWaterShare / 100)", hilf);

/** Distance of the fill from its optimum: water content is of dry mass, added water of moist mass. */
export const gapOfRapidMethod = relation("waterGap", "0 - peakAddedWater * (1 + waterContent / 100)", hilf);

export interface RapidPeak {
  /** added water at the peak, percent of moist mass (negative: dried) */
  readonly added: number;
  /** peak of the converted wet density */
  readonly peak: number;
  /** converted wet density of the fill's soil as it came, without added water: on the curve */
  readonly atFill: number;
  /** root of the residual sum of squares over the spare points; null with three */
  readonly standardError: number | null;
}

/**
 * The peak of the converted wet densities: a parabola through the points, by least squares where there are more than three.
 * Null where they hold no peak.
 */
export function rapidPeak(added: readonly number[], wetDensities: readonly number[]): RapidPeak | null {
  const convert = convertedWetDensity.by("wetDensity", "addedWaterShare"), converted = wetDensities.map((wet, i) => convert(wet, added[i]!));
  const fit = fitPolynomial(added, converted, 2), top = curvatureAt(fit, 0) < 0 ? peakOf(fit) : null;
  if (top === null) return null;
  return {
    added: unscaled(fit, top), peak: valueAt(fit, top), atFill: valueAt(fit, scaled(fit, 0)),
    standardError: added.length > 3 ? Math.sqrt(fit.sumOfSquares / (added.length - 3)) : null,
  };
}
